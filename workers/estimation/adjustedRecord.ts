import type { Candidate, FitRequest } from '../contract/candidate.ts';
import type { Result } from '../contract/result.ts';
import { differencingPolynomial } from '../model/differencingPolynomial.ts';
import { differenceRecord } from '../series/differenceRecord.ts';
import { regressionColumns } from '../series/regressionColumns.ts';
import { transformRecord } from '../series/transformRecord.ts';

/**
 * The record as the ARMA part sees it: windowed, transformed, less level and regression, differenced.
 *
 * @param request values, window and covariates
 * @param beta level (where there is one), then regression coefficients, in transformed units
 * @param lambda λ where the candidate estimates it
 * @returns values of length (window) − d − sD, gaps as NaN
 */
export function adjustedRecord(
  request: Pick<FitRequest, 'values' | 'window' | 'columns'>,
  candidate: Candidate,
  beta: ArrayLike<number>,
  lambda?: number,
): Result<Float64Array> {
  const from = request.window?.from ?? 0;
  const to = request.window?.to ?? request.values.length;
  const transformed = transformRecord(request.values.slice(from, to), candidate.transform, lambda);
  if (!transformed.ok) return transformed;
  const regression = regressionColumns(candidate, request.values.length, request.columns);
  if (!regression.ok) return regression;
  const rest = transformed.value.values.slice();
  regression.value.columns.forEach((column, i) => {
    for (let t = 0; t < rest.length; t++) rest[t]! -= beta[i]! * column[from + t]!;
  });
  return { ok: true, value: differenceRecord(rest, differencingPolynomial(candidate.order)) };
}
