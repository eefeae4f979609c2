import { monthNumber } from './monthNames.ts';

const whole = /^(\d+)(?:[.,]0+)?$/u;
const hourMinute = /^\d{3,4}$/u;

/** A whole number of at least two digits; empty where the cell holds none. */
function digits(cell: string | undefined): string {
  const match = whole.exec(cell?.trim() ?? '');
  return match === null ? '' : String(Number(match[1])).padStart(2, '0');
}

function month(cell: string | undefined): string {
  const number = monthNumber(cell?.trim().replace(/\.$/u, '') ?? '');
  return number > 0 ? String(number).padStart(2, '0') : digits(cell);
}

/**
 * One stamp of parts that stand in columns of their own.
 *
 * Method: year, month (number or name), day, hour, minute, second, as far as there are columns; left-out days are the first;
 * hours of three or four digits at the end are hour and minute (NDBC and other archives head that column hhmm).
 *
 * @param cells of a row; @param columns of the parts, year first
 * @returns `2024-03-13 08:00:00`, year first, for the reader of stamps; `?` where a part is no whole number
 */
export function joinStampParts(cells: readonly string[], columns: readonly number[]): string {
  const cell = (part: number): string | undefined => (part < columns.length ? cells[columns[part]!] : undefined);
  const [year, day] = [digits(cell(0)), columns.length > 2 ? digits(cell(2)) : '01'];
  const date = [year, month(cell(1)), day];
  if (date.includes('')) return '?';
  if (columns.length <= 3) return date.join('-');
  const hourText = cell(3)?.trim() ?? '';
  if (columns.length === 4 && hourMinute.test(hourText)) {
    const padded = hourText.padStart(4, '0');
    return `${date.join('-')} ${padded.slice(0, 2)}:${padded.slice(2)}`;
  }
  const clock = [digits(hourText), columns.length > 4 ? digits(cell(4)) : '00'];
  if (columns.length > 5) {
    const second = (cell(5)?.trim() ?? '').replace(',', '.');
    const [before, after] = second.split('.');
    clock.push(digits(before) === '' ? '' : `${digits(before)}${after === undefined ? '' : `.${after}`}`);
  }
  return clock.includes('') ? '?' : `${date.join('-')} ${clock.join(':')}`;
}
