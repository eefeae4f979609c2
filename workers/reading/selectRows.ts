import type { RowsRead } from './rows/readRows.ts';

/**
 * The rows of one tag.
 *
 * @param read rows as columns; @param tag index into its tags
 * @returns row numbers in the order of the file; null where the layout has no tags, that is, all rows
 */
export function rowsOfTag(read: RowsRead, tag: number): Int32Array | null {
  if (read.tags === null) return null;
  const rows = new Int32Array(read.rows);
  let count = 0;
  for (let row = 0; row < read.rows; row++) if (read.tags[row] === tag) rows[count++] = row;
  return rows.subarray(0, count);
}

/** Values at the chosen rows; all of them where `rows` is null. */
export const gather = (values: Float64Array, rows: Int32Array | null): Float64Array =>
  rows === null ? values : Float64Array.from(rows, (row) => values[row]!);

/** Numbers of a column, rows that the status column leaves out as gaps. */
export function columnValues(read: RowsRead, column: number): Float64Array {
  const values = read.columns[column]!.values.view().subarray(0, read.rows);
  if (read.leftOut === null) return values;
  return values.map((value, row) => (read.leftOut![row] === 1 ? NaN : value));
}
