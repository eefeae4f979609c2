import type { Result } from '../contract/result.ts';
import { expandPolynomials } from '../model/expandPolynomials.ts';
import { GapFilter } from './engine/gapFilter.ts';
import { residualRecord, type ResidualRequest } from './residualRecord.ts';

/** Mean and standard deviation of readings after the end of the record, on the scale of the model. */
export interface PredictiveMoments {
  readonly expected: Float64Array;
  /** From the innovations alone, parameters taken as known; NaN where the record does not fix the reading at all. */
  readonly standardError: Float64Array;
}

/**
 * Exact finite-sample predictions of the readings 1…horizon after the end of the record.
 *
 * Method: the horizon is a run of gaps for the Kalman filter; with differencing its flat start. A phase of the season that was never observed cannot be predicted and is NaN.
 *
 * @param request the record, a checked candidate, its parameters, horizon ≥ 1; covariates continued over the horizon
 * @returns moments on the transformed scale; failures as `residualRecord`
 */
export function predictiveMoments(request: ResidualRequest & { readonly horizon: number }): Result<PredictiveMoments> {
  const made = residualRecord(request);
  if (!made.ok) return made;
  const { residual, taken, differencing, sigma } = made.value;
  const { horizon } = request;
  const { ar, ma } = expandPolynomials(request.at, request.candidate.order.s);
  const expected = new Float64Array(horizon).fill(NaN);
  const standardError = new Float64Array(horizon).fill(NaN);
  const first = residual.length - horizon;
  const filter = new GapFilter([residual], ar.length, ma.length, differencing, (t, errors, variance) => {
    if (t < first || variance === Infinity) return;
    // In a gap the errors are those of a reading of zero: the prediction with its sign turned.
    expected[t - first] = taken[t]! - errors[0]! * sigma;
    standardError[t - first] = sigma * Math.sqrt(variance);
  });
  if (!filter.evaluate(ar, ma))
    return { ok: false, failure: { code: 'badCandidate', field: 'ar', reason: 'nonstationary' } };
  return { ok: true, value: { expected, standardError } };
}
