import { monthOf } from './findMonths.ts';
import type { GridFound } from './findGrid.ts';

/** Rows put on a grid. Row numbers are indices into the stamps. */
export interface Placement {
  readonly places: number;
  /** Place of each row; −1 where its stamp is unreadable or off the grid. */
  readonly at: Int32Array;
  /** Row whose reading stands at each place (rule `nearest` and `last`); −1 for none. */
  readonly owner: Int32Array;
  readonly offGrid: number[];
  readonly duplicates: number[];
  readonly reversed: number[];
  readonly offGridCount: number;
  readonly duplicateCount: number;
  /** Duplicates whose stamp equals that of the row before them while the readings differ. */
  readonly conflictCount: number;
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
 * @returns place of every row, row of every place, and what did not fit
 */
export function placeOnGrid(times: Float64Array, values: Float64Array, found: GridFound): Placement {
  const { grid, start, places } = found;
  const at = new Int32Array(times.length).fill(-1);
  const owner = new Int32Array(places).fill(-1);
  const [offGrid, duplicates, reversed]: [number[], number[], number[]] = [[], [], []];
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
    if (grid.rule === 'nearest') {
      duplicateCount++;
      keep(duplicates, row);
      if (time === times[held]! && Math.abs(values[row]! - values[held]!) > 0) conflictCount++;
      const [missing, given] = [Number.isNaN(values[held]!), !Number.isNaN(values[row]!)];
      const nearer = off < distance[place]! - rounding && given;
      if ((missing && given) || nearer) {
        owner[place] = row;
        distance[place] = off;
      }
    } else if (time === times[held]!) {
      duplicateCount++;
      keep(duplicates, row);
    } else if (time > times[held]! && !Number.isNaN(values[row]!)) owner[place] = row;
  }
  const counts = { offGridCount, duplicateCount, conflictCount, reversedCount, jitterCount };
  return { places, at, owner, offGrid, duplicates, reversed, jitter, ...counts };
}
