import { sparsePolynomial, type SparsePolynomial } from '../../model/expandPolynomials.ts';
import type { Engine } from './engine.ts';
import { dot } from './fastEngine.ts';
import { startCovariance } from './startCovariance.ts';
import { steadyStretch } from './steadyRecursion.ts';

/** Below this the covariance of the predictor state is nothing beside the unit innovation variance. */
const NOTHING = 1e-20;

/**
 * The Kalman filter, for records with gaps and for differencing across gaps.
 *
 * State: with w the ARMA part in its innovations form, w_t = s_1 + e_t, s ← [φ | shift] s + (φ+θ) e, and for d + sD = m₀ > 0 the last m₀ values
 * of the record, y_t = w_t − Σ c_i y_{t−i}. Written with T̃ = T − RZ the covariance of the state after an observed value
 * is T̃ P⁺ T̃′ with no noise term, so that it falls to exactly nothing where the past is known and the filter is then the steady
 * recursion; F − 1 is read off without cancellation.
 *
 * Start: the exact stationary covariance of the ARMA part; the m₀ values before the record have a flat prior, carried as
 * m₀ columns with unit starting values (Rosenberg 1973; Ansley & Kohn 1985, Ann. Stat. 13, 1286–1316; de Jong 1991), which the caller integrates
 * out. Gaps are steps without a measurement: nothing is interpolated.
 */
export class GapFilter implements Engine {
  readonly kind: 'filter' | 'diffuse';
  readonly flat: number;
  readonly count: number;
  readonly cross: Float64Array;
  readonly observed: number;
  logDeterminant = 0;
  private readonly m: number;
  private readonly r: number;
  private readonly present: Uint8Array;
  /** States of all series, one row each. */
  private readonly state: Float64Array;
  private readonly P: Float64Array;
  private readonly next: Float64Array;
  private readonly input: Float64Array;
  /** First column of the transition at hand: φ over a gap, −θ where the value was seen. */
  private readonly lead: Float64Array;
  private readonly row: Float64Array;
  private readonly errors: Float64Array;
  private innovations: Float64Array[] | null = null;
  private readonly known: number[];

  /**
   * @param series the record (gaps as NaN) and its columns (no gaps), not differenced, all of length n
   * @param p degree of the multiplied-out AR polynomial; @param q of the MA polynomial
   * @param differencing c_0…c_m₀ of the differencing polynomial
   * @param sink called at every step with its index, the errors of all series (in a gap those of a reading of zero), their
   *   variance for unit σ², and whether the reading was seen
   */
  constructor(
    private readonly series: readonly Float64Array[],
    p: number,
    q: number,
    private readonly differencing: Float64Array,
    private readonly sink: ((t: number, errors: Float64Array, variance: number, seen: boolean) => void) | null = null,
  ) {
    const record = series[0]!;
    this.present = Uint8Array.from(record, (value) => (Number.isNaN(value) ? 0 : 1));
    this.observed = this.present.reduce((sum, one) => sum + one, 0);
    this.flat = differencing.length - 1;
    this.kind = this.flat > 0 ? 'diffuse' : 'filter';
    this.m = Math.max(p, q, 1);
    this.r = this.m + this.flat;
    this.count = series.length + this.flat;
    this.cross = new Float64Array(this.count ** 2);
    this.state = new Float64Array(this.count * this.r);
    this.P = new Float64Array(this.r ** 2);
    this.next = new Float64Array(this.r ** 2);
    this.input = new Float64Array(this.m);
    this.lead = new Float64Array(this.m);
    this.row = new Float64Array(this.r);
    this.errors = new Float64Array(this.count);
    this.known = [];
    for (let i = 1; i <= this.flat; i++) if (differencing[i] !== 0) this.known.push(i);
  }

  evaluate(ar: Float64Array, ma: Float64Array): boolean {
    const { m, r, P, state, input, count, flat } = this;
    this.cross.fill(0);
    this.logDeterminant = 0;
    P.fill(0);
    state.fill(0);
    for (let i = 0; i < m; i++) input[i] = (ar[i] ?? 0) + (ma[i] ?? 0);
    const order = Math.max(ar.length, ma.length);
    if (order > 0) {
      const start = new Float64Array(order ** 2);
      if (!startCovariance(ar, ma, order, start)) return false;
      for (let i = 0; i < order; i++) for (let j = 0; j < order; j++) P[i * r + j] = start[i * order + j]!;
    }
    // Column 1…flat: the values before the record, the latest first.
    for (let k = 0; k < flat; k++) state[(1 + k) * r + m + k] = 1;
    const sparse = [sparsePolynomial(ar), sparsePolynomial(ma)] as const;
    let settled = false;
    for (let t = 0; t < this.present.length; t++) {
      if (settled && this.sink === null && flat === 0) {
        t = this.stretch(t, ...sparse);
        if (t === this.present.length) break;
      }
      const seen = this.present[t] === 1;
      const variance = settled ? 1 : this.predictVariance();
      this.predictErrors(t, seen);
      if (seen) {
        if (variance !== 1) this.logDeterminant += Math.log(variance);
        for (let i = 0; i < count; i++)
          for (let j = 0; j <= i; j++) this.cross[i * count + j]! += (this.errors[i]! * this.errors[j]!) / variance;
      }
      this.sink?.(t, this.errors, variance, seen);
      this.stepStates(ar, t, seen, settled ? null : variance);
      if (settled && seen) continue;
      if (seen) this.stepSeen(ma, variance);
      else this.stepGap(ar);
      settled = seen && this.isNothing();
    }
    for (let i = 0; i < count; i++) for (let j = 0; j < i; j++) this.cross[j * count + i] = this.cross[i * count + j]!;
    return true;
  }

  /**
   * From a settled state to the next gap: the steady recursion with what the past still puts into its first m values.
   *
   * @returns the place of the gap, or the end
   */
  private stretch(from: number, ar: SparsePolynomial, ma: SparsePolynomial): number {
    const { present, count, series, m } = this;
    let to = from;
    while (to < present.length && present[to] === 1) to++;
    if (to === from) return to;
    this.innovations ??= series.map((one) => new Float64Array(one.length));
    const filtered = this.innovations;
    for (let i = 0; i < count; i++) {
      const w = series[i]!;
      const e = filtered[i]!;
      const s = this.state.slice(i * m, (i + 1) * m);
      const head = Math.min(to, from + m);
      for (let t = from; t < head; t++) {
        let value = w[t]! - s[t - from]!;
        for (let k = 0; k < ar.lags.length && ar.lags[k]! <= t - from; k++)
          value -= ar.values[k]! * w[t - ar.lags[k]!]!;
        for (let k = 0; k < ma.lags.length && ma.lags[k]! <= t - from; k++)
          value -= ma.values[k]! * e[t - ma.lags[k]!]!;
        e[t] = value;
      }
      if (head < to) steadyStretch(w, e, head, to, ar, ma);
      for (let j = 0; j < m; j++) {
        let value = s[to - from + j] ?? 0;
        // Lag l puts the value at to + j − l into place j ahead.
        for (let k = 0; k < ar.lags.length; k++) {
          const at = to + j - ar.lags[k]!;
          if (at < to && at >= from) value += ar.values[k]! * w[at]!;
        }
        for (let k = 0; k < ma.lags.length; k++) {
          const at = to + j - ma.lags[k]!;
          if (at < to && at >= from) value += ma.values[k]! * e[at]!;
        }
        this.state[i * m + j] = value;
      }
    }
    for (let i = 0; i < count; i++)
      for (let j = 0; j <= i; j++) this.cross[i * count + j]! += dot(filtered[i]!, filtered[j]!, from, to);
    return to;
  }

  /** z′P into `row` and z′Pz + 1 back: z picks s_1 and −c_i of the last values. */
  private predictVariance(): number {
    const { P, r, m, row, known, differencing } = this;
    for (let j = 0; j < r; j++) row[j] = P[j]!;
    for (const i of known) {
      const c = differencing[i]!;
      const base = (m + i - 1) * r;
      for (let j = 0; j < r; j++) row[j]! -= c * P[base + j]!;
    }
    let sum = row[0]!;
    for (const i of known) sum -= differencing[i]! * row[m + i - 1]!;
    return 1 + Math.max(sum, 0);
  }

  private predictErrors(t: number, seen: boolean): void {
    const { state, r, m, flat, count, errors, known, differencing, series } = this;
    for (let i = 0; i < count; i++) {
      let forecast = state[i * r]!;
      for (const k of known) forecast -= differencing[k]! * state[i * r + m + k - 1]!;
      const source = i === 0 ? series[0]! : i > flat ? series[i - flat]! : null;
      errors[i] = (source === null || (i === 0 && !seen) ? 0 : source[t]!) - forecast;
    }
  }

  /** States one step on; `variance` null in the steady state, where the gain is the input alone. */
  private stepStates(ar: Float64Array, t: number, seen: boolean, variance: number | null): void {
    const { state, r, m, flat, count, errors, row, input, known, differencing } = this;
    for (let i = 0; i < count; i++) {
      const base = i * r;
      const gain = seen && variance !== null ? errors[i]! / variance : 0;
      if (gain !== 0) for (let j = 0; j < r; j++) state[base + j]! += row[j]! * gain;
      const first = state[base]!;
      let value = first;
      for (const k of known) value -= differencing[k]! * state[base + m + k - 1]!;
      // The innovation left after filtering: e = y − z′s⁺ where the value was seen, 0 in a gap.
      const source = i === 0 ? this.series[0]! : i > flat ? this.series[i - flat]! : null;
      const shock = seen ? (source === null ? 0 : source[t]!) - value : 0;
      for (let j = 0; j < m; j++) {
        const ahead = j + 1 < m ? state[base + j + 1]! : 0;
        state[base + j] = ahead + (ar[j] ?? 0) * first + input[j]! * shock;
      }
      for (let j = flat - 1; j > 0; j--) state[base + m + j] = state[base + m + j - 1]!;
      if (flat > 0) state[base + m] = value + shock;
    }
  }

  /** P ← T̃ (P − P z z′ P / F) T̃′: the step after an observed value, without noise. */
  private stepSeen(ma: Float64Array, variance: number): void {
    const { P, r, row } = this;
    for (let i = 0; i < r; i++) {
      const scaled = row[i]! / variance;
      for (let j = 0; j < r; j++) P[i * r + j]! -= scaled * row[j]!;
    }
    for (let j = 0; j < this.m; j++) this.lead[j] = -(ma[j] ?? 0);
    this.transform(true);
  }

  /** P ← T P T′ + R R′: the step over a gap. */
  private stepGap(ar: Float64Array): void {
    const { r, m, input, flat } = this;
    for (let j = 0; j < m; j++) this.lead[j] = ar[j] ?? 0;
    this.transform(false);
    const { P } = this;
    for (let i = 0; i < m; i++) for (let j = 0; j < m; j++) P[i * r + j]! += input[i]! * input[j]!;
    if (flat === 0) return;
    // The value in the gap is s_1 − Σ c y + e: its own noise and that shared with the ARMA part.
    P[m * r + m]! += 1;
    for (let i = 0; i < m; i++) {
      P[i * r + m]! += input[i]!;
      P[m * r + i]! += input[i]!;
    }
  }

  /**
   * P ← A P A′ with the ARMA rows A s = lead·s_1 + shift (where the value was seen T̃ = T − R z′, whose rows take R times
   * the whole of z′), and the remembered values shifted with the new one in front.
   */
  private transform(seen: boolean): void {
    const { r } = this;
    const half = this.next;
    for (let i = 0; i < r; i++) this.applyRow(this.P, i * r, 1, half, i * r, seen);
    for (let j = 0; j < r; j++) this.applyRow(half, j, r, this.P, j, seen);
  }

  /** Applies A to one vector laid out with a stride. */
  private applyRow(
    source: Float64Array,
    from: number,
    stride: number,
    target: Float64Array,
    to: number,
    seen: boolean,
  ): void {
    const { m, flat, known, differencing, input, lead } = this;
    const first = source[from]!;
    let past = 0;
    for (const k of known) past -= differencing[k]! * source[from + (m + k - 1) * stride]!;
    for (let j = 0; j < m; j++) {
      const ahead = j + 1 < m ? source[from + (j + 1) * stride]! : 0;
      // Seen: T̃ s = φ s_1 + shift − R (s_1 + past) = −θ s_1 + shift − R past.
      target[to + j * stride] = ahead + lead[j]! * first - (seen ? input[j]! * past : 0);
    }
    if (flat === 0) return;
    const remembered = seen ? 0 : first + past;
    for (let j = flat - 1; j > 0; j--) target[to + (m + j) * stride] = source[from + (m + j - 1) * stride]!;
    target[to + m * stride] = remembered;
  }

  private isNothing(): boolean {
    const { P, r } = this;
    for (let i = 0; i < r; i++) {
      if (P[i * r + i]! > NOTHING) return false;
    }
    return true;
  }
}
