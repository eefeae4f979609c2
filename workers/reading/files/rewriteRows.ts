import type { Dialect } from '../../contract/dialect.ts';
import { splitRows } from '../rows/splitRows.ts';

type Way = Pick<Dialect, 'delimiter' | 'quote'>;

/**
 * Data rows of a text written another way: cells in another order, another delimiter.
 *
 * @param text whole text with line feeds; @param from its first data row
 * @param way how it is written; @param wanted how it shall be; a wanted text without quotes is given double ones where needed
 * @param map for each column wanted, the column of the text; cells beyond them follow as they stand
 * @returns the rows, each ended by a line feed; as many lines as before
 */
export function rewriteRows(text: string, from: number, way: Way, wanted: Way, map: readonly number[]): string {
  const quote = wanted.quote ?? '"';
  const write = (cell: string): string => {
    const plain = !cell.includes(wanted.delimiter) && !cell.includes(quote) && !cell.includes('\n');
    return plain ? cell : `${quote}${cell.replaceAll(quote, quote + quote)}${quote}`;
  };
  const rows: string[] = [];
  splitRows(
    { text, delimiter: way.delimiter, quote: way.quote, from, line: 1 },
    {
      row: (cells) => {
        const ordered = map.map((column) => cells[column] ?? '').concat(cells.slice(map.length));
        rows.push(cells.length === 1 && cells[0] === '' ? '' : ordered.map(write).join(wanted.delimiter));
        return true;
      },
    },
  );
  return rows.length === 0 ? '' : `${rows.join('\n')}\n`;
}
