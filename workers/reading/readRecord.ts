import type { Dialect } from '../contract/dialect.ts';
import type { Failure } from '../contract/failures.ts';
import type { ColumnProfile, Question, ReadAnswer, ReadingNote, ReadRequest } from '../contract/reading.ts';
import { plainLines } from './files/plainLines.ts';
import { noteOf } from './noteBook.ts';
import { previewRows } from './previewRows.ts';
import { readThoroughly, type ThoroughRead } from './readThoroughly.ts';
import { chooseValueColumn } from './rows/chooseValueColumn.ts';
import { profileColumns } from './rows/profileColumns.ts';
import { rowShape, type RowsRead } from './rows/readRows.ts';
import { timeColumns } from './rows/timeColumns.ts';
import { takeRecord, type Taken } from './takeRecord.ts';

/** Text characters in which a NUL says that this is no text. */
const LOOKED_AT = 1 << 16;

/** A column number from the settings that the file does not have. */
function absentColumn(settings: Partial<Dialect>, columns: number): Failure | null {
  const { valueColumn, timeColumn, clockColumn, tagColumn, status, stampColumns } = settings;
  const named = [valueColumn, timeColumn, clockColumn, tagColumn, status?.column, ...(stampColumns ?? [])];
  const absent = named.find((column) => typeof column === 'number' && !(column >= 0 && column < columns));
  return typeof absent === 'number' ? { code: 'noSuchColumn', column: absent + 1, columns } : null;
}

function noNumbers({ found, read }: ThoroughRead, profiles: readonly ColumnProfile[]): Failure {
  const times = timeColumns(found.plan.dialect);
  const others = profiles.filter(({ index }) => !times.has(index));
  const silent = others.find(({ role }) => role === 'empty');
  const wordy = read.columns.findIndex(({ oddTexts }, j) => !times.has(j) && oddTexts.length > 0);
  if (wordy < 0 && silent !== undefined) return { code: 'allGaps', column: silent.name, rows: read.rows };
  const column = wordy < 0 ? 0 : wordy;
  const row = read.columns[column]?.oddRows[0] ?? 0;
  const example = read.columns[column]?.oddTexts[0] ?? found.body[0]?.cells[0] ?? '';
  return { code: 'noNumbers', lines: read.rows, example, line: read.lines[row] ?? 1, column: column + 1 };
}

/** Notes on the rows themselves, whatever became of them. */
function rowNotes(read: RowsRead, valueColumn: number, openOrder: ThoroughRead['openOrder']): (ReadingNote | null)[] {
  const column = read.columns[valueColumn]!;
  const lines = (rows: readonly number[]) => rows.map((row) => read.lines[row]!);
  const ragged: number[] = [];
  let raggedCount = 0;
  for (let row = 0; row < read.rows; row++) {
    if (read.shapes[row] === rowShape.whole) continue;
    raggedCount++;
    if (ragged.length < 8) ragged.push(row);
  }
  const out = read.leftOut?.reduce((sum, left) => sum + left, 0) ?? 0;
  const firstOut = read.leftOut === null ? [] : [...read.leftOut.keys()].filter((row) => read.leftOut![row] === 1);
  return [
    openOrder === 'guessed' ? noteOf('ambiguousDates', read.order.open, lines([0])) : null,
    noteOf(
      'badStamps',
      read.badStampCount,
      read.badStamps.map(({ line }) => line),
      read.badStamps.map(({ cells }) => cells.join(' ')),
    ),
    noteOf(
      'gapCells',
      column.gaps - blankTail(read, valueColumn),
      lines(column.gapRows.filter((row) => row < read.rows)),
    ),
    noteOf('textCells', column.texts, lines(column.oddRows), column.oddTexts),
    noteOf('belowLimit', column.belowLimit, lines(column.limitRows), column.limitTexts),
    noteOf('raggedRows', raggedCount, lines(ragged)),
    noteOf('emptyRows', read.emptyCount, read.emptyLines),
    noteOf('leftOutByStatus', out, lines(firstOut.slice(0, 8))),
  ];
}

/** Blank lines after the last reading of a single column are no gaps. */
const blankTail = (read: RowsRead, column: number): number => read.columns[column]!.values.length - read.rows;

function questionsOf(
  { found, openOrder }: ThoroughRead,
  settings: Partial<Dialect>,
  column: number | null,
  others: readonly number[],
  read: RowsRead,
): Question[] {
  const questions = [...found.questions];
  const form = found.plan.dialect.stamp;
  const asked = questions.some(({ about }) => about === 'dateOrder');
  if (openOrder !== 'no' && !asked && form !== null)
    questions.push({ about: 'dateOrder', options: [form, form === 'dayFirst' ? 'monthFirst' : 'dayFirst'] });
  if (settings.valueColumn === undefined && column !== null && others.length > 0)
    questions.push({ about: 'valueColumn', options: [column, ...others].map(String) });
  if (settings.tag === undefined && read.tags !== null && read.tagNames.length > 1)
    questions.push({ about: 'tag', options: read.tagNames });
  return questions;
}

/**
 * Reads a file's text to a record, or says where and why it cannot be read.
 *
 * Method: how the text is written is detected (`readThoroughly`) wherever the person has not settled it; all rows are read
 * in one pass into typed columns; the value column is chosen and laid on the regular grid of its stamps. Whether or not
 * that succeeds, the answer holds what was detected and a preview of the first and the worst rows.
 *
 * @param request text, file name, settings the person has fixed
 * @param progress called with the fraction done, 0…1
 * @returns what was detected (null only where there are no rows at all), the record or null, the failure or null
 */
export function readRecord(request: ReadRequest, progress?: (fraction: number) => void): ReadAnswer {
  const { settings } = request;
  const text = plainLines(request.text);
  if (text.trim() === '') return { sniffed: null, record: null, failure: { code: 'emptyFile' } };
  if (text.slice(0, LOOKED_AT).includes('\u0000'))
    return { sniffed: null, record: null, failure: { code: 'binaryFile', kind: 'data that are not text' } };

  const thorough = readThoroughly(text, settings, progress === undefined ? undefined : (part) => progress(0.9 * part));
  const { found, read } = thorough;
  const { plan } = found;
  const profiles = profileColumns(read, plan, found.headings);
  const chosen = chooseValueColumn(read, profiles);
  const absent = absentColumn(settings, plan.columns);
  const wanted = absent === null ? (settings.valueColumn ?? chosen.column) : chosen.column;
  const tag = Math.max(0, settings.tag == null ? 0 : read.tagNames.indexOf(settings.tag));

  const open = plan.dialect.stamp !== null && thorough.openOrder === 'open';
  let taken: Taken | null = null;
  let failure: Failure | null;
  if (read.openQuote > 0) failure = { code: 'unclosedQuote', line: read.openQuote };
  else if (absent !== null) failure = absent;
  else if (found.clash !== null && settings.delimiter === undefined)
    failure = { code: 'decimalCommaClash', line: found.clash.line, text: found.clash.cells.join(',') };
  else if (wanted === null) failure = noNumbers(thorough, profiles);
  else {
    taken = takeRecord({
      plan,
      read,
      profiles,
      valueColumn: wanted,
      tag,
      grid: settings.grid ?? null,
      repeatsSettled: settings.repeats !== undefined,
      parts: request.parts ?? [],
    });
    failure = taken.failure;
    if (failure === null && open) failure = ambiguousDates(thorough);
  }
  const grid = taken?.grid ?? settings.grid ?? null;
  const tagName = read.tags === null ? null : (read.tagNames[tag] ?? null);
  const times = timeColumns(plan.dialect);
  const shown = wanted ?? profiles.find(({ index }) => !times.has(index))?.index ?? 0;
  const dialect: Dialect = { ...plan.dialect, tag: tagName, valueColumn: shown, grid };
  const sniffed = {
    dialect,
    columns: profiles,
    ...previewRows(plan, read, taken, wanted),
    rows: read.rows,
    questions: questionsOf(thorough, settings, chosen.column, chosen.others, read),
    ...(read.tags === null ? {} : { tags: read.tagNames }),
    timing: taken?.timing ?? null,
  };
  progress?.(1);
  if (failure !== null || taken?.record == null || wanted === null) return { sniffed, record: null, failure };
  const notes = [...taken.notes, ...rowNotes(read, wanted, thorough.openOrder)].filter((note) => note !== null);
  return { sniffed, record: { ...taken.record, dialect, notes }, failure: null };
}

function ambiguousDates({ found, read }: ThoroughRead): Failure {
  const first = read.first[0];
  return { code: 'ambiguousDates', line: first?.line ?? 1, text: first?.cells[found.plan.dialect.timeColumn!] ?? '' };
}
