import type { Result } from '../contract/result.ts';
import { expandPolynomials } from '../model/expandPolynomials.ts';
import { GapFilter } from './engine/gapFilter.ts';
import { residualRecord, type ResidualRequest } from './residualRecord.ts';

/** Innovations of a model held at given parameters, as long as the record; NaN where there is none. */
export interface FilteredInnovations {
  readonly values: Float64Array;
  readonly standardDeviations: Float64Array;
}

/**
 * Exact (finite-sample) one-step-ahead errors with their own standard deviations, on the scale of the model.
 *
 * Method: the Kalman filter with the stationary start; with differencing its flat start, so that a reading spent on a starting
 * value has no innovation. Without gaps these are the innovations of the
 * differenced record, and −½ Σ (ln 2πs² + e²/s²) is the exact ln L.
 *
 * @param request the record, a checked candidate, its parameters; window, covariates, λ
 * @returns NaN in gaps, outside the window, and where a reading is spent on a starting value; failures as `residualRecord`
 */
export function filterInnovations(request: ResidualRequest): Result<FilteredInnovations> {
  const made = residualRecord({ ...request, horizon: 0 });
  if (!made.ok) return made;
  const { residual, differencing, from, sigma } = made.value;
  const { ar, ma } = expandPolynomials(request.at, request.candidate.order.s);
  const nothing = () => new Float64Array(request.values.length).fill(NaN);
  const found = { values: nothing(), standardDeviations: nothing() };
  const filter = new GapFilter([residual], ar.length, ma.length, differencing, (t, errors, variance, seen) => {
    if (!seen || variance === Infinity) return;
    found.values[from + t] = errors[0]! * sigma;
    found.standardDeviations[from + t] = sigma * Math.sqrt(variance);
  });
  if (!filter.evaluate(ar, ma))
    return { ok: false, failure: { code: 'badCandidate', field: 'ar', reason: 'nonstationary' } };
  return { ok: true, value: found };
}
