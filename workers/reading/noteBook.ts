import type { ReadingNote } from '../contract/reading.ts';

/** Places and texts a note shows; its count has them all. */
const SHOWN = 8;

/**
 * A note about a file.
 *
 * @param kind what was found; @param count how often
 * @param lines lines of the file where it is, in any order; @param texts first texts concerned
 * @returns the note with its first places; null where the count is nought
 */
export function noteOf(
  kind: ReadingNote['kind'],
  count: number,
  lines: Iterable<number> = [],
  texts: readonly string[] = [],
): ReadingNote | null {
  if (count === 0) return null;
  const first = [...new Set(lines)].sort((a, b) => a - b).slice(0, SHOWN);
  return { kind, count, lines: first, texts: texts.slice(0, SHOWN) };
}
