import type { Failure } from '../contract/failures.ts';
import type { Prediction, PredictRequest } from '../contract/prediction.ts';
import type { Result } from '../contract/result.ts';
import { normalQuantile } from '../distributions/normalQuantile.ts';
import { predictiveMoments } from '../estimation/predictiveMoments.ts';
import { backTransform, powerOf } from '../series/transformRecord.ts';
import { columnsOver } from './columnsOver.ts';

/** Longer predictions say nothing more and would only cost time. */
const LONGEST = 100_000;

/**
 * Predicted readings after the end of the record, with a band.
 *
 * Method: exact finite-sample prediction by the Kalman filter with gaps, differencing, season, level, events and covariates
 * (`predictiveMoments`), from the first reading of the fit window to the origin; normal innovations, parameters taken as known. On a transformed
 * scale median and bounds are transformed back, which is exact for quantiles (common practice; the mean would need a correction).
 *
 * @param request fit, whole record, horizon ≥ 1, coverage in (0, 1), covariates continued over the horizon; `origin`: index of
 *   the first reading predicted, the end of the record when left out
 * @returns arrays of length `horizon`; NaN where the record does not fix a reading (a phase of the season never observed).
 *   Failures name a bad setting, a covariate that is absent, too short, or has no value in the horizon.
 */
export function predictRecord(request: PredictRequest): Result<Prediction> {
  const { fit, values, horizon, coverage } = request;
  const origin = request.origin ?? values.length;
  const { candidate, parameters } = fit;
  const refusal = refuse(request, origin);
  if (refusal !== null) return { ok: false, failure: refusal };
  const columns = columnsOver(candidate, request.columns, origin, horizon);
  if (!columns.ok) return columns;
  const window = { from: Math.min(fit.window.from, origin - 1), to: origin };
  const moments = predictiveMoments({ values, candidate, at: parameters, columns: columns.value, window, horizon });
  if (!moments.ok) return moments;
  const { expected, standardError } = moments.value;
  const z = normalQuantile((1 + coverage) / 2);
  const power = powerOf(candidate.transform, parameters.lambda ?? 1);
  const back = (deviations: number) =>
    expected.map((value, h) => backTransform(value + deviations * standardError[h]!, power, candidate.transform));
  return {
    ok: true,
    value: { horizon, expected, standardError, coverage, lower: back(-z), upper: back(z), median: back(0) },
  };
}

function refuse({ values, horizon, coverage }: PredictRequest, origin: number): Failure | null {
  const bad = (field: string, reason: 'notAWholeNumber' | 'negative' | 'tooLarge'): Failure => ({
    code: 'badCandidate',
    field,
    reason,
  });
  if (!Number.isInteger(horizon)) return bad('horizon', 'notAWholeNumber');
  if (horizon < 1) return bad('horizon', 'negative');
  if (horizon > LONGEST) return bad('horizon', 'tooLarge');
  if (!(coverage > 0)) return bad('coverage', 'negative');
  if (!(coverage < 1)) return bad('coverage', 'tooLarge');
  if (!Number.isInteger(origin)) return bad('origin', 'notAWholeNumber');
  if (origin < 1) return bad('origin', 'negative');
  if (origin > values.length) return bad('origin', 'tooLarge');
  return null;
}
