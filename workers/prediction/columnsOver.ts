import type { Candidate } from '../contract/candidate.ts';
import type { Result } from '../contract/result.ts';
import type { Covariates } from '../series/regressionColumns.ts';

/**
 * The covariates of a candidate over record and horizon, checked: a prediction needs their future values.
 *
 * A covariate that enters `lag` readings late may end that many readings before the horizon does.
 *
 * @param columns values by id, at least origin + horizon − lag long; @param origin first index predicted
 * @returns columns of length origin + horizon, padded with NaN only where no lag reaches; a failure names the covariate that is
 *   absent or too short, or the first index in the horizon at which it has no value
 */
export function columnsOver(
  candidate: Candidate,
  columns: Covariates | undefined,
  origin: number,
  horizon: number,
): Result<Record<string, Float64Array>> {
  const length = origin + horizon;
  const result: Record<string, Float64Array> = {};
  for (const regressor of candidate.regressors) {
    if (regressor.kind !== 'column') continue;
    const { id, lag } = regressor;
    const given = columns?.[id];
    if (given === undefined) return { ok: false, failure: { code: 'columnMissing', column: id } };
    const needed = length - lag;
    if (given.length < needed)
      return { ok: false, failure: { code: 'columnLength', column: id, length: given.length, needed } };
    for (let t = Math.max(0, origin - lag); t < needed; t++)
      if (!Number.isFinite(given[t]!)) return { ok: false, failure: { code: 'columnGap', column: id, index: t } };
    const own = new Float64Array(length).fill(NaN);
    own.set(given.subarray(0, length));
    result[id] = own;
  }
  return { ok: true, value: result };
}
