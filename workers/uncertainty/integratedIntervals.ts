import type { Parameters } from '../contract/candidate.ts';
import type { Result } from '../contract/result.ts';
import type {
  DerivedInterval,
  DerivedQuantity,
  IntegratedIntervals,
  Interval,
  IntervalsRequest,
} from '../contract/uncertainty.ts';
import { mixturesOf, type StudentMixture } from './mixtures.ts';
import { parameterDraws } from './parameterDraws.ts';
import { levelGain, pointQuantities } from './pointQuantities.ts';
import { weightedQuantiles } from './weightedQuantiles.ts';
import { factorsOf, weighParameters, type ParameterPoint } from './weighParameters.ts';

/** Points that carry less than this of the weight are left out of mixtures. */
const NOTHING = 1e-9;

/**
 * Intervals for parameters and what follows from them that hold in short records and near the edges of the region, where an estimate ± 2
 * standard errors does not.
 *
 * Method: parameter points weighed by the exact likelihood, level, regression and σ² integrated out (`weighParameters`), a Bayesian
 * computation with weight flat in level and regression, 1/σ, ∏(1 − r²)^(−1/2) over the partial autocorrelations, and no AR root beyond
 * exp(−1/(3n)). The interval of a coefficient runs between weighted quantiles; level and regression are mixtures of Student t laws, σ² a
 * mixture of inverse chi-squares. Their coverage over repeated records is measured by `npm run calibrate -- intervals`.
 * No standard deviation is given: that of the level need not exist.
 *
 * @param request fit (exact likelihood), its record and covariates, coverage in (0, 1), seed
 * @returns central intervals; `intervalsNotExact`, `intervalsUnreliable`, or a failure of the record
 */
export function integratedIntervals(request: IntervalsRequest): Result<IntegratedIntervals> {
  const { fit, values, columns, coverage, seed } = request;
  const weighed = weighParameters(fit, values, columns, seed);
  if (!weighed.ok) return weighed;
  const { points, estimated, effectiveSize, drawn, largestArModulus, degreesOfFreedom } = weighed.value;
  const probabilities = [(1 - coverage) / 2, 0.5, (1 + coverage) / 2];
  const weights = Float64Array.from(points, ({ weight }) => weight);
  const plain = (about: string, list: ArrayLike<number>): Interval =>
    named(about, weightedQuantiles(list, weights, probabilities).quantiles);
  const mixtures = mixturesOf(degreesOfFreedom);
  const kept = points.filter(({ weight }) => weight > NOTHING);
  const linear = (about: string, row: number, factor: (point: ParameterPoint) => number): Interval =>
    named(about, mixtures.student(lawsOf(kept, row, factor), probabilities));

  const free = estimated.length;
  const coefficients = fit.names.map((name, i) =>
    i < free
      ? plain(
          name,
          points.map((point) => point.coefficients[estimated[i]!]!),
        )
      : linear(name, i - free, () => 1),
  );
  const sums = kept.map(({ sumOfSquares }) => sumOfSquares);
  const sigma = named('sigma', mixtures.sigma(sharesOf(kept), sums, probabilities));
  const { order } = fit.candidate;
  const quantities = points.map((point) => pointQuantities(factorsOf(point, order), order.s));
  const atEstimate = pointQuantities(fit.parameters, order.s);
  const derived = (Object.keys(atEstimate) as (keyof typeof atEstimate)[]).flatMap((about): DerivedInterval[] => {
    if (isTrivial(about, fit.parameters)) return [];
    const list = quantities.map((each) => each[about]);
    const found = weightedQuantiles(list, weights, probabilities);
    if (found.share === 0) return [];
    return [{ ...named(about, found.quantiles), about, estimate: atEstimate[about], share: found.share }];
  });
  if (fit.candidate.level !== 'none') {
    const estimate = fit.parameters.mean * levelGain(fit.parameters);
    derived.unshift({
      ...linear('constant', 0, (point) => levelGain(factorsOf(point, order))),
      about: 'constant',
      estimate,
      share: 1,
    });
  }
  const nearest = Math.exp(-1 / fit.readingsUsed);
  const nearLimit = quantities.reduce((sum, { timeConstant }, i) => {
    const modulus = timeConstant > 0 ? Math.exp(-1 / timeConstant) : 0;
    return modulus > nearest ? sum + weights[i]! : sum;
  }, 0);
  return {
    ok: true,
    value: {
      coverage,
      seed,
      coefficients,
      sigma,
      derived,
      points: drawn,
      effectiveSize,
      largestArModulus,
      nearLimit,
      draws: request.draws === undefined ? [] : parameterDraws(fit, weighed.value, request.draws, seed),
    },
  };
}

function named(about: string, [lower, median, upper]: readonly number[]): Interval {
  return { about, lower: lower!, median: median!, upper: upper! };
}

/** A root of a single coefficient is that coefficient over again. */
function isTrivial(about: DerivedQuantity, { ar, ma }: Parameters): boolean {
  return about.startsWith('ar') ? ar.length < 2 : about.startsWith('ma') && ma.length < 2;
}

/** Laws of element `row` of level and regression, times a factor of the point. */
function lawsOf(
  points: readonly ParameterPoint[],
  row: number,
  factor: (point: ParameterPoint) => number,
): StudentMixture {
  const stretches = points.map(factor);
  return {
    weights: sharesOf(points),
    centres: points.map(({ beta }, i) => beta[row]! * stretches[i]!),
    scales: points.map(({ beta, betaFactor }, i) => {
      const k = beta.length;
      let squares = 0;
      for (let j = 0; j <= row; j++) squares += betaFactor[row * k + j]! ** 2;
      return Math.sqrt(squares) * Math.abs(stretches[i]!);
    }),
  };
}

function sharesOf(points: readonly ParameterPoint[]): number[] {
  const total = points.reduce((sum, { weight }) => sum + weight, 0);
  return points.map(({ weight }) => weight / total);
}
