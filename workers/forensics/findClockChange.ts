import type { Finding } from '../contract/forensics.ts';
import type { ReadingNote } from '../contract/reading.ts';
import type { Axis, Span } from '../contract/series.ts';
import { runsWhere } from './runsWhere.ts';

const HOUR = 3600;
const DAY = 86_400;
/** Clocks are put forward between midnight and three, on Sundays of these months (0 is January): north and south. */
const MONTHS = [2, 3, 8, 9];
/** Beyond this many missing hours on such Sundays a plant that rests on Sundays is likelier. */
const MOST = 4;

/**
 * A clock that was put forward or back.
 *
 * Method: forward: exactly one hour without a reading, between midnight and four of a Sunday in March, April, September or October, on a
 * record in plant time, with readings on both sides. Back: rows that the reading of the file found to repeat an hour.
 *
 * @param values gaps as NaN; @param axis of the record; @param notes from the reading of the file
 * @returns a finding whose places are the missing hours, or null; `numbers`: missing (hours), repeated (rows). None is offered: the
 *   remedy is to read the file in its time zone
 */
export function findClockChange(values: Float64Array, axis: Axis, notes: readonly ReadingNote[]): Finding | null {
  if (axis.kind !== 'seconds' || axis.zone !== null || axis.step > HOUR || HOUR % axis.step !== 0) return null;
  const perHour = HOUR / axis.step;
  const places = runsWhere(values.length, (t) => Number.isNaN(values[t]!), perHour).filter((run) =>
    isMissingHour(run, axis, perHour, values.length),
  );
  const missing = places.length <= MOST ? places.length : 0;
  const repeated = notes.find(({ kind }) => kind === 'clockChange')?.count ?? 0;
  if (missing + repeated === 0) return null;
  return {
    code: 'clockChange',
    count: missing + repeated,
    places: missing > 0 ? places : [],
    numbers: { missing, repeated },
    effect: 'patternShifted',
    offered: [],
  };
}

function isMissingHour({ from, to }: Span, axis: Axis, perHour: number, length: number): boolean {
  if (to - from !== perHour || from === 0 || to === length) return false;
  const begins = axis.start + from * axis.step;
  const date = new Date(1000 * begins);
  return begins % DAY <= 3 * HOUR && date.getUTCDay() === 0 && MONTHS.includes(date.getUTCMonth());
}
