import type { SparsePolynomial } from '../../model/expandPolynomials.ts';

/** Steps of a block, as in `shortRecursion`: called often, compiled once and well. */
const BLOCK = 512;

/** Places of the running values in the state: coefficients, the last two values of the chain, and four sums. */
const THETA = 0;
const ETA = 1;
const C1 = 2;
const C2 = 3;
const SUMS = 4;

const state = new Float64Array(8);

/**
 * The adjoint recursion c_t = e_t − θ_1 c_{t+1} − θ_2 c_{t+2}, from the end backwards, and in the same pass the sums of c_t x_{t−1},
 * c_t x_{t−2}, c_t e_{t−1} and c_t e_{t−2} that the gradient is made of: c itself is never written.
 *
 * @param x, e padded values; @param pad zeros in front of both, at least 1; @param n number of steps; @param ma lags 1 and 2 alone
 * @param sums receives the four sums in this order; values before the start count as 0, whatever stands there
 */
export function shortAdjoint(
  x: Float64Array,
  e: Float64Array,
  pad: number,
  n: number,
  { lags, values }: SparsePolynomial,
  sums: Float64Array,
): void {
  state.fill(0);
  for (let k = 0; k < lags.length; k++) state[THETA + lags[k]! - 1] = values[k]!;
  // The first two values, which have fewer than two before them, are left for the end.
  const low = pad + Math.min(2, n);
  for (let t = pad + n; t > low; t -= BLOCK) backBlock(x, e, Math.max(low, t - BLOCK), t);
  for (let t = low - 1; t >= pad; t--) {
    const c = e[t]! - state[ETA]! * state[C2]! - state[THETA]! * state[C1]!;
    state[C2] = state[C1]!;
    state[C1] = c;
    if (t === pad) continue;
    state[SUMS]! += c * x[t - 1]!;
    state[SUMS + 2]! += c * e[t - 1]!;
  }
  for (let k = 0; k < 4; k++) sums[k] = state[SUMS + k]!;
}

function backBlock(x: Float64Array, e: Float64Array, from: number, to: number): void {
  const theta = state[THETA]!;
  const eta = state[ETA]!;
  let c1 = state[C1]!;
  let c2 = state[C2]!;
  let x1 = 0;
  let x2 = 0;
  let e1 = 0;
  let e2 = 0;
  for (let t = to - 1; t >= from; t--) {
    const c = e[t]! - eta * c2 - theta * c1;
    c2 = c1;
    c1 = c;
    x1 += c * x[t - 1]!;
    x2 += c * x[t - 2]!;
    e1 += c * e[t - 1]!;
    e2 += c * e[t - 2]!;
  }
  state[C1] = c1;
  state[C2] = c2;
  state[SUMS]! += x1;
  state[SUMS + 1]! += x2;
  state[SUMS + 2]! += e1;
  state[SUMS + 3]! += e2;
}
