import type { HeadRow } from './headRows.ts';

const MOST_TAGS = 200;
/** Share of rows that repeat a stamp from which on a file is taken to list several tags. */
const REPEATS = 0.25;
/** The half of the day, apart from its clock, is no tag. */
const half = /^[ap]\.?\s?m\.?$/iu;

/**
 * The column that names the tag in a file of rows (time, tag, value).
 *
 * Method: a column of few distinct words such that stamps repeat while stamp and word together do not.
 *
 * @param rows data rows; @param columns their number; @param timeColumn the time; @param wordColumns columns of text
 * @returns the column, or null where each row is a reading of every column
 */
export function sniffTags(
  rows: readonly HeadRow[],
  timeColumn: number | null,
  wordColumns: readonly number[],
): number | null {
  if (timeColumn === null || rows.length < 4) return null;
  const times = rows.map(({ cells }) => cells[timeColumn]?.trim() ?? '');
  if (new Set(times).size > (1 - REPEATS) * rows.length) return null;
  for (const column of wordColumns) {
    const words = rows.map(({ cells }) => cells[column]?.trim() ?? '');
    const distinct = new Set(words).size;
    if (words.every((word) => half.test(word))) continue;
    if (distinct < 2 || distinct > MOST_TAGS || distinct * 2 > rows.length) continue;
    const pairs = new Set(words.map((word, i) => `${times[i]!}\u0000${word}`)).size;
    if (pairs > 0.9 * rows.length) return column;
  }
  return null;
}
