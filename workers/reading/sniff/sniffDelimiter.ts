import type { Dialect } from '../../contract/dialect.ts';
import { cellClass } from './cellClass.ts';
import { headRows, type HeadRow } from './headRows.ts';

type Delimiter = Dialect['delimiter'];

const candidates: readonly Delimiter[] = ['\t', ';', ',', '|', ' '];
/** A blank also stands inside stamps and names: it is taken only where it does clearly better. */
const BLANK_HANDICAP = 0.8;
const ROWS_JUDGED = 120;
const digitsOnly = /^\d+$/u;

/** The number of cells most rows have, blank rows aside. */
export function modalWidth(rows: readonly HeadRow[]): number {
  const counts = new Map<number, number>();
  for (const { cells } of rows) {
    if (cells.every((cell) => cell.trim() === '')) continue;
    counts.set(cells.length, (counts.get(cells.length) ?? 0) + 1);
  }
  let best = 1;
  let most = 0;
  for (const [width, count] of counts) {
    if (count > most || (count === most && width > best)) [best, most] = [width, count];
  }
  return best;
}

/** Share of rows with the usual width times the share of their cells that are numbers or stamps. */
function score(rows: readonly HeadRow[]): number {
  // The end of the head is the body of the file; preambles are at its beginning.
  const judged = rows.filter(({ cells }) => cells.some((cell) => cell.trim() !== '')).slice(-ROWS_JUDGED);
  const width = modalWidth(judged);
  if (width < 2 || judged.length === 0) return 0;
  const fitting = judged.filter(({ cells }) => cells.length === width);
  let cells = 0;
  let data = 0;
  for (const row of fitting) {
    for (const cell of row.cells) {
      const kind = cellClass(cell);
      if (kind === 'empty' || kind === 'gap') continue;
      cells++;
      if (kind !== 'text') data++;
    }
  }
  if (cells === 0) return 0;
  return (fitting.length / judged.length) * (data / cells) * (1 + 0.02 * Math.min(width, 10));
}

/** One column of numbers with decimal commas, taken for two columns of whole numbers. */
export function isSplitDecimal(rows: readonly HeadRow[]): boolean {
  const filled = rows.filter(({ cells }) => cells.some((cell) => cell.trim() !== ''));
  const pairs = filled.filter(({ cells }) => cells.length === 2 && digitsOnly.test(cells[1]!));
  if (pairs.length === 0 || pairs.length < 0.8 * filled.length) return false;
  const heads = pairs.map(({ cells }) => cells[0]!.trim());
  if (!heads.every((head) => /^[+\u2212-]?\d+$/u.test(head))) return false;
  // A heading of two names, or a first column that only ascends (a counter, epoch seconds), speaks for two columns.
  if (filled[0]!.cells.length === 2 && filled[0]!.cells.every((cell) => cellClass(cell) === 'text')) return false;
  return !heads.every((head, i) => i === 0 || Number(head) > Number(heads[i - 1]!));
}

/**
 * Delimiter of a text.
 *
 * Method: the head of the file is split by each candidate; the best is the one under which most rows have the same number
 * of cells and most cells are numbers or stamps. One column of decimal commas is told from two columns of whole numbers by
 * the heading, or else by the first column not ascending.
 *
 * @param text whole text; @param quote quote mark or null
 * @param decimal decimal mark where it is settled
 * @returns the delimiter, and whether it rests on taking commas for decimal marks; a text of one column gives `;` where
 * its decimal mark is a comma and `,` otherwise
 */
export function sniffDelimiter(
  text: string,
  quote: Dialect['quote'],
  decimal: '.' | ',' | undefined,
): { delimiter: Delimiter; guessed: boolean } {
  let best: Delimiter = ',';
  let most = 0;
  for (const delimiter of candidates) {
    const rows = headRows(text, delimiter, quote);
    if (delimiter === ',' && isSplitDecimal(rows)) {
      const header = rows.find(({ cells }) => cells.some((cell) => cell.trim() !== ''))?.cells ?? [];
      const named = header.length === 1 && cellClass(header[0]!) === 'text';
      if (decimal !== '.' || named) {
        if (most === 0) return { delimiter: ';', guessed: !named && decimal === undefined };
        continue;
      }
    }
    const value = score(rows) * (delimiter === ' ' ? BLANK_HANDICAP : 1);
    if (value > most + 1e-12) [best, most] = [delimiter, value];
  }
  if (most === 0 && decimal === ',') return { delimiter: ';', guessed: false };
  return { delimiter: best, guessed: false };
}
