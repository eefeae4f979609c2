import type { Transform } from '../contract/candidate.ts';
import type { Result } from '../contract/result.ts';

/**
 * Readings on the scale of the model.
 *
 * Method: log, or Box–Cox (y^λ − 1)/λ with λ = 0 the logarithm (Box & Cox 1964, J. R. Stat. Soc. B 26, 211–252).
 *
 * @param values gaps as NaN stay gaps; @param lambda used where the transform's λ is to be estimated
 * @returns `values`, and `logJacobian` whose element t is ln |d transformed/d reading| (0 without a transform, NaN in a
 *   gap); a `transformDomain` failure names the first reading that is not positive and counts them
 */
export function transformRecord(
  values: Float64Array,
  transform: Transform,
  lambda = 1,
): Result<{ values: Float64Array; logJacobian: Float64Array | null }> {
  if (transform.kind === 'none') return { ok: true, value: { values, logJacobian: null } };
  const power = powerOf(transform, lambda);
  let first = -1;
  let count = 0;
  for (let t = 0; t < values.length; t++) {
    if (values[t]! <= 0) {
      if (first < 0) first = t;
      count++;
    }
  }
  if (count > 0)
    return {
      ok: false,
      failure: { code: 'transformDomain', transform: transform.kind, index: first, value: values[first]!, count },
    };
  const logJacobian = new Float64Array(values.length);
  const transformed = values.map((value, t) => {
    const log = Math.log(value);
    logJacobian[t] = (power - 1) * log;
    return power === 0 ? log : Math.expm1(power * log) / power;
  });
  return { ok: true, value: { values: transformed, logJacobian } };
}

/** λ of a transform; `estimated` where it is to be estimated. 1 without a transform, 0 for the logarithm. */
export function powerOf(transform: Transform, estimated: number): number {
  if (transform.kind === 'none') return 1;
  if (transform.kind === 'log') return 0;
  return transform.lambda === 'estimate' ? estimated : transform.lambda;
}

/** The reading that a transformed value stands for; NaN where none does. */
export function backTransform(value: number, power: number, transform: Transform): number {
  if (transform.kind === 'none') return value;
  if (power === 0) return Math.exp(value);
  const base = 1 + power * value;
  return base > 0 ? base ** (1 / power) : power > 0 ? 0 : NaN;
}
