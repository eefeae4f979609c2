import type { Fit } from '../contract/fit.ts';
import type { Prediction, PredictRequest } from '../contract/prediction.ts';
import { predictRecord } from './predictRecord.ts';

/**
 * Predicted readings 1…horizon after the end of a record: `predictRecord` for callers that hold a sound fit.
 *
 * @param fit an estimated candidate; @param values the whole record, gaps as NaN, in its own unit
 * @param horizon ≥ 1; @param options coverage (0.95 when left out), covariates over record and horizon, origin
 * @returns `expected` and `standardError` on the scale of the model, `median`, `lower`, `upper` on that of the record
 * @throws RangeError that says what is wrong with the request
 * @example white noise with mean 5, σ² = 4: expected 5, standard error 2 at every horizon
 */
export function predictReadings(
  fit: Fit,
  values: Float64Array,
  horizon: number,
  options: Partial<Pick<PredictRequest, 'coverage' | 'columns' | 'origin'>> = {},
): Prediction {
  const result = predictRecord({ coverage: 0.95, ...options, fit, values, horizon });
  if (!result.ok) throw new RangeError(`The readings cannot be predicted: ${JSON.stringify(result.failure)}`);
  return result.value;
}
