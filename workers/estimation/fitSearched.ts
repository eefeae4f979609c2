import type { Parameters } from '../contract/candidate.ts';
import type { Failure } from '../contract/failures.ts';
import type { Fit, Maximum, Outcome } from '../contract/fit.ts';
import type { Result } from '../contract/result.ts';
import { adjustedRecord } from './adjustedRecord.ts';
import { assembleFit } from './assembleFit.ts';
import { conditionalSurface } from './conditionalSurface.ts';
import { covarianceFromHessian, type CovarianceEnd } from './covarianceFromHessian.ts';
import { differencingFacts } from './differencingFacts.ts';
import type { Job } from './fitCandidate.ts';
import { fitWarnings } from './fitWarnings.ts';
import { recordWarnings } from './recordWarnings.ts';
import type { Terrain } from './search/climb.ts';
import type { Exploration, Summit } from './search/survey.ts';
import { searchMaxima } from './search/searchMaxima.ts';
import { SearchSpace, type Coefficients } from './search/searchSpace.ts';

/** Rounding that subtracting level and regression can leave, in units of the readings. */
const ROUNDING = 2 ** -46;

/** The height that is searched, and what it implies for everything that was profiled out. */
export interface Surface {
  /** Writes the gradient for all coefficients and returns the height. */
  readonly gradientAt: (coefficients: Coefficients, gradient: Float64Array) => number;
  /** Level and regression at the coefficients that `gradientAt` was called with last. */
  readonly betaAt: (coefficients: Coefficients) => Float64Array;
  readonly implied: (coefficients: Coefficients) => {
    readonly height: number;
    /** What the estimator minimises: −ln L, or the sum of squares. */
    readonly objective: number;
    readonly beta: Float64Array;
    readonly innovationVariance: number;
    /** X′V⁻¹X/σ², row-major. */
    readonly betaInformation: Float64Array;
  };
}

/**
 * Fits by maximising the exact or the conditional likelihood. The fit's ln L is the exact one in both cases; the maxima
 * listed with it are those of what was searched.
 */
export function fitSearched(job: Job): Result<Fit> {
  const { request, candidate, likelihood, names, parameterCount, lambda } = job;
  const readings = likelihood.readingsUsed;
  const exact = candidate.estimator === 'exact';
  const { gaps } = likelihood.prepared;
  if (!exact && gaps > 0) return { ok: false, failure: { code: 'conditionalWithGaps', gaps } };
  const space = new SearchSpace(candidate.order, candidate.zeroLags);
  const surface = exact ? exactSurface(job) : conditionalSurface(job);
  const centred = adjustedRecord(likelihood.prepared, likelihood.concentrated(space.coefficients).beta);
  const noiseless = refuseNoiseless(job, centred);
  if (noiseless !== null) return { ok: false, failure: noiseless };

  const terrain: Terrain = {
    space,
    likelihood: surface.gradientAt,
    height: (coefficients) => surface.implied(coefficients).height,
    readings,
    season: candidate.order.s,
  };
  const found = searchMaxima(terrain, candidate, centred, request);
  const best = found.summits.find(({ admissible }) => admissible);
  if (best === undefined) {
    const [highest] = found.summits;
    return highest === undefined
      ? { ok: false, failure: { code: 'searchFailed', starts: found.starts } }
      : { ok: false, failure: { code: 'noAdmissibleMaximum', logLikelihood: highest.landing.logLikelihood } };
  }

  const rows = space.estimated();
  const covariance = covarianceAt(terrain, surface, best, rows);
  const maxima = found.summits.map((summit) => maximumOf(job, space, surface, summit));
  const { parameters, logLikelihood: height } = maximumOf(job, space, surface, best);
  const { objective } = surface.implied(space.coefficients);
  const warnings = [
    ...fitWarnings({
      candidate,
      coefficients: space.coefficients,
      readings,
      found,
      best,
      covariance,
      rows,
      differencing: differencingFacts(request, candidate, lambda),
    }),
    ...recordWarnings(job, parameters.innovationVariance),
  ];
  return {
    ok: true,
    value: assembleFit(request, {
      candidate,
      parameters,
      names,
      covariance: covariance?.ok === true ? covariance.values : null,
      logLikelihood: exact ? height : likelihood.atParameters(parameters),
      readingsUsed: readings,
      parameterCount,
      outcome: outcomeOf(found, best, maxima, objective),
      warnings,
    }),
  };
}

/** Nothing left to model: what level, regression and differencing leave is rounding of the readings. */
function refuseNoiseless({ likelihood, candidate }: Job, centred: Float64Array): Failure | null {
  const { scale, centre } = likelihood;
  let spread = 0;
  for (const value of centred) if (!Number.isNaN(value)) spread = Math.max(spread, Math.abs(value) * scale);
  const resolution = ROUNDING * Math.max(scale, Math.abs(centre));
  if (spread > resolution) return null;
  return candidate.order.d + candidate.order.D > 0
    ? { code: 'noVariation', value: 0, afterDifferencing: true }
    : { code: 'deterministic', spread, resolution };
}

function exactSurface({ likelihood }: Job): Surface {
  return {
    gradientAt: (coefficients, gradient) => likelihood.concentratedWithGradient(coefficients, gradient),
    betaAt: () => likelihood.lastBeta(),
    implied: (coefficients) => {
      const { logLikelihood, ...rest } = likelihood.concentrated(coefficients);
      return { height: logLikelihood, objective: -logLikelihood, ...rest };
    },
  };
}

/** Covariance at an interior maximum; null at one with an MA root on the circle, where no Wald number holds. */
function covarianceAt(
  { space, readings, season }: Terrain,
  surface: Surface,
  best: Summit,
  rows: readonly number[],
): CovarianceEnd | null {
  if (best.landing.held.some((value) => value !== 0)) return null;
  space.place(best.landing.x);
  const source = {
    gradientAt: surface.gradientAt,
    betaAt: surface.betaAt,
    betaInformation: surface.implied(space.coefficients).betaInformation.slice(),
    readings,
    season: Math.max(1, season),
  };
  return covarianceFromHessian(source, space, rows);
}

function maximumOf(
  { candidate, lambda }: Job,
  space: SearchSpace,
  surface: Surface,
  { landing, reached, admissible }: Summit,
): Maximum {
  space.place(landing.x);
  const { beta, innovationVariance, height } = surface.implied(space.coefficients);
  const level = candidate.level === 'none' ? 0 : 1;
  const { ar, ma, seasonalAr, seasonalMa } = space.coefficients;
  const parameters: Parameters = {
    ar: [...ar],
    ma: [...ma],
    seasonalAr: [...seasonalAr],
    seasonalMa: [...seasonalMa],
    mean: level === 1 ? beta[0]! : 0,
    regression: [...beta].slice(level),
    innovationVariance,
    ...(lambda === undefined ? {} : { lambda }),
  };
  const boundary = landing.held.some((value) => value !== 0);
  return { parameters, logLikelihood: height, reached, boundary, admissible };
}

function outcomeOf(found: Exploration, { landing }: Summit, maxima: readonly Maximum[], objective: number): Outcome {
  const boundary = landing.held.some((value) => value !== 0);
  return {
    status: landing.status !== 'converged' ? 'stalled' : boundary ? 'boundary' : 'converged',
    iterations: found.iterations,
    evaluations: found.evaluations,
    gradientNorm: landing.gradientNorm,
    objective,
    starts: found.starts,
    maxima,
  };
}
