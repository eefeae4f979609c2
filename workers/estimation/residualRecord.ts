import type { Candidate, Parameters } from '../contract/candidate.ts';
import type { Result } from '../contract/result.ts';
import type { Span } from '../contract/series.ts';
import { differencingPolynomial } from '../model/differencingPolynomial.ts';
import { regressionColumns, type Covariates } from '../series/regressionColumns.ts';
import { transformRecord } from '../series/transformRecord.ts';

/** A record held against given parameters: what the regression leaves of it, ready for the filter. */
export interface ResidualRecord {
  /** Record on the model's scale less regression and `offset`, divided by σ, over the window and the horizon; gaps NaN. */
  readonly residual: Float64Array;
  /** What was taken off, in the units of the model's scale: level, regression and the offset that differencing annihilates. */
  readonly taken: Float64Array;
  readonly differencing: Float64Array;
  readonly from: number;
  readonly sigma: number;
}

export interface ResidualRequest {
  readonly values: Float64Array;
  readonly candidate: Candidate;
  readonly at: Parameters;
  /** Covariates by id, each as long as the record and the horizon. */
  readonly columns?: Covariates | undefined;
  readonly window?: Span | undefined;
  readonly horizon?: number | undefined;
  /** Box–Cox λ where the candidate has it estimated; that of the parameters when left out. */
  readonly lambda?: number | undefined;
}

/**
 * The record less its level and regression, in units of σ.
 *
 * @param request see ResidualRequest; @returns failures of the transform, and of covariates that are absent or too short
 */
export function residualRecord(request: ResidualRequest): Result<ResidualRecord> {
  const { values, candidate, at, horizon = 0 } = request;
  const window = request.window ?? { from: 0, to: values.length };
  const transformed = transformRecord(
    values.slice(window.from, window.to),
    candidate.transform,
    request.lambda ?? at.lambda,
  );
  if (!transformed.ok) return transformed;
  const regression = regressionColumns(candidate, window.to + horizon, request.columns);
  if (!regression.ok) return regression;
  const differencing = differencingPolynomial(candidate.order);
  const record = transformed.value.values;
  const offset = differencing.length > 1 ? (record.find((value) => !Number.isNaN(value)) ?? 0) : 0;
  const beta = candidate.level === 'none' ? [...at.regression] : [at.mean, ...at.regression];
  const sigma = Math.sqrt(at.innovationVariance);
  const length = record.length + horizon;
  const taken = new Float64Array(length).fill(offset);
  regression.value.columns.forEach((column, i) => {
    for (let t = 0; t < length; t++) {
      const value = column[window.from + t]!;
      // A covariate unknown where the record has a gap does not enter; elsewhere it makes the reading unusable.
      taken[t]! += beta[i]! * (Number.isNaN(value) && Number.isNaN(record[t] ?? NaN) && t < record.length ? 0 : value);
    }
  });
  const residual = new Float64Array(length).fill(NaN);
  for (let t = 0; t < record.length; t++) residual[t] = (record[t]! - taken[t]!) / sigma;
  return { ok: true, value: { residual, taken, differencing, from: window.from, sigma } };
}
