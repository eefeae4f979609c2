import type { Innovations } from '../contract/diagnostics.ts';
import type { Fit } from '../contract/fit.ts';
import type { Result } from '../contract/result.ts';
import { filterInnovations } from '../estimation/filterInnovations.ts';
import type { Covariates } from '../series/regressionColumns.ts';

/**
 * Innovations of a fit over its window: exact one-step-ahead errors, each with its own standard deviation.
 *
 * @param fit an estimated candidate; @param values the whole record, gaps as NaN
 * @param columns values of its covariates by id, as long as the record
 * @returns arrays as long as the record, NaN where there is no innovation; failures as `filterInnovations`
 */
export function innovationsOf(fit: Fit, values: Float64Array, columns?: Covariates): Result<Innovations> {
  const { candidate, parameters, window } = fit;
  const found = filterInnovations({ values, candidate, at: parameters, window, columns });
  if (!found.ok) return found;
  const { values: errors, standardDeviations } = found.value;
  const standardised = errors.map((error, t) => error / standardDeviations[t]!);
  return { ok: true, value: { values: errors, standardDeviations, standardised } };
}
