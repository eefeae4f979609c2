import type { SparsePolynomial } from '../../model/expandPolynomials.ts';

/** Steps of a block: what the first pass writes is still at hand for the second, and short calls are compiled once and well. */
const BLOCK = 512;

/**
 * e_t = w_t − Σ φ_i w_{t−i} − Σ θ_j e_{t−j} with nothing before the start.
 *
 * Two passes: the AR part has no dependence between steps, the MA part is one chain. Low orders keep the last values in
 * registers. Both arrays carry `pad` zeros in front, so that no step asks where the start is.
 *
 * @param w padded values; @param e padded result, w itself where there is no AR part; both at least pad + n long, pad ≥ the highest lag
 * @param n number of steps
 */
export function steadyRecursion(
  w: Float64Array,
  e: Float64Array,
  pad: number,
  n: number,
  ar: SparsePolynomial,
  ma: SparsePolynomial,
): void {
  steadyStretch(w, e, pad, pad + n, ar, ma);
}

/**
 * The same recursion over the places from…to of longer arrays, going on from what stands before them.
 *
 * @param from at least the highest lag
 */
export function steadyStretch(
  w: Float64Array,
  e: Float64Array,
  from: number,
  to: number,
  ar: SparsePolynomial,
  ma: SparsePolynomial,
): void {
  for (let t = from; t < to; t += BLOCK) {
    const end = Math.min(t + BLOCK, to);
    filterAr(w, e, t, end, ar);
    filterMa(e, t, end, ma);
  }
}

function filterAr(
  w: Float64Array,
  e: Float64Array,
  from: number,
  to: number,
  { lags, values }: SparsePolynomial,
): void {
  const a = lags[0] ?? 0;
  const phi = values[0] ?? 0;
  if (lags.length === 0) {
    if (e !== w) for (let t = from; t < to; t++) e[t] = w[t]!;
  } else if (lags.length === 1) for (let t = from; t < to; t++) e[t] = w[t]! - phi * w[t - a]!;
  else if (lags.length === 3) {
    const b = lags[1]!;
    const c = lags[2]!;
    const psi = values[1]!;
    const chi = values[2]!;
    for (let t = from; t < to; t++) e[t] = w[t]! - phi * w[t - a]! - psi * w[t - b]! - chi * w[t - c]!;
  } else {
    const b = lags[1]!;
    const psi = values[1]!;
    for (let t = from; t < to; t++) e[t] = w[t]! - phi * w[t - a]! - psi * w[t - b]!;
    for (let k = 2; k < lags.length; k++) {
      const lag = lags[k]!;
      const value = values[k]!;
      for (let t = from; t < to; t++) e[t]! -= value * w[t - lag]!;
    }
  }
}

function filterMa(e: Float64Array, from: number, to: number, { lags, values }: SparsePolynomial): void {
  const count = lags.length;
  if (count === 0) return;
  const theta = values[0]!;
  if (count === 1 && lags[0] === 1) {
    let last = e[from - 1]!;
    for (let t = from; t < to; t++) e[t] = last = e[t]! - theta * last;
  } else if (count === 1) {
    const a = lags[0]!;
    for (let t = from; t < to; t++) e[t]! -= theta * e[t - a]!;
  } else if (count === 2 && lags[1] === 2) {
    const second = values[1]!;
    let last = e[from - 1]!;
    let before = e[from - 2]!;
    for (let t = from; t < to; t++) {
      const now = e[t]! - second * before - theta * last;
      before = last;
      e[t] = last = now;
    }
  } else if (count === 3 && lags[0] === 1) {
    const b = lags[1]!;
    const c = lags[2]!;
    const second = values[1]!;
    const third = values[2]!;
    let last = e[from - 1]!;
    for (let t = from; t < to; t++) e[t] = last = e[t]! - second * e[t - b]! - third * e[t - c]! - theta * last;
  } else if (lags[0] === 1) {
    let last = e[from - 1]!;
    for (let t = from; t < to; t++) {
      let now = e[t]!;
      for (let k = 1; k < count; k++) now -= values[k]! * e[t - lags[k]!]!;
      e[t] = last = now - theta * last;
    }
  } else {
    for (let t = from; t < to; t++) {
      let now = e[t]!;
      for (let k = 0; k < count; k++) now -= values[k]! * e[t - lags[k]!]!;
      e[t] = now;
    }
  }
}

/**
 * The adjoint recursion c_t = e_t − Σ θ_j c_{t+j}, from the end backwards, over the first n steps.
 *
 * @param e padded in front by `pad`; @param c the same length with room for the highest lag of zeros behind n
 */
export function adjointRecursion(e: Float64Array, c: Float64Array, pad: number, n: number, ma: SparsePolynomial): void {
  const { lags, values } = ma;
  const count = lags.length;
  const end = pad + n;
  c.fill(0, end, Math.min(c.length, end + ma.degree));
  if (count === 1 && lags[0] === 1) {
    const theta = values[0]!;
    let last = 0;
    for (let t = end - 1; t >= pad; t--) c[t] = last = e[t]! - theta * last;
    return;
  }
  if (count === 1) {
    const theta = values[0]!;
    const a = lags[0]!;
    for (let t = end - 1; t >= pad; t--) c[t] = e[t]! - theta * c[t + a]!;
    return;
  }
  for (let t = end - 1; t >= pad; t--) {
    let now = e[t]!;
    for (let k = 0; k < count; k++) now -= values[k]! * c[t + lags[k]!]!;
    c[t] = now;
  }
}
