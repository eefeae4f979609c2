import type { SparsePolynomial } from '../../model/expandPolynomials.ts';

/**
 * e_t = w_t − Σ φ_i w_{t−i} − Σ θ_j e_{t−j} with nothing before the start.
 *
 * Two passes: the AR part has no dependence between steps, the MA part is one chain. Low orders keep the last values in
 * registers. Both arrays carry `pad` zeros in front, so that no step asks where the start is.
 *
 * @param w padded values; @param e padded result; both at least pad + n long, pad ≥ the highest lag
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
 * The same recursion for lags 1 and 2 alone, in one pass with everything in registers.
 *
 * @returns Σ e_t², so that the commonest orders need no second pass; NaN where the polynomials have other lags, and then nothing is done
 */
export function shortRecursion(
  w: Float64Array,
  e: Float64Array,
  pad: number,
  n: number,
  ar: SparsePolynomial,
  ma: SparsePolynomial,
): number {
  if (ar.degree > 2 || ma.degree > 2) return NaN;
  const at = ({ lags, values }: SparsePolynomial, lag: number) => {
    for (let k = 0; k < lags.length; k++) if (lags[k] === lag) return values[k]!;
    return 0;
  };
  const [phi, psi, theta, eta] = [at(ar, 1), at(ar, 2), at(ma, 1), at(ma, 2)];
  let [w1, w2, e1, e2] = [0, 0, 0, 0];
  let sum = 0;
  for (let t = pad; t < pad + n; t++) {
    const now = w[t]!;
    // What does not wait for the last innovation first: one product and one difference are the chain.
    const value = now - phi * w1 - psi * w2 - eta * e2 - theta * e1;
    w2 = w1;
    w1 = now;
    e2 = e1;
    e1 = value;
    e[t] = value;
    sum += value * value;
  }
  return sum;
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
  filterAr(w, e, from, to, ar);
  filterMa(e, from, to, ma);
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
  if (lags.length === 0) for (let t = from; t < to; t++) e[t] = w[t]!;
  else if (lags.length === 1) for (let t = from; t < to; t++) e[t] = w[t]! - phi * w[t - a]!;
  else {
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
  } else if (count === 2 && lags[1] === 2) {
    const second = values[1]!;
    let last = e[from - 1]!;
    let before = e[from - 2]!;
    for (let t = from; t < to; t++) {
      const now = e[t]! - second * before - theta * last;
      before = last;
      e[t] = last = now;
    }
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
  for (let t = end - 1; t >= pad; t--) {
    let now = e[t]!;
    for (let k = 0; k < count; k++) now -= values[k]! * c[t + lags[k]!]!;
    c[t] = now;
  }
}
