import type { Candidate, FitRequest, Parameters } from '../contract/candidate.ts';
import type { Fit, Outcome, Warning } from '../contract/fit.ts';
import { coreVersion } from '../model/coreVersion.ts';
import { hashValues } from '../series/hashValues.ts';
import { criteriaOf } from './criteriaOf.ts';

/** What an estimator found, before it is dressed as a Fit. */
export interface Found {
  readonly candidate: Candidate;
  readonly parameters: Parameters;
  readonly names: readonly string[];
  /** Row-major, names.length squared values. */
  readonly covariance: Float64Array | null;
  readonly logLikelihood: number;
  readonly readingsUsed: number;
  readonly parameterCount: number;
  readonly outcome: Outcome;
  readonly warnings: readonly Warning[];
}

/** The Fit of what an estimator found, with the inputs that made it. */
export function assembleFit(request: FitRequest, found: Found): Fit {
  const { covariance, names } = found;
  const n = names.length;
  return {
    candidate: found.candidate,
    seriesHash: request.seriesHash ?? hashValues(request.values),
    window: request.window ?? { from: 0, to: request.values.length },
    seed: request.seed,
    coreVersion,
    parameters: found.parameters,
    names,
    covariance: covariance === null ? null : { n, values: covariance },
    standardErrors: covariance === null ? null : Array.from({ length: n }, (_, i) => Math.sqrt(covariance[i * n + i]!)),
    logLikelihood: found.logLikelihood,
    criteria: criteriaOf(found.logLikelihood, found.parameterCount, found.readingsUsed),
    readingsUsed: found.readingsUsed,
    parameterCount: found.parameterCount,
    outcome: found.outcome,
    warnings: found.warnings,
  };
}
