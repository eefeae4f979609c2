import type { Candidate, Regressor } from '../contract/candidate.ts';
import type { Result } from '../contract/result.ts';

/** Columns of the regression on the scale of the readings, level first, and their names (mean or drift, then β1…). */
export interface RegressionColumns {
  readonly names: readonly string[];
  readonly columns: readonly Float64Array[];
}

/** Columns of the covariates by id, each as long as the record. */
export type Covariates = Readonly<Record<string, Float64Array>>;

/**
 * The inputs that are estimated along with the ARMA part, as columns as long as the record.
 *
 * The drift's column is t^(d+D)/((d+D)! s^D): its d-fold and seasonal differences are 1 exactly up to lower powers, which the
 * differences annihilate. t is counted from the start of the record.
 *
 * @param candidate checked; @param length readings wanted (the record, or the record and a horizon)
 * @param covariates values of `column` regressors, each at least `length` long
 * @returns the columns, or `columnMissing`/`columnLength`. A covariate lagged by L is NaN in its first L places.
 */
export function regressionColumns(
  candidate: Candidate,
  length: number,
  covariates: Covariates = {},
): Result<RegressionColumns> {
  const names: string[] = [];
  const columns: Float64Array[] = [];
  const { order, level } = candidate;
  if (level === 'mean') columns.push(new Float64Array(length).fill(1));
  if (level === 'drift') columns.push(driftColumn(order.d + order.D, order.D > 0 ? order.s ** order.D : 1, length));
  if (level !== 'none') names.push(level);
  for (const regressor of candidate.regressors) {
    if (regressor.kind === 'column') {
      const source = covariates[regressor.id];
      if (source === undefined) return { ok: false, failure: { code: 'columnMissing', column: regressor.id } };
      if (source.length < length)
        return {
          ok: false,
          failure: { code: 'columnLength', column: regressor.id, length: source.length, needed: length },
        };
      columns.push(Float64Array.from({ length }, (_, t) => source[t - regressor.lag] ?? NaN));
    } else columns.push(...ownColumns(regressor, length));
    while (names.length < columns.length) names.push(`β${names.length + (level === 'none' ? 1 : 0)}`);
  }
  return { ok: true, value: { names, columns } };
}

/** Number of columns of one regressor. */
export function columnCount(regressor: Regressor): number {
  return regressor.kind === 'harmonic' && regressor.k * 2 !== regressor.period ? 2 : 1;
}

function driftColumn(power: number, scale: number, length: number): Float64Array {
  let factorial = 1;
  for (let i = 2; i <= power; i++) factorial *= i;
  return Float64Array.from({ length }, (_, t) => t ** power / (factorial * scale));
}

function ownColumns(regressor: Exclude<Regressor, { kind: 'column' }>, length: number): Float64Array[] {
  if (regressor.kind !== 'harmonic') {
    const { at, kind } = regressor;
    const value = {
      step: (t: number) => +(t >= at),
      pulse: (t: number) => +(t === at),
      ramp: (t: number) => Math.max(0, t - at),
    };
    return [Float64Array.from({ length }, (_, t) => value[kind](t))];
  }
  const turn = (t: number) => (2 * Math.PI * ((regressor.k * t) % regressor.period)) / regressor.period;
  const cosine = Float64Array.from({ length }, (_, t) => Math.cos(turn(t)));
  if (columnCount(regressor) === 1) return [cosine];
  return [cosine, Float64Array.from({ length }, (_, t) => Math.sin(turn(t)))];
}
