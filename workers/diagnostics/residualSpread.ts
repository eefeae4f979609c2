import type { Candidate, Parameters } from '../contract/candidate.ts';
import { psiWeights } from '../model/psiWeights.ts';

/**
 * What fitting takes out of the residual autocorrelations: √n r̂ over lags 1…m has covariance I − QQ′.
 */
export interface ResidualSpread {
  /** Columns of Q: at most one for each ARMA coefficient, fewer where coefficients are redundant. */
  readonly rank: number;
  readonly lags: number;
  /** m × rank, row-major. */
  readonly basis: Float64Array;
}

/** A response this small a part of itself beside the ones before it adds nothing: the coefficient is redundant. */
const REDUNDANT = 1e-7;

/**
 * Asymptotic covariance of the residual autocorrelations of a fitted ARMA model, seasonal factors included.
 *
 * Method: Box & Pierce 1970, J. Am. Stat. Assoc. 65, 1509–1526; McLeod 1978, J. R. Stat. Soc. B 40, 296–302, for
 * multiplicative seasonal models: I − X J⁻¹ X′, where column a of X is the impulse response of the innovations to coefficient a at lags 1…m and
 * J = X_∞′X_∞ the information. Written with an orthonormal basis of the columns of X_∞, whose first m rows are Q, so that a
 * singular information (common factors) loses a column rather than its digits.
 *
 * @param candidate names the lags held at zero, which take nothing; @param parameters φ, θ, Φ, Θ
 * @param lags m; @param readings length of the responses kept, which also bounds them where a root lies on the circle
 * @example AR(1), φ = .5: var r̂_1 = φ²/n, var r̂_2 = (1 − φ²(1 − φ²))/n
 */
export function residualSpread(
  candidate: Candidate,
  parameters: Parameters,
  lags: number,
  readings: number,
): ResidualSpread {
  const length = Math.max(lags, readings);
  const columns: Float64Array[] = [];
  for (const response of responses(candidate, parameters, length)) {
    const whole = norm(response);
    // Twice is enough (Kahan, in Parlett, The Symmetric Eigenvalue Problem, §6.9).
    for (let pass = 0; pass < 2; pass++) for (const unit of columns) subtractAlong(response, unit);
    const left = norm(response);
    if (left > REDUNDANT * whole) columns.push(response.map((value) => value / left));
  }
  const rank = columns.length;
  const basis = new Float64Array(lags * rank);
  columns.forEach((column, a) => {
    for (let k = 0; k < lags; k++) basis[k * rank + a] = column[k]!;
  });
  return { rank, lags, basis };
}

/** −∂e/∂c for each estimated coefficient at lags 1…length: 1/φ, 1/θ, 1/Φ, 1/Θ delayed by the coefficient's lag. */
function responses({ order, zeroLags }: Candidate, parameters: Parameters, length: number): Float64Array[] {
  const factors = [
    { coefficients: parameters.ar, sign: 1, stride: 1, held: zeroLags.ar },
    { coefficients: parameters.ma, sign: -1, stride: 1, held: zeroLags.ma },
    { coefficients: parameters.seasonalAr, sign: 1, stride: order.s, held: zeroLags.seasonalAr },
    { coefficients: parameters.seasonalMa, sign: -1, stride: order.s, held: zeroLags.seasonalMa },
  ];
  return factors.flatMap(({ coefficients, sign, stride, held }) => {
    if (coefficients.length === 0) return [];
    const inverse = Float64Array.from(coefficients, (value) => sign * value);
    const weights = psiWeights(inverse, new Float64Array(0), Math.ceil(length / stride));
    const estimated = coefficients.map((_, index) => index + 1).filter((lag) => !held.includes(lag));
    return estimated.map((lag) => {
      const response = new Float64Array(length);
      for (let j = 0, at = lag * stride; at <= length; j++, at += stride) response[at - 1] = weights[j]!;
      return response;
    });
  });
}

function norm(values: Float64Array): number {
  let sum = 0;
  for (const value of values) sum += value * value;
  return Math.sqrt(sum);
}

function subtractAlong(values: Float64Array, unit: Float64Array): void {
  let along = 0;
  for (let i = 0; i < values.length; i++) along += values[i]! * unit[i]!;
  for (let i = 0; i < values.length; i++) values[i]! -= along * unit[i]!;
}
