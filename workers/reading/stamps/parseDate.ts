import type { StampForm } from '../../contract/dialect.ts';
import { daysFromCivil } from './daysFromCivil.ts';
import { monthNumber } from './monthNames.ts';

/** A date read from a text. `other`: the same fields with day and month exchanged, where the text leaves that open. */
export interface DateRead {
  /** Days since 1 January 1970; NaN where the text is no date in this form. */
  readonly days: number;
  /** Days under the other order of day and month; NaN where that is no date; undefined where the order is not open. */
  readonly other?: number;
}

const none: DateRead = { days: NaN };
const three = /^(\d{1,4})\s*([-/.])\s*(\d{1,2})\s*\2\s*(\d{1,4})\.?$/u;
const compact = /^(\d{4})(\d{2})(\d{2})$/u;
const blanks = /^(\d{4})\s+(\d{1,2})\s+(\d{1,2})$/u;
const yearMonth = /^(\d{4})([-/.]?)(\d{2})$/u;
const monthYear = /^(\d{1,2})([-/.])(\d{4})$/u;
const yearAlone = /^\d{4}$/u;
const ordinal = /^(\d{4})-(\d{3})$/u;
const week = /^(\d{4})-?[Ww](\d{1,2})(?:-?([1-7]))?$/u;
const quarter = /^(\d{4})\s*[-/. ]?\s*[Qq]([1-4])$/u;
const quarterFirst = /^[Qq]([1-4])\s*[-/. ]?\s*(\d{4})$/u;
const dayName = /^(\d{1,2})(?:st|nd|rd|th)?[-./ ]*(?:de )?(\p{L}{3,10})\.?(?: de)?[-./, ]*(\d{4}|\d{2})$/u;
const nameDay = /^(\p{L}{3,10})\.?[-/ ]*(\d{1,2})(?:st|nd|rd|th)?(?:,\s*|[-/ ]+)(\d{4}|\d{2})$/u;
const yearName = /^(\d{4})[-/. ]*(\p{L}{3,10})\.?(?:[-/. ]*(\d{1,2}))?$/u;
const nameYear = /^(\p{L}{3,10})\.?[-/.' ]*(\d{4}|\d{2})$/u;
const weekday =
  /^(?:mon|tue|wed|thu|fri|sat|sun|mo|di|mi|do|fr|sa|so|lun|mar|mer|mie|jeu|jue|ven|vie|sam|sab|dim|dom|gio|ma|wo|vr|za|zo)\p{L}*\.?,?\s+/iu;

/** POSIX `strptime`: 69…99 are 1969…1999, 00…68 are 2000…2068. */
const fullYear = (text: string): number => {
  const year = Number(text);
  return text.length > 2 ? year : year + (year >= 69 ? 1900 : 2000);
};

/** Monday of a week (ISO 8601: week 1 holds the first Thursday, that is 4 January), plus a day 1…7. */
function daysOfWeek(year: number, number: number, day: number): number {
  const fourth = daysFromCivil(year, 1, 4);
  const monday = fourth - ((((fourth + 3) % 7) + 7) % 7);
  const next = daysFromCivil(year + 1, 1, 4);
  const weeks = (next - ((((next + 3) % 7) + 7) % 7) - monday) / 7;
  return number < 1 || number > weeks ? NaN : monday + (number - 1) * 7 + day - 1;
}

function numeric(text: string, form: StampForm): DateRead | null {
  const match = three.exec(text);
  if (match === null) return null;
  const [a, mark, b, c] = [match[1]!, match[2]!, match[3]!, match[4]!];
  if (a.length === 4) {
    const strict = form === 'iso' && (mark !== '-' || b.length !== 2 || c.length !== 2);
    return strict || c.length > 2 ? none : { days: daysFromCivil(Number(a), Number(b), Number(c)) };
  }
  if (a.length > 2 || c.length === 3 || c.length === 1) return none;
  const year = fullYear(c);
  if (form === 'dayFirst' || form === 'monthFirst') {
    const dayFirst = daysFromCivil(year, Number(b), Number(a));
    const monthFirst = daysFromCivil(year, Number(a), Number(b));
    return form === 'dayFirst' ? { days: dayFirst, other: monthFirst } : { days: monthFirst, other: dayFirst };
  }
  return form === 'yearFirst' && c.length === 2
    ? { days: daysFromCivil(fullYear(a.padStart(2, '0')), Number(b), Number(c)) }
    : none;
}

/** Dates with the month by name; year first only in that form, so that a form says what is written. */
function named(text: string, form: StampForm): number {
  const ordered = yearName.exec(text);
  if (ordered !== null) return daysFromCivil(Number(ordered[1]), monthNumber(ordered[2]!), Number(ordered[3] ?? 1));
  if (form === 'yearFirst') return NaN;
  let match = dayName.exec(text);
  if (match !== null) return daysFromCivil(fullYear(match[3]!), monthNumber(match[2]!), Number(match[1]));
  match = nameDay.exec(text);
  if (match !== null) return daysFromCivil(fullYear(match[3]!), monthNumber(match[1]!), Number(match[2]));
  match = nameYear.exec(text);
  return match === null ? NaN : daysFromCivil(fullYear(match[2]!), monthNumber(match[1]!), 1);
}

/** Shapes that read the same in every form: compact, ordinal, week, quarter, month or year alone. */
function settled(text: string): number {
  let match = compact.exec(text) ?? blanks.exec(text);
  if (match !== null) return daysFromCivil(Number(match[1]), Number(match[2]), Number(match[3]));
  match = yearMonth.exec(text);
  if (match !== null) return daysFromCivil(Number(match[1]), Number(match[3]), 1);
  match = monthYear.exec(text);
  if (match !== null) return daysFromCivil(Number(match[3]), Number(match[1]), 1);
  if (yearAlone.test(text)) return daysFromCivil(Number(text), 1, 1);
  match = ordinal.exec(text);
  if (match !== null) {
    const days = daysFromCivil(Number(match[1]), 1, 1) + Number(match[2]) - 1;
    return Number(match[2]) < 1 || days >= daysFromCivil(Number(match[1]) + 1, 1, 1) ? NaN : days;
  }
  match = week.exec(text);
  if (match !== null) return daysOfWeek(Number(match[1]), Number(match[2]), Number(match[3] ?? 1));
  match = quarter.exec(text);
  if (match !== null) return daysFromCivil(Number(match[1]), Number(match[2]) * 3 - 2, 1);
  match = quarterFirst.exec(text);
  return match === null ? NaN : daysFromCivil(Number(match[2]), Number(match[1]) * 3 - 2, 1);
}

/**
 * The date a text states, in one form.
 *
 * Method: the shapes of ISO 8601 (calendar, compact, ordinal, week dates; month or year alone, which read as their first
 * day), three numbers in the order of the form, month names in seven languages, quarters. Two-digit years after POSIX
 * (69…99 are 19xx). Dates that do not exist are refused, never rolled over.
 *
 * @param text a date without a time of day
 * @param form order of the fields where three numbers leave it open; `iso` accepts no other order than its own
 * @returns days since 1 January 1970, and under the exchanged order of day and month where the text leaves that open
 */
export function parseDate(text: string, form: StampForm): DateRead {
  if (text.length < 4 || text.length > 40) return none;
  const read = numeric(text, form);
  if (read !== null) return read;
  const fixed = settled(text);
  if (!Number.isNaN(fixed)) return { days: fixed };
  if (form === 'iso') return none;
  const days = named(text, form);
  if (!Number.isNaN(days)) return { days };
  const bare = text.replace(weekday, '');
  return bare === text ? none : parseDate(bare, form);
}
