import type { Concentrated, PreparedLikelihood } from '../estimation/prepareLikelihood.ts';
import { inversePartialMap } from '../estimation/search/partialMap.ts';
import { SearchSpace } from '../estimation/search/searchSpace.ts';
import type { Candidate, Parameters } from '../contract/candidate.ts';
import { cholesky } from '../numeric/cholesky.ts';

/** The weight of one point: its density, and what was integrated out there. */
export interface PointWeight {
  readonly logDensity: number;
  readonly at: Concentrated;
}

/**
 * Weight of ARMA coefficients given a record, with level, regression and σ² integrated out. Points are angles: a partial
 * autocorrelation is the sine of its angle, so that the weight ∏(1 − r²)^(−1/2) dr is flat in them.
 */
export interface ParameterPosterior {
  readonly space: SearchSpace;
  readonly dimension: number;
  /** ln density up to a constant; −Infinity outside. Angles beyond ±π/2 are folded back by the sine. */
  readonly weigh: (angles: Float64Array) => PointWeight | null;
  /** Whether no angle had to be folded: each point of the region has just one such place. */
  readonly isUnfolded: (angles: Float64Array) => boolean;
  readonly anglesOf: (at: Pick<Parameters, 'ar' | 'ma' | 'seasonalAr' | 'seasonalMa'>) => Float64Array;
  readonly largestArModulus: number;
}

/**
 * The integrated likelihood times the weight of the parameters.
 *
 * Method: with a flat weight on the k level and regression coefficients and 1/σ on σ, the integral over both is
 * |V|^(−1/2) |X′V⁻¹X|^(−1/2) RSS^(−(n−k)/2), which is the profile likelihood times |X′V⁻¹X/σ̂²|^(−1/2) (Harville 1974, Biometrika 61,
 * 383–385). Coefficients of a factor with lags held at zero have a flat weight over the stationary (invertible) region.
 *
 * @param likelihood prepared for the record and candidate
 * @param readings n of the largest AR modulus exp(−1/(3n))
 */
export function parameterPosterior(
  likelihood: PreparedLikelihood,
  candidate: Candidate,
  readings: number,
): ParameterPosterior {
  const space = new SearchSpace(candidate.order, candidate.zeroLags);
  const partial = Array.from({ length: space.dimension }, (_, i) => space.isPartial(i));
  const largestArModulus = Math.exp(-1 / (3 * readings));
  const place = new Float64Array(space.dimension);
  const season = Math.max(1, candidate.order.s);
  return {
    space,
    dimension: space.dimension,
    largestArModulus,
    isUnfolded: (angles) => partial.every((is, i) => !is || Math.abs(angles[i]!) <= Math.PI / 2),
    anglesOf: ({ ar, ma, seasonalAr, seasonalMa }) => {
      const lists = { ar: [...ar], ma: [...ma], seasonalAr: [...seasonalAr], seasonalMa: [...seasonalMa] };
      return space.locate(lists).map((x, i) => (partial[i] === true ? Math.asin(x) : x));
    },
    weigh: (angles) => {
      for (let i = 0; i < place.length; i++) place[i] = partial[i] === true ? Math.sin(angles[i]!) : angles[i]!;
      if (!space.place(place)) return null;
      const { ar, seasonalAr } = space.coefficients;
      if (!within(ar, largestArModulus) || !within(seasonalAr, largestArModulus ** season)) return null;
      const at = likelihood.concentrated(space.coefficients);
      const logDensity = at.logLikelihood - logDeterminant(at.betaInformation) / 2;
      return Number.isFinite(logDensity) ? { logDensity, at } : null;
    },
  };
}

/** Whether all inverse roots of 1 − Σ φ_j Bʲ are inside the circle of this radius: then the polynomial in B/radius is stationary. */
function within(coefficients: Float64Array, radius: number): boolean {
  if (coefficients.length === 0) return true;
  if (coefficients.length === 1) return Math.abs(coefficients[0]!) <= radius;
  const stretched = coefficients.map((value, j) => value / radius ** (j + 1));
  return inversePartialMap(stretched, new Float64Array(stretched.length));
}

function logDeterminant(matrix: Float64Array): number {
  const k = Math.round(Math.sqrt(matrix.length));
  const factor = matrix.slice();
  if (!cholesky(factor, k)) return Infinity;
  let sum = 0;
  for (let i = 0; i < k; i++) sum += 2 * Math.log(factor[i * k + i]!);
  return sum;
}
