import type { JoinedPart, ReadingNote } from '../contract/reading.ts';
import { noteOf } from './noteBook.ts';

/**
 * Rows of joined files whose times another file covers as well.
 *
 * Method: a row overlaps where its stamp lies between the first and the last stamp of a file before its own.
 *
 * @param times stamps by row, NaN where unreadable; @param lineOf line of a row in the whole text
 * @param parts files in the order of the text
 * @returns the note with the files concerned; null where no file reaches into another, or there is only one
 */
export function overlapNote(
  times: Float64Array,
  lineOf: (row: number) => number,
  parts: readonly JoinedPart[],
): ReadingNote | null {
  if (parts.length < 2) return null;
  const spans = parts.map(() => [Infinity, -Infinity] as [number, number]);
  const owners = new Int32Array(times.length);
  let part = 0;
  for (let row = 0; row < times.length; row++) {
    const line = lineOf(row);
    while (part + 1 < parts.length && line >= parts[part + 1]!.line) part++;
    owners[row] = part;
    const time = times[row]!;
    const span = spans[part]!;
    if (time < span[0]) span[0] = time;
    if (time > span[1]) span[1] = time;
  }
  let count = 0;
  const lines: number[] = [];
  const names = new Set<string>();
  for (let row = 0; row < times.length; row++) {
    const other = spans.findIndex(([from, to], k) => k < owners[row]! && times[row]! >= from && times[row]! <= to);
    if (other < 0) continue;
    count++;
    if (lines.length < 8) lines.push(lineOf(row));
    names.add(parts[other]!.fileName).add(parts[owners[row]!]!.fileName);
  }
  return noteOf('overlappingFiles', count, lines, [...names]);
}
