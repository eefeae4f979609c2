import type { Failure } from '../contract/failures.ts';

/**
 * The first infinite number among readings and covariates, as a failure; null where there is none. NaN is a gap.
 */
export function infinityIn(request: {
  readonly values?: Float64Array;
  readonly columns?: Readonly<Record<string, Float64Array>>;
}): Failure | null {
  const arrays = { ...(request.values ? { values: request.values } : {}), ...request.columns };
  for (const [what, array] of Object.entries(arrays)) {
    const index = array.findIndex((value) => Math.abs(value) === Infinity);
    if (index >= 0) return { code: 'notFinite', what, index };
  }
  return null;
}
