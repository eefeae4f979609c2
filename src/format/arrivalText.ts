import type { Dialect } from '../../workers/contract/dialect.ts';
import type { ColumnProfile, JoinedPart, Sniffed, Timing } from '../../workers/contract/reading.ts';
import { formatDuration } from './axisTime.ts';
import { delimiterName } from './dialectText.ts';
import { counted, formatNumber, formatReading } from './numbers.ts';

type Grid = NonNullable<Dialect['grid']>;

const encodings: Record<Dialect['encoding'], string> = {
  'utf-8': 'UTF-8',
  'utf-16le': 'UTF-16, low byte first',
  'utf-16be': 'UTF-16, high byte first',
  'windows-1252': 'Windows-1252',
};
export const encodingName = (encoding: Dialect['encoding']): string => encodings[encoding];

/** Name of a column, or its number where it has none. */
export function columnName(columns: readonly ColumnProfile[], index: number): string {
  const name = columns.find((one) => one.index === index)?.name ?? '';
  return name === '' ? `column ${index + 1}` : name;
}

const rules: Record<Grid['rule'], string> = {
  nearest: 'nearest reading',
  binMean: 'mean of the bin',
  last: 'last reading of the bin',
};
export const ruleName = (rule: Grid['rule']): string => rules[rule];

/** Step of a grid in words. */
export function stepText({ kind, step }: Pick<Grid, 'kind' | 'step'>): string {
  if (kind === 'seconds') return formatDuration(step);
  if (kind === 'months') return counted(step, 'month');
  return formatReading(step);
}

/** A grid as a choice: what it does, how wide. */
export const gridText = (grid: Grid): string => `${rules[grid.rule]}, ${stepText(grid)}`;

const share = (fraction: number): string => `${formatNumber(100 * fraction, 2)} %`;

/** How the stamps follow one another, before any grid. */
export function timingSentence(
  { kind, intervals, count, regular, jitter, offGrid, repeats, crowded, reversals }: Timing,
  grid: Grid | null,
): string {
  const distance = (interval: number) => (kind === 'index' ? formatReading(interval) : formatDuration(interval));
  const several = intervals.slice(0, 3).map((one) => `${distance(one.interval)} × ${one.count}`);
  const apart =
    kind === 'months'
      ? `Readings by ${grid === null ? 'months' : stepText(grid)}`
      : `${regular} of ${counted(count, 'interval')} are ${grid === null ? 'equal' : stepText(grid)}`;
  const others = kind !== 'months' && regular < count ? `; commonest ${several.join(', ')}` : '';
  const more = [
    jitter > 0 ? `jitter up to ${share(jitter)} of a step` : '',
    offGrid > 0 ? `${counted(offGrid, 'row')} off the grid` : '',
    crowded > 0 ? `${counted(crowded, 'row')} at a place already taken` : '',
    repeats > 0 ? counted(repeats, 'repeated time') : '',
    reversals > 0 ? `${counted(reversals, 'step')} back in time` : '',
  ].filter((text) => text !== '');
  return `${apart}${others}${more.length === 0 ? '' : `; ${more.join(', ')}`}.`;
}

/** What becomes of rows marked by a status column. */
export function statusSentence({ dialect, columns }: Sniffed): string {
  const { status } = dialect;
  if (status === null) return 'Every row is kept, whatever a status column says.';
  const cells = columns.find(({ index }) => index === status.column)?.cells ?? [];
  const keep = new Set(status.keep);
  const list = (kept: boolean) =>
    cells
      .filter(({ text }) => keep.has(text) === kept)
      .map(({ text, count }) => `${text === '' ? 'empty' : `“${text}”`} (${count})`)
      .join(', ');
  const out = list(false);
  return `Rows by “${columnName(columns, status.column)}”: kept ${list(true) || 'none'}; left out ${out || 'none'}.`;
}

/** Texts as one line for a field, and back. */
export const wordsText = (words: readonly string[]): string => words.join('; ');
export const wordsOf = (text: string): string[] =>
  [
    ...new Set(
      text
        .split(';')
        .map((word) => word.trim().slice(0, 100))
        .filter((word) => word !== ''),
    ),
  ].slice(0, 100);

const counts = (column: ColumnProfile | undefined, what: 'gaps' | 'texts'): number => column?.[what] ?? 0;

/** Gaps in the column of the readings. */
export function gapSentence({ dialect, columns }: Sniffed): string {
  const column = columns.find(({ index }) => index === dialect.valueColumn);
  return `${counted(counts(column, 'gaps'), 'cell')} empty or a word for a gap; ${counted(counts(column, 'texts'), 'cell')} neither number nor gap.`;
}

/** How the table is laid out. */
export function tableSentence({ header, unitsRow, preambleLines }: Dialect): string {
  const top = header
    ? unitsRow
      ? 'A header row and a units row'
      : 'A header row'
    : unitsRow
      ? 'A units row'
      : 'No header row';
  return `${top}, ${counted(preambleLines, 'line')} before it.`;
}

/** Delimiter and quotes. */
export function cellsSentence({ delimiter, quote }: Dialect): string {
  const quotes =
    quote === null
      ? 'quotes are plain letters'
      : quote === '"'
        ? 'double quotes enclose cells'
        : 'single quotes enclose cells';
  return `Columns parted by ${delimiterName(delimiter)}; ${quotes}.`;
}

const thousandsNames: Record<NonNullable<Dialect['thousands']>, string> = {
  ',': 'comma',
  '.': 'point',
  ' ': 'blank',
  "'": 'apostrophe',
};
export const thousandsName = (mark: Dialect['thousands']): string => (mark === null ? 'none' : thousandsNames[mark]);

/** Marks inside numbers. */
export function marksSentence({ decimal, thousands }: Dialect): string {
  const groups = thousands === null ? 'thousands not marked' : `thousands marked by a ${thousandsName(thousands)}`;
  return `Decimal ${decimal === ',' ? 'comma' : 'point'}; ${groups}.`;
}

const partNames = ['year', 'month', 'day', 'hour', 'minute', 'second'];
export const stampPartName = (part: number): string => partNames[part] ?? '';

/** Where time stands. */
export function timeSentence({ dialect, columns }: Sniffed): string {
  const { timeColumn, clockColumn, stampColumns, zone } = dialect;
  if (timeColumn === null) return 'No time: the readings are numbered.';
  const named = (index: number) => `“${columnName(columns, index)}”`;
  const where =
    stampColumns === null
      ? `Times in ${named(timeColumn)}`
      : `Times put together of ${stampColumns.map((column, part) => `${stampPartName(part)} ${named(column)}`).join(', ')}`;
  const clock = clockColumn === null ? '' : ` with the time of day in ${named(clockColumn)}`;
  return `${where}${clock}, ${zone === null ? 'by the plant clock as logged' : `in the zone ${zone}`}.`;
}

/** Which files were put together, and where each begins in the lines counted through. */
export function partsSentence(parts: readonly JoinedPart[]): string {
  const list = parts.map(({ fileName, line, ownLine }) =>
    ownLine === 1 ? `${fileName} from line ${line}` : `${fileName} from line ${line} (its line ${ownLine})`,
  );
  return `${counted(parts.length, 'file')} put together in the order of time; lines are counted through: ${list.join(', ')}.`;
}

const repeatsWords: Record<Dialect['repeats'], string> = {
  first: 'the first reading is kept',
  last: 'the last reading is kept',
  gap: 'none is kept: a gap',
};
export const repeatsName = (repeats: Dialect['repeats']): string => repeatsWords[repeats];
