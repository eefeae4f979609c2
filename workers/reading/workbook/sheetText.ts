/** A cell as the workbook library gives it; dates as UTC fields of what the sheet shows. */
export type SheetCell = string | number | boolean | Date | null;

/** Serial 1, the first day a sheet can show (ECMA-376 part 1, § 18.17.4.1); before it, a cell is a time of day. */
const FIRST_DAY = Date.UTC(1900, 0, 1);
const DAY = 86_400_000;
const special = /["\t\r\n]/u;

/** Serials are fractions of a day cut to whole milliseconds: one short of a hundredth of a second is that hundredth. */
const tidy = (time: number): number => (((time % 10) + 10) % 10 === 9 ? time + 1 : time);

function dateText(cell: Date, bare: boolean): string {
  const time = tidy(cell.getTime());
  if (Number.isNaN(time)) return '';
  const iso = new Date(time).toISOString();
  const clock = iso.slice(11, 23).replace('.000', '');
  if (time < FIRST_DAY) return clock;
  return bare ? iso.slice(0, 10) : `${iso.slice(0, 10)} ${clock}`;
}

/** Whether a column holds dates, each at midnight: then they are days. */
function holdsDays(rows: readonly (readonly SheetCell[])[], column: number): boolean {
  let dates = 0;
  for (const row of rows) {
    const cell = row[column];
    if (!(cell instanceof Date)) continue;
    if (cell.getTime() < FIRST_DAY || tidy(cell.getTime()) % DAY !== 0) return false;
    dates++;
  }
  return dates > 0;
}

function cellText(cell: SheetCell | undefined, bare: boolean): string {
  if (cell === null || cell === undefined) return '';
  if (cell instanceof Date) return dateText(cell, bare);
  if (typeof cell === 'boolean') return cell ? 'TRUE' : 'FALSE';
  const text = String(cell);
  return special.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

/**
 * The rows of a sheet as text with tabs between the cells.
 *
 * Numbers are written with as many digits as tell them from every other double, dates as `2024-03-13 08:00:00`
 * (without the time where all of a column are at midnight), times of day
 * as `08:00:00`; texts with tabs, quotes or line breaks in quotes (RFC 4180). Empty cells at the end of all rows are left out.
 *
 * @param rows cells by row, rows as long as they like
 * @returns the text, every row ended by a line feed
 */
export function sheetText(rows: readonly (readonly SheetCell[])[]): string {
  let width = 0;
  for (const row of rows) {
    let length = row.length;
    while (length > width && row[length - 1] === null) length--;
    width = Math.max(width, length);
  }
  const bare = Array.from({ length: width }, (_, j) => holdsDays(rows, j));
  const lines = rows.map((row) => bare.map((days, j) => cellText(row[j], days)).join('\t'));
  return lines.length === 0 ? '' : `${lines.join('\n')}\n`;
}
