import type { Finding } from '../contract/forensics.ts';
import { normalUpperTail } from '../distributions/normalUpperTail.ts';
import { gapRunsOf } from './gapRunsOf.ts';
import { medianOf } from './medianOf.ts';
import { runsWhere } from './runsWhere.ts';

/** Φ⁻¹(¾). */
const QUARTER = 0.6744897501960817;
/** Steps of more than this many standard deviations of the second differences hide straight lines. */
const COARSE = 0.6;
/** A law more peaked than the normal puts up to this many times as much into the middle. */
const PEAKED = 1.6;
/** Standard deviations above the count expected; readings lean on each other, so they are more than binomial ones. */
const EXCESS = 7;
const SHORTEST_COUNT = 4;
/** Runs are taken from the length on at which at most this share of them is chance. */
const CHANCE_SHARE = 0.2;

/** Answer: the finding, or that steps are too coarse to see straight lines. */
export type Interpolation = { readonly finding: Finding | null; readonly coarse: boolean };

/**
 * Straight lines between readings.
 *
 * Method: a reading is in line when the second difference about it is no larger than rounding allows (one step where readings are
 * rounded, rounding of the numbers where not) and the three are not all equal. In-line readings are counted against the number
 * expected of a smooth law with the spread of the second differences that are not in line, from their median as a half-normal cut
 * off below. More than 7 standard deviations above 1.6 times that number are lines. The runs reported are those of the length from
 * which at most one in five is chance.
 *
 * @param values gaps as NaN; @param resolution smallest step, 0 for none
 * @returns `numbers`: readings (in line), share, expected (share by chance), longest, kept (share of readings not on a line).
 *   `coarse` where the step is above 0.6 standard deviations of the second differences: then nothing can be said
 */
export function findInterpolation(values: Float64Array, resolution: number): Interpolation {
  const n = values.length;
  let largest = 0;
  for (const value of values) if (Math.abs(value) > largest) largest = Math.abs(value);
  // Second differences of a rounded line are −1, 0 or 1 steps.
  const limit = Math.max(1.25 * resolution, 32 * Number.EPSILON * largest);
  const second = new Float64Array(n).fill(NaN);
  let [inLine, triples, flat] = [0, 0, 0];
  const rest: number[] = [];
  for (let t = 1; t + 1 < n; t++) {
    const [a, b, c] = [values[t - 1]!, values[t]!, values[t + 1]!];
    const size = Math.abs(a - 2 * b + c);
    if (Number.isNaN(size)) continue;
    triples++;
    if (a === b && b === c) {
      flat++;
      continue;
    }
    second[t] = size;
    if (size <= limit) inLine++;
    else rest.push(size);
  }
  const judged = triples - flat;
  if (judged < 20 || rest.length < 5) return { finding: null, coarse: judged >= 20 };
  const spread = spreadAbove(Float64Array.from(rest), limit);
  // What counts as in line reaches half a step further than the steps do.
  const reach = resolution > 0 ? 1.5 * resolution : limit;
  const share = 1 - 2 * normalUpperTail(reach / spread);
  if (reach / spread > 1.5 * COARSE) return { finding: null, coarse: true };
  const expected = Math.min(0.95, PEAKED * share) * judged;
  const found = inLine >= SHORTEST_COUNT && inLine > expected + EXCESS * Math.sqrt(expected + 0.25);
  if (!found) return { finding: null, coarse: false };
  const isIn = (t: number) => second[t]! <= limit;
  const all = runsWhere(n, isIn);
  const least = leastRun(
    all.map(({ from, to }) => to - from),
    share,
    judged,
  );
  const places = all.filter(({ from, to }) => to - from >= least);
  if (places.length === 0) return { finding: null, coarse: false };
  const readings = places.reduce((sum, { from, to }) => sum + to - from, 0);
  const longest = places.reduce((most, { from, to }) => Math.max(most, to - from), 0);
  return {
    coarse: false,
    finding: {
      code: 'interpolated',
      count: places.length,
      places,
      numbers: { readings, share: inLine / judged, expected: share, longest, kept: 1 - readings / (triples + 2) },
      effect: 'memoryInvented',
      offered: [{ kind: 'gaps', runs: gapRunsOf(places) }],
    },
  };
}

/** Standard deviation of a normal law of which the absolute values above a limit have this median. */
function spreadAbove(sizes: Float64Array, limit: number): number {
  const median = medianOf(sizes);
  let spread = median / QUARTER;
  for (let i = 0; i < 60; i++) {
    // P(|Z| > median) = ½ P(|Z| > limit)
    const above = normalUpperTail(limit / spread);
    const half = normalUpperTail(median / spread) / above;
    spread *= half < 0.5 ? 1.02 : 0.98;
  }
  return spread;
}

/** Shortest length of run of which at most one in five is chance: n p^L runs of at least L are expected. */
function leastRun(lengths: readonly number[], share: number, n: number): number {
  for (let least = 1; least < 50; least++) {
    const found = lengths.filter((length) => length >= least).length;
    if (n * share ** least * (1 - share) <= CHANCE_SHARE * found) return least;
  }
  return Infinity;
}
