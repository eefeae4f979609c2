import type { Order, Parameters, ZeroLags } from '../../contract/candidate.ts';
import { inversePartialMap, partialMap } from './partialMap.ts';

/** Coefficients of the four factors; the arrays are views of `all`, in the order φ, θ, Φ, Θ. */
export interface Coefficients {
  readonly all: Float64Array;
  readonly ar: Float64Array;
  readonly ma: Float64Array;
  readonly seasonalAr: Float64Array;
  readonly seasonalMa: Float64Array;
}

/**
 * One factor of the model in the search. `partial`: its coordinates are partial autocorrelations; `direct`: it has
 * lags held at zero, and its coordinates are the coefficients that are not.
 */
interface Factor {
  readonly kind: 'partial' | 'direct';
  readonly ma: boolean;
  readonly seasonal: boolean;
  /** +1: coefficients are those of 1 − Σ; −1: of 1 + Σ. */
  readonly sign: 1 | -1;
  readonly at: number;
  readonly coefficients: Float64Array;
  /** Index in `coefficients` of each coordinate. */
  readonly lags: readonly number[];
  readonly start: number;
  readonly partials: Float64Array;
  readonly signed: Float64Array;
  readonly jacobian: Float64Array;
}

/** AR partial autocorrelations nearer to ±1 than this are outside: there the stationary likelihood does not exist. */
const AR_MARGIN = 1e-7;

/**
 * The space searched: one coordinate for each coefficient to be estimated. Coordinates of a factor without zero lags
 * are its partial autocorrelations, so that the box [−1, 1] is exactly the stationary (invertible) set; the faces ±1 of
 * the MA coordinates are models with MA roots on the unit circle.
 */
export class SearchSpace {
  readonly dimension: number;
  readonly coefficients: Coefficients;
  private readonly factors: readonly Factor[];

  constructor(order: Order, zeroLags: ZeroLags) {
    this.coefficients = coefficientsOf([order.p, order.q, order.P, order.Q]);
    const { ar, ma, seasonalAr, seasonalMa } = this.coefficients;
    let dimension = 0;
    const factor = (coefficients: Float64Array, zero: readonly number[], isMa: boolean, seasonal: boolean): Factor => {
      const p = coefficients.length;
      const lags = Array.from({ length: p }, (_, i) => i).filter((i) => !zero.includes(i + 1));
      const start = dimension;
      dimension += lags.length;
      return {
        kind: lags.length === p ? 'partial' : 'direct',
        ma: isMa,
        seasonal,
        sign: isMa ? -1 : 1,
        at: (coefficients.byteOffset - this.coefficients.all.byteOffset) / 8,
        coefficients,
        lags,
        start,
        partials: new Float64Array(p),
        signed: new Float64Array(p),
        jacobian: new Float64Array(p * p),
      };
    };
    this.factors = [
      factor(ar, zeroLags.ar, false, false),
      factor(ma, zeroLags.ma, true, false),
      factor(seasonalAr, zeroLags.seasonalAr, false, true),
      factor(seasonalMa, zeroLags.seasonalMa, true, true),
    ].filter((each) => each.coefficients.length > 0);
    this.dimension = dimension;
  }

  /**
   * Sets `coefficients` to the model at `x`. Returns false outside the space: |r| too near 1 for an AR factor, above 1
   * for an MA one, or coefficients of a factor with zero lags that are not stationary (invertible).
   */
  place(x: ArrayLike<number>): boolean {
    for (const factor of this.factors) {
      const { coefficients, lags, start, partials, signed, sign } = factor;
      if (factor.kind === 'partial') {
        const most = factor.ma ? 1 : 1 - AR_MARGIN;
        for (let i = 0; i < partials.length; i++) {
          const r = x[start + i]!;
          if (!(Math.abs(r) <= most)) return false;
          partials[i] = r;
        }
        partialMap(partials, signed, factor.jacobian);
        for (let i = 0; i < partials.length; i++) coefficients[i] = sign * signed[i]!;
      } else {
        for (let i = 0; i < lags.length; i++) coefficients[lags[i]!] = x[start + i]!;
        for (let i = 0; i < signed.length; i++) signed[i] = sign * coefficients[i]!;
        if (!inversePartialMap(signed, partials)) return false;
        if (!factor.ma && partials.some((r) => Math.abs(r) > 1 - AR_MARGIN)) return false;
      }
    }
    return true;
  }

  /** Gradient with respect to the coordinates from that with respect to all coefficients, at the last place. */
  pullBack(coefficientGradient: Float64Array, gradient: Float64Array): void {
    for (const { kind, at, lags, start, sign, jacobian, partials } of this.factors) {
      const p = partials.length;
      for (let m = 0; m < lags.length; m++) {
        let sum = 0;
        if (kind === 'direct') sum = coefficientGradient[at + lags[m]!]!;
        else for (let j = 0; j < p; j++) sum += sign * coefficientGradient[at + j]! * jacobian[j * p + m]!;
        gradient[start + m] = sum;
      }
    }
  }

  /**
   * Coordinates of a model given by coefficients, which may be shorter than this space's (missing ones count as 0) and
   * may lie outside it: roots are then drawn in, all by the same factor, until they are not.
   */
  locate(given: Pick<Parameters, 'ar' | 'ma' | 'seasonalAr' | 'seasonalMa'>): Float64Array {
    const x = new Float64Array(this.dimension);
    const parts = [given.ar, given.ma, given.seasonalAr, given.seasonalMa];
    const own = Object.values(this.coefficients).slice(1) as Float64Array[];
    for (const factor of this.factors) {
      const { lags, start, signed, partials, sign } = factor;
      const part = parts[own.indexOf(factor.coefficients)]!;
      const length = signed.length;
      for (let attempt = 0; attempt < 200; attempt++) {
        const shrink = attempt < 3 ? 1 - attempt * 1e-4 : 0.97 ** (attempt - 2);
        for (let i = 0; i < length; i++) {
          const kept = factor.kind === 'partial' || lags.includes(i) ? (part[i] ?? 0) : 0;
          signed[i] = sign * kept * shrink ** (i + 1);
        }
        if (inversePartialMap(signed, partials)) break;
      }
      for (let i = 0; i < lags.length; i++) {
        x[start + i] = factor.kind === 'partial' ? partials[i]! : sign * signed[lags[i]!]!;
      }
    }
    return x;
  }

  /** Whether `coefficients` as they stand are stationary and invertible, strictly. */
  isInside(): boolean {
    return this.factors.every(({ coefficients, signed, partials, sign }) => {
      for (let i = 0; i < signed.length; i++) signed[i] = sign * coefficients[i]!;
      return inversePartialMap(signed, partials);
    });
  }

  /** Indices into `coefficients.all` of the coefficients that are estimated, in order. */
  estimated(): number[] {
    return this.factors.flatMap(({ at, lags }) => lags.map((lag) => at + lag));
  }

  /** True where coordinate i is a partial autocorrelation of an MA factor, which may lie on ±1. */
  mayReachCircle(i: number): boolean {
    const factor = this.factorOf(i);
    return factor.ma && factor.kind === 'partial';
  }

  /** True where coordinate i is a partial autocorrelation, searched through its Fisher transform. */
  isPartial(i: number): boolean {
    return this.factorOf(i).kind === 'partial';
  }

  /** True where coordinate i is a partial autocorrelation of an AR factor. */
  isAr(i: number): boolean {
    const factor = this.factorOf(i);
    return !factor.ma && factor.kind === 'partial';
  }

  isSeasonal(i: number): boolean {
    return this.factorOf(i).seasonal;
  }

  /**
   * Faces of the space worth a search of their own: a real MA root at +1 or −1 (first partial ±1) or a complex pair on
   * the circle (second partial −1). Each is one coordinate and the value it is held at.
   */
  faces(): { readonly coordinate: number; readonly value: 1 | -1 }[] {
    return this.factors.flatMap(({ ma, kind, start, partials }) => {
      if (!ma || kind === 'direct') return [];
      const real = [1, -1].map((value) => ({ coordinate: start, value: value as 1 | -1 }));
      return partials.length > 1 ? [...real, { coordinate: start + 1, value: -1 as const }] : real;
    });
  }

  /** True where coordinate i is the second of its factor: on its face −1 a pair of roots is on the circle. */
  isPairFace(i: number): boolean {
    return this.factorOf(i).start === i - 1;
  }

  /** First of the two coordinates that set a pair of regular AR roots; null where there are no two. */
  arPair(): number | null {
    const factor = this.factors.find(
      ({ ma, seasonal, kind, lags }) => !ma && !seasonal && kind === 'partial' && lags.length > 1,
    );
    return factor?.start ?? null;
  }

  private factorOf(i: number): Factor {
    const found = this.factors.find(({ start, lags }) => i >= start && i < start + lags.length);
    if (found === undefined) throw new RangeError(`The search space has no coordinate ${i}.`);
    return found;
  }
}

function coefficientsOf(lengths: readonly [number, number, number, number]): Coefficients {
  const [p, q, P, Q] = lengths;
  const all = new Float64Array(p + q + P + Q);
  return {
    all,
    ar: all.subarray(0, p),
    ma: all.subarray(p, p + q),
    seasonalAr: all.subarray(p + q, p + q + P),
    seasonalMa: all.subarray(p + q + P),
  };
}
