import { sparsePolynomial, type SparsePolynomial } from '../../model/expandPolynomials.ts';
import type { Engine } from './engine.ts';
import { StartEffect } from './startEffect.ts';
import { adjointRecursion, steadyRecursion } from './steadyRecursion.ts';

/** Beyond this ratio of the steady sum of squares to the exact one, its subtraction costs too many digits. */
const CANCELLATION = 1e5;

/**
 * The fast engine, for a record without gaps: the steady recursion over the whole record and a correction for the unknown
 * past (see `StartEffect`), O(n·(p+q)) with sparse polynomials.
 *
 * The correction needs the innovations only up to the step where the past has no effect to rounding, which the impulse
 * response of 1/θ(B) tells; with an MA root on the circle that is the whole record.
 */
export class FastEngine implements Engine {
  readonly kind = 'fast';
  readonly count: number;
  readonly cross: Float64Array;
  readonly observed: number;
  logDeterminant = 0;
  /** Zeros in front of every series. */
  readonly pad: number;
  readonly start: StartEffect;
  /** Padded series, and their innovations started from nothing. */
  readonly series: readonly Float64Array[];
  readonly innovations: readonly Float64Array[];
  /** y = L⁻¹H′e⁰ and v = R⁻¹y of each series. */
  readonly whitened: readonly Float64Array[];
  readonly shrunk: readonly Float64Array[];
  private readonly adjoint: Float64Array;
  sparseAr: SparsePolynomial = sparsePolynomial(new Float64Array(0));
  sparseMa: SparsePolynomial = sparsePolynomial(new Float64Array(0));

  /**
   * @param series the differenced record and its columns, all of length n, no gaps
   * @param p degree of the multiplied-out AR polynomial; @param q of the MA polynomial
   */
  constructor(
    series: readonly Float64Array[],
    p: number,
    q: number,
    /** How many columns behind the record stand for missing readings, whose values have a flat prior. */
    readonly flat = 0,
  ) {
    const n = series[0]!.length;
    this.observed = n;
    this.pad = Math.max(p, q);
    this.count = series.length;
    this.cross = new Float64Array(this.count ** 2);
    this.start = new StartEffect(n, this.pad);
    this.series = series.map((values) => padded(values, this.pad));
    this.innovations = series.map(() => new Float64Array(n + this.pad));
    this.whitened = series.map(() => new Float64Array(this.start.m));
    this.shrunk = series.map(() => new Float64Array(this.start.m));
    this.adjoint = new Float64Array(n + 2 * this.pad);
  }

  evaluate(ar: Float64Array, ma: Float64Array): boolean {
    const { start, pad, observed: n, count } = this;
    this.sparseAr = sparsePolynomial(ar);
    this.sparseMa = sparsePolynomial(ma);
    if (!start.prepare(ar, ma, this.sparseMa)) return false;
    this.logDeterminant = start.logDeterminant;
    for (let i = 0; i < count; i++) {
      const e = this.innovations[i]!;
      steadyRecursion(this.series[i]!, e, pad, n, this.sparseAr, this.sparseMa);
      this.correct(i, e);
    }
    let sane = true;
    for (let i = 0; i < count; i++) {
      for (let j = 0; j <= i; j++) {
        const steady = dot(this.innovations[i]!, this.innovations[j]!, pad, pad + n);
        const y = dot(this.whitened[i]!, this.whitened[j]!, 0, start.m);
        const exact = steady - y + dot(this.shrunk[i]!, this.shrunk[j]!, 0, start.m);
        this.cross[i * count + j] = exact;
        this.cross[j * count + i] = exact;
        if (i === j && !(steady <= CANCELLATION * exact)) sane = steady === 0 && sane;
      }
    }
    return sane;
  }

  private correct(i: number, e: Float64Array): void {
    const { start, pad, adjoint, observed: n } = this;
    if (start.m === 0) return;
    const steps = Math.min(n, start.reach + start.m);
    adjointRecursion(e, adjoint, pad, steps, this.sparseMa);
    const y = this.whitened[i]!;
    for (let k = 0; k < start.m; k++) y[k] = adjoint[pad + k]!;
    start.whiten(y);
    const v = this.shrunk[i]!;
    v.set(y);
    start.shrink(v);
  }
}

function padded(values: Float64Array, pad: number): Float64Array {
  const result = new Float64Array(values.length + pad);
  result.set(values, pad);
  return result;
}

/** Σ a_t b_t over [from, to), four partial sums. */
export function dot(a: Float64Array, b: Float64Array, from: number, to: number): number {
  let s0 = 0;
  let s1 = 0;
  let s2 = 0;
  let s3 = 0;
  let t = from;
  for (; t + 3 < to; t += 4) {
    s0 += a[t]! * b[t]!;
    s1 += a[t + 1]! * b[t + 1]!;
    s2 += a[t + 2]! * b[t + 2]!;
    s3 += a[t + 3]! * b[t + 3]!;
  }
  for (; t < to; t++) s0 += a[t]! * b[t]!;
  return s0 + s1 + (s2 + s3);
}
