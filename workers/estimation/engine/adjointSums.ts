import type { SparsePolynomial } from '../../model/expandPolynomials.ts';

/** A response below this is nothing beside innovations of unit size. */
const NOTHING = 1e-19;

/** sum (or, the first time, nothing) plus factor·x. */
export function accumulate(sum: Float64Array, x: Float64Array, factor: number, first = false): void {
  if (!first) for (let t = 0; t < sum.length; t++) sum[t]! += factor * x[t]!;
  else if (factor === 1) sum.set(x);
  else for (let t = 0; t < sum.length; t++) sum[t] = factor * x[t]!;
}

/** Σ c_t x_{t−lag}; what lies before the start is zero. */
export function lagDot(c: Float64Array, x: Float64Array, pad: number, n: number, lag: number): number {
  let even = 0;
  let odd = 0;
  let t = pad + lag;
  const end = pad + n;
  for (; t + 1 < end; t += 2) {
    even += c[t]! * x[t - lag]!;
    odd += c[t + 1]! * x[t + 1 - lag]!;
  }
  if (t < end) even += c[t]! * x[t - lag]!;
  return even + odd;
}

/**
 * Adds to the output of a recursion e = … − Σ θ_j e_{t−j} what inputs at its first places put into it. Stops where that is nothing.
 *
 * @param e padded; @param input values added at the first places
 */
export function addResponse(
  e: Float64Array,
  input: Float64Array,
  pad: number,
  n: number,
  { lags, values, degree }: SparsePolynomial,
): void {
  const response = new Float64Array(n);
  let quiet = 0;
  for (let t = 0; t < n; t++) {
    let now = t < input.length ? input[t]! : 0;
    for (let k = 0; k < lags.length; k++) if (lags[k]! <= t) now -= values[k]! * response[t - lags[k]!]!;
    response[t] = now;
    e[pad + t]! += now;
    quiet = Math.abs(now) < NOTHING ? quiet + 1 : 0;
    if (quiet > degree && t >= input.length) return;
  }
}
