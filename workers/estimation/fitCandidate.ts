import type { Candidate, FitRequest } from '../contract/candidate.ts';
import type { Fit } from '../contract/fit.ts';
import type { Result } from '../contract/result.ts';
import { checkCandidate } from '../model/checkCandidate.ts';
import { coefficientNames } from './coefficientNames.ts';
import { estimateLambda } from './estimateLambda.ts';
import { fitClosedForm } from './fitClosedForm.ts';
import { fitSearched } from './fitSearched.ts';
import { lambdaError } from './lambdaError.ts';
import { neighbourStarts } from './neighbourStarts.ts';
import { prepareLikelihood, type PreparedLikelihood } from './prepareLikelihood.ts';
import { refuseRecord } from './refuseRecord.ts';

/** One fit on its way: the request, its checked candidate, and the likelihood prepared for it. */
export interface Job {
  readonly request: FitRequest;
  readonly candidate: Candidate;
  readonly likelihood: PreparedLikelihood;
  /** Estimated coefficients, level and regression by name; σ² and an estimated λ are not among them. */
  readonly names: readonly string[];
  /** Everything that is estimated: names, σ², and λ where it is. */
  readonly parameterCount: number;
  /** Box–Cox λ where the candidate estimates it. */
  readonly lambda: number | undefined;
}

/**
 * Fits one candidate to a record: the only orchestration of the estimation.
 *
 * Method: by the candidate's estimator. `exact`: level, regression and σ² are profiled out of the exact Gaussian ln L;
 * the rest is searched from many starts over partial autocorrelations, and the highest admissible maximum is the fit.
 * `conditional`: the same search over the conditional sum of squares. `yuleWalker`, `burg`, `leastSquares`: closed
 * forms for pure autoregressions. Deterministic for a given seed.
 *
 * @param given the record with gaps as NaN, the candidate, a seed, and optionally window, covariates, further starts
 *   and effort
 * @returns the fit with how it was found and what to be wary of, or a failure that says what is wrong
 */
export function fitCandidate(given: FitRequest): Result<Fit> {
  const checked = checkCandidate(given.candidate, given.values.length);
  if (!checked.ok) return checked;
  const candidate = checked.value;
  const lent = given.neighbours === undefined ? [] : neighbourStarts(candidate, given.neighbours);
  const request = { ...given, starts: [...(given.starts ?? []), ...lent] };
  const refusal = refuseRecord(request, candidate);
  if (refusal !== null) return { ok: false, failure: refusal };
  const { transform } = candidate;
  if (transform.kind !== 'boxCox' || transform.lambda !== 'estimate') return fitAt(request, candidate, undefined);
  const profile = (at: number, starts = request.starts) =>
    fitAt({ ...request, starts, effort: 'first' }, candidate, at);
  const lambda = estimateLambda((at) => {
    const fit = profile(at);
    return fit.ok ? { ok: true, value: fit.value.logLikelihood } : fit;
  });
  if (!lambda.ok) return lambda;
  const fit = fitAt(request, candidate, lambda.value);
  if (!fit.ok) return fit;
  const { parameters, logLikelihood } = fit.value;
  const height = (at: number) => {
    const near = profile(at, [parameters, ...request.starts]);
    return near.ok ? near.value.logLikelihood : -Infinity;
  };
  return { ok: true, value: { ...fit.value, lambdaStandardError: lambdaError(height, lambda.value, logLikelihood) } };
}

function fitAt(request: FitRequest, candidate: Candidate, lambda: number | undefined): Result<Fit> {
  const prepared = prepareLikelihood({ ...request, candidate, ...(lambda === undefined ? {} : { lambda }) });
  if (!prepared.ok) return prepared;
  const likelihood = prepared.value;
  const level = candidate.level === 'none' ? 0 : 1;
  const names = coefficientNames(candidate, likelihood.columnNames.length - level);
  const parameterCount = names.length + (lambda === undefined ? 1 : 2);
  const readings = likelihood.readingsUsed;
  if (readings < parameterCount + 2) {
    // AICc = −2L + 2kN/(N − k − 1) is the last of the numbers shown to become undefined.
    const needed = parameterCount + 2;
    return { ok: false, failure: { code: 'tooFewReadings', readings, needed, coefficients: parameterCount } };
  }
  const job: Job = { request, candidate, likelihood, names, parameterCount, lambda };
  const searched = candidate.estimator === 'exact' || candidate.estimator === 'conditional';
  return searched ? fitSearched(job) : fitClosedForm(job);
}
