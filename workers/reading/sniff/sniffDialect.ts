import type { Dialect, StampForm } from '../../contract/dialect.ts';
import type { Question } from '../../contract/reading.ts';
import { defaultGapWords } from '../cells/gapWords.ts';
import { defaultLimitWords } from '../cells/limitWords.ts';
import type { RowPlan } from '../rows/readRows.ts';
import { timeColumns } from '../rows/timeColumns.ts';
import { isZone } from '../stamps/zoneResolver.ts';
import { cellClass } from './cellClass.ts';
import { headingName, type Heading } from './headingName.ts';
import { headRows, type HeadRow } from './headRows.ts';
import { sniffDecimal } from './sniffDecimal.ts';
import { isSplitDecimal, sniffDelimiter } from './sniffDelimiter.ts';
import { sniffLayout, type Layout } from './sniffLayout.ts';
import { sniffSuffixes } from './sniffSuffixes.ts';
import { sniffTags } from './sniffTags.ts';
import { columnCells, sniffTime } from './sniffTime.ts';

/** What the head of a file tells. */
export interface Found {
  readonly plan: RowPlan;
  readonly headings: readonly Heading[];
  readonly body: readonly HeadRow[];
  readonly questions: readonly Question[];
  /** A row whose unquoted decimal commas look like delimiters, if the file is written so. */
  readonly clash: HeadRow | null;
}

function sniffQuote(text: string): Dialect['quote'] {
  const head = text.slice(0, 1 << 16);
  if (head.includes('"')) return '"';
  // An apostrophe quotes only where it opens and closes cells; inside numbers it separates thousands.
  const opening = head.match(/(?:^|[,;\t|])'[^'\n]*'(?=[,;\t|\r\n]|$)/gmu)?.length ?? 0;
  return opening >= 3 ? "'" : '"';
}

/** Index of the first character behind a number of lines. */
function afterLines(text: string, lines: number): number {
  let at = 0;
  for (let i = 0; i < lines; i++) {
    const next = text.indexOf('\n', at);
    if (next < 0) return text.length;
    at = next + 1;
  }
  return at;
}

/** Headings moved by one where the header leaves out the name of a leading counter or of the time of day. */
function alignedHeading(layout: Layout, clockColumn: number | null, timeColumn: number | null): readonly string[] {
  const { heading, columns } = layout;
  if (heading.length !== columns - 1) return heading;
  if (clockColumn !== null) return [...heading.slice(0, clockColumn), '', ...heading.slice(clockColumn)];
  const counter = timeColumn === 0 && columnCells(layout.body, 0).every((cell) => /^\d+$/u.test(cell));
  return counter ? ['', ...heading] : heading;
}

/** A header of m names over rows of 2m − 1 or 2m cells, all of whole numbers: each number was split at its decimal comma. */
function findClash(layout: Layout, delimiter: string, timeColumn: number | null): HeadRow | null {
  const names = layout.heading.filter((cell) => cell.trim() !== '').length;
  const before = timeColumn === null ? 0 : 1;
  if (delimiter !== ',' || !layout.header || names <= before) return null;
  if (layout.columns - before !== 2 * (names - before)) return null;
  const whole = layout.body.every(({ cells }) =>
    cells.every((cell, j) => j === timeColumn || cell.trim() === '' || /^[+\u2212-]?\d+$/u.test(cell.trim())),
  );
  return whole ? (layout.body[0] ?? null) : null;
}

/**
 * Everything the beginning of a file tells about how it is written.
 *
 * Method: delimiter, then preamble, header and units row, then decimal mark, time and tags, each by its own detector, each
 * only where the person has not settled it.
 *
 * @param text whole text with line feeds; @param settings what the person has fixed
 * @param more cells met later in the file that the first attempt could not read as numbers
 * @returns a plan for reading all rows, the headings, and the guesses to confirm
 */
export function sniffDialect(text: string, settings: Partial<Dialect>, more: readonly string[] = []): Found {
  const questions: Question[] = [];
  const quote = settings.quote === undefined ? sniffQuote(text) : settings.quote;
  const found = sniffDelimiter(text, quote, settings.decimal);
  const delimiter = settings.delimiter ?? found.delimiter;
  const layout = sniffLayout(headRows(text, delimiter, quote), settings);
  const { body, columns } = layout;

  const numeric = Array.from({ length: columns }, (_, j) => j).filter((j) => j !== settings.timeColumn);
  const cells = numeric.flatMap((j) => columnCells(body, j).filter((cell) => cellClass(cell) === 'number'));
  const marks = sniffDecimal([...cells, ...more], settings.decimal);
  const { decimal } = marks;
  const thousands = settings.thousands === undefined ? marks.thousands : settings.thousands;
  const splitGuess = found.guessed || (delimiter === ',' && isSplitDecimal(body));
  if (settings.decimal === undefined && (!marks.sure || splitGuess))
    questions.push({ about: 'decimal', options: decimal === ',' ? [',', '.'] : ['.', ','] });

  const time = sniffTime(body, columns, layout.heading, decimal, settings);
  if (settings.timeColumn === undefined && time.timeColumn !== null && time.others.length > 0)
    questions.push({ about: 'timeColumn', options: [time.timeColumn, ...time.others].map(String) });
  if (settings.stamp === undefined && time.rivals.length > 0 && time.stamp !== null)
    questions.push({ about: 'dateOrder', options: [time.stamp, ...time.rivals] satisfies StampForm[] });

  const heading = alignedHeading(layout, time.clockColumn, time.timeColumn);
  const headings = Array.from({ length: columns }, (_, j) => headingName(heading[j] ?? '', layout.units[j] ?? '', j));
  const times = timeColumns(time);
  const words = numeric.filter((j) => !times.has(j) && isWordColumn(body, j));
  const tagColumn =
    settings.tagColumn !== undefined
      ? settings.tagColumn
      : settings.layout === 'wide'
        ? null
        : sniffTags(body, time.timeColumn, words);
  const suffixes = sniffSuffixes(body, columns, { decimal, thousands });
  const dialect: RowPlan['dialect'] = {
    encoding: settings.encoding ?? 'utf-8',
    delimiter,
    quote,
    decimal,
    thousands,
    preambleLines: layout.preambleLines,
    header: layout.header,
    unitsRow: layout.unitsRow,
    layout: settings.layout ?? (tagColumn === null ? 'wide' : 'long'),
    tagColumn,
    tag: settings.tag ?? null,
    timeColumn: time.timeColumn,
    clockColumn: time.clockColumn,
    stampColumns: time.stampColumns,
    stamp: time.stamp,
    zone: settings.zone != null && isZone(settings.zone) ? settings.zone : null,
    status: settings.status ?? null,
    gapWords: settings.gapWords ?? defaultGapWords,
    limitWords: settings.limitWords ?? defaultLimitWords,
    repeats: settings.repeats ?? 'first',
    sheet: settings.sheet ?? null,
  };
  const from = afterLines(text, layout.preambleLines);
  const plan = { text, dialect, from, line: layout.preambleLines + 1, columns, suffixes };
  return { plan, headings, body, questions, clash: findClash(layout, delimiter, time.timeColumn) };
}

const isWordColumn = (body: readonly HeadRow[], column: number): boolean => {
  const cells = columnCells(body, column);
  return cells.length > 0 && cells.filter((cell) => cellClass(cell) === 'text').length > cells.length / 2;
};
