import type { Dialect, StampForm } from '../../contract/dialect.ts';
import { parseNumber } from '../cells/parseNumber.ts';
import type { HeadRow } from './headRows.ts';
import { sniffStampColumns } from './sniffStampColumns.ts';
import { sniffStampForm, type FormFound } from './sniffStampForm.ts';

/** Where time stands in a file. `others`: further columns that could be the time. */
export interface TimeFound {
  readonly timeColumn: number | null;
  readonly clockColumn: number | null;
  readonly stamp: StampForm | null;
  readonly stampColumns: readonly number[] | null;
  readonly others: readonly number[];
  /** Forms that read the stamps as well as `stamp` does. */
  readonly rivals: readonly StampForm[];
}

const noTime: TimeFound = {
  timeColumn: null,
  clockColumn: null,
  stampColumns: null,
  stamp: null,
  others: [],
  rivals: [],
};
const SAMPLE = 200;
const timeName =
  /^(?:t|time|zeit|temps|tiempo|tempo|tijd|elapsed.*|seconds?|secs?|s|min|mins|minutes?|hours?|hrs?|h|days?)(?:\W.*)?$/iu;

/** Time from parts in columns of their own, with the time of day beside them where that is written as a clock. */
function fromParts(
  parts: readonly number[],
  forms: readonly (FormFound | null)[],
  settings: Partial<Dialect>,
): TimeFound {
  const isClock = (j: number) => forms[j]?.clock === true && !forms[j].date && !parts.includes(j);
  const beside = parts.length === 3 ? forms.findIndex((_, j) => isClock(j)) : -1;
  const clockColumn = settings.clockColumn !== undefined ? settings.clockColumn : beside < 0 ? null : beside;
  const own = { timeColumn: parts[0]!, clockColumn, stampColumns: parts };
  return { ...own, stamp: settings.stamp ?? 'yearFirst', others: [], rivals: [] };
}

/** Cells of a column as a sample, blanks left out. */
export function columnCells(body: readonly HeadRow[], column: number): string[] {
  const cells: string[] = [];
  for (const row of body) {
    const cell = row.cells[column]?.trim() ?? '';
    if (cell !== '') cells.push(cell);
    if (cells.length >= SAMPLE) break;
  }
  return cells;
}

/** A plain count or elapsed time: strictly ascending, and evenly so unless its name says that it is a time. */
function isCounter(cells: readonly string[], name: string, decimal: '.' | ','): boolean {
  const values = cells.map((cell) => parseNumber(cell, decimal, null));
  if (values.length < 3 || values.some((value) => Number.isNaN(value))) return false;
  const differences = values.slice(1).map((value, i) => value - values[i]!);
  if (!differences.every((difference) => difference > 0)) return false;
  if (timeName.test(name.trim())) return true;
  const step = differences.toSorted((a, b) => a - b)[Math.floor(differences.length / 2)]!;
  const even = differences.filter((difference) => Math.abs(difference - step) < 1e-6 * step).length;
  return even >= 0.95 * differences.length;
}

/**
 * The time column, the column with the time of day where date and time are apart, and how the stamps are written.
 *
 * Method: year, month and day in columns of their own; then columns of calendar stamps, from the left; then a time of day alone; then epoch counts; then a plain
 * count. Settings of the person go before all of it, and the rest is detected around them.
 *
 * @param body data rows of the head; @param columns their number; @param names headings, as many or fewer
 * @param decimal decimal mark; @param settings what the person has fixed
 * @returns the columns and form; `timeColumn` null where the file has no time
 */
export function sniffTime(
  body: readonly HeadRow[],
  columns: number,
  names: readonly string[],
  decimal: '.' | ',',
  settings: Partial<Dialect>,
): TimeFound {
  if (settings.timeColumn === null) return noTime;
  const cells = Array.from({ length: columns }, (_, j) => columnCells(body, j));
  const forms = cells.map((column, j) => sniffStampForm(column, names[j] ?? ''));
  const isDated = (found: FormFound | null) => found !== null && found.date && !found.form.startsWith('epoch');
  const isClock = (found: FormFound | null) => found !== null && found.clock && !found.date;
  const parts =
    settings.stampColumns !== undefined
      ? settings.stampColumns
      : settings.timeColumn === undefined
        ? sniffStampColumns(body, columns, names)
        : null;
  if (parts !== null && parts.length > 1) return fromParts(parts, forms, settings);
  const dated = forms.flatMap((found, j) => (isDated(found) ? [j] : []));
  const clocks = forms.flatMap((found, j) => (isClock(found) ? [j] : []));
  const epochs = forms.flatMap((found, j) => (found !== null && found.form.startsWith('epoch') ? [j] : []));
  const counters = cells.flatMap((column, j) => (isCounter(column, names[j] ?? '', decimal) ? [j] : []));
  const several = columns > 1;
  const time = settings.timeColumn ?? dated[0] ?? clocks[0] ?? (several ? (epochs[0] ?? counters[0]) : undefined);
  if (time === undefined) return noTime;
  const found = forms[time] ?? null;
  let clockColumn = settings.clockColumn ?? null;
  if (settings.clockColumn === undefined && found !== null && found.date && !found.clock)
    clockColumn = clocks.find((j) => j === time + 1) ?? clocks.find((j) => j !== time) ?? null;
  return {
    timeColumn: time,
    clockColumn,
    stampColumns: null,
    stamp: settings.stamp ?? found?.form ?? 'number',
    others: dated.filter((j) => j !== time),
    rivals: found?.rivals ?? [],
  };
}
