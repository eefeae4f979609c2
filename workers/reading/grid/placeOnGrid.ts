import type { Dialect } from '../../contract/dialect.ts';
import { monthOf } from './findMonths.ts';
import type { GridFound } from './findGrid.ts';

/** Rows put on a grid. Row numbers are indices into the stamps. */
export interface Placement {
  readonly places: number;
  /** Place of each row; −1 where its stamp is unreadable or off the grid. */
  readonly at: Int32Array;
  /** Row whose reading stands at each place (rule `nearest` and `last`); −1 for none, −2 where rows contradict and none is kept. */
  readonly owner: Int32Array;
  readonly offGrid: number[];
  readonly duplicates: number[];
  readonly reversed: number[];
  readonly conflicts: number[];
  readonly offGridCount: number;
  readonly duplicateCount: number;
  /** Duplicates whose stamp equals that of the row before them while the readings differ. */
  readonly conflictCount: number;
  /** Rows that came to a place taken by a row of another time (`binMean`, `last`): averaged in, or one of the two dropped. */
  readonly sharedCount: number;
  readonly reversedCount: number;
  /** Rows that are on the grid though not exactly, and the largest distance as a fraction of the step. */
  readonly jitterCount: number;
  readonly jitter: number;
}

const PLACES_KEPT = 8;
/** Distances below this fraction of the step are rounding of the stamps, not jitter. */
const ROUNDING = 1e-6;

/**
 * Puts rows on a grid.
 *
 * Method by rule. `nearest`: the nearest grid point within the tolerance; of several rows at one place the nearest stays,
 * the first of equals, a row with a number before one without. `binMean`: the bin [start + k·step, start + (k+1)·step),
 * stamped with its beginning. `last`: the bin (start + (k−1)·step, start + k·step], stamped with its end; the latest row
 * stays.
 *
 * @param times stamps in seconds or counts, in the order of the file; NaN where unreadable
 * @param values readings of the same rows, NaN where there is none
 * @param found grid, first point, number of places
 * @param repeats which of two rows of one stamp with different readings stays; `gap`: neither
 * @returns place of every row, row of every place, and what did not fit
 */
export function placeOnGrid(
  times: Float64Array,
  values: Float64Array,
  found: GridFound,
  repeats: Dialect['repeats'] = 'first',
): Placement {
  const { grid, start, places } = found;
  const at = new Int32Array(times.length).fill(-1);
  const owner = new Int32Array(places).fill(-1);
  const offGrid: number[] = [];
  const duplicates: number[] = [];
  const reversed: number[] = [];
  const conflicts: number[] = [];
  const contradicted = new Set<number>();
  let sharedCount = 0;
  let [offGridCount, duplicateCount, conflictCount, reversedCount, jitterCount, jitter] = [0, 0, 0, 0, 0, 0];
  const keep = (list: number[], row: number) => {
    if (list.length < PLACES_KEPT) list.push(row);
  };
  const turnsOf = (time: number) => ((grid.kind === 'months' ? monthOf(time) : time) - start) / grid.step;
  const distance = new Float32Array(grid.rule === 'nearest' ? places : 0);
  // Seconds since 1970 have steps of a quarter of a microsecond as doubles.
  const rounding = Math.max(ROUNDING, grid.kind === 'seconds' ? (4 * Number.EPSILON * Math.abs(start)) / grid.step : 0);
  let before = -Infinity;
  for (let row = 0; row < times.length; row++) {
    const time = times[row]!;
    if (Number.isNaN(time)) continue;
    if (time < before) {
      reversedCount++;
      keep(reversed, row);
    }
    before = time;
    const turns = turnsOf(time);
    let place = Math.round(turns);
    if (grid.rule === 'binMean') place = Math.floor(turns + rounding);
    else if (grid.rule === 'last') place = Math.ceil(turns - rounding);
    const off = Math.abs(turns - place);
    if (place < 0 || place >= places || (grid.rule === 'nearest' && off > grid.tolerance)) {
      offGridCount++;
      keep(offGrid, row);
      continue;
    }
    at[row] = place;
    if (grid.rule === 'nearest' && off > rounding) {
      jitterCount++;
      if (off > jitter) jitter = off;
    }
    const held = owner[place]!;
    if (held < 0) {
      owner[place] = row;
      if (grid.rule === 'nearest') distance[place] = off;
      continue;
    }
    const repeated = time === times[held]!;
    if (repeated && Math.abs(values[row]! - values[held]!) > 0) {
      conflictCount++;
      keep(conflicts, row);
      if (repeats === 'gap') contradicted.add(place);
    }
    if (repeated || grid.rule === 'nearest') {
      duplicateCount++;
      keep(duplicates, row);
    } else sharedCount++;
    const [missing, given] = [Number.isNaN(values[held]!), !Number.isNaN(values[row]!)];
    if (!given) continue;
    if (grid.rule === 'nearest') {
      const nearer = off < distance[place]! - rounding;
      if (!missing && !nearer && !(repeated && repeats === 'last')) continue;
      distance[place] = off;
      owner[place] = row;
    } else if (missing || time > times[held]! || (repeated && repeats === 'last')) owner[place] = row;
  }
  for (const place of contradicted) owner[place] = -2;
  const counts = { offGridCount, duplicateCount, conflictCount, sharedCount, reversedCount, jitterCount };
  return { places, at, owner, offGrid, duplicates, reversed, conflicts, jitter, ...counts };
}
