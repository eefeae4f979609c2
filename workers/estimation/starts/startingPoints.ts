import type { Candidate, Parameters } from '../../contract/candidate.ts';
import { levinson } from '../../numeric/levinson.ts';
import type { SearchSpace } from '../search/searchSpace.ts';
import { burg } from './burg.ts';
import { hannanRissanen } from './hannanRissanen.ts';
import { pairwiseAutocovariances } from './pairwiseAutocovariances.ts';

/** Readings, and seasons, that starting values are made of: more would make them more exact than a start need be. */
const ENOUGH = 4000;
const SEASONS = 40;

/**
 * Starting points of the search that have a reason: Hannan–Rissanen, the autoregression alone (Burg's, or
 * Yule–Walker's where there are gaps), no memory, and plain values of each kind of memory.
 *
 * @param whole the (differenced, transformed) record less its level and regression; NaN is a gap. Of a very
 *   long one a stretch is used
 * @returns coordinates in `space`, best reasons first
 */
export function startingPoints(space: SearchSpace, candidate: Candidate, whole: Float64Array): Float64Array[] {
  const { order, zeroLags } = candidate;
  const centred = stretchOf(whole, Math.max(ENOUGH, SEASONS * order.s));
  const starts: Float64Array[] = [];
  const regression = hannanRissanen(centred, order, zeroLags);
  if (regression !== null) starts.push(space.locate(regression));
  if (order.p > 0) starts.push(space.locate({ ...NONE, ar: autoregression(centred, order.p) }));
  starts.push(new Float64Array(space.dimension));
  for (const [ar, ma] of [
    [0.5, 0.3],
    [0.9, -0.5],
    [-0.5, 0.3],
    [0.95, -0.8],
    [-0.95, 0.8],
    [0, -0.7],
    [0, 0.7],
  ] as const) {
    starts.push(
      space.locate({
        ar: order.p > 0 ? [ar] : [],
        ma: order.q > 0 ? [ma] : [],
        seasonalAr: order.P > 0 ? [ar / 2] : [],
        seasonalMa: order.Q > 0 ? [-0.5] : [],
      }),
    );
  }
  return starts;
}

/**
 * Points on the ridges of models that contain the given one with one more AR–MA pair of roots, which cancels: there
 * ln L is that of the given model, so that a climb from them ends no lower.
 */
export function withCancellingPair(space: SearchSpace, candidate: Candidate, smaller: Parameters): Float64Array[] {
  const { p, q } = candidate.order;
  if (lastUsed(smaller.ar) >= p || lastUsed(smaller.ma) >= q) return [];
  return [-0.7, -0.3, 0.3, 0.7].map((root) =>
    space.locate({
      ...smaller,
      ar: timesFactor(smaller.ar, root, -1).slice(0, p),
      ma: timesFactor(smaller.ma, root, 1).slice(0, q),
    }),
  );
}

/** A stretch of at most so many values: of five places, the one with the fewest gaps. */
function stretchOf(whole: Float64Array, most: number): Float64Array {
  if (whole.length <= most) return whole;
  let best = whole;
  let fewest = Infinity;
  for (let i = 0; i < 5; i++) {
    const from = Math.floor((i * (whole.length - most)) / 4);
    const stretch = whole.subarray(from, from + most);
    let gaps = 0;
    for (const value of stretch) if (value !== value) gaps++;
    if (gaps >= fewest) continue;
    best = stretch;
    fewest = gaps;
  }
  return best;
}

const NONE = { ar: [], ma: [], seasonalAr: [], seasonalMa: [] };

function autoregression(centred: Float64Array, p: number): number[] {
  if (centred.some((value) => Number.isNaN(value))) {
    return [...levinson(pairwiseAutocovariances(centred, p)).coefficients];
  }
  return [...burg(centred, Math.min(p, centred.length - 1)).coefficients];
}

/** Coefficients of (1 + sign·Σ c_j Bʲ)(1 − root·B), written in the same sign convention. */
function timesFactor(coefficients: readonly number[], root: number, sign: 1 | -1): number[] {
  const polynomial = [1, ...coefficients.map((c) => sign * c)];
  return [...polynomial, 0].slice(1).map((value, j) => sign * (value - root * polynomial[j]!));
}

function lastUsed(coefficients: readonly number[]): number {
  let length = coefficients.length;
  while (length > 0 && coefficients[length - 1] === 0) length--;
  return length;
}
