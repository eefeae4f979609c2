import type { Axis, Span } from '../../workers/contract/series.ts';
import { counted, formatNumber } from './numbers.ts';

const UNITS = [
  [604_800, 'week'],
  [86_400, 'day'],
  [3600, 'hour'],
  [60, 'minute'],
  [1, 'second'],
] as const;

/** Milliseconds for a chart's time axis: the plant clock is shown as it was logged. */
export function chartTime(axis: Axis, index: number): number {
  if (axis.kind === 'months') {
    const months = axis.start + index * axis.step;
    return Date.UTC(1970 + Math.floor(months / 12), ((months % 12) + 12) % 12, 1);
  }
  return axis.kind === 'seconds' ? 1000 * (axis.start + index * axis.step) : axis.start + index * axis.step;
}

/** The time of a reading in ISO 8601 order, as exact as the interval needs; its number where the record has no time. */
export function timeAt(axis: Axis, index: number): string {
  if (axis.kind === 'index') return `reading ${formatNumber(axis.start + index * axis.step, 9)}`;
  const ms = chartTime(axis, index);
  if (axis.kind === 'months') return new Date(ms).toISOString().slice(0, axis.step % 12 === 0 ? 4 : 7);
  const parts = new Intl.DateTimeFormat('en-GB', {
    timeZone: axis.zone ?? 'UTC',
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
    second: '2-digit',
    hourCycle: 'h23',
  }).formatToParts(ms);
  const part = (type: string) => parts.find((one) => one.type === type)?.value ?? '';
  const date = `${part('year')}-${part('month')}-${part('day')}`;
  if (axis.step % 86_400 === 0 && part('hour') === '00' && part('minute') === '00') return date;
  const seconds = axis.step % 60 === 0 && part('second') === '00' ? '' : `:${part('second')}`;
  return `${date} ${part('hour')}:${part('minute')}${seconds}`;
}

/** A length of time in seconds, in the largest unit that keeps it short. */
export function formatDuration(seconds: number): string {
  for (const [size, name] of UNITS) {
    if (seconds < size && size > 1) continue;
    if (seconds % size === 0) return counted(seconds / size, name);
    if (seconds >= 2 * size || size === 1) return `${formatNumber(seconds / size, 3)} ${name}s`;
  }
  return `${formatNumber(seconds, 3)} seconds`;
}

/** The sampling interval in words, such as "every 10 minutes". */
export function formatInterval({ kind, step }: Axis): string {
  if (kind === 'index') return 'numbered, no time';
  if (kind === 'months') {
    if (step === 1) return 'every month';
    return step % 12 === 0 ? (step === 12 ? 'every year' : `every ${step / 12} years`) : `every ${step} months`;
  }
  return `every ${formatDuration(step).replace(/^1 /, '')}`;
}

/** A number of readings as a length of time, or as readings where there is no time. */
export function formatReadings(axis: Axis, readings: number): string {
  if (axis.kind === 'seconds') return formatDuration(readings * axis.step);
  if (axis.kind === 'months') return `${formatNumber(readings * axis.step, 3)} months`;
  return `${formatNumber(readings, 3)} readings`;
}

/** From and to of a stretch. */
export function formatSpan(axis: Axis, { from, to }: Span): string {
  return `${timeAt(axis, from)} to ${timeAt(axis, to - 1)}`;
}

/** The place nearest to a point of a chart's time axis; it may lie outside the record. */
export function placeAtChart(axis: Axis, x: number): number {
  if (axis.kind === 'index') return Math.round((x - axis.start) / axis.step);
  if (axis.kind === 'seconds') return Math.round((x / 1000 - axis.start) / axis.step);
  const date = new Date(x);
  const months = 12 * (date.getUTCFullYear() - 1970) + date.getUTCMonth() + (date.getUTCDate() - 1) / 31;
  return Math.round((months - axis.start) / axis.step);
}

/** The whole number at or above a quotient that may be a rounding error too large; never −0. */
const upTo = (quotient: number): number => Math.ceil(quotient - 1e-9) + 0;

/** A time that `placeOfTime` reads back: the time itself, or the count of the reading where times are finer than seconds. */
export function typedTime(axis: Axis, place: number): string {
  return axis.kind === 'seconds' && !Number.isInteger(axis.step) ? `reading ${place + 1}` : timeAt(axis, place);
}

/**
 * The place of a typed time: a date with or without a time of day, a month, a year, or the number of a reading.
 *
 * @returns the place of the reading at that time, or of the first one after it; null where the text is no time
 * @example on a record without time "12" is the reading numbered 12; "reading 12" is the twelfth of a record with time
 */
export function placeOfTime(axis: Axis, text: string): number | null {
  const counting = /^reading\s+(\d+)$/iu.exec(text.trim());
  if (counting !== null && axis.kind !== 'index') return Number(counting[1]) - 1;
  const bare = text.trim().replace(/^reading\s+/iu, '');
  if (axis.kind === 'index') {
    const number = Number(bare.replace(/[\u2009\s]/gu, ''));
    return bare === '' || !Number.isFinite(number) ? null : upTo((number - axis.start) / axis.step);
  }
  const match = /^(\d{4})(?:-(\d{1,2}))?(?:-(\d{1,2}))?(?:[T ](\d{1,2}):(\d{2})(?::(\d{2}(?:\.\d+)?))?)?$/u.exec(bare);
  if (match === null) return null;
  const [year, month, day, hour, minute, second] = match
    .slice(1)
    .map((part) => (part === undefined ? 0 : Number(part)));
  if (axis.kind === 'months') return upTo((12 * (year! - 1970) + (month || 1) - 1 - axis.start) / axis.step);
  const clock = Date.UTC(year!, (month || 1) - 1, day || 1, hour, minute) / 1000 + second!;
  // With a zone the clock shows another time than UTC: what it shows there is compared, twice for a change of the clock.
  let place = upTo((clock - axis.start) / axis.step);
  if (axis.zone === null) return place;
  for (let round = 0; round < 2; round += 1) {
    const shown =
      Date.parse(
        `${timeAt({ ...axis, kind: 'seconds' }, place)
          .replace(' ', 'T')
          .padEnd(16, 'T00:00')}Z`,
      ) / 1000;
    if (Number.isNaN(shown)) return place;
    place += upTo((clock - shown) / axis.step);
  }
  return place;
}
