import { centredRecord } from './centredRecord.ts';

/** Sample autocorrelations at lags 1…m; arrays have length m, index 0 is lag 1. */
export interface Autocorrelations {
  readonly correlations: Float64Array;
  /** Pairs of readings observed at each lag; n − k without gaps. */
  readonly pairs: Int32Array;
  readonly mean: number;
  /** c_0: Σ (x − mean)² divided by the number of readings observed. */
  readonly variance: number;
  readonly observed: number;
}

/**
 * Sample autocorrelations of a record, gaps included.
 *
 * Method: r_k = c_k/c_0 with the usual divisor n, c_k = (1/n) Σ (x_t − x̄)(x_{t−k} − x̄) (Box & Jenkins, Time Series Analysis,
 * §2.1.5). With gaps c_k is the mean product of the pairs observed, times (1 − k/n) for the same divisor, and c_0 the mean
 * square of the readings observed (Parzen 1963, Sankhyā A 25, 383–392). Two-pass centring; the sums are direct, since a one-pass
 * or transform-based formula loses every digit on an offset record.
 *
 * @param values gaps as NaN, length n
 * @param lags m ≥ 0; lags from n on have no pairs
 * @param centre `mean`: the sample mean is removed; `zero`: the mean is known to be 0, as for innovations
 * @returns a correlation is NaN where no pair is observed or the record does not vary
 * @example 10000001, 10000003, 10000002: r_1 = −0.5
 */
export function autocorrelation(
  values: Float64Array,
  lags: number,
  centre: 'mean' | 'zero' = 'mean',
): Autocorrelations {
  const own = centredRecord(values);
  const centred = centre === 'mean' ? own.centred : values;
  const sumOfSquares = centre === 'mean' ? own.sumOfSquares : own.sumOfSquares + own.count * own.mean ** 2;
  const n = values.length;
  const gaps = own.count < n;
  const variance = sumOfSquares / own.count;
  const correlations = new Float64Array(lags).fill(NaN);
  const pairs = new Int32Array(lags);
  for (let k = 1; k <= Math.min(lags, n - 1); k++) {
    const { sum, count } = gaps ? observedProducts(centred, k) : products(centred, k);
    pairs[k - 1] = count;
    if (count > 0 && variance > 0) correlations[k - 1] = (gaps ? (sum / count) * (1 - k / n) : sum / n) / variance;
  }
  return { correlations, pairs, mean: own.mean, variance, observed: own.count };
}

function products(x: Float64Array, lag: number): { sum: number; count: number } {
  let sum = 0;
  for (let t = lag; t < x.length; t++) sum += x[t]! * x[t - lag]!;
  return { sum, count: x.length - lag };
}

function observedProducts(x: Float64Array, lag: number): { sum: number; count: number } {
  let sum = 0;
  let count = 0;
  for (let t = lag; t < x.length; t++) {
    const product = x[t]! * x[t - lag]!;
    if (Number.isNaN(product)) continue;
    sum += product;
    count++;
  }
  return { sum, count };
}
