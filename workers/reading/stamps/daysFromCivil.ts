const lengths = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];

const isLeap = (year: number): boolean => year % 4 === 0 && (year % 100 !== 0 || year % 400 === 0);

/**
 * Days from 1 January 1970 to a date of the Gregorian calendar.
 *
 * Method: years counted from March in 400-year eras of 146 097 days (E. G. Richards, in Explanatory Supplement to the
 * Astronomical Almanac, 3rd ed. 2013, § 15.11; the rule itself is that of ISO 8601).
 *
 * @param year 0…9999; @param month 1…12; @param day 1…31, all whole
 * @returns whole days; NaN for a date that does not exist, such as 30 February
 */
export function daysFromCivil(year: number, month: number, day: number): number {
  if (month < 1 || month > 12 || day < 1) return NaN;
  const length = month === 2 && isLeap(year) ? 29 : lengths[month - 1]!;
  if (day > length) return NaN;
  const marchYear = month > 2 ? year : year - 1;
  const era = Math.floor(marchYear / 400);
  const yearOfEra = marchYear - era * 400;
  const dayOfYear = Math.floor((153 * (month + (month > 2 ? -3 : 9)) + 2) / 5) + day - 1;
  const dayOfEra = yearOfEra * 365 + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100) + dayOfYear;
  return era * 146097 + dayOfEra - 719468;
}
