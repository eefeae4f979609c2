import type { Axis } from '../contract/series.ts';
import type { CalendarPeriod } from '../contract/shape.ts';

const SECONDS: readonly (readonly [CalendarPeriod, number])[] = [
  ['hour', 3600],
  ['shift', 28_800],
  ['day', 86_400],
  ['week', 604_800],
  ['year', 31_556_952],
];
const MONTHS: readonly (readonly [CalendarPeriod, number])[] = [
  ['quarter', 3],
  ['year', 12],
];

/**
 * The lengths of time that people keep, in readings: hour, shift of eight hours, day, week and the Gregorian year of 365.2425 days; for
 * monthly axes quarter and year. Longest first.
 *
 * @param axis its interval
 * @returns those of at least two readings; none where the record has no time
 * @example hourly: year 8765.82, week 168, day 24, shift 8
 */
export function calendarPeriods(axis: Axis): readonly { readonly name: CalendarPeriod; readonly readings: number }[] {
  const table = axis.kind === 'seconds' ? SECONDS : axis.kind === 'months' ? MONTHS : [];
  return table
    .map(([name, length]) => ({ name, readings: length / axis.step }))
    .filter(({ readings }) => readings >= 2 - 1e-9)
    .reverse();
}
