import { isBlank } from '../cells/parseNumber.ts';

/** Offsets of zone words, in minutes: RFC 5322 § 4.3 for the obsolete American ones; CET, CEST, WET, WEST, EET, EEST by usage. */
const zoneWords: Readonly<Record<string, number>> = {
  z: 0,
  ut: 0,
  utc: 0,
  gmt: 0,
  wet: 0,
  west: 60,
  cet: 60,
  cest: 120,
  eet: 120,
  eest: 180,
  est: -300,
  edt: -240,
  cst: -360,
  cdt: -300,
  mst: -420,
  mdt: -360,
  pst: -480,
  pdt: -420,
};

/** A time of day. `offset`: minutes east of Greenwich; NaN where the text names none. */
export interface ClockRead {
  seconds: number;
  offset: number;
}

const tailShape =
  /^\s*(?:(a|p)\.?\s?m\.?)?\s*(?:\[?([A-Za-z]{1,4})?\s*(?:([+\u2212-])(\d{1,2})(?::?(\d{2}))?)?\]?)?(?:\[[\w/+-]+\])?\s*$/iu;

const isDigit = (code: number): boolean => code >= 48 && code <= 57;
const two = (text: string, at: number): number => {
  const high = text.charCodeAt(at) - 48;
  const low = text.charCodeAt(at + 1) - 48;
  return high >= 0 && high <= 9 && low >= 0 && low <= 9 ? high * 10 + low : NaN;
};

/** What may stand behind a time of day: a. m. or p. m., a zone word, an offset. */
function readTail(text: string, hour: number, into: ClockRead): boolean {
  const match = tailShape.exec(text);
  if (match === null) return false;
  const [, half, word, sign, offsetHours, offsetMinutes] = match;
  if (half !== undefined) {
    if (hour < 1 || hour > 12) return false;
    into.seconds += ((hour % 12) + (half.toLowerCase() === 'p' ? 12 : 0) - hour) * 3600;
  }
  if (word !== undefined) {
    const known = zoneWords[word.toLowerCase()];
    if (known === undefined) return false;
    into.offset = known;
  }
  if (sign !== undefined) {
    const size = Number(offsetHours) * 60 + Number(offsetMinutes ?? 0);
    if (Number(offsetHours) > 14 || Number(offsetMinutes ?? 0) > 59) return false;
    into.offset = (Number.isNaN(into.offset) ? 0 : into.offset) + (sign === '+' ? size : -size);
  }
  return true;
}

/**
 * The time of day written in a text from a place on.
 *
 * Method: ISO 8601 with colons; full stops as separators where `mark` says so; decimal fractions of a second after a
 * full stop or a comma; 24:00 as the end of the day; a leap second runs into the next minute; 12-hour clocks; offsets and
 * zone words behind.
 *
 * @param text whole stamp; @param at index of the first digit of the hour; @param mark code of the separator
 * @param elapsed true: hours may exceed 24 (a duration, where there is no date)
 * @param into receives the seconds since midnight and the offset
 * @returns whether the text from there to its end is a time of day
 */
export function parseClock(text: string, at: number, mark: number, elapsed: boolean, into: ClockRead): boolean {
  let hour = 0;
  let i = at;
  for (; i < text.length && isDigit(text.charCodeAt(i)); i++) hour = hour * 10 + text.charCodeAt(i) - 48;
  if (i === at || i - at > (elapsed ? 5 : 2) || text.charCodeAt(i) !== mark) return false;
  const minute = two(text, i + 1);
  if (!(minute < 60)) return false;
  i += 3;
  let second = 0;
  if (text.charCodeAt(i) === mark && isDigit(text.charCodeAt(i + 1))) {
    second = two(text, i + 1);
    if (!(second <= 60)) return false;
    i += 3;
    const point = text.charCodeAt(i);
    if ((point === 0x2e || point === 0x2c || point === 0x3a) && isDigit(text.charCodeAt(i + 1))) {
      const from = i + 1;
      for (i = from; i < text.length && isDigit(text.charCodeAt(i)); i++);
      // One division, so that the fraction is the double nearest to the text.
      const digits = Math.min(i - from, 15);
      second += Number(text.slice(from, from + digits)) / 10 ** digits;
    }
  }
  if (hour > 24 && !elapsed) return false;
  if (hour === 24 && !elapsed && (minute > 0 || second > 0)) return false;
  into.seconds = hour * 3600 + minute * 60 + second;
  into.offset = NaN;
  while (i < text.length && isBlank(text.charCodeAt(i))) i++;
  return i === text.length || readTail(text.slice(i), hour, into);
}
