import { cholesky } from '../../numeric/cholesky.ts';
import type { SparsePolynomial } from '../../model/expandPolynomials.ts';
import { startCovariance } from './startCovariance.ts';

/** A weight of the impulse response below this, for as many steps as the MA order, is nothing to rounding. */
const NOTHING = 1e-19;

/**
 * What the unknown past does to the exact likelihood of n values.
 *
 * With e = e⁰ + H g (e⁰: the recursion started from nothing; H: lower-triangular Toeplitz of the impulse response h of 1/θ(B);
 * g ~ N(0, C), see `startCovariance`) the covariance of e⁰ is I + H C H′, hence with G = H′H = L L′ and M = I + L′C L
 * ln |V| = ln |M|, and e⁰′V⁻¹e⁰ = e⁰′e⁰ − y′y + y′M⁻¹y with y = L⁻¹H′e⁰. No matrix is inverted that can be singular: M ≥ 1.
 * Source: the Galbraith & Galbraith (1974, J. Appl. Prob. 11) and Ljung & Box (1979, Biometrika 66, 265–270) form of the
 * likelihood, arranged so that it holds for MA roots on the circle.
 */
export class StartEffect {
  readonly m: number;
  /** H′H factor L, lower, row-major. */
  readonly gram: Float64Array;
  /** Factor of M. */
  readonly mixed: Float64Array;
  readonly covariance: Float64Array;
  /** Impulse response of 1/θ(B) up to `reach`. */
  readonly impulse: Float64Array;
  /** Steps after which the past has no effect to rounding; at most n. */
  reach = 0;
  logDeterminant = 0;
  private readonly product: Float64Array;

  constructor(
    private readonly n: number,
    order: number,
  ) {
    this.m = Math.min(order, n);
    const size = this.m * this.m;
    this.gram = new Float64Array(size);
    this.mixed = new Float64Array(size);
    this.covariance = new Float64Array(size);
    this.product = new Float64Array(size);
    this.impulse = new Float64Array(n);
  }

  /** Sets everything for the given polynomials; false where the AR part is not stationary. */
  prepare(ar: Float64Array, ma: Float64Array, sparseMa: SparsePolynomial): boolean {
    const { m, gram, covariance } = this;
    this.logDeterminant = 0;
    this.reach = 0;
    if (m === 0) return true;
    if (!startCovariance(ar, ma, m, covariance)) return false;
    this.respond(sparseMa);
    this.fillGram();
    if (!cholesky(gram, m)) return false;
    this.fillMixed();
    if (!cholesky(this.mixed, m)) return false;
    for (let i = 0; i < m; i++) this.logDeterminant += 2 * Math.log(this.mixed[i * m + i]!);
    return true;
  }

  /** y = L⁻¹ b in place. */
  whiten(b: Float64Array): void {
    forward(this.gram, this.m, b);
  }

  /** v = R⁻¹ y in place, with M = R R′. */
  shrink(y: Float64Array): void {
    forward(this.mixed, this.m, y);
  }

  private respond({ lags, values, degree }: SparsePolynomial): void {
    const { impulse, n } = this;
    let quiet = 0;
    for (let t = 0; t < n; t++) {
      let now = t === 0 ? 1 : 0;
      for (let k = 0; k < lags.length; k++) {
        const lag = lags[k]!;
        if (lag > t) break;
        now -= values[k]! * impulse[t - lag]!;
      }
      impulse[t] = now;
      quiet = Math.abs(now) < NOTHING ? quiet + 1 : 0;
      if (quiet > degree) {
        impulse.fill(0, t + 1, Math.min(n, t + 1 + this.m));
        this.reach = t + 1;
        return;
      }
    }
    this.reach = n;
  }

  private fillGram(): void {
    const { m, n, impulse: h, gram, reach } = this;
    for (let j = 0; j < m; j++) {
      let sum = 0;
      const last = Math.min(n - j, reach);
      for (let k = 0; k < last; k++) sum += h[k]! * (h[k + j] ?? 0);
      gram[j * m] = sum;
    }
    const at = (k: number) => (k < reach ? h[k]! : 0);
    for (let i = 1; i < m; i++) {
      for (let j = i; j < m; j++) gram[j * m + i] = gram[(j - 1) * m + i - 1]! - at(n - j) * at(n - i);
    }
  }

  /** M = I + L′ C L, lower triangle. */
  private fillMixed(): void {
    const { m, gram, covariance, product, mixed } = this;
    for (let i = 0; i < m; i++) {
      for (let j = 0; j < m; j++) {
        let sum = 0;
        for (let k = j; k < m; k++) sum += covariance[i * m + k]! * gram[k * m + j]!;
        product[i * m + j] = sum;
      }
    }
    for (let i = 0; i < m; i++) {
      for (let j = 0; j <= i; j++) {
        let sum = i === j ? 1 : 0;
        for (let k = i; k < m; k++) sum += gram[k * m + i]! * product[k * m + j]!;
        mixed[i * m + j] = sum;
      }
    }
  }
}

function forward(factor: Float64Array, m: number, b: Float64Array): void {
  for (let i = 0; i < m; i++) {
    let sum = b[i]!;
    for (let k = 0; k < i; k++) sum -= factor[i * m + k]! * b[k]!;
    b[i] = sum / factor[i * m + i]!;
  }
}

/** x = L′⁻¹ y in place for a lower factor L. */
export function backward(factor: Float64Array, m: number, y: Float64Array): void {
  for (let i = m - 1; i >= 0; i--) {
    let sum = y[i]!;
    for (let k = i + 1; k < m; k++) sum -= factor[k * m + i]! * y[k]!;
    y[i] = sum / factor[i * m + i]!;
  }
}
