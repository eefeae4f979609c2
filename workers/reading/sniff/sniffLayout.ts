import type { Dialect } from '../../contract/dialect.ts';
import { cellClass, type CellClass } from './cellClass.ts';
import { looksLikeUnit } from './headingName.ts';
import type { HeadRow } from './headRows.ts';
import { modalWidth } from './sniffDelimiter.ts';

/** Where the data begin and what stands above them. */
export interface Layout {
  readonly preambleLines: number;
  readonly header: boolean;
  readonly unitsRow: boolean;
  readonly columns: number;
  readonly heading: readonly string[];
  readonly units: readonly string[];
  /** Rows of the head that are data, blank ones left out. */
  readonly body: readonly HeadRow[];
}

/** A line drawn under the header (`-----|----`). */
export const isRule = (cells: readonly string[]): boolean => {
  const drawn = cells.join('').replace(/\s/gu, '');
  return drawn.length > 1 && /^[-=_+:|]+$/u.test(drawn);
};

const blank = ({ cells }: HeadRow): boolean => cells.every((cell) => cell.trim() === '');

/** Column classes that most of the lower half of the head shows. */
function bodyClasses(rows: readonly HeadRow[], columns: number): (CellClass | null)[] {
  const lower = rows.slice(Math.floor(rows.length / 2)).filter(({ cells }) => cells.length === columns);
  return Array.from({ length: columns }, (_, j) => {
    const tally = { number: 0, stamp: 0, text: 0 };
    for (const { cells } of lower) {
      const kind = cellClass(cells[j]!);
      if (kind === 'number' || kind === 'stamp' || kind === 'text') tally[kind]++;
    }
    const all = tally.number + tally.stamp + tally.text;
    if (all === 0) return null;
    if (tally.stamp > all / 2) return 'stamp';
    return tally.number >= all / 2 ? 'number' : 'text';
  });
}

/** Whether a row has stamps where the body has them, or, without stamps, numbers or gaps in half of the numeric columns. */
function isData(row: HeadRow, classes: readonly (CellClass | null)[]): boolean {
  const kinds = row.cells.map(cellClass);
  const stampColumns = classes.flatMap((kind, j) => (kind === 'stamp' ? [j] : []));
  if (stampColumns.length > 0) return stampColumns.some((j) => kinds[j] === 'stamp');
  const numeric = classes.flatMap((kind, j) => (kind === 'number' ? [j] : []));
  if (numeric.length === 0) return true;
  const fitting = numeric.filter((j) => kinds[j] === 'number' || kinds[j] === 'gap' || kinds[j] === 'empty').length;
  return fitting * 2 >= numeric.length && numeric.some((j) => kinds[j] === 'number');
}

/** Rows directly above the data that may be header and units row, nearest last; lines drawn under the header are passed over. */
function headingRows(rows: readonly HeadRow[], first: number, columns: number): HeadRow[] {
  const above: HeadRow[] = [];
  for (let i = first - 1; i >= 0 && above.length < 2; i--) {
    const row = rows[i]!;
    if (blank(row)) {
      if (above.length > 0) break;
      continue;
    }
    if (isRule(row.cells)) continue;
    const cells = row.cells.filter((cell) => cell.trim() !== '');
    const filled = cells.length;
    // Beside many columns of time, few have a unit.
    const units = above.length === 0 && row.cells.length > 2 && cells.every(looksLikeUnit);
    if (filled * 2 < columns && !(columns <= 2 && filled > 0) && !units) break;
    above.unshift(row);
  }
  return above;
}

function isUnits(row: HeadRow, upper: HeadRow): boolean {
  const filled = row.cells.filter((cell) => cell.trim() !== '');
  const likely = filled.filter(looksLikeUnit).length;
  if (likely * 2 >= filled.length && likely > 0) return upper.cells.length >= row.cells.length - 1;
  return false;
}

/**
 * Preamble, header, units row and number of columns.
 *
 * Method: the usual width and the classes of the columns are taken from the lower half of the head; the data begin at the
 * first row that fits them; the row above is the header, or the units row with the header above it where most of its
 * cells look like units. Settings of the person go first.
 *
 * @param rows head of the file under its delimiter; @param settings what the person has fixed
 * @returns the layout
 */
export function sniffLayout(rows: readonly HeadRow[], settings: Partial<Dialect>): Layout {
  const given = settings.preambleLines;
  const kept = given === undefined ? rows : rows.filter(({ line }) => line > given);
  const filled = kept.filter((row) => !blank(row));
  const columns = modalWidth(filled);
  const classes = bodyClasses(filled, columns);
  let first = filled.findIndex((row) => row.cells.length <= columns + 1 && isData(row, classes));
  if (first < 0) first = 0;
  // A column of words only: its first row is its heading.
  if (first === 0 && filled.length > 1 && classes.every((kind) => kind === 'text' || kind === null)) first = 1;
  const data = filled[first];
  const at = data === undefined ? kept.length : kept.indexOf(data);
  const used = classes.filter((kind) => kind !== null).length;
  let above = headingRows(kept, at, used);
  let unitsRow = above.length === 2 && isUnits(above[1]!, above[0]!);
  if (settings.unitsRow !== undefined) unitsRow = settings.unitsRow && (above.length === 2 || given !== undefined);
  let header = above.length > 0;
  if (given !== undefined) {
    header = settings.header ?? at > 0;
    const count = (header ? 1 : 0) + (unitsRow ? 1 : 0);
    above = filled.slice(0, count);
  } else if (settings.header === false) {
    header = false;
    unitsRow = settings.unitsRow ?? false;
    above = unitsRow ? above.slice(-1) : [];
  } else if (settings.header === true && !header) {
    header = true;
    above = filled.slice(0, unitsRow ? 2 : 1);
  } else above = unitsRow ? above.slice(-2) : above.slice(-1);
  const top = above[0] ?? data;
  const last = above.at(-1);
  const body = filled.filter(
    ({ line, cells }) => !isRule(cells) && (last === undefined ? line >= (data?.line ?? 1) : line > last.line),
  );
  return {
    preambleLines: given ?? (top === undefined ? 0 : top.line - 1),
    header,
    unitsRow,
    columns,
    heading: header ? (above[0]?.cells ?? []) : [],
    units: unitsRow ? (above[header ? 1 : 0]?.cells ?? []) : [],
    body,
  };
}
