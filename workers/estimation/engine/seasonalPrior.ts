import { autocovariances } from '../../model/autocovariances.ts';
import type { Factors } from '../../model/expandPolynomials.ts';
import { startCovariance } from './startCovariance.ts';

/** A weight below this beside 1 is nothing. */
const NOTHING = 1e-19;
/**
 * Impulse responses longer than this, or than so many squared seasons, are not summed: where both AR factors are so near to the circle,
 * another engine is cheaper.
 */
const LONGEST = 60_000;
const SQUARED_SEASONS = 10;

/**
 * Covariance of what the past puts into the two recursions of a multiplicative seasonal model, unit innovation variance.
 *
 * With u = Θ(Bˢ)/Φ(Bˢ) e, s processes in one, each a short ARMA from season to season, and w = θ(B)/φ(B) u:
 * γ_t = Σ_{i>t} φ_i w_{t−i} + Σ_{j>t} θ_j u_{t−j} (t = 0…g−1, g = max(p, q)) is what the past puts into u, and
 * α_{rk} = Σ_{i>r} Φ_i u_{k+(r−i)s} + Σ_{j>r} Θ_j e_{k+(r−j)s} (r = 0…M−1, M = max(P, Q); phase k = 0…s−1) into e.
 * Cov(α) is the same for every phase and nothing between phases. Sums over impulse responses give the rest.
 */
export class SeasonalPrior {
  readonly g: number;
  readonly M: number;
  /** Cov(α) of one phase, M×M. */
  readonly seasonal: Float64Array;
  /** Cov(γ), g×g. */
  readonly regular: Float64Array;
  /** Cov(γ_t, α_{rk}) at t·sM + r·s + k. */
  readonly mixed: Float64Array;
  private impulse = new Float64Array(0);

  constructor(
    p: number,
    q: number,
    P: number,
    Q: number,
    private readonly s: number,
  ) {
    this.g = Math.max(p, q);
    this.M = Math.max(P, Q);
    this.seasonal = new Float64Array(this.M ** 2);
    this.regular = new Float64Array(this.g ** 2);
    this.mixed = new Float64Array(this.g * s * this.M);
  }

  /** False where an AR factor is not stationary, or the sums are too long. */
  set(factors: Factors): boolean {
    const { s, g, M } = this;
    const ar = trimmed(factors.ar);
    const ma = Float64Array.from(factors.ma);
    const seasonalAr = trimmed(factors.seasonalAr);
    const seasonalMa = Float64Array.from(factors.seasonalMa);
    if (M > 0) {
      const order = Math.max(seasonalAr.length, seasonalMa.length);
      this.seasonal.fill(0);
      const own = new Float64Array(order * order);
      if (order > 0 && !startCovariance(seasonalAr, seasonalMa, order, own)) return false;
      for (let i = 0; i < order; i++) for (let j = 0; j < order; j++) this.seasonal[i * M + j] = own[i * order + j]!;
    }
    this.regular.fill(0);
    this.mixed.fill(0);
    if (g === 0) return true;
    const seasons = this.seasonsOf(seasonalAr, seasonalMa, ar, ma);
    if (seasons === null) return false;
    const { covariances, impulse, count } = seasons;
    const response = autocovariances(ar, ma, count * s + g);
    if (response === null) return false;
    this.fillRegular(ar, ma, covariances, count, impulse, response);
    this.fillMixed(ar, ma, seasonalAr, covariances, count, impulse);
    return true;
  }

  /** Autocovariances of u from season to season, the impulse response of θ/φ, and the seasons after which their product is nothing. */
  private seasonsOf(seasonalAr: Float64Array, seasonalMa: Float64Array, ar: Float64Array, ma: Float64Array) {
    const { s, g, M } = this;
    const most = Math.ceil(Math.min(LONGEST / s, SQUARED_SEASONS * s)) + M + 1;
    const finite = seasonalAr.length === 0;
    let count = finite ? seasonalMa.length : 32;
    let covariances: Float64Array | null;
    for (;;) {
      covariances = autocovariances(seasonalAr, seasonalMa, count + 2 * M + 1);
      if (covariances === null) return null;
      if (finite || count >= most) break;
      const settled = lastOf(covariances, M);
      if (settled <= count) {
        count = settled;
        break;
      }
      count = Math.min(most, 2 * count);
    }
    const length = (count + 2) * s + g + 1;
    if (this.impulse.length < length) this.impulse = new Float64Array(length);
    const { impulse } = this;
    const last = respond(ar, ma, impulse, length, g);
    impulse.fill(0, last + 1, Math.min(length, last + 1 + 3 * (s + g)));
    count = Math.min(count, Math.ceil((last + g) / s) + 1);
    if (count < most) return { covariances, impulse, count };
    const left = Math.abs(covariances[count]! / covariances[0]!) * Math.abs(impulse[count * s]!);
    return left < NOTHING ? { covariances, impulse, count } : null;
  }

  /** A Cov(w_{−1}…w_{−p}, u_{−1}…u_{−q}) A′, row t of A: φ_{t+a} for w_{−a}, θ_{t+b} for u_{−b}. */
  private fillRegular(
    ar: Float64Array,
    ma: Float64Array,
    seasonal: Float64Array,
    count: number,
    impulse: Float64Array,
    response: Float64Array,
  ): void {
    const { g, s, regular } = this;
    const p = ar.length;
    const q = ma.length;
    const size = p + q;
    const own = new Float64Array(g);
    for (let l = 0; l < p; l++) {
      let sum = seasonal[0]! * response[l]!;
      for (let j = 1; j <= count; j++)
        sum += seasonal[j]! * (response[Math.abs(l - j * s)]! + (response[l + j * s] ?? 0));
      own[l] = sum;
    }
    // Cov(w_t, u_{t+l}) = Σ_J ψ_{Js−l} Cov(u_t, u_{t+Js}).
    const between = (l: number) => {
      let sum = 0;
      for (let j = l > 0 ? 1 : 0; j <= count; j++) sum += impulse[j * s - l]! * seasonal[j]!;
      return sum;
    };
    const matrix = new Float64Array(size * size);
    for (let a = 0; a < p; a++) for (let b = 0; b < p; b++) matrix[a * size + b] = own[Math.abs(a - b)]!;
    for (let a = 0; a < p; a++) {
      for (let b = 0; b < q; b++) {
        const value = between(a - b);
        matrix[a * size + p + b] = value;
        matrix[(p + b) * size + a] = value;
      }
    }
    for (let b = 0; b < q; b++) matrix[(p + b) * size + p + b] = seasonal[0]!;
    const weight = (t: number, i: number) => (i < p ? (ar[t + i] ?? 0) : (ma[t + i - p] ?? 0));
    for (let t = 0; t < g; t++) {
      for (let v = 0; v <= t; v++) {
        let sum = 0;
        for (let i = 0; i < size; i++) {
          let inner = 0;
          for (let j = 0; j < size; j++) inner += matrix[i * size + j]! * weight(v, j);
          sum += weight(t, i) * inner;
        }
        regular[t * g + v] = sum;
        regular[v * g + t] = sum;
      }
    }
  }

  private fillMixed(
    ar: Float64Array,
    ma: Float64Array,
    seasonalAr: Float64Array,
    covariances: Float64Array,
    count: number,
    impulse: Float64Array,
  ): void {
    const { g, s, M, mixed } = this;
    const p = ar.length;
    const q = ma.length;
    const along = new Float64Array(count + 1);
    // S(x) = Σ_j ψ_{x+js} Cov(u of j + 1 seasons ago, α_r) at places x + p − 1, x = 1 − p…s − 1.
    const sums = new Float64Array(s + p);
    for (let r = 0; r < M; r++) {
      for (let j = 0; j <= count; j++) {
        let value = covariances[r + j + 1] ?? 0;
        for (let i = 1; i <= Math.min(r, seasonalAr.length); i++)
          value -= seasonalAr[i - 1]! * (covariances[r - i + j + 1] ?? 0);
        along[j] = value;
      }
      if (p > 0) {
        for (let x = 1 - p; x < s; x++) {
          let sum = 0;
          if (x <= q) for (let j = x < 0 ? 1 : 0; j <= count; j++) sum += impulse[x + j * s]! * along[j]!;
          else for (let i = 1; i <= p; i++) sum += ar[i - 1]! * sums[x - i + p - 1]!;
          sums[x + p - 1] = sum;
        }
      }
      for (let t = 0; t < g; t++) {
        const base = (t * M + r) * s;
        for (let a = 1; t + a <= p; a++) {
          const value = ar[t + a - 1]!;
          for (let k = 0; k < s; k++) mixed[base + k]! += value * sums[s - k - a + p - 1]!;
        }
        for (let b = 1; t + b <= q; b++) mixed[base + s - b]! += ma[t + b - 1]! * along[0]!;
      }
    }
  }
}

/** Place of the last value that is something beside the first, if more than `most` nothings follow it; else infinite. */
function lastOf(covariances: Float64Array, most: number): number {
  let last = covariances.length - 1;
  while (last > 0 && Math.abs(covariances[last]!) < NOTHING * covariances[0]!) last--;
  return last < covariances.length - 1 - most ? last : Infinity;
}

/** Fills ψ of θ(B)/φ(B) and returns the place of the last weight that is something. */
function respond(ar: Float64Array, ma: Float64Array, impulse: Float64Array, length: number, g: number): number {
  let quiet = 0;
  for (let t = 0; t < length; t++) {
    let now = t === 0 ? 1 : (ma[t - 1] ?? 0);
    for (let i = 1; i <= Math.min(ar.length, t); i++) now += ar[i - 1]! * impulse[t - i]!;
    impulse[t] = now;
    quiet = Math.abs(now) < NOTHING ? quiet + 1 : 0;
    if (quiet > g + 1 && t > g) return t;
  }
  return length - 1;
}

/** Without zeros at the end. */
function trimmed(coefficients: ArrayLike<number>): Float64Array {
  let length = coefficients.length;
  while (length > 0 && coefficients[length - 1] === 0) length--;
  return Float64Array.from({ length }, (_, i) => coefficients[i]!);
}
