import type { Span } from '../contract/series.ts';

/**
 * Stretches of places at which something holds.
 *
 * @param length number of places; @param holds asked once for each place, in order
 * @param least shortest stretch returned
 * @returns stretches, ascending, not touching
 */
export function runsWhere(length: number, holds: (t: number) => boolean, least = 1): Span[] {
  const runs: Span[] = [];
  let from = -1;
  for (let t = 0; t <= length; t++) {
    const now = t < length && holds(t);
    if (now && from < 0) from = t;
    if (!now && from >= 0) {
      if (t - from >= least) runs.push({ from, to: t });
      from = -1;
    }
  }
  return runs;
}
