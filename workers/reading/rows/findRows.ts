import { splitRows } from './splitRows.ts';
import type { RawRow, RowPlan, RowsRead } from './readRows.ts';

/**
 * The cells of a few rows, found again in the text.
 *
 * Method: only the pieces that hold a wanted row are split a second time, from the mark left at their first row.
 *
 * @param plan the plan the rows were read by
 * @param read what reading gave
 * @param wanted row numbers, any order
 * @returns the rows in ascending order; rows that are not there are left out
 */
export function findRows(plan: RowPlan, read: RowsRead, wanted: readonly number[]): RawRow[] {
  const { text, dialect } = plan;
  const left = [...new Set(wanted)].filter((row) => row < read.rows).sort((a, b) => a - b);
  const found: RawRow[] = [];
  while (left.length > 0) {
    const next = left[0]!;
    const mark = read.marks.findLast(({ row }) => row <= next)!;
    const split = { text, delimiter: dialect.delimiter, quote: dialect.quote, from: mark.from, line: mark.line };
    const line = read.lines[next]!;
    left.shift();
    splitRows(split, {
      row: (cells, at) => {
        if (at === line) found.push({ row: next, line, cells });
        return at < line;
      },
    });
  }
  return found;
}
