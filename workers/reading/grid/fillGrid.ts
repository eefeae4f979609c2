import type { Grid } from './findGrid.ts';
import type { Placement } from './placeOnGrid.ts';

/**
 * Values of one column at the places of the grid.
 *
 * Method: the value of the row that owns each place, or for `binMean` the mean of all numbers in the bin.
 *
 * @param values one a row, NaN for a gap; @param placement rows on the grid; @param rule of the grid
 * @returns one value a place, NaN where there is none
 */
export function fillGrid(values: Float64Array, placement: Placement, rule: Grid['rule']): Float64Array {
  const { places, at, owner } = placement;
  const filled = new Float64Array(places);
  if (rule !== 'binMean') {
    for (let k = 0; k < places; k++) filled[k] = owner[k]! < 0 ? NaN : values[owner[k]!]!;
    return filled;
  }
  const counts = new Int32Array(places);
  for (let row = 0; row < at.length; row++) {
    const place = at[row]!;
    if (place < 0 || Number.isNaN(values[row]!)) continue;
    counts[place]!++;
    // Updated mean: no sum that loses digits on a large offset.
    filled[place]! += (values[row]! - filled[place]!) / counts[place]!;
  }
  for (let k = 0; k < places; k++) if (counts[k] === 0) filled[k] = NaN;
  return filled;
}
