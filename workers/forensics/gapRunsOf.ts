import type { Span } from '../contract/series.ts';

/**
 * The lengths of alternating stretches (kept, made a gap, kept, …) that a `gaps` repair is written in.
 *
 * @param spans ascending, not touching
 * @returns an even number of lengths; empty for no spans
 * @example 3…5 and 8…9 give 3, 2, 3, 1
 */
export function gapRunsOf(spans: readonly Span[]): number[] {
  const runs: number[] = [];
  let end = 0;
  for (const { from, to } of spans) {
    runs.push(from - end, to - from);
    end = to;
  }
  return runs;
}
