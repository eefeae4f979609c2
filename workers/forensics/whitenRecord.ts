import { autocorrelation } from '../identification/autocorrelation.ts';
import { levinson } from '../numeric/levinson.ts';
import { sortedQuantile } from '../numeric/sortedQuantile.ts';
import { robustScale } from './robustScale.ts';

/** A record as one-step-ahead errors of a plain autoregression. */
export interface Whitened {
  /** Coefficients of x_t − μ = Σ a_i (x_{t−i} − μ) + e_t. */
  readonly coefficients: Float64Array;
  readonly mean: number;
  /** e_t, NaN where the reading or one of those it leans on is missing. */
  readonly innovations: Float64Array;
  /** Robust standard deviation of the innovations: by their median or by their 95th percentile, whichever is larger. */
  readonly scale: number;
  readonly count: number;
}

const MOST_LAGS = 24;
/** Fewer innovations than this tell nothing. */
const NEEDED = 40;
/** A reading this many robust deviations from the median of its neighbourhood does not take part in the correlations. */
const FAR = 6;
const REACH = 3;

/**
 * Whitens a record by an autoregression, gaps and wild readings notwithstanding.
 *
 * Method: readings far from the median of the seven around them are left out; Yule–Walker equations on correlations of the pairs
 * that remain (Parzen 1963, Sankhyā A 25, 383–392); order up to min(24, 10 log₁₀ n, n/10) by Akaike's criterion; innovations of the
 * whole record; their scale by the median absolute deviation, or by the 95th percentile of their sizes where that says more (a peaked
 * law, or coarse rounding that makes most of them equal). Gaps shorten the order until half of the readings have innovations.
 *
 * @param values gaps as NaN
 * @returns null where fewer than 40 innovations can be had or the readings do not vary
 */
export function whitenRecord(values: Float64Array): Whitened | null {
  const calm = withoutWild(values);
  let observed = 0;
  for (const value of calm) if (!Number.isNaN(value)) observed++;
  if (observed < NEEDED) return null;
  let lags = Math.min(MOST_LAGS, Math.floor(10 * Math.log10(observed)), Math.floor(observed / 10));
  const { correlations, mean, variance } = autocorrelation(calm, lags);
  if (!(variance > 0)) return null;
  const usable = correlations.findIndex((r) => Number.isNaN(r));
  if (usable >= 0) lags = usable;
  while (lags > 1 && completeStretches(values, lags) < Math.max(NEEDED, 0.5 * observed)) lags--;
  const order = orderOf(correlations.subarray(0, lags), observed);
  const { coefficients } = levinson(Float64Array.of(1, ...correlations.subarray(0, order)));
  const innovations = innovationsBy(values, coefficients, mean);
  let count = 0;
  for (const e of innovations) if (!Number.isNaN(e)) count++;
  const scale = scaleOf(innovations);
  return count < NEEDED || !(scale > 0) ? null : { coefficients, mean, innovations, scale, count };
}

/** Innovations of x about its mean under an autoregression; NaN where a reading it needs is missing, and at the first p. */
export function innovationsBy(values: Float64Array, coefficients: Float64Array, mean: number): Float64Array {
  const p = coefficients.length;
  const innovations = new Float64Array(values.length).fill(NaN);
  for (let t = p; t < values.length; t++) {
    let e = values[t]! - mean;
    for (let i = 0; i < p; i++) e -= coefficients[i]! * (values[t - 1 - i]! - mean);
    innovations[t] = e;
  }
  return innovations;
}

/** Φ⁻¹(0.975). */
const CENTRAL_95 = 1.959963984540054;

function scaleOf(innovations: Float64Array): number {
  const sizes = innovations
    .filter((e) => !Number.isNaN(e))
    .map(Math.abs)
    .sort();
  return Math.max(robustScale(innovations), sortedQuantile(sizes, 0.95) / CENTRAL_95);
}

function withoutWild(values: Float64Array): Float64Array {
  const median = localMedian(values);
  const local = values.map((value, t) => value - median[t]!);
  const limit = FAR * robustScale(local);
  return limit > 0 ? values.map((value, t) => (Math.abs(local[t]!) > limit ? NaN : value)) : values;
}

/** Median of the readings observed within REACH places; sorted by insertion, since a long record has half a million of them. */
function localMedian(values: Float64Array): Float64Array {
  const sorted = new Float64Array(2 * REACH + 1);
  return values.map((_, t) => {
    let count = 0;
    const last = Math.min(values.length - 1, t + REACH);
    for (let k = Math.max(0, t - REACH); k <= last; k++) {
      const value = values[k]!;
      if (Number.isNaN(value)) continue;
      let i = count++;
      for (; i > 0 && sorted[i - 1]! > value; i--) sorted[i] = sorted[i - 1]!;
      sorted[i] = value;
    }
    const half = count >> 1;
    if (count === 0) return NaN;
    return count % 2 === 1 ? sorted[half]! : (sorted[half - 1]! + sorted[half]!) / 2;
  });
}

/** How many readings have the p before them. */
function completeStretches(values: Float64Array, p: number): number {
  let run = 0;
  let count = 0;
  for (const value of values) {
    run = Number.isNaN(value) ? 0 : run + 1;
    if (run > p) count++;
  }
  return count;
}

/** Order with the least n ln σ² + 2p. */
function orderOf(correlations: Float64Array, n: number): number {
  const { variances } = levinson(Float64Array.of(1, ...correlations));
  let best = 0;
  let least = Infinity;
  variances.forEach((variance, p) => {
    const cost = n * Math.log(variance) + 2 * p;
    if (cost < least) [best, least] = [p, cost];
  });
  return best;
}
