import type { SparsePolynomial } from '../../model/expandPolynomials.ts';
import { dot } from './fastEngine.ts';
import type { StartEffect } from './startEffect.ts';

/**
 * How ln |V| changes with the polynomials, by the effect of the past.
 *
 * d ln |I + CG| = tr(A dC) + tr(B dG) with A = G(I + CG)⁻¹ = L M⁻¹L′ and B = C(I + GC)⁻¹ = C − CAC (notation of `StartEffect`).
 * G depends on θ alone: with d the impulse response of 1/θ(B)², the one of 1/θ(B) changes by −d_{t−j} with θ_j, hence
 * dG_ab = −Σ_t (d_{t−a−j} h_{t−b} + h_{t−a} d_{t−b−j}), and these sums go down the diagonals by one product each.
 */
export class StartGradient {
  /** A, both triangles. */
  readonly forCovariance: Float64Array;
  private readonly forGram: Float64Array;
  private readonly half: Float64Array;
  private readonly second: Float64Array;

  constructor(
    private readonly n: number,
    private readonly m: number,
  ) {
    this.forCovariance = new Float64Array(m * m);
    this.forGram = new Float64Array(m * m);
    this.half = new Float64Array(m * m);
    this.second = new Float64Array(m === 0 ? 0 : n);
  }

  /** Sets A, and adds −½ ∂ ln |V|/∂θ_j by way of G to `by[j]` for each lag. */
  add(start: StartEffect, ma: SparsePolynomial, lags: readonly number[], by: Float64Array): void {
    this.invert(start);
    if (lags.length === 0) return;
    this.respondTwice(start, ma);
    const { m, n, second: d, forGram } = this;
    const { impulse: h, reach } = start;
    const at = (x: Float64Array, k: number) => (k < reach ? x[k]! : 0);
    const most = lags.reduce((a, b) => Math.max(a, b), 0);
    const least = lags.reduce((a, b) => Math.min(a, b), most);
    for (let shift = least - m + 1; shift < most + m; shift++) {
      const [ahead, behind] = shift >= 0 ? [shift, 0] : [0, -shift];
      let sum = lagged(d, ahead, h, behind, n, reach);
      for (let a = ahead, b = behind; b < m && a < most + m; a++, b++) {
        for (const lag of lags) if (a >= lag && a - lag < m) by[lag]! += forGram[(a - lag) * m + b]! * sum;
        sum -= at(d, n - 1 - a) * at(h, n - 1 - b);
      }
    }
  }

  private invert({ gram: L, mixed: R, covariance: C }: StartEffect): void {
    const { m, half: Y, forCovariance: A, forGram: B } = this;
    // Y = R⁻¹L′, then A = Y′Y.
    for (let j = 0; j < m; j++) {
      for (let i = 0; i < m; i++) {
        let sum = i <= j ? L[j * m + i]! : 0;
        for (let k = 0; k < i; k++) sum -= R[i * m + k]! * Y[k * m + j]!;
        Y[i * m + j] = sum / R[i * m + i]!;
      }
    }
    for (let i = 0; i < m; i++) {
      for (let j = 0; j <= i; j++) {
        let sum = 0;
        for (let k = 0; k < m; k++) sum += Y[k * m + i]! * Y[k * m + j]!;
        A[i * m + j] = sum;
        A[j * m + i] = sum;
      }
    }
    // Y = Y C, then B = C − Y′Y.
    const row = new Float64Array(m);
    for (let i = 0; i < m; i++) {
      for (let j = 0; j < m; j++) {
        let sum = 0;
        for (let k = 0; k < m; k++) sum += Y[i * m + k]! * C[k * m + j]!;
        row[j] = sum;
      }
      Y.set(row, i * m);
    }
    for (let i = 0; i < m; i++) {
      for (let j = 0; j <= i; j++) {
        let sum = C[i * m + j]!;
        for (let k = 0; k < m; k++) sum -= Y[k * m + i]! * Y[k * m + j]!;
        B[i * m + j] = sum;
        B[j * m + i] = sum;
      }
    }
  }

  private respondTwice({ impulse: h, reach }: StartEffect, { lags, values }: SparsePolynomial): void {
    const d = this.second;
    for (let t = 0; t < reach; t++) {
      let now = h[t]!;
      for (let k = 0; k < lags.length; k++) {
        const lag = lags[k]!;
        if (lag > t) break;
        now -= values[k]! * d[t - lag]!;
      }
      d[t] = now;
    }
  }
}

/** Σ_t d_{t−a} h_{t−b} over t < n, with nothing beyond `reach`. One of a, b is 0. */
function lagged(d: Float64Array, a: number, h: Float64Array, b: number, n: number, reach: number): number {
  const shift = a + b;
  const count = Math.min(n - shift, reach - shift);
  if (count <= 0) return 0;
  return a > 0 ? dot(d, h.subarray(shift), 0, count) : dot(d.subarray(shift), h, 0, count);
}
