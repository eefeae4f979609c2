import type { Failure } from '../../workers/contract/failures.ts';
import type { Axis } from '../../workers/contract/series.ts';
import { plantReadings, type Reading } from './plantFixtures.ts';
import { publishedSeries, type PublishedName } from '../helpers/publishedSeries.ts';

export interface Refusal {
  readonly file: string;
  readonly failure: Partial<Failure> & Pick<Failure, 'code'>;
}

const published = (name: PublishedName, count: number) => publishedSeries(name).slice(0, count);
const hormone = published('luteinisingHormone', 24);
const nile = published('nile', 24);
const overshorts = published('overshorts', 24);
const airline = published('airline', 36);

/** The series with gaps at some places (counted from 0). */
const without = (values: Float64Array, ...gaps: number[]) => values.map((value, k) => (gaps.includes(k) ? NaN : value));
const seconds = (iso: string, step: number, zone: string | null = null): Axis => {
  return { kind: 'seconds', start: Date.parse(`${iso}Z`) / 1000, step, zone };
};
const tenMinutes = seconds('2024-03-13T08:00', 600);
const days = seconds('2024-03-13T00:00', 86400);
const numbered = (start = 1, step = 1): Axis => ({ kind: 'index', start, step, zone: null });
const months = (year: number, step: number): Axis => ({ kind: 'months', start: (year - 1970) * 12, step, zone: null });

/** The first 24 readings of the hormone, every ten minutes from 13 March 2024, 08:00, unless something else is said. */
const usual = (file: string, more: Partial<Reading> = {}): Reading => ({
  file,
  values: hormone,
  axis: tenMinutes,
  ...more,
});

const textReadings: readonly Reading[] = [
  usual('plain-comma-iso.csv', { detected: { delimiter: ',', decimal: '.', header: true, stamp: 'iso' } }),
  usual('semicolon-decimal-comma.csv', { detected: { delimiter: ';', decimal: ',' } }),
  usual('tab-separated.tsv', { detected: { delimiter: '\t' } }),
  usual('pipe-separated.txt', { detected: { delimiter: '|' } }),
  usual('aligned-by-blanks.txt', { detected: { delimiter: ' ', timeColumn: 0, clockColumn: 1 } }),
  usual('utf8-with-mark.csv', { detected: { encoding: 'utf-8', timeColumn: 0 } }),
  usual('utf16-little-with-mark.txt', { detected: { encoding: 'utf-16le', delimiter: '\t' } }),
  usual('utf16-big-without-mark.csv', { detected: { encoding: 'utf-16be' } }),
  usual('windows-1252-degree.csv', { name: 'Größe', unit: '°C', detected: { encoding: 'windows-1252' } }),
  usual('windows-line-ends-none-at-end.csv'),
  usual('carriage-returns-only.csv'),
  usual('doubled-carriage-returns.csv'),
  usual('separator-named-in-first-line.csv', { detected: { preambleLines: 1 } }),
  usual('preamble-of-lines.csv', { detected: { preambleLines: 4, header: true } }),
  usual('commented-preamble.csv', { detected: { preambleLines: 2 } }),
  usual('units-row.csv', { unit: 'IU/L', detected: { unitsRow: true }, asks: ['valueColumn'] }),
  usual('unit-in-brackets.csv', { unit: 'IU/L' }),
  usual('unit-behind-slash.csv', { name: 'T', unit: 'K' }),
  usual('rule-under-header.txt'),
  usual('no-header.csv', { name: 'column 2', detected: { header: false } }),
  usual('totals-at-the-end.csv', { notes: { badStamps: 3, emptyRows: 1, raggedRows: 1, gapCells: 1 } }),
  usual('trailing-delimiter.csv'),
  usual('empty-columns-behind.csv', { notes: { emptyRows: 2 } }),
  usual('header-again-every-day.csv', { notes: { badStamps: 1, textCells: 1 } }),
  usual('blank-lines-between.csv', { notes: { emptyRows: 4 } }),
  usual('counter-column.csv', {
    axis: numbered(),
    detected: { stamp: 'number', timeColumn: 0 },
    asks: ['valueColumn'],
  }),
  usual('counter-without-name.csv', { axis: numbered(0) }),
  usual('file-of-many-tags.csv', { detected: { valueColumn: 2 }, asks: ['valueColumn'] }),
  usual('all-quoted.csv'),
  usual('apostrophes-as-quotes.csv', { detected: { quote: "'" } }),
  usual('line-break-in-header.csv', { unit: 'IU/L' }),
  usual('delimiter-in-remark.csv'),
  usual('decimal-comma-in-quotes.csv', { detected: { delimiter: ',', decimal: ',' } }),
  usual('inch-mark-inside.csv'),
  usual('open-quote.csv', { settings: { quote: null } }),
  usual('values-only.txt', { axis: numbered(), name: 'column 1' }),
  usual('values-with-a-sum.txt', { axis: numbered(), name: 'column 1', notes: { textCells: 1 } }),
  usual('values-only-decimal-comma.txt', { axis: numbered(), detected: { decimal: ',' } }),
  usual('blank-line-for-a-gap.txt', { axis: numbered(), values: without(hormone, 9), notes: { gapCells: 1 } }),
  ...[
    ['thousands-point.csv', '.', ','] as const,
    ['thousands-comma-in-quotes.csv', ',', '.'] as const,
    ['thousands-narrow-blank.csv', ' ', ','] as const,
    ['thousands-apostrophe.csv', "'", '.'] as const,
  ].map(([file, thousands, decimal]): Reading => {
    const halves = nile.map((value) => value + 0.5);
    return { file, values: halves, axis: days, name: 'flow', detected: { thousands, decimal } };
  }),
  {
    file: 'thousands-only-later.csv',
    values: nile.map((value, k) => (k < 20 ? value : value + 0.5)),
    axis: days,
    name: 'flow',
    detected: { thousands: '.', decimal: ',' },
  },
  usual('scientific-notation.csv'),
  usual('fortran-exponents.txt', { axis: numbered(), name: 'column 1' }),
  { file: 'minus-behind.csv', values: overshorts, axis: days, name: 'overshort' },
  { file: 'typographic-minus.csv', values: overshorts, axis: days, name: 'overshort' },
  usual('unit-in-every-cell.csv', { unit: 'IU/L' }),
  usual('words-for-values.csv', { values: without(hormone, 4, 5), notes: { textCells: 2 } }),
  usual('below-detection-limit.csv', { values: without(hormone, 5), notes: { belowLimit: 1 } }),
  usual('words-for-gaps.csv', { values: without(hormone, 6, 7, 8, 9, 10), notes: { gapCells: 5 } }),
  usual('code-for-gaps.csv', {
    values: without(hormone, 6),
    settings: { gapWords: ['-999'] },
    notes: { gapCells: 1 },
  }),
  usual('quality-column.csv', {
    values: without(hormone, 3, 11),
    settings: { status: { column: 2, keep: ['Good'] } },
    notes: { leftOutByStatus: 2 },
  }),
  usual('unquoted-delimiter-in-remark.csv', { values: without(hormone, 5), notes: { raggedRows: 1, gapCells: 1 } }),
  usual('last-row-cut-off.csv', { notes: { badStamps: 1, raggedRows: 1, gapCells: 1 } }),
  usual('day-first-slashes.csv', { detected: { stamp: 'dayFirst' } }),
  usual('month-first-slashes.csv', { detected: { stamp: 'monthFirst' } }),
  usual('day-or-month-open.csv', { settings: { stamp: 'dayFirst' }, axis: seconds('2024-04-03T08:00', 600) }),
  usual('day-or-month-open.csv', { settings: { stamp: 'monthFirst' }, axis: seconds('2024-03-04T08:00', 600) }),
  usual('day-or-month-with-points.csv', {
    axis: seconds('2024-04-03T08:00', 600),
    notes: { ambiguousDates: 1 },
    asks: ['dateOrder'],
  }),
  usual('day-or-month-told-by-gap.csv', {
    axis: seconds('2024-04-03T08:00', 7200),
    notes: { ambiguousDates: 2 },
    asks: ['dateOrder'],
  }),
  usual('two-digit-years.csv', { asks: ['dateOrder'] }),
  usual('month-by-name.csv', { detected: { stamp: 'dayFirst' } }),
  usual('month-by-german-name.csv'),
  usual('twelve-hour-clock.csv', { detected: { stamp: 'monthFirst' } }),
  usual('blanks-around-am-and-pm.txt', { axis: seconds('2024-03-13T08:00', 3600), detected: { clockColumn: 1 } }),
  usual('fifty-readings-a-second.csv', { axis: seconds('2024-03-13T08:00', 0.02, 'UTC') }),
  usual('date-and-time-apart.csv', { detected: { timeColumn: 0, clockColumn: 1 } }),
  usual('time-before-date.csv', { detected: { timeColumn: 1, clockColumn: 0 } }),
  usual('points-in-the-time.csv'),
  usual('digits-only-stamps.csv'),
  usual('iso-with-offset.csv'),
  usual('iso-with-z-and-milliseconds.csv', { axis: { ...tenMinutes, zone: 'UTC' } }),
  usual('offset-changes-with-the-clock.csv', {
    axis: seconds('2024-03-30T16:00', 3600, 'UTC'),
    notes: { clockChange: 1 },
  }),
  usual('hour-twice-in-autumn.csv', {
    // 26 October 2024 from 14:00 plant clock; 02:00 of the 27th comes twice, and the first stays.
    values: Float64Array.from([...hormone.slice(0, 13), ...hormone.slice(14)]),
    axis: seconds('2024-10-26T14:00', 3600),
    notes: { duplicateTimes: 1, conflictingTimes: 1, clockChange: 1 },
  }),
  usual('hour-twice-in-autumn.csv', {
    settings: { zone: 'Europe/Berlin' },
    axis: seconds('2024-10-26T12:00', 3600, 'Europe/Berlin'),
    notes: { clockChange: 2 },
  }),
  usual('epoch-seconds.csv', { axis: { ...tenMinutes, zone: 'UTC' } }),
  usual('epoch-milliseconds.csv', { axis: { ...tenMinutes, zone: 'UTC' } }),
  usual('elapsed-seconds.csv', { axis: numbered(0, 0.1) }),
  usual('time-of-day-over-midnight.csv', { axis: seconds('1970-01-01T08:00', 3600), notes: { noDate: 24 } }),
  usual('stamp-that-is-no-date.csv', { values: without(hormone, 3), notes: { badStamps: 1, gapsInserted: 1 } }),
  usual('rows-left-out.csv', { values: without(hormone, 7, 8, 15), notes: { gapsInserted: 3 } }),
  usual('rows-twice.csv', { notes: { duplicateTimes: 1, conflictingTimes: 1 } }),
  usual('rows-twice.csv', {
    settings: { repeats: 'gap' },
    values: without(hormone, 6),
    notes: { duplicateTimes: 1, conflictingTimes: 1 },
  }),
  usual('newest-first.csv', { notes: { reversedTimes: 23 } }),
  usual('seconds-that-jitter.csv', { notes: { jitter: 21 } }),
  usual('interval-changes.csv', {
    values: Float64Array.from({ length: 36 }, (_, k) => (k < 24 ? (k % 2 ? NaN : hormone[k / 2]!) : hormone[k - 12]!)),
    notes: { gapsInserted: 12 },
  }),
  { file: 'months-by-number.csv', values: airline, axis: months(1949, 1), name: 'passengers' },
  { file: 'months-by-name.csv', values: airline, axis: months(1949, 1), name: 'passengers' },
  { file: 'months-at-their-end.csv', values: airline, axis: months(1949, 1), name: 'passengers' },
  {
    file: 'quarters.csv',
    values: published('presidents', 40),
    axis: months(1945, 3),
    name: 'approval',
    notes: { gapCells: 4 },
  },
  { file: 'years.csv', values: published('lakeHuron', 40), axis: months(1875, 12), name: 'level' },
  // 2020 has 53 weeks (ISO 8601); week 41 begins on Monday, 5 October.
  usual('iso-weeks.csv', { axis: seconds('2020-10-05T00:00', 604800) }),
  usual('one-row-a-tag.csv', { name: 'LH-1', detected: { layout: 'long', tagColumn: 1 }, asks: ['tag'] }),
  usual('one-tag-after-the-other.csv', { name: 'LH-1', settings: { tag: 'LH-1' }, detected: { layout: 'long' } }),
];

export const readings = [...textReadings, ...plantReadings];

export const refusals: readonly Refusal[] = [
  { file: 'empty.csv', failure: { code: 'emptyFile' } },
  { file: 'blank-lines-only.csv', failure: { code: 'emptyFile' } },
  { file: 'header-only.csv', failure: { code: 'noNumbers', line: 1, column: 1, example: 'time' } },
  { file: 'words-only.csv', failure: { code: 'noNumbers', lines: 3, line: 2, column: 1, example: 'pump off' } },
  { file: 'three-readings.csv', failure: { code: 'tooFewRows', readings: 3, needed: 8 } },
  { file: 'one-value-throughout.csv', failure: { code: 'constantColumn', column: 'LH', value: 7 } },
  { file: 'gaps-only.csv', failure: { code: 'allGaps', column: 'LH', rows: 24 } },
  { file: 'photo.jpg', failure: { code: 'binaryFile', kind: 'JPEG picture' } },
  { file: 'workbook-cut-off.xlsx', failure: { code: 'workbookDamaged' } },
  { file: 'workbook-of-words.xlsx', failure: { code: 'noNumbers', line: 2, column: 1, example: 'valve freed' } },
  { file: 'workbook-that-would-fill-the-memory.xlsx', failure: { code: 'workbookTooLarge' } },
  { file: 'table.ods', failure: { code: 'binaryFile', kind: 'spreadsheet workbook (.ods)' } },
  { file: 'machine-data.csv', failure: { code: 'binaryFile', kind: 'data that are not text' } },
  { file: 'day-or-month-open.csv', failure: { code: 'ambiguousDates', line: 2, text: '03/04/2024 08:00' } },
  {
    file: 'decimal-commas-between-commas.csv',
    failure: { code: 'decimalCommaClash', line: 2, text: '2024-03-13 08:00,2,4' },
  },
  { file: 'open-quote.csv', failure: { code: 'unclosedQuote', line: 9 } },
  { file: 'unreadable-stamps.csv', failure: { code: 'badStamp', line: 3, column: 1, text: 'shift 1', count: 12 } },
  { file: 'irregular-stamps.csv', failure: { code: 'noRegularAxis', rows: 24 } },
  {
    file: 'seconds-cut-off.csv',
    failure: { code: 'repeatedStamps', line: 3, text: '2024-03-13 08:00', count: 13 },
  },
  { file: 'mistyped-year.csv', failure: { code: 'gridTooLong', line: 12 } },
];
