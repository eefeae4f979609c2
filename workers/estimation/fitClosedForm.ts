import type { Fit, Warning } from '../contract/fit.ts';
import type { Result } from '../contract/result.ts';
import { adjustedRecord } from './adjustedRecord.ts';
import { assembleFit } from './assembleFit.ts';
import { closedFormEstimate } from './closedFormEstimate.ts';
import type { Job } from './fitCandidate.ts';
import { recordWarnings } from './recordWarnings.ts';

/** Fits a pure autoregression by Yule–Walker, Burg or least squares; ln L is the exact one at those estimates. */
export function fitClosedForm(job: Job): Result<Fit> {
  const { request, candidate, likelihood, names, parameterCount, lambda } = job;
  const { estimator, zeroLags } = candidate;
  const { prepared } = likelihood;
  if (prepared.gaps > 0) {
    return { ok: false, failure: { code: 'estimatorNeedsNoGaps', estimator, gaps: prepared.gaps } };
  }
  if (estimator === 'burg' && zeroLags.ar.length > 0) {
    return { ok: false, failure: { code: 'badCandidate', field: 'zeroLags.ar', reason: 'zeroLagOutOfRange' } };
  }
  // The level is left in: each estimator takes its own.
  const none = likelihood.columnNames.map((name) => (name === 'mean' ? prepared.centre : 0));
  const found = closedFormEstimate(adjustedRecord(prepared, none), candidate);
  if (found === null) return { ok: false, failure: { code: 'searchFailed', starts: 0 } };
  const { scale, centre } = likelihood;
  const innovationVariance = found.innovationVariance * scale ** 2;
  const parameters = {
    ar: found.ar,
    ma: [],
    seasonalAr: [],
    seasonalMa: [],
    mean: candidate.level === 'none' ? 0 : found.mean * scale + (candidate.level === 'mean' ? centre : 0),
    regression: [],
    innovationVariance,
    ...(lambda === undefined ? {} : { lambda }),
  };
  const logLikelihood = likelihood.atParameters(parameters);
  if (!Number.isFinite(logLikelihood)) {
    return { ok: false, failure: { code: 'badCandidate', field: 'estimator', reason: 'nonstationary' } };
  }
  const unavailable: Warning[] = [{ code: 'covarianceUnavailable', numbers: { onCircle: 0 }, about: ['flat'] }];
  const n = names.length;
  const units = names.map((name) => (name === 'mean' || name === 'drift' ? scale : 1));
  return {
    ok: true,
    value: assembleFit(request, {
      candidate,
      parameters,
      names,
      covariance: found.covariance?.map((value, at) => value * units[Math.floor(at / n)]! * units[at % n]!) ?? null,
      logLikelihood,
      readingsUsed: likelihood.readingsUsed,
      parameterCount,
      outcome: {
        status: 'closedForm',
        iterations: 0,
        evaluations: 1,
        gradientNorm: 0,
        objective: -logLikelihood,
        starts: 0,
        maxima: [{ parameters, logLikelihood, reached: 1, boundary: false, admissible: true }],
      },
      warnings: [...(found.covariance === null ? unavailable : []), ...recordWarnings(job, innovationVariance)],
    }),
  };
}
