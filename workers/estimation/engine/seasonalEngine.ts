import type { Order } from '../../contract/candidate.ts';
import { sparsePolynomial, type Factors, type SparsePolynomial } from '../../model/expandPolynomials.ts';
import { dot, padded } from './fastEngine.ts';
import type { PulseHost } from './gapPulses.ts';
import { SeasonalStart } from './seasonalStart.ts';
import { shortRecursion } from './shortRecursion.ts';
import { steadyRecursion } from './steadyRecursion.ts';

/** Beyond this ratio of the steady sum of squares to the exact one, its subtraction costs too many digits. */
const CANCELLATION = 1e5;
/** Shortest season for which the work by phases is worth its while, measured. */
const SHORTEST = 12;

/** The polynomials of a model, factor by factor. */
export interface SparseFactors {
  readonly ar: SparsePolynomial;
  readonly ma: SparsePolynomial;
  readonly seasonalAr: SparsePolynomial;
  readonly seasonalMa: SparsePolynomial;
}

/**
 * The fast engine of multiplicative seasonal models, for a record without gaps: the regular recursion, then the seasonal one, and a
 * correction for the unknown past whose cost does not grow with the season (see `SeasonalStart`).
 */
export class SeasonalEngine implements PulseHost {
  readonly kind = 'fast';
  readonly count: number;
  readonly cross: Float64Array;
  readonly observed: number;
  readonly pad: number;
  readonly start: SeasonalStart;
  readonly series: readonly Float64Array[];
  logDeterminant = 0;
  /** D′e⁰, R′e⁰ and Q′B₀⁻¹e⁰ of each series. */
  readonly byPhase: readonly Float64Array[];
  readonly reduced: readonly Float64Array[];
  sparse: SparseFactors = { ar: NONE, ma: NONE, seasonalAr: NONE, seasonalMa: NONE };
  private readonly between: Float64Array;
  readonly innovations: readonly Float64Array[];
  private readonly byResponse: Float64Array;

  /** Whether a record of n values under this order is for this engine. */
  static fits({ p, q, P, Q, s }: Order, n: number): boolean {
    const M = Math.max(P, Q);
    return M > 0 && s >= SHORTEST && s > Math.max(p, q) + 1 && n >= s * (M + 2);
  }

  /** @param series the differenced record and its columns, all of length n, no gaps; @param flat as in `FastEngine` */
  constructor(
    series: readonly Float64Array[],
    order: Order,
    readonly flat = 0,
  ) {
    const { p, q, P, Q, s } = order;
    const n = series[0]!.length;
    this.observed = n;
    this.pad = Math.max(p, q, s * P, s * Q);
    this.count = series.length;
    this.cross = new Float64Array(this.count ** 2);
    this.start = new SeasonalStart(n, p, q, P, Q, s);
    this.series = series.map((values) => padded(values, this.pad));
    this.between = new Float64Array(n + this.pad);
    this.innovations = series.map(() => new Float64Array(n + this.pad));
    this.byPhase = series.map(() => new Float64Array(this.start.size));
    this.reduced = series.map(() => new Float64Array(2 * this.start.g));
    this.byResponse = new Float64Array(this.start.g);
  }

  /** False where the AR part is not stationary, where rounding has eaten the answer, or where another engine must do. */
  evaluate(factors: Factors, s: number): boolean {
    const { start, count, pad, observed: n, innovations } = this;
    if (!this.settle(factors, s)) return false;
    this.logDeterminant = start.logDeterminant;
    for (let i = 0; i < count; i++) {
      const e = innovations[i]!;
      this.filter(this.series[i]!, e);
      this.look(e, this.byPhase[i]!, this.reduced[i]!);
    }
    let sane = true;
    for (let i = 0; i < count; i++) {
      for (let j = 0; j <= i; j++) {
        const steady = dot(innovations[i]!, innovations[j]!, pad, pad + n);
        const exact =
          steady - start.weighted(this.byPhase[i]!, this.byPhase[j]!) - this.bend(this.reduced[i]!, this.reduced[j]!);
        this.cross[i * count + j] = exact;
        this.cross[j * count + i] = exact;
        if (i === j && !(steady <= CANCELLATION * exact)) sane = steady === 0 && sane;
      }
    }
    return sane;
  }

  get pastReach(): number {
    return this.start.response.furthest;
  }

  settle(factors: Factors, s: number): boolean {
    this.sparse = sparseFactors(factors, s);
    return this.start.prepare(factors);
  }

  /** D′e⁰, then Q′B₀⁻¹e⁰. */
  past(e: Float64Array): Float64Array {
    const { size, g } = this.start;
    const both = new Float64Array(size + 2 * g);
    this.look(e, both.subarray(0, size), both.subarray(size));
    return both;
  }

  pastOf(i: number): Float64Array {
    const both = new Float64Array(this.start.size + 2 * this.start.g);
    both.set(this.byPhase[i]!);
    both.set(this.reduced[i]!, this.start.size);
    return both;
  }

  pastProduct(a: Float64Array, b: Float64Array): number {
    const { size } = this.start;
    return this.start.weighted(a, b) + this.bend(a.subarray(size), b.subarray(size));
  }

  /** Innovations of padded values started from nothing. */
  filter(x: Float64Array, e: Float64Array): void {
    const { pad, observed: n, sparse } = this;
    const u = sparse.seasonalAr.lags.length > 0 ? this.between : e;
    regularRecursion(x, u, pad, n, sparse);
    steadyRecursion(u, e, pad, n, sparse.seasonalAr, sparse.seasonalMa);
  }

  private look(e: Float64Array, byPhase: Float64Array, reduced: Float64Array): void {
    const { start, pad } = this;
    start.response.fold(e, pad, byPhase);
    start.correlate(e, pad, this.byResponse);
    start.reduce(byPhase, this.byResponse, reduced);
  }

  /** a′(J⁻¹ + Q′B₀⁻¹Q)⁻¹b. */
  private bend(a: Float64Array, b: Float64Array): number {
    const { inner, g } = this.start;
    let sum = 0;
    for (let i = 0; i < 2 * g; i++) for (let j = 0; j < 2 * g; j++) sum += a[i]! * inner[i * 2 * g + j]! * b[j]!;
    return sum;
  }
}

const NONE = sparsePolynomial(new Float64Array(0));
const sums = new Float64Array(2);

/** u from w by φ and θ alone, started from nothing. */
export function regularRecursion(
  w: Float64Array,
  u: Float64Array,
  pad: number,
  n: number,
  sparse: SparseFactors,
): void {
  if (!shortRecursion(w, u, pad, n, sparse.ar, sparse.ma, n, sums)) steadyRecursion(w, u, pad, n, sparse.ar, sparse.ma);
}

function sparseFactors(factors: Factors, s: number): SparseFactors {
  const plain = (values: ArrayLike<number>) => sparsePolynomial(Float64Array.from(values));
  const spread = (values: ArrayLike<number>) => {
    const { lags, values: kept, degree } = plain(values);
    return { lags: lags.map((lag) => lag * s), values: kept, degree: degree * s };
  };
  return {
    ar: plain(factors.ar),
    ma: plain(factors.ma),
    seasonalAr: spread(factors.seasonalAr),
    seasonalMa: spread(factors.seasonalMa),
  };
}
