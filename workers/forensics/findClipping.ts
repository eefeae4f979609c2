import type { Finding } from '../contract/forensics.ts';
import type { Span } from '../contract/series.ts';
import { gapRunsOf } from './gapRunsOf.ts';
import { runsWhere } from './runsWhere.ts';

/** An end value of an unrounded record repeats by chance never; so often it is the end of a range. */
const TIMES_UNROUNDED = 3;
/** In a rounded record it must hold this many times as many readings as the two values next to it hold on average, and these more. */
const RATIO = 4;
const MORE = 8;

/**
 * Readings cut off at the end of a range: the highest or lowest value, repeated.
 *
 * Method: without rounding the end value stands there at least 3 times exactly; with rounding its count is more than 4 times the
 * mean count of the two steps next to it, plus 8: the tail of a record thins out, it does not pile up.
 *
 * @param values gaps as NaN; @param resolution smallest step, 0 for none; @param excepted stretches reported otherwise
 * @returns a finding or null; `numbers`: value of the fuller end, ends (1 or 2), step
 */
export function findClipping(values: Float64Array, resolution: number, excepted: readonly Span[]): Finding | null {
  const seen = values.slice();
  for (const { from, to } of excepted) seen.fill(NaN, from, to);
  let low = Infinity;
  let high = -Infinity;
  let observed = 0;
  for (const value of seen) {
    if (Number.isNaN(value)) continue;
    observed++;
    if (value < low) low = value;
    if (value > high) high = value;
  }
  if (observed < 30 || !(high > low)) return null;
  const rounding = 16 * Number.EPSILON * Math.max(Math.abs(low), Math.abs(high));
  const near = (value: number, reach: number) => {
    let count = 0;
    for (const one of seen) if (Math.abs(one - value) <= reach) count++;
    return count;
  };
  const distinct = (high - low) / resolution;
  const coarse = resolution > rounding && distinct < observed;
  const held = (end: number, inward: number): number => {
    const count = near(end, coarse ? 0.2 * resolution : rounding);
    if (!coarse) return count >= TIMES_UNROUNDED ? count : 0;
    if (distinct < 4) return 0;
    const next =
      (near(end + inward * resolution, 0.2 * resolution) + near(end + 2 * inward * resolution, 0.2 * resolution)) / 2;
    return count > RATIO * next + MORE ? count : 0;
  };
  const counts = [held(low, 1), held(high, -1)] as const;
  if (counts[0] + counts[1] === 0) return null;
  const reach = coarse ? 0.2 * resolution : rounding;
  const isEnd = (value: number) =>
    (counts[0] > 0 && Math.abs(value - low) <= reach) || (counts[1] > 0 && Math.abs(value - high) <= reach);
  const places = runsWhere(seen.length, (t) => isEnd(seen[t]!));
  return {
    code: 'clipped',
    count: counts[0] + counts[1],
    places,
    numbers: {
      value: counts[0] > counts[1] ? low : high,
      ends: +(counts[0] > 0) + +(counts[1] > 0),
      share: (counts[0] + counts[1]) / observed,
    },
    effect: 'tailsCut',
    offered: [{ kind: 'gaps', runs: gapRunsOf(places) }],
  };
}
