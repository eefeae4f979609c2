import { sparsePolynomial, type SparsePolynomial } from '../../model/expandPolynomials.ts';
import { integratedAr } from '../../model/integratedAr.ts';
import { dot } from './fastEngine.ts';
import type { Engine } from './engine.ts';
import { PredictorCovariance } from './predictorCovariance.ts';
import { startCovariance } from './startCovariance.ts';
import { StartingDirections } from './startingDirections.ts';
import { steadyStretch } from './steadyRecursion.ts';

/**
 * Called at every step with its index, the errors of all series (in a gap those of a reading of zero), their variance for unit σ²
 * (Infinity where starting values that no reading has fixed yet enter), and whether the reading was seen.
 */
export type FilterSink = (t: number, errors: Float64Array, variance: number, seen: boolean) => void;

/**
 * The Kalman filter, for records with gaps and for differencing across gaps.
 *
 * State: what the past puts into the readings ahead, with the differencing multiplied into the AR part, so that its length is
 * max(p + d + sD, q) (see `PredictorCovariance`). Start: the exact stationary covariance of the ARMA part, and a flat prior on the d + sD values
 * before the record (see `StartingDirections`). Gaps are steps without a reading: nothing is interpolated. Once the past is known
 * to rounding the filter is the steady recursion up to the next gap.
 */
export class GapFilter implements Engine {
  readonly kind: 'filter' | 'diffuse';
  readonly flat = 0;
  readonly count: number;
  readonly cross: Float64Array;
  readonly observed: number;
  logDeterminant = 0;
  private readonly m: number;
  private readonly present: Uint8Array;
  /** State of each series, by place. */
  private readonly states: readonly Float64Array[];
  private readonly covariance: PredictorCovariance;
  private readonly directions: StartingDirections;
  private readonly errors: Float64Array;
  private innovations: Float64Array[] | null = null;

  /**
   * @param series the record (gaps as NaN) and its columns (no gaps), not differenced, all of length n
   * @param p degree of the multiplied-out AR polynomial; @param q of the MA polynomial
   * @param differencing c_0…c_m₀ of the differencing polynomial
   */
  constructor(
    private readonly series: readonly Float64Array[],
    p: number,
    q: number,
    private readonly differencing: Float64Array,
    private readonly sink: FilterSink | null = null,
  ) {
    const record = series[0]!;
    this.present = Uint8Array.from(record, (value) => (Number.isNaN(value) ? 0 : 1));
    this.observed = this.present.reduce((sum, one) => sum + one, 0);
    const starting = differencing.length - 1;
    this.kind = starting > 0 ? 'diffuse' : 'filter';
    this.m = Math.max(p + starting, q, 1);
    this.count = series.length;
    this.cross = new Float64Array(this.count ** 2);
    this.states = series.map(() => new Float64Array(this.m));
    this.covariance = new PredictorCovariance(this.m);
    this.directions = new StartingDirections(this.m, differencing);
    this.errors = new Float64Array(this.count);
  }

  evaluate(ar: Float64Array, ma: Float64Array): boolean {
    const { covariance, directions, count, errors, cross } = this;
    const alpha = sparsePolynomial(integratedAr(ar, this.differencing));
    const theta = sparsePolynomial(ma);
    if (!this.begin(ar, ma)) return false;
    const noise = sparsePolynomial(sum(alpha, theta, this.m));
    let settled = false;
    for (let t = 0; t < this.present.length; t++) {
      if (settled && this.sink === null) {
        t = this.stretch(t, alpha, theta);
        if (t === this.present.length) break;
      }
      const seen = this.present[t] === 1;
      const { head } = covariance;
      for (let i = 0; i < count; i++) {
        const value = i === 0 && !seen ? 0 : this.series[i]![t]!;
        errors[i] = value - this.states[i]![head]!;
      }
      if (settled && seen) {
        this.add(1);
        this.sink?.(t, errors, 1, true);
        this.moveStates(t, alpha, theta, null, 0);
        covariance.head = (head + 1) % this.m;
        continue;
      }
      const variance = covariance.look();
      if (!seen) {
        this.sink?.(t, errors, directions.left > 0 && directions.enter(head) ? Infinity : variance, false);
        this.passStates(alpha);
        directions.pass(head, alpha);
        covariance.pass(alpha, noise);
        settled = false;
        continue;
      }
      const fixed = directions.left > 0 ? directions.fix(head) : null;
      if (fixed !== null) {
        this.logDeterminant += 2 * fixed.logEffect;
        this.sink?.(t, errors, Infinity, true);
        this.moveStates(t, alpha, theta, fixed.direction, 1);
        covariance.spend(fixed.direction, theta);
        continue;
      }
      this.logDeterminant += Math.log(variance);
      this.add(variance);
      this.sink?.(t, errors, variance, true);
      this.moveStates(t, alpha, theta, covariance.row, variance);
      covariance.see(variance, theta);
      settled = directions.left === 0 && covariance.isNothing();
      if (settled) covariance.forget();
    }
    for (let i = 0; i < count; i++) for (let j = 0; j < i; j++) cross[j * count + i] = cross[i * count + j]!;
    return true;
  }

  private begin(ar: Float64Array, ma: Float64Array): boolean {
    this.cross.fill(0);
    this.logDeterminant = 0;
    for (const state of this.states) state.fill(0);
    const order = Math.max(ar.length, ma.length);
    const start = new Float64Array(order ** 2);
    if (order > 0 && !startCovariance(ar, ma, order, start)) return false;
    this.covariance.start(start, order);
    this.directions.begin(sparsePolynomial(ar));
    return true;
  }

  private add(variance: number): void {
    const { count, cross, errors } = this;
    for (let i = 0; i < count; i++)
      for (let j = 0; j <= i; j++) cross[i * count + j]! += (errors[i]! * errors[j]!) / variance;
  }

  /** States over a reading: first the gain (none in the steady state), then shift + α y + θ e. */
  private moveStates(
    t: number,
    alpha: SparsePolynomial,
    theta: SparsePolynomial,
    gain: Float64Array | null,
    variance: number,
  ): void {
    const { count, states, series, errors, m } = this;
    const { head } = this.covariance;
    for (let i = 0; i < count; i++) {
      const state = states[i]!;
      if (gain !== null) {
        const step = errors[i]! / variance;
        for (let b = 0; b < m; b++) state[b]! += gain[b]! * step;
      }
      const value = series[i]![t]!;
      const shock = value - state[head]!;
      state[head] = 0;
      for (let k = 0; k < alpha.lags.length; k++) state[(head + alpha.lags[k]!) % m]! += alpha.values[k]! * value;
      for (let k = 0; k < theta.lags.length; k++) state[(head + theta.lags[k]!) % m]! += theta.values[k]! * shock;
    }
  }

  /** States over a gap: shift + α s_1. */
  private passStates(alpha: SparsePolynomial): void {
    const { m } = this;
    const { head } = this.covariance;
    for (const state of this.states) {
      const value = state[head]!;
      state[head] = 0;
      for (let k = 0; k < alpha.lags.length; k++) state[(head + alpha.lags[k]!) % m]! += alpha.values[k]! * value;
    }
  }

  /**
   * From a settled state to the next gap: the steady recursion with what the past still puts into its first m values.
   *
   * @returns the place of the gap, or the end
   */
  private stretch(from: number, alpha: SparsePolynomial, theta: SparsePolynomial): number {
    const { present, count, series, m, states, covariance } = this;
    let to = from;
    while (to < present.length && present[to] === 1) to++;
    if (to === from) return to;
    this.innovations ??= series.map((one) => new Float64Array(one.length));
    const filtered = this.innovations;
    for (let i = 0; i < count; i++) {
      const y = series[i]!;
      const e = filtered[i]!;
      const state = states[i]!;
      const left = Float64Array.from({ length: m }, (_, j) => state[(covariance.head + j) % m]!);
      const turn = Math.min(to, from + m);
      for (let t = from; t < turn; t++)
        e[t] = y[t]! - left[t - from]! - within(alpha, y, t, from, t) - within(theta, e, t, from, t);
      if (turn < to) steadyStretch(y, e, turn, to, alpha, theta);
      for (let j = 0; j < m; j++)
        state[j] = (left[to - from + j] ?? 0) + within(alpha, y, to + j, from, to) + within(theta, e, to + j, from, to);
    }
    covariance.head = 0;
    for (let i = 0; i < count; i++)
      for (let j = 0; j <= i; j++) this.cross[i * count + j]! += dot(filtered[i]!, filtered[j]!, from, to);
    return to;
  }
}

/** Σ values_k x_{t − lag_k} over the terms that lie in [from, to). */
function within({ lags, values }: SparsePolynomial, x: Float64Array, t: number, from: number, to: number): number {
  let sum = 0;
  for (let k = 0; k < lags.length; k++) {
    const at = t - lags[k]!;
    if (at >= from && at < to) sum += values[k]! * x[at]!;
  }
  return sum;
}

function sum(one: SparsePolynomial, other: SparsePolynomial, m: number): Float64Array {
  const result = new Float64Array(m);
  for (const { lags, values } of [one, other])
    for (let k = 0; k < lags.length; k++) result[lags[k]! - 1]! += values[k]!;
  return result;
}
