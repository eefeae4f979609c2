/** A date of the Gregorian calendar. */
export interface Civil {
  readonly year: number;
  readonly month: number;
  readonly day: number;
}

/**
 * The date a number of days after 1 January 1970; inverse of `daysFromCivil`.
 *
 * Method: 400-year eras of 146 097 days, years counted from March (as in `daysFromCivil`).
 *
 * @param days whole number
 * @returns year, month 1…12, day 1…31
 */
export function civilFromDays(days: number): Civil {
  const shifted = days + 719468;
  const era = Math.floor(shifted / 146097);
  const dayOfEra = shifted - era * 146097;
  const yearOfEra = Math.floor(
    (dayOfEra - Math.floor(dayOfEra / 1460) + Math.floor(dayOfEra / 36524) - Math.floor(dayOfEra / 146096)) / 365,
  );
  const dayOfYear = dayOfEra - (365 * yearOfEra + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100));
  const monthFromMarch = Math.floor((5 * dayOfYear + 2) / 153);
  const day = dayOfYear - Math.floor((153 * monthFromMarch + 2) / 5) + 1;
  const month = monthFromMarch < 10 ? monthFromMarch + 3 : monthFromMarch - 9;
  return { year: yearOfEra + era * 400 + (month <= 2 ? 1 : 0), month, day };
}
