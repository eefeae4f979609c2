import type { Placement } from './grid/placeOnGrid.ts';
import type { ColumnTally } from './rows/columnTally.ts';

/**
 * Places of a record that are gaps because the reading was below a detection limit.
 *
 * @param column the column of the readings; @param rows rows of the file that belong to the record; null for all
 * @param placement those rows on the grid; @param values readings on the grid
 * @returns places counted from 0, ascending; a place that another row has filled with a number is none
 */
export function limitPlaces(
  column: ColumnTally,
  rows: Int32Array | null,
  placement: Placement,
  values: Float64Array,
): Int32Array {
  const below = new Set(column.limits.view());
  const places = new Set<number>();
  if (below.size === 0) return new Int32Array(0);
  for (let row = 0; row < placement.at.length; row++) {
    const place = placement.at[row]!;
    if (place >= 0 && below.has(rows === null ? row : rows[row]!) && Number.isNaN(values[place]!)) places.add(place);
  }
  return Int32Array.from(places).sort();
}
