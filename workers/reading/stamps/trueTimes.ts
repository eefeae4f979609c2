import type { Dialect } from '../../contract/dialect.ts';
import { noOffset, type RowsRead } from '../rows/readRows.ts';
import { resolveZone } from './zoneResolver.ts';

/** Stamps as the axis counts them, with its zone, and rows where the clock was changed. */
export interface TrueTimes {
  readonly times: Float64Array;
  readonly zone: string | null;
  readonly clockChanges: readonly number[];
  readonly skipped: readonly number[];
  /** Rows whose stamp names no offset while those of other rows do, with different ones: their instant is not known. */
  readonly unplaced: readonly number[];
}

const HALF_DAY = 43200;

/** Times of day without a date, counted on over midnight. */
function countDays(clock: Float64Array): Float64Array {
  let [day, before] = [0, -Infinity];
  return clock.map((time) => {
    if (Number.isNaN(time)) return time;
    if (time < before - HALF_DAY) day += 86400;
    before = time;
    return time + day;
  });
}

/**
 * Stamps as read turned into the seconds of the axis.
 *
 * Method: stamps that all name the same offset stay as the plant clock shows them (zone UTC where that offset is nought);
 * with changing offsets they become true instants in UTC; without offsets they are the plant clock, unless a zone with its
 * clock changes is given. Epoch counts are instants already. Times of day alone are counted on over midnight.
 *
 * @param read rows with stamps; @param dialect form, and zone (a name the platform knows)
 * @returns times by row, the zone of the axis, and rows next to clock changes
 */
export function trueTimes(read: RowsRead, dialect: Pick<Dialect, 'stamp' | 'zone'>): TrueTimes {
  const times = read.times ?? new Float64Array(0);
  const { zone } = dialect;
  const plain = { times, zone: null, clockChanges: [], skipped: [], unplaced: [] };
  if (dialect.stamp === 'number' || dialect.stamp === null) return plain;
  if (dialect.stamp.startsWith('epoch')) return { ...plain, zone: zone ?? 'UTC' };
  if (read.dateless * 2 > times.length) return { ...plain, times: countDays(times) };
  const { offsets } = read;
  if (offsets === null) {
    if (zone === null) return plain;
    const resolved = resolveZone(times, zone);
    return { times: resolved.times, zone, clockChanges: resolved.twice, skipped: resolved.missing, unplaced: [] };
  }
  const changes: number[] = [];
  let before = noOffset;
  for (let row = 0; row < offsets.length; row++) {
    if (offsets[row] === noOffset) continue;
    if (before !== noOffset && offsets[row] !== before) changes.push(row);
    before = offsets[row]!;
  }
  if (changes.length === 0 && zone === null) return { ...plain, zone: before === 0 ? 'UTC' : null };
  const instants = times.map((time, row) => (offsets[row] === noOffset ? NaN : time - offsets[row]! * 60));
  const unplaced: number[] = [];
  for (let row = 0; row < times.length; row++)
    if (Number.isNaN(instants[row]!) && !Number.isNaN(times[row]!)) unplaced.push(row);
  return { times: instants, zone: zone ?? 'UTC', clockChanges: changes, skipped: [], unplaced };
}
