import type { Candidate } from '../contract/candidate.ts';
import { cholesky } from '../numeric/cholesky.ts';
import { choleskySolve } from '../numeric/choleskySolve.ts';
import { asymptoticInformation } from './asymptoticInformation.ts';
import { burg } from './starts/burg.ts';
import { pairwiseAutocovariances } from './starts/pairwiseAutocovariances.ts';

/** Estimate of a pure autoregression without a search. Covariance: coefficients in order of lag, then the level. */
export interface ClosedFormEstimate {
  readonly ar: number[];
  readonly mean: number;
  readonly innovationVariance: number;
  readonly covariance: Float64Array | null;
}

/**
 * Yule–Walker, Burg and least-squares estimates of an autoregression.
 *
 * Methods: Brockwell & Davis, Introduction to Time Series and Forecasting, sections 5.1.1 (Yule–Walker: the sample
 * autocovariances with divisor n solve the moment equations) and 5.1.2 (Burg), both about the sample mean, with the
 * asymptotic covariance σ²Γ⁻¹/n and σ²/(φ(1)²n) for the mean; least squares is the regression on a constant and the
 * lagged readings, with that regression's own covariance (residual degrees of freedom as divisor) and the mean
 * constant/φ(1) by the delta method.
 *
 * @param record (differenced, transformed) readings without gaps
 * @param candidate pure autoregression by one of the three estimators; lags held at zero only with Yule–Walker and
 *   least squares
 * @returns the estimate, or null where the equations are singular. Least squares may be non-stationary.
 */
export function closedFormEstimate(record: Float64Array, candidate: Candidate): ClosedFormEstimate | null {
  const { order, zeroLags, level, estimator } = candidate;
  const lags = Array.from({ length: order.p }, (_, i) => i + 1).filter((lag) => !zeroLags.ar.includes(lag));
  if (estimator === 'leastSquares') return leastSquares(record, lags, order.p, level !== 'none');
  const mean = level === 'none' ? 0 : averageOf(record);
  const centred = record.map((value) => value - mean);
  const found = estimator === 'burg' ? burgOf(centred, order.p) : yuleWalker(centred, lags, order.p);
  if (found === null) return null;
  return { ...found, mean, covariance: asymptotic(found, lags, record.length, level !== 'none') };
}

function burgOf(centred: Float64Array, p: number) {
  const { coefficients, variance } = burg(centred, p);
  return { ar: [...coefficients], innovationVariance: variance };
}

function yuleWalker(centred: Float64Array, lags: readonly number[], p: number) {
  const gamma = pairwiseAutocovariances(centred, p);
  const k = lags.length;
  const matrix = new Float64Array(k * k);
  const right = Float64Array.from(lags, (lag) => gamma[lag]!);
  lags.forEach((one, i) => lags.forEach((other, j) => (matrix[i * k + j] = gamma[Math.abs(one - other)]!)));
  if (!cholesky(matrix, k)) return null;
  choleskySolve(matrix, k, right);
  const ar = Array.from({ length: p }, () => 0);
  let innovationVariance = gamma[0]!;
  lags.forEach((lag, i) => {
    ar[lag - 1] = right[i]!;
    innovationVariance -= right[i]! * gamma[lag]!;
  });
  return { ar, innovationVariance };
}

/** σ²Γ⁻¹/n over the coefficients and σ²/(φ(1)²n) for the mean, uncorrelated. */
function asymptotic(
  { ar, innovationVariance }: { ar: readonly number[]; innovationVariance: number },
  lags: readonly number[],
  n: number,
  withMean: boolean,
): Float64Array | null {
  const none = new Float64Array(0);
  const all = Float64Array.from(ar);
  const coefficients = { all, ar: all, ma: none, seasonalAr: none, seasonalMa: none };
  const rows = lags.map((lag) => lag - 1);
  const k = lags.length;
  const information = asymptoticInformation(coefficients, 1, rows, Math.max(n, 2000));
  if (!cholesky(information, k)) return null;
  const size = k + (withMean ? 1 : 0);
  const covariance = new Float64Array(size * size);
  for (let i = 0; i < k; i++) {
    const column = new Float64Array(k);
    column[i] = 1 / n;
    choleskySolve(information, k, column);
    for (let j = 0; j < k; j++) covariance[j * size + i] = column[j]!;
  }
  const gain = 1 - ar.reduce((sum, value) => sum + value, 0);
  if (withMean) covariance[size * size - 1] = innovationVariance / (gain * gain * n);
  return covariance;
}

function leastSquares(
  record: Float64Array,
  lags: readonly number[],
  p: number,
  withMean: boolean,
): ClosedFormEstimate | null {
  // Centring first keeps the normal equations well conditioned; the constant is then that of the centred record.
  const shift = withMean ? averageOf(record) : 0;
  const k = lags.length;
  const size = k + (withMean ? 1 : 0);
  const rows = record.length - p;
  const normal = new Float64Array(size * size);
  const right = new Float64Array(size);
  const row = new Float64Array(size).fill(1);
  let total = 0;
  for (let t = p; t < record.length; t++) {
    const target = record[t]! - shift;
    lags.forEach((lag, i) => (row[i] = record[t - lag]! - shift));
    total += target * target;
    for (let i = 0; i < size; i++) {
      right[i]! += row[i]! * target;
      for (let j = 0; j < size; j++) normal[i * size + j]! += row[i]! * row[j]!;
    }
  }
  if (rows <= size || !cholesky(normal, size)) return null;
  const solution = right.slice();
  choleskySolve(normal, size, solution);
  const residual = right.reduce((sum, value, i) => sum - value * solution[i]!, total);
  const ar = Array.from({ length: p }, () => 0);
  lags.forEach((lag, i) => (ar[lag - 1] = solution[i]!));
  const gain = 1 - ar.reduce((sum, value) => sum + value, 0);
  const meanShift = withMean ? solution[k]! / gain : 0;

  const covariance = new Float64Array(size * size);
  for (let i = 0; i < size; i++) {
    const column = new Float64Array(size);
    column[i] = residual / (rows - size);
    choleskySolve(normal, size, column);
    for (let j = 0; j < size; j++) covariance[j * size + i] = column[j]!;
  }
  if (withMean) constantToMean(covariance, size, gain, meanShift);
  return { ar, mean: shift + meanShift, innovationVariance: residual / rows, covariance };
}

/** Turns the covariance of (φ, c) into that of (φ, μ) with μ = c/φ(1): ∂μ/∂φ_i = μ/φ(1), ∂μ/∂c = 1/φ(1). */
function constantToMean(covariance: Float64Array, size: number, gain: number, mean: number): void {
  const slope = Float64Array.from({ length: size }, (_, i) => (i === size - 1 ? 1 : mean) / gain);
  const last = size - 1;
  const cross = Float64Array.from({ length: size }, (_, i) => {
    let sum = 0;
    for (let j = 0; j < size; j++) sum += covariance[i * size + j]! * slope[j]!;
    return sum;
  });
  const variance = cross.reduce((sum, value, i) => sum + value * slope[i]!, 0);
  for (let i = 0; i < last; i++) {
    covariance[i * size + last] = cross[i]!;
    covariance[last * size + i] = cross[i]!;
  }
  covariance[last * size + last] = variance;
}

function averageOf(values: Float64Array): number {
  let sum = 0;
  for (const value of values) sum += value;
  const first = sum / values.length;
  // Second pass: what rounding left in the first.
  let rest = 0;
  for (const value of values) rest += value - first;
  return first + rest / values.length;
}
