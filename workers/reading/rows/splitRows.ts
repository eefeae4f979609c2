import Papa from 'papaparse';
import type { Dialect } from '../../contract/dialect.ts';

/** Characters handed to the parser at a time; few enough that the cells of one piece die young (measured: 13 to 15 bits are best). */
const PIECE = 1 << 15;

/** Where splitting starts and what it heeds. `line` is counted from 1. */
export interface SplitRequest {
  readonly text: string;
  readonly delimiter: Dialect['delimiter'];
  readonly quote: Dialect['quote'];
  readonly from: number;
  readonly line: number;
}

/** Called before the rows of each piece with the place of its first row; return false to stop. */
export interface RowSink {
  piece?(from: number, line: number): boolean;
  /** Return false to stop. */
  row(cells: string[], line: number): boolean;
}

/** How splitting ended. `openQuote`: line of a quoted field that is never closed; 0 where there is none. */
export interface SplitEnd {
  readonly openQuote: number;
  /** Line number after the last. */
  readonly line: number;
}

function lineBreaks(cells: readonly string[]): number {
  let count = 0;
  for (const cell of cells) for (let at = cell.indexOf('\n'); at >= 0; at = cell.indexOf('\n', at + 1)) count++;
  return count;
}

const half = /^[ap]\.?m\.?$/iu;

/** Runs of blanks count as one delimiter, and blanks at the ends of a line as none; AM and PM stay with their clock. */
function squeeze(cells: readonly string[]): string[] {
  const kept: string[] = [];
  for (const cell of cells) {
    if (cell === '' || cell === '\r') continue;
    const before = kept.at(-1);
    if (before !== undefined && half.test(cell) && before.includes(':')) kept[kept.length - 1] = `${before} ${cell}`;
    else kept.push(cell);
  }
  return kept.length === 0 ? [''] : kept;
}

/**
 * The rows of a delimited text, one after the other (RFC 4180, with any of the dialects' delimiters).
 *
 * Method: papaparse's row parser over pieces of some ten thousand characters, each ended at its last complete row. A quoted
 * field longer than a piece doubles it, so that the work stays proportional to the text. Carriage returns before a line
 * feed are taken off; a text with carriage returns alone must be given with line feeds.
 *
 * @param request text, delimiter, quote mark (null: quotes are plain characters), first character and its line number
 * @param sink receives each row with the line it starts on
 * @returns how it ended
 */
export function splitRows(request: SplitRequest, sink: RowSink): SplitEnd {
  const { text, delimiter, quote } = request;
  const parser = new Papa.Parser({
    delimiter,
    newline: '\n',
    quoteChar: quote ?? '"',
    ...(quote === null ? { fastMode: true } : {}),
  });
  let { from, line } = request;
  let size = PIECE;
  while (from < text.length) {
    const end = Math.min(text.length, from + size);
    const last = end === text.length;
    const input = text.slice(from, end);
    const { data, meta, errors } = parser.parse(input, 0, !last);
    const open = errors.find(({ code }) => code === 'MissingQuotes');
    const used = last ? input.length : meta.cursor;
    if (used === 0) {
      size *= 2;
      continue;
    }
    if (sink.piece?.(from, line) === false) return { openQuote: 0, line };
    const quoted = quote !== null && input.includes(quote);
    // The row behind the final line feed is no row.
    const count = last && input.endsWith('\n') && open === undefined ? data.length - 1 : data.length;
    for (let i = 0; i < count; i++) {
      if (open?.row === i) return { openQuote: line, line };
      let cells = data[i]!;
      const breaks = quoted ? lineBreaks(cells) : 0;
      const end = cells.length - 1;
      if (cells[end]!.endsWith('\r')) cells[end] = cells[end]!.replace(/\r+$/u, '');
      if (delimiter === ' ') cells = squeeze(cells);
      if (!sink.row(cells, line)) return { openQuote: 0, line };
      line += 1 + breaks;
    }
    from += used;
    size = PIECE;
  }
  return { openQuote: 0, line };
}
