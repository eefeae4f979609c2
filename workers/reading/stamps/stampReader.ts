import type { StampForm } from '../../contract/dialect.ts';
import { parseNumber } from '../cells/parseNumber.ts';
import { parseClock, type ClockRead } from './parseClock.ts';
import { parseDate } from './parseDate.ts';

const packed = /^(\d{8})[T ]?(\d{2})(\d{2})(\d{2})?(?:[.,](\d+))?(Z|[+-]\d{2}:?\d{2})?$/u;
const isoHour = /^(\d{4}-\d{2}-\d{2})[T ](\d{2})(\d{2})?(\d{2})?(Z|[+-]\d{2}:?\d{2})?$/u;
const dotted = /^(.*\d.*?)(?:[T ]|-(?=\d{2}\.\d{2}\.\d{2}))\s*(\d{1,2}\.\d{2}(?:\.\d{2}(?:[.,]\d+)?)?)$/u;
const hourMark = /^(.*?)[T ]*(\d{1,2})\s?[hH]\s?(\d{2})?(?:\s?(?:min|m)?\s?(\d{2})\s?s?)?$/u;

/** No stamp is longer than this. */
const LONGEST = 64;

const isDigit = (code: number): boolean => code >= 48 && code <= 57;
const endOfDate = /[T_,;\-–\s]+$/u;

/** How often the order of day and month was told by a date: `own`, only this order exists; `other`, only the other one. */
export interface OrderTally {
  own: number;
  other: number;
  open: number;
}

/**
 * Reader of stamps in one form. `read` answers seconds since 1 January 1970 by the clock as written (the offset is not
 * taken off), NaN where the text is no stamp of the form.
 *
 * The date of the stamp before is remembered, since most stamps repeat it. Dates whose order of day and month is open are
 * tallied; a run of equal dates counts once.
 */
export class StampReader {
  /** Minutes east of Greenwich that the last stamp named; NaN where it named none. */
  offset = NaN;
  /** Whether the last stamp had a date, and a time of day. */
  hasDate = false;
  hasClock = false;
  readonly tally: OrderTally = { own: 0, other: 0, open: 0 };
  private readonly form: StampForm;
  private readonly decimal: '.' | ',';
  private lastDate = '';
  private lastDays = NaN;
  private readonly clock: ClockRead = { seconds: 0, offset: NaN };

  constructor(form: StampForm, decimal: '.' | ',') {
    this.form = form;
    this.decimal = decimal;
  }

  read(text: string): number {
    this.offset = NaN;
    this.hasDate = false;
    this.hasClock = false;
    if (this.form === 'number' || this.form === 'epochSeconds') return parseNumber(text, this.decimal, null);
    if (this.form === 'epochMilliseconds') return parseNumber(text, this.decimal, null) / 1000;
    return this.calendar(text.trim());
  }

  private calendar(text: string): number {
    if (text.length > LONGEST) return NaN;
    const colon = text.indexOf(':');
    if (colon < 1) return this.withoutColon(text);
    let at = colon - 1;
    if (!isDigit(text.charCodeAt(at))) return NaN;
    while (at > 0 && isDigit(text.charCodeAt(at - 1))) at--;
    // A date that runs into the hour (20240501T...) is taken apart elsewhere; more than two digits are elapsed hours.
    const dateText = at === 0 ? '' : text.slice(0, at);
    if (!parseClock(text, at, 0x3a, dateText === '', this.clock)) return NaN;
    return this.combine(dateText);
  }

  private combine(dateText: string): number {
    this.hasClock = true;
    this.offset = this.clock.offset;
    if (dateText === '') return this.clock.seconds;
    return this.days(dateText) * 86400 + this.clock.seconds;
  }

  private withoutColon(text: string): number {
    let match = packed.exec(text) ?? isoHour.exec(text);
    if (match !== null) {
      const [hour, minute, second] = [match[2]!, match[3] ?? '00', match[4] ?? '00'];
      const fraction = match.length === 7 && match[5] !== undefined ? `.${match[5]}` : '';
      const zone = match[match.length - 1] ?? '';
      if (!parseClock(`${hour}:${minute}:${second}${fraction}${zone}`, 0, 0x3a, false, this.clock)) return NaN;
      return this.combine(match[1]!);
    }
    const days = this.days(text);
    if (!Number.isNaN(days)) return days * 86400;
    match = dotted.exec(text);
    if (match !== null && parseClock(match[2]!, 0, 0x2e, false, this.clock)) return this.combine(match[1]!);
    match = hourMark.exec(text);
    if (match === null) return NaN;
    const [hour, minute, second] = [match[2]!, match[3] ?? '00', match[4] ?? '00'];
    return parseClock(`${hour}:${minute}:${second}`, 0, 0x3a, false, this.clock) ? this.combine(match[1]!) : NaN;
  }

  private days(dateText: string): number {
    if (dateText === this.lastDate) {
      this.hasDate = !Number.isNaN(this.lastDays);
      return this.lastDays;
    }
    const { days, other } = parseDate(dateText.replace(endOfDate, ''), this.form);
    if (other !== undefined) {
      const [mine, exchanged] = [!Number.isNaN(days), !Number.isNaN(other)];
      if (mine && exchanged && days !== other) this.tally.open++;
      else if (mine && !exchanged) this.tally.own++;
      else if (exchanged && !mine) this.tally.other++;
    }
    this.lastDate = dateText;
    this.lastDays = days;
    this.hasDate = !Number.isNaN(days);
    return days;
  }
}
