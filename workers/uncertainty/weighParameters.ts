import type { Fit } from '../contract/fit.ts';
import type { Result } from '../contract/result.ts';
import { cholesky } from '../numeric/cholesky.ts';
import { createRandom } from '../numeric/random.ts';
import { prepareLikelihood, type Concentrated } from '../estimation/prepareLikelihood.ts';
import type { Covariates } from '../series/regressionColumns.ts';
import { importanceSample } from './importanceSample.ts';
import { parameterPosterior } from './parameterPosterior.ts';
import { pilotBump } from './pilotBump.ts';

/** One weighed parameter point: coefficients, and the laws of level, regression and σ² given them. */
export interface ParameterPoint {
  readonly weight: number;
  /** φ, θ, Φ, Θ one after the other, lags held at zero among them. */
  readonly coefficients: Float64Array;
  /** Centre of the Student t law of level and regression. */
  readonly beta: Float64Array;
  /** Lower Cholesky factor of its scale matrix, row-major. */
  readonly betaFactor: Float64Array;
  /** Residual sum of squares: σ² is this over a chi-square. */
  readonly sumOfSquares: number;
}

/** Parameter points of one fit, with what their laws share. */
export interface WeighedParameters {
  readonly points: readonly ParameterPoint[];
  /** Places in `coefficients` of those that are estimated, in the order of `Fit.names`. */
  readonly estimated: readonly number[];
  /** Degrees of freedom of the Student t and chi-square laws: readings used less level and regression. */
  readonly degreesOfFreedom: number;
  readonly effectiveSize: number;
  readonly drawn: number;
  readonly largestArModulus: number;
}

/** Effective sizes wanted; long records need less, their likelihoods being nearly normal. */
const WANTED = 1000;
const WANTED_LONG = 400;
const LONG = 50_000;
/** Points after which it is given up, in multiples of the size wanted. */
const PATIENCE = 12;
/** Below this effective size the tails of an interval would be a few points' doing. */
const NEEDED = 150;

/**
 * Parameter points weighed by the exact likelihood with level, regression and σ² integrated out.
 *
 * Method: see `parameterPosterior` for the weight and `importanceSample` for the points; first bumps stand at every admissible maximum that
 * the search found within 2 of the best. An estimated λ is held at its estimate.
 *
 * @param fit by the exact likelihood; @param values the record it was made from; @param columns its covariates
 * @param seed of the points
 * @returns the points, or why there are none
 */
export function weighParameters(
  fit: Fit,
  values: Float64Array,
  columns: Covariates | undefined,
  seed: number,
): Result<WeighedParameters> {
  const { candidate, parameters, window } = fit;
  if (candidate.estimator !== 'exact')
    return { ok: false, failure: { code: 'intervalsNotExact', estimator: candidate.estimator } };
  const prepared = prepareLikelihood({ values, candidate, window, columns, lambda: parameters.lambda });
  if (!prepared.ok) return prepared;
  const likelihood = prepared.value;
  const n = likelihood.readingsUsed;
  const posterior = parameterPosterior(likelihood, candidate, n);
  const { space, dimension } = posterior;
  const dof = n - likelihood.columnNames.length;
  const point = (at: Concentrated, weight = 0): ParameterPoint => ({
    weight,
    coefficients: space.coefficients.all.slice(),
    beta: at.beta,
    betaFactor: scaleFactor(at.betaInformation, n / dof),
    sumOfSquares: at.innovationVariance * n,
  });
  const weigh = (angles: Float64Array) => {
    if (!posterior.isUnfolded(angles)) return null;
    const found = posterior.weigh(angles);
    return found && { logDensity: found.logDensity, value: point(found.at) };
  };
  const { largestArModulus } = posterior;
  const shared = { estimated: space.estimated(), degreesOfFreedom: dof, largestArModulus };
  if (dimension === 0) {
    const found = posterior.weigh(new Float64Array(0))!;
    return { ok: true, value: { ...shared, points: [point(found.at, 1)], effectiveSize: Infinity, drawn: 1 } };
  }
  const maxima = fit.outcome.maxima.filter(({ admissible }) => admissible).map((maximum) => maximum.parameters);
  const pilots = (maxima.length === 0 ? [parameters] : maxima)
    .map((at) => inside(posterior.anglesOf(at), (angles) => posterior.weigh(angles) !== null))
    .filter((at) => at !== null)
    .map((at) => pilotBump((angles) => posterior.weigh(angles)?.logDensity ?? -Infinity, at));
  if (pilots.length === 0)
    return { ok: false, failure: { code: 'intervalsUnreliable', effectiveSize: 0, needed: NEEDED, drawn: 0 } };
  const wanted = n > LONG ? WANTED_LONG : WANTED;
  const sample = importanceSample(weigh, pilots, createRandom(seed), { wanted, most: PATIENCE * wanted });
  const { effectiveSize, drawn } = sample;
  if (!(effectiveSize >= NEEDED))
    return { ok: false, failure: { code: 'intervalsUnreliable', effectiveSize, needed: NEEDED, drawn } };
  const points = sample.points.map(({ value, weight }) => ({ ...value, weight }));
  return { ok: true, value: { ...shared, points, effectiveSize, drawn } };
}

/** Draws a place towards the middle until it is in the region; null where it never is. */
function inside(angles: Float64Array, isInside: (angles: Float64Array) => boolean): Float64Array | null {
  for (let attempt = 0; attempt < 60; attempt++) {
    if (isInside(angles)) return angles;
    angles = angles.map((angle) => angle * 0.99);
  }
  return null;
}

/** Lower Cholesky factor of stretch × the inverse of an information matrix. */
function scaleFactor(information: Float64Array, stretch: number): Float64Array {
  const k = Math.round(Math.sqrt(information.length));
  if (k === 1) return Float64Array.of(Math.sqrt(stretch / information[0]!));
  // With L L′ the information taken in reverse order, the inverse transpose of L, reversed back, is lower triangular.
  const reversed = information.slice().reverse();
  if (!cholesky(reversed, k)) return new Float64Array(k * k).fill(NaN);
  const inverse = new Float64Array(k * k);
  for (let column = 0; column < k; column++) {
    for (let row = column; row < k; row++) {
      let sum = row === column ? 1 : 0;
      for (let j = column; j < row; j++) sum -= reversed[row * k + j]! * inverse[j * k + column]!;
      inverse[row * k + column] = sum / reversed[row * k + row]!;
    }
  }
  // (L⁻¹)′ reversed in both directions.
  const root = Math.sqrt(stretch);
  return Float64Array.from({ length: k * k }, (_, p) => {
    const [row, column] = [Math.floor(p / k), p % k];
    return column > row ? 0 : root * inverse[(k - 1 - column) * k + (k - 1 - row)]!;
  });
}

/** The coefficients of a point factor by factor. */
export function factorsOf({ coefficients }: ParameterPoint, { p, q, P }: Fit['candidate']['order']) {
  const part = (from: number, to?: number) => [...coefficients.subarray(from, to)];
  return { ar: part(0, p), ma: part(p, p + q), seasonalAr: part(p + q, p + q + P), seasonalMa: part(p + q + P) };
}
