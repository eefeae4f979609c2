import type { SparsePolynomial } from '../../model/expandPolynomials.ts';

/**
 * Steps of a block. A loop over a whole long record is compiled while it runs, before what follows it was ever seen, and thrown
 * away at its end, call after call; a block that is called often is compiled once and well.
 */
const BLOCK = 512;

/** Places of the running values in the state of a chain. */
const PHI = 0;
const PSI = 1;
const THETA = 2;
const ETA = 3;
const W1 = 4;
const W2 = 5;
const E1 = 6;
const E2 = 7;
const SQUARES = 8;
const PLAIN = 9;

const state = new Float64Array(10);

/**
 * The recursion e_t = w_t − Σ φ_i w_{t−i} − Σ θ_j e_{t−j} for lags 1 and 2 alone, in one pass with everything in registers. Only the
 * first `kept` innovations are written: on a long record the writing costs as much as the arithmetic.
 *
 * @param w padded values; @param e padded result; @param pad zeros in front of both; @param n number of steps
 * @param sums receives Σ e_t² over all steps and Σ e_t over those not written
 * @returns false where the polynomials have other lags, and then nothing is done
 */
export function shortRecursion(
  w: Float64Array,
  e: Float64Array,
  pad: number,
  n: number,
  ar: SparsePolynomial,
  ma: SparsePolynomial,
  kept: number,
  sums: Float64Array,
): boolean {
  if (ar.degree > 2 || ma.degree > 2) return false;
  state.fill(0);
  set(ar, PHI);
  set(ma, THETA);
  const end = pad + n;
  const turn = pad + Math.min(kept, n);
  for (let t = pad; t < turn; t += BLOCK) writingBlock(w, e, t, Math.min(t + BLOCK, turn));
  state[PLAIN] = 0;
  for (let t = turn; t < end; t += BLOCK) quietBlock(w, t, Math.min(t + BLOCK, end));
  sums[0] = state[SQUARES]!;
  sums[1] = state[PLAIN]!;
  return true;
}

function set({ lags, values }: SparsePolynomial, at: number): void {
  for (let k = 0; k < lags.length; k++) state[at + lags[k]! - 1] = values[k]!;
}

function writingBlock(w: Float64Array, e: Float64Array, from: number, to: number): void {
  const phi = state[PHI]!;
  const psi = state[PSI]!;
  const theta = state[THETA]!;
  const eta = state[ETA]!;
  let w1 = state[W1]!;
  let w2 = state[W2]!;
  let e1 = state[E1]!;
  let e2 = state[E2]!;
  let squares = state[SQUARES]!;
  for (let t = from; t < to; t++) {
    const now = w[t]!;
    // What does not wait for the last innovation first: one product and one difference are the chain.
    const value = now - phi * w1 - psi * w2 - eta * e2 - theta * e1;
    w2 = w1;
    w1 = now;
    e2 = e1;
    e1 = value;
    e[t] = value;
    squares += value * value;
  }
  state[W1] = w1;
  state[W2] = w2;
  state[E1] = e1;
  state[E2] = e2;
  state[SQUARES] = squares;
}

function quietBlock(w: Float64Array, from: number, to: number): void {
  const phi = state[PHI]!;
  const psi = state[PSI]!;
  const theta = state[THETA]!;
  const eta = state[ETA]!;
  let w1 = state[W1]!;
  let w2 = state[W2]!;
  let e1 = state[E1]!;
  let e2 = state[E2]!;
  let squares = state[SQUARES]!;
  let plain = state[PLAIN]!;
  for (let t = from; t < to; t++) {
    const now = w[t]!;
    const value = now - phi * w1 - psi * w2 - eta * e2 - theta * e1;
    w2 = w1;
    w1 = now;
    e2 = e1;
    e1 = value;
    squares += value * value;
    plain += value;
  }
  state[W1] = w1;
  state[W2] = w2;
  state[E1] = e1;
  state[E2] = e2;
  state[SQUARES] = squares;
  state[PLAIN] = plain;
}
