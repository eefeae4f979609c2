import type { Dialect } from '../../contract/dialect.ts';
import { parseNumber } from '../cells/parseNumber.ts';
import type { HeadRow } from './headRows.ts';
import { columnCells } from './sniffTime.ts';

const tail = /\d[.,]?(\s*[°%‰µμ\p{L}][\p{L}\d°/³²%·]{0,7})$/u;
const SHARE = 0.6;

/**
 * What the numbers of each column are followed by, such as the unit in `7.31 pH`.
 *
 * Method: the text behind the last digit, where most cells of a column share it and become numbers without it.
 *
 * @param body data rows; @param columns their number; @param marks decimal and thousands marks
 * @returns one text a column, empty where there is none
 */
export function sniffSuffixes(
  body: readonly HeadRow[],
  columns: number,
  marks: Pick<Dialect, 'decimal' | 'thousands'>,
): string[] {
  return Array.from({ length: columns }, (_, j) => {
    const cells = columnCells(body, j);
    const counts = new Map<string, number>();
    for (const cell of cells) {
      if (!Number.isNaN(parseNumber(cell, marks.decimal, marks.thousands))) continue;
      const suffix = tail.exec(cell)?.[1];
      if (suffix === undefined) continue;
      if (Number.isNaN(parseNumber(cell.slice(0, -suffix.length), marks.decimal, marks.thousands))) continue;
      counts.set(suffix, (counts.get(suffix) ?? 0) + 1);
    }
    const [best, count] = [...counts].sort((a, b) => b[1] - a[1])[0] ?? ['', 0];
    return count > SHARE * cells.length ? best.trim() : '';
  });
}
