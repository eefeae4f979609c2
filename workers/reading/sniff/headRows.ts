import type { Dialect } from '../../contract/dialect.ts';
import { splitRows } from '../rows/splitRows.ts';

/** A row of the beginning of the file, for detection. */
export interface HeadRow {
  readonly cells: readonly string[];
  readonly line: number;
}

const HEAD_CHARACTERS = 1 << 18;
const HEAD_ROWS = 400;

/**
 * The first rows of a text under one delimiter: at most 400 rows and a quarter of a million characters, whole lines.
 *
 * @param text the whole text; @param delimiter a candidate; @param quote quote mark or null
 * @returns rows with their lines, blank rows among them
 */
export function headRows(text: string, delimiter: Dialect['delimiter'], quote: Dialect['quote']): HeadRow[] {
  let head = text.slice(0, HEAD_CHARACTERS);
  if (head.length < text.length) {
    const cut = head.lastIndexOf('\n');
    if (cut > 0) head = head.slice(0, cut + 1);
  }
  const rows: HeadRow[] = [];
  splitRows(
    { text: head, delimiter, quote, from: 0, line: 1 },
    {
      row: (cells, line) => {
        rows.push({ cells, line });
        return rows.length < HEAD_ROWS;
      },
    },
  );
  return rows;
}
