import { joinStampParts } from '../stamps/joinStampParts.ts';
import { StampReader } from '../stamps/stampReader.ts';
import type { HeadRow } from './headRows.ts';

/** Headings of the parts of a stamp in English, German, French, Spanish, Italian, Dutch and the archives' short forms. */
const partNames: readonly RegExp[] = [
  /^(?:#?\s*y{2,4}|year|yr|jahr|ann[ée]e|a[ñn]o|anno|jaar)$/iu,
  /^(?:mo|mm|mon|month|monat|mois|mes|mese|maand)$/iu,
  /^(?:d|dd|dy|day|tag|jour|d[ií]a|giorno|dag)$/iu,
  /^(?:h|hh|hr|hour|std|stunde|heure|hora|ora|uur|hhmm)$/iu,
  /^(?:mi|min|mn|mm|minute|minuten|minuto|minuut)$/iu,
  /^(?:s|ss|sec|second|seconds|sek|sekunde|seconde|segundo|secondo)$/iu,
];
const FEWEST_ROWS = 3;
/** Share of rows whose parts must make a date that exists. */
const VALID_SHARE = 0.95;

/** Stamps made of some columns in the sample; NaN where they are no date. */
function stampsOf(body: readonly HeadRow[], columns: readonly number[]): number[] {
  const reader = new StampReader('yearFirst', '.');
  const rows = body.filter(({ cells }) => cells.some((cell) => cell.trim() !== ''));
  return rows.map(({ cells }) => reader.read(joinStampParts(cells, columns)));
}

const isValid = (stamps: readonly number[]): boolean =>
  stamps.length >= FEWEST_ROWS && stamps.filter((stamp) => !Number.isNaN(stamp)).length >= VALID_SHARE * stamps.length;

function byName(body: readonly HeadRow[], names: readonly string[]): readonly number[] | null {
  const columns: number[] = [];
  for (const pattern of partNames) {
    const column = names.findIndex((name, j) => pattern.test(name.trim()) && !columns.includes(j));
    if (column < 0) break;
    columns.push(column);
  }
  for (; columns.length >= 2; columns.pop()) if (isValid(stampsOf(body, columns))) return columns;
  return null;
}

/** Without names: neighbours that read as dates which go one way through the file, and hours and minutes as long as stamps repeat. */
function byLooks(body: readonly HeadRow[], columns: number): readonly number[] | null {
  const fullYear = (column: number) => body.every(({ cells }) => /^(?:19|20)\d{2}$/u.test(cells[column]?.trim() ?? ''));
  for (let first = 0; first + 3 < columns; first++) {
    if (!fullYear(first)) continue;
    let parts = [first, first + 1, first + 2];
    let stamps = stampsOf(body, parts);
    if (!isValid(stamps)) continue;
    const repeats = () => new Set(stamps).size < stamps.length;
    for (let next = first + 3; next < Math.min(first + 6, columns - 1) && repeats(); next++) {
      const longer = stampsOf(body, [...parts, next]);
      if (!isValid(longer)) break;
      parts = [...parts, next];
      stamps = longer;
    }
    const oneWay = stamps.every((stamp, i) => i === 0 || !(stamp <= stamps[i - 1]!));
    const otherWay = stamps.every((stamp, i) => i === 0 || !(stamp >= stamps[i - 1]!));
    if (oneWay || otherWay) return parts;
  }
  return null;
}

/**
 * Columns that hold year, month, day (and hour, minute, second) apart.
 *
 * Method: by their headings, year and month at least; without headings, three neighbours that are years, months and days of
 * dates which exist and go one way through the file.
 *
 * @param body data rows of the head; @param columns their number; @param names headings, as many or fewer
 * @returns the columns, year first; null where the stamp is not written so
 */
export function sniffStampColumns(
  body: readonly HeadRow[],
  columns: number,
  names: readonly string[],
): readonly number[] | null {
  const found = names.some((name) => name.trim() !== '') ? byName(body, names) : byLooks(body, columns);
  // A column of readings must be left.
  return found !== null && found.length < columns ? found : null;
}
