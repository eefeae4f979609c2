import type { Candidate, FitRequest, Parameters } from '../contract/candidate.ts';
import type { Fit, Maximum, Outcome } from '../contract/fit.ts';
import type { Result } from '../contract/result.ts';
import { checkCandidate } from '../model/checkCandidate.ts';
import { coreVersion } from '../model/coreVersion.ts';
import { hashValues } from '../series/hashValues.ts';
import { adjustedRecord } from './adjustedRecord.ts';
import { coefficientNames } from './coefficientNames.ts';
import { covarianceFromHessian, type CovarianceEnd } from './covarianceFromHessian.ts';
import { criteriaOf } from './criteriaOf.ts';
import { differencingFacts } from './differencingFacts.ts';
import { fitWarnings } from './fitWarnings.ts';
import { prepareLikelihood, type PreparedLikelihood } from './prepareLikelihood.ts';
import { refuseRecord } from './refuseRecord.ts';
import type { Terrain } from './search/climb.ts';
import type { Exploration, Summit } from './search/exploreMaxima.ts';
import { searchMaxima } from './search/searchMaxima.ts';
import { SearchSpace } from './search/searchSpace.ts';

/**
 * Fits one candidate to a record: the only orchestration of the estimation.
 *
 * Method: level, regression and σ² are profiled out of the exact Gaussian ln L; the rest is searched from many starts
 * over partial autocorrelations (search/), the highest admissible maximum is the fit. Its standard errors are those of
 * the observed information. Deterministic for a given seed.
 *
 * @param request the record with gaps as NaN, the candidate, a seed, and optionally window, covariates, further starts
 *   and effort
 * @returns the fit with how it was found and what to be wary of, or a failure that says what is wrong
 */
export function fitCandidate(request: FitRequest): Result<Fit> {
  const checked = checkCandidate(request.candidate, request.values.length);
  if (!checked.ok) return checked;
  const candidate = checked.value;
  const refusal = refuseRecord(request, candidate);
  if (refusal !== null) return { ok: false, failure: refusal };
  const prepared = prepareLikelihood({ ...request, candidate });
  if (!prepared.ok) return prepared;
  return fitPrepared(request, candidate, prepared.value);
}

function fitPrepared(request: FitRequest, candidate: Candidate, likelihood: PreparedLikelihood): Result<Fit> {
  const space = new SearchSpace(candidate.order, candidate.zeroLags);
  const readings = likelihood.readingsUsed;
  const names = coefficientNames(candidate, likelihood.columnNames.length - (candidate.level === 'none' ? 0 : 1));
  const parameterCount = names.length + 1;
  if (readings < parameterCount + 2) {
    const needed = parameterCount + 2;
    return { ok: false, failure: { code: 'tooFewReadings', readings, needed, coefficients: parameterCount } };
  }
  const memoryless = likelihood.concentrated(space.coefficients);
  const adjusted = adjustedRecord(request, candidate, memoryless.beta);
  if (!adjusted.ok) return adjusted;
  const noise = Math.sqrt(memoryless.innovationVariance);
  const resolution = 2 ** -50 * Math.max(likelihood.scale, Math.abs(likelihood.centre));
  if (!(noise > resolution)) {
    const differenced = candidate.order.d + candidate.order.D > 0;
    return differenced
      ? { ok: false, failure: { code: 'noVariation', value: memoryless.beta[0] ?? 0, afterDifferencing: true } }
      : { ok: false, failure: { code: 'deterministic', spread: noise, resolution } };
  }
  const centred = adjusted.value.map((value) => value / noise);

  const terrain: Terrain = {
    space,
    likelihood: (coefficients, gradient) => likelihood.concentratedWithGradient(coefficients, gradient),
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
  const covariance = covarianceAt(terrain, likelihood, best, rows);
  const maxima = found.summits.map((summit) => maximumOf(space, likelihood, candidate, summit));
  const { parameters, logLikelihood } = maximumOf(space, likelihood, candidate, best);
  const warnings = fitWarnings({
    candidate,
    coefficients: space.coefficients,
    readings,
    parameterCount,
    found,
    best,
    covariance,
    rows,
    offsetRatio: Math.abs(likelihood.centre) / likelihood.scale,
    differencing: differencingFacts(request, candidate),
  });
  const usable = covariance?.ok === true ? covariance : null;
  return {
    ok: true,
    value: {
      candidate,
      seriesHash: request.seriesHash ?? hashValues(request.values),
      window: request.window ?? { from: 0, to: request.values.length },
      seed: request.seed,
      coreVersion,
      parameters,
      names,
      covariance: usable === null ? null : { n: usable.size, values: usable.values },
      standardErrors:
        usable === null
          ? null
          : Array.from({ length: usable.size }, (_, i) => Math.sqrt(usable.values[i * usable.size + i]!)),
      logLikelihood,
      criteria: criteriaOf(logLikelihood, parameterCount, readings),
      readingsUsed: readings,
      parameterCount,
      outcome: outcomeOf(found, best, maxima),
      warnings,
    },
  };
}

/** Covariance at an interior maximum; null at one with an MA root on the circle, where no Wald number holds. */
function covarianceAt(
  { space, readings, season }: Terrain,
  likelihood: PreparedLikelihood,
  best: Summit,
  rows: readonly number[],
): CovarianceEnd | null {
  if (best.landing.held.some((value) => value !== 0)) return null;
  space.place(best.landing.x);
  const source = {
    gradientAt: (coefficients: SearchSpace['coefficients'], gradient: Float64Array) =>
      likelihood.concentratedWithGradient(coefficients, gradient),
    betaAt: (coefficients: SearchSpace['coefficients']) => likelihood.concentrated(coefficients).beta,
    betaInformation: likelihood.concentrated(space.coefficients).betaInformation.slice(),
    readings,
    season: Math.max(1, season),
  };
  return covarianceFromHessian(source, space, rows);
}

function maximumOf(
  space: SearchSpace,
  likelihood: PreparedLikelihood,
  candidate: Candidate,
  { landing, reached, admissible }: Summit,
): Maximum {
  space.place(landing.x);
  const { beta, innovationVariance, logLikelihood } = likelihood.concentrated(space.coefficients);
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
  };
  return { parameters, logLikelihood, reached, boundary: landing.held.some((value) => value !== 0), admissible };
}

function outcomeOf(found: Exploration, { landing }: Summit, maxima: readonly Maximum[]): Outcome {
  const boundary = landing.held.some((value) => value !== 0);
  return {
    status: landing.status !== 'converged' ? 'stalled' : boundary ? 'boundary' : 'converged',
    iterations: found.iterations,
    evaluations: found.evaluations,
    gradientNorm: landing.gradientNorm,
    objective: -landing.logLikelihood,
    starts: found.starts,
    maxima,
  };
}
