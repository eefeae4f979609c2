import type { Failure } from './failures.ts';

/** The outcome of a call that may fail in an expected way. Bugs throw; expected failures are values. */
export type Result<T, F = Failure> =
  { readonly ok: true; readonly value: T } | { readonly ok: false; readonly failure: F };

/** A square matrix as it crosses the thread boundary: `n` rows, `values` row-major, length n². */
export interface Square {
  readonly n: number;
  readonly values: Float64Array;
}
