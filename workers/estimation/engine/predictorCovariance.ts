import type { SparsePolynomial } from '../../model/expandPolynomials.ts';

/** An entry of the gain below this is nothing beside the unit innovation variance. */
const NOTHING = 1e-24;

/** The whole covariance below this is nothing: the filter has become the steady recursion. */
const SETTLED = 1e-20;

/**
 * Covariance P of the predictor state of an ARIMA process for unit innovation variance: places 1…m hold what the past puts into the
 * readings ahead, y_t = s_1 + e_t and s ← shift(s) + α y + θ e, with α of the multiplied-out φ(B)∇ᵈ∇ₛᴰ.
 *
 * The shift is a turn of the index, so that a step costs one product of a vector with itself, and over a gap only what the sparse
 * polynomials touch. After a reading the transition is T̃ = shift − θz′, without noise: P falls to exactly nothing where the past is
 * known. Only one triangle is stored, in places that do not move.
 */
export class PredictorCovariance {
  /** Place of s_1. */
  head = 0;
  /** First row of P, by place; after `observe` divided by the variance. */
  readonly row: Float64Array;
  private readonly P: Float64Array;
  private readonly places: Int32Array;

  constructor(readonly m: number) {
    this.row = new Float64Array(m);
    this.P = new Float64Array(m * m);
    this.places = new Int32Array(m);
  }

  /** Starts from a symmetric matrix, row-major, that fills the first `size` places. */
  start(covariance: Float64Array, size: number): void {
    const { P, m } = this;
    this.head = 0;
    P.fill(0);
    for (let i = 0; i < size; i++) for (let j = 0; j <= i; j++) P[i * m + j] = covariance[i * size + j]!;
  }

  /** Reads the first row and returns the variance of the next reading, 1 + z′Pz. */
  look(): number {
    const { P, m, head, row } = this;
    const base = head * m;
    for (let b = 0; b <= head; b++) row[b] = P[base + b]!;
    for (let a = head + 1; a < m; a++) row[a] = P[a * m + head]!;
    return 1 + Math.max(row[head]!, 0);
  }

  /** A reading was seen: P − row row′/F, then T̃ P T̃′. After `look`, with the variance it gave. */
  see(variance: number, theta: SparsePolynomial): void {
    const { P, m, row } = this;
    for (let a = 0; a < m; a++) {
      const own = row[a]!;
      if (Math.abs(own) < NOTHING) continue;
      const scaled = own / variance;
      const base = a * m;
      for (let b = 0; b <= a; b++) P[base + b]! -= scaled * row[b]!;
    }
    for (let b = 0; b < m; b++) row[b]! /= variance;
    this.move(theta, -1);
  }

  /**
   * A reading was spent on a starting value that enters it by `direction` (1 at the head): the state is then known up to the
   * reading's own noise along that direction.
   */
  spend(direction: Float64Array, theta: SparsePolynomial): void {
    const { P, m, row, head } = this;
    const c = row[head]! + 1;
    for (let a = 0; a < m; a++) {
      const k = direction[a]!;
      const r = row[a]!;
      if (k === 0 && r === 0) continue;
      const base = a * m;
      for (let b = 0; b <= a; b++) P[base + b]! += (c * k - r) * direction[b]! - k * row[b]!;
    }
    row.set(direction);
    this.move(theta, -1);
  }

  /** No reading: T P T′ with the noise of the value that was not seen. After `look`. */
  pass(alpha: SparsePolynomial, noise: SparsePolynomial): void {
    this.move(alpha, 1);
    this.addProduct(noise, 1);
  }

  isNothing(): boolean {
    const { P, m } = this;
    for (let a = 0; a < m; a++) if (P[a * m + a]! > SETTLED) return false;
    return true;
  }

  /** Sets what is nothing to rounding to nothing. */
  forget(): void {
    this.P.fill(0);
  }

  /** Shift, and sign·lead in the first column: P + lead r′ + r lead′ + p lead lead′ with r the first row of the P left behind. */
  private move(lead: SparsePolynomial, sign: 1 | -1): void {
    const { P, m, row, head } = this;
    const variance = row[head]!;
    for (let b = 0; b < head; b++) P[head * m + b] = 0;
    for (let a = head; a < m; a++) P[a * m + head] = 0;
    row[head] = 0;
    this.head = head + 1 === m ? 0 : head + 1;
    const { lags, values } = lead;
    for (let i = 0; i < lags.length; i++) {
      let a = head + lags[i]!;
      if (a >= m) a -= m;
      addCross(P, m, a, sign * values[i]!, row);
    }
    this.addProduct(lead, variance);
  }

  /** P + scale·v v′ for a sparse v. */
  private addProduct({ lags, values }: SparsePolynomial, scale: number): void {
    const { P, m, head, places } = this;
    for (let i = 0; i < lags.length; i++) {
      const a = head + lags[i]! - 1;
      places[i] = a >= m ? a - m : a;
    }
    for (let i = 0; i < lags.length; i++) {
      const a = places[i]!;
      const own = scale * values[i]!;
      for (let j = 0; j < lags.length; j++) if (places[j]! <= a) P[a * m + places[j]!]! += own * values[j]!;
    }
  }
}

/** Row and column a of P + scale·(u r′ + r u′) with u the a-th unit vector. */
function addCross(P: Float64Array, m: number, a: number, scale: number, row: Float64Array): void {
  const base = a * m;
  for (let b = 0; b < a; b++) P[base + b]! += scale * row[b]!;
  P[base + a]! += 2 * scale * row[a]!;
  for (let b = a + 1, at = base + m + a; b < m; b++, at += m) P[at]! += scale * row[b]!;
}
