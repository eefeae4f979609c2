import type { Dialect } from '../../workers/contract/dialect.ts';
import type { ReadingNote, Sniffed } from '../../workers/contract/reading.ts';
import { counted } from './numbers.ts';

const delimiters: Record<Dialect['delimiter'], string> = {
  ',': 'commas',
  ';': 'semicolons',
  '\t': 'tabs',
  '|': 'bars',
  ' ': 'blanks',
};

const stamps: Record<NonNullable<Dialect['stamp']>, string> = {
  iso: 'ISO 8601',
  yearFirst: 'year first',
  dayFirst: 'day first',
  monthFirst: 'month first',
  epochSeconds: 'seconds since 1970',
  epochMilliseconds: 'milliseconds since 1970',
  number: 'plain numbers',
};

export const delimiterName = (delimiter: Dialect['delimiter']): string => delimiters[delimiter];
export const stampName = (stamp: NonNullable<Dialect['stamp']>): string => stamps[stamp];

/** Everything detected about a file in one sentence. */
export function dialectSentence({ dialect, columns, rows }: Sniffed): string {
  const column = (index: number | null) => columns.find((one) => one.index === index)?.name ?? '';
  const named = (index: number | null) => (column(index) === '' ? `column ${(index ?? 0) + 1}` : `“${column(index)}”`);
  const time =
    dialect.timeColumn === null
      ? 'no time column'
      : `times in ${named(dialect.timeColumn)}${dialect.stamp === null ? '' : ` (${stamps[dialect.stamp]})`}`;
  const decimal = dialect.decimal === ',' ? 'decimal comma' : 'decimal point';
  const preamble =
    dialect.preambleLines > 0 ? `, ${counted(dialect.preambleLines, 'line')} skipped before the table` : '';
  const header = dialect.header ? 'a header row' : 'no header row';
  const units = dialect.unitsRow ? ' and a units row' : '';
  const cells =
    dialect.sheet === null ? `columns parted by ${delimiters[dialect.delimiter]}` : `sheet “${dialect.sheet}”`;
  return `${counted(rows, 'row')}, ${cells}, ${decimal}, ${header}${units}${preamble}; ${time}; readings from ${named(dialect.valueColumn)}.`;
}

const repeatsKept: Record<string, string> = {
  first: 'the first is kept',
  last: 'the last is kept',
  gap: 'none is kept, a gap is',
};

/** One thing found on reading, in words. */
export function noteSentence({ kind, count, lines, texts }: ReadingNote): string {
  const at =
    lines.length === 0
      ? ''
      : ` (line ${lines.slice(0, 5).join(', ')}${count > Math.min(lines.length, 5) ? ', …' : ''})`;
  const such = texts.length === 0 ? '' : `, such as “${texts.slice(0, 3).join('”, “')}”`;
  const rows = counted(count, 'row');
  switch (kind) {
    case 'gapsInserted':
      return `${counted(count, 'place')} on the time axis without a row: kept as gaps, nothing is interpolated${at}.`;
    case 'gapCells':
      return `${counted(count, 'empty cell')}: kept as gaps${at}.`;
    case 'textCells':
      return `${counted(count, 'cell')} with text instead of a number${such}: kept as gaps${at}.`;
    case 'raggedRows':
      return `${rows} with more or fewer cells than the header${at}.`;
    case 'duplicateTimes':
      return `${rows} whose place in time was taken already: one reading a place is kept${at}.`;
    case 'conflictingTimes':
      return `${rows} ${count === 1 ? 'repeats' : 'repeat'} a time with another reading: ${repeatsKept[texts[0] ?? 'first']}${at}.`;
    case 'sharedPlaces':
      return `${rows} ${count === 1 ? 'shares' : 'share'} a place of the grid with others: ${texts[0] === 'last' ? 'the latest is kept' : 'their mean is taken'}.`;
    case 'reversedTimes':
      return `${rows} earlier than the row before: put in order${at}.`;
    case 'jitter':
      return `${rows} a little off the regular interval: moved to the nearest place${at}.`;
    case 'emptyRows':
      return `${counted(count, 'empty row')} skipped${at}.`;
    case 'ambiguousDates':
      return `${counted(count, 'date')} can be read day first or month first${such}${at}.`;
    case 'leftOutByStatus':
      return `${rows} left out by the status column${such}${at}.`;
    case 'overlappingFiles':
      return `Files overlap in time: ${rows} where another file has readings as well (${texts.join(', ')})${at}. Equal readings are merged.`;
    case 'clockChange':
      return `${rows} at a change of the clock${at}.`;
    case 'offGrid':
      return `${rows} too far off the regular interval: left out${at}.`;
    case 'digitsLost':
      return `${counted(count, 'number')} with more digits than can be kept${such}${at}.`;
    case 'badStamps':
      return `${rows} whose time cannot be read${such}: left out${at}.`;
    case 'noOffset':
      return `${rows} whose time names no offset from UTC, while others name different ones: left out${at}.`;
    case 'noDate':
      return 'Times of day without a date: days are counted from 1 January 1970.';
    case 'belowLimit':
      return `${counted(count, 'reading')} below a detection limit${such}: kept as gaps${at}.`;
  }
}
