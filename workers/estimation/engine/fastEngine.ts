import {
  expandPolynomials,
  sparsePolynomial,
  type Factors,
  type SparsePolynomial,
} from '../../model/expandPolynomials.ts';
import type { Engine } from './engine.ts';
import type { PulseHost } from './gapPulses.ts';
import { shortRecursion } from './shortRecursion.ts';
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
export class FastEngine implements Engine, PulseHost {
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
  private readonly constant: readonly boolean[];
  /** Some column but the record is not constant. */
  private readonly varied: boolean;
  /** Σ e² of each series where the recursion gave it, and Σ e over its innovations that were not written. */
  private readonly squares: Float64Array;
  private readonly rests: Float64Array;
  private readonly sums = new Float64Array(2);
  /** Innovations written at the last evaluation. */
  private kept = 0;
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
    this.constant = series.map((values) => values.every((value) => value === values[0]));
    this.varied = this.constant.some((one, i) => i > 0 && !one);
    this.squares = new Float64Array(series.length);
    this.rests = new Float64Array(series.length);
    this.adjoint = new Float64Array(n + 2 * this.pad);
  }

  /** @param whole whether all innovations must be written, as the gradient needs them */
  evaluate(ar: Float64Array, ma: Float64Array, whole = true): boolean {
    const { start, count, observed: n } = this;
    if (!this.prepare(ar, ma)) return false;
    this.logDeterminant = start.logDeterminant;
    this.kept = whole || this.varied ? n : this.settling();
    for (let i = 0; i < count; i++) {
      this.run(i);
      this.correct(this.innovations[i]!, this.whitened[i]!, this.shrunk[i]!);
    }
    let sane = true;
    for (let i = 0; i < count; i++) {
      for (let j = 0; j <= i; j++) {
        const steady = i === j && !Number.isNaN(this.squares[i]!) ? this.squares[i]! : this.product(i, j);
        const y = dot(this.whitened[i]!, this.whitened[j]!, 0, start.m);
        const exact = steady - y + dot(this.shrunk[i]!, this.shrunk[j]!, 0, start.m);
        this.cross[i * count + j] = exact;
        this.cross[j * count + i] = exact;
        if (i === j && !(steady <= CANCELLATION * exact)) sane = steady === 0 && sane;
      }
    }
    return sane;
  }

  get pastReach(): number {
    return this.start.m === 0 ? 0 : this.start.reach + this.start.m;
  }

  settle(factors: Factors, s: number): boolean {
    const { ar, ma } = expandPolynomials(factors, s);
    return this.prepare(ar, ma);
  }

  /** y = L⁻¹H′e⁰, then v = R⁻¹y. */
  past(e: Float64Array): Float64Array {
    const { m } = this.start;
    const both = new Float64Array(2 * m);
    this.correct(e, both.subarray(0, m), both.subarray(m));
    return both;
  }

  pastOf(i: number): Float64Array {
    return Float64Array.of(...this.whitened[i]!, ...this.shrunk[i]!);
  }

  pastProduct(a: Float64Array, b: Float64Array): number {
    const { m } = this.start;
    return dot(a, b, 0, m) - dot(a, b, m, 2 * m);
  }

  /** Innovations of padded values started from nothing. */
  filter(x: Float64Array, e: Float64Array): void {
    const { pad, observed: n, sparseAr, sparseMa, sums } = this;
    if (!shortRecursion(x, e, pad, n, sparseAr, sparseMa, n, sums)) steadyRecursion(x, e, pad, n, sparseAr, sparseMa);
  }

  private prepare(ar: Float64Array, ma: Float64Array): boolean {
    this.sparseAr = sparsePolynomial(ar);
    this.sparseMa = sparsePolynomial(ma);
    return this.start.prepare(ar, ma, this.sparseMa);
  }

  /** Innovations of one series started from nothing; those of a constant no longer change once the past has no effect. */
  private run(i: number): void {
    const { pad, observed: n, squares, rests, sums } = this;
    const e = this.innovations[i]!;
    const w = this.series[i]!;
    const steps = this.settles(i);
    const kept = Math.min(steps, this.kept);
    const short = shortRecursion(w, e, pad, steps, this.sparseAr, this.sparseMa, kept, sums);
    squares[i] = short ? sums[0]! : NaN;
    rests[i] = short && kept < steps ? sums[1]! : NaN;
    if (!short) steadyRecursion(w, e, pad, steps, this.sparseAr, this.sparseMa);
    if (steps === n) return;
    const last = e[pad + steps - 1]!;
    if (this.kept > steps) e.fill(last, pad + steps, pad + n);
    squares[i] += (n - steps) * last * last;
  }

  /** Steps after which the innovations of a constant no longer change to rounding. */
  private settling(): number {
    return Math.min(this.observed, this.start.reach + 2 * this.pad + 1);
  }

  private settles(i: number): number {
    return this.constant[i] === true ? this.settling() : this.observed;
  }

  private product(i: number, j: number): number {
    const { pad, observed: n } = this;
    const [a, b] = this.settles(i) <= this.settles(j) ? [i, j] : [j, i];
    const steps = this.settles(a);
    const x = this.innovations[a]!;
    const y = this.innovations[b]!;
    const head = dot(x, y, pad, pad + steps);
    if (steps === n) return head;
    const last = x[pad + steps - 1]!;
    if (this.settles(b) === steps) return head + (n - steps) * last * y[pad + steps - 1]!;
    return head + last * (Number.isNaN(this.rests[b]!) ? total(y, pad + steps, pad + n) : this.rests[b]!);
  }

  private correct(e: Float64Array, y: Float64Array, v: Float64Array): void {
    const { start, pad, adjoint, observed: n } = this;
    if (start.m === 0) return;
    const steps = Math.min(n, start.reach + start.m);
    adjointRecursion(e, adjoint, pad, steps, this.sparseMa);
    for (let k = 0; k < start.m; k++) y[k] = adjoint[pad + k]!;
    start.whiten(y);
    v.set(y);
    start.shrink(v);
  }
}

/** Values with zeros in front. */
export function padded(values: Float64Array, pad: number): Float64Array {
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

/** Σ a_t over [from, to), four partial sums. */
function total(a: Float64Array, from: number, to: number): number {
  let s0 = 0;
  let s1 = 0;
  let s2 = 0;
  let s3 = 0;
  let t = from;
  for (; t + 3 < to; t += 4) {
    s0 += a[t]!;
    s1 += a[t + 1]!;
    s2 += a[t + 2]!;
    s3 += a[t + 3]!;
  }
  for (; t < to; t++) s0 += a[t]!;
  return s0 + s1 + (s2 + s3);
}
