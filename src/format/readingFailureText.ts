import type { ReadingFailure } from '../../workers/contract/failures.ts';
import type { FailureText } from './failureText.ts';
import { counted, formatNumber } from './numbers.ts';

const say = (what: string, where: string, todo: string): FailureText => ({ what, where, todo });

const differences: Record<Extract<ReadingFailure, { code: 'filesDiffer' }>['what'], string> = {
  columns: 'they have other columns',
  decimal: 'they write numbers with another decimal mark',
  stamp: 'they write times in another form',
  time: 'one has times and the other has none',
};

/** The words for what can be wrong with a file. */
export function readingFailureText(failure: ReadingFailure): FailureText {
  switch (failure.code) {
    case 'emptyFile':
      return say('The file is empty.', '', 'Export it again and open it anew. What was open is kept.');
    case 'fileUnreadable':
      return say(
        'The file cannot be read from the disk.',
        failure.reason,
        'It may have been moved, or another program holds it: close it there and open it anew. What was open is kept.',
      );
    case 'binaryFile':
      return say(
        `This is not a text file (${failure.kind}).`,
        '',
        'Export the record as CSV or text and open that. What was open is kept.',
      );
    case 'fileTooLarge':
      return say(
        `The file is too large (${formatNumber(failure.bytes / 1e6, 4)} MB).`,
        `limit ${formatNumber(failure.limit / 1e6, 4)} MB`,
        'Export a shorter stretch or fewer columns.',
      );
    case 'noNumbers':
      return say(
        'No column of numbers was found.',
        `line ${failure.line}, column ${failure.column}: “${failure.example}”`,
        'Check the delimiter and the decimal mark below, or open another file.',
      );
    case 'noSuchColumn':
      return say(
        `There is no column ${failure.column}; the file has ${counted(failure.columns, 'column')}.`,
        '',
        'Choose another column.',
      );
    case 'tooFewRows':
      return say(
        `Only ${counted(failure.readings, 'reading')} in this column; at least ${failure.needed} are needed.`,
        '',
        'Choose another column, or bring a longer record.',
      );
    case 'allGaps':
      return say(
        `The column has no readings at all: ${counted(failure.rows, 'row')}, every one a gap.`,
        failure.column,
        'Choose another column, or check the decimal mark.',
      );
    case 'constantColumn':
      return say(
        `Every reading of the column is the same (${formatNumber(failure.value, 6)}): there is no variation to model.`,
        failure.column,
        'Choose another column.',
      );
    case 'badStamp':
      return say(
        `${counted(failure.count, 'time stamp')} cannot be read.`,
        `line ${failure.line}, column ${failure.column}: “${failure.text}”`,
        'Choose how the times are written, or another time column, or no time at all.',
      );
    case 'ambiguousDates':
      return say(
        'The dates can be read day first or month first.',
        `line ${failure.line}: “${failure.text}”`,
        'Say which it is.',
      );
    case 'noRegularAxis':
      return say(
        `No regular interval fits the times: ${failure.offGrid} of ${failure.rows} rows are off a grid of ${formatNumber(failure.interval, 5)} s.`,
        '',
        'Lay them on a grid below, with the mean or the last reading of each bin; or choose another time column, or no time: the readings are then numbered.',
      );
    case 'gridTooLong':
      return say(
        `The times span ${failure.places} places of the grid, more than ${failure.limit}.`,
        `line ${failure.line}`,
        'One stamp is probably wrong by years; correct it or choose a longer interval.',
      );
    case 'decimalCommaClash':
      return say(
        'Commas stand both between columns and inside numbers: the columns cannot be told apart.',
        `line ${failure.line}: “${failure.text}”`,
        'Export with semicolons or tabs between columns, or with a decimal point.',
      );
    case 'repeatedStamps':
      return say(
        `${counted(failure.count, 'row')} repeat a time with another reading.`,
        `first at line ${failure.line}: “${failure.text}”`,
        'The times may have lost their seconds, or the file lists several tags: export full times, choose the tag column, say below which reading stays, or read it without time.',
      );
    case 'workbookTooLarge':
      return say(
        `Unpacked, the workbook would take ${formatNumber(failure.bytes / 1e6, 4)} MB.`,
        `limit ${formatNumber(failure.limit / 1e6, 4)} MB`,
        'Export the sheet as CSV and open that. What was open is kept.',
      );
    case 'workbookDamaged':
      return say(
        'The workbook cannot be unpacked.',
        failure.reason,
        'Save it again as .xlsx, or export the sheet as CSV. What was open is kept.',
      );
    case 'workbookEmpty':
      return say(
        'Every sheet of the workbook is empty.',
        failure.sheets.map((sheet) => `“${sheet}”`).join(', '),
        'Open another workbook.',
      );
    case 'noSuchSheet':
      return say(
        `The workbook has no sheet “${failure.sheet}”.`,
        `it has ${failure.sheets.map((sheet) => `“${sheet}”`).join(', ')}`,
        'Choose another sheet.',
      );
    case 'filesDiffer':
      return say(
        `The files cannot be put together: ${differences[failure.what]}.`,
        `${failure.firstName}: ${failure.expected}; ${failure.fileName}: ${failure.found}`,
        'Open files of one export together, and the others on their own. What was open is kept.',
      );
    case 'unclosedQuote':
      return say(
        'A quotation mark is opened and never closed.',
        `line ${failure.line}`,
        'Set quoting to none below, or correct the line.',
      );
  }
}
