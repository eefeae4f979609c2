import type { Order } from '../../contract/candidate.ts';
import { accumulate, lagDot } from './adjointSums.ts';
import { expandPolynomials, type Factors } from '../../model/expandPolynomials.ts';
import type { FastEngine } from './fastEngine.ts';
import type { GapPulses } from './gapPulses.ts';
import { factorStep } from './numericGradient.ts';
import type { ProfileGls } from './profileGls.ts';
import { shortAdjoint } from './shortAdjoint.ts';
import { startCovariance } from './startCovariance.ts';
import { backward } from './startEffect.ts';
import { StartGradient } from './startGradient.ts';
import { adjointRecursion } from './steadyRecursion.ts';

/** Half the distance of the differences by an MA coefficient: the covariance of the past is quadratic in it, so that they are exact. */
const WIDE = 0.25;

/**
 * Gradient of the concentrated ln L by the adjoint of the recursion.
 *
 * With ê the innovations of the regression residual r that start from the most likely past ĝ, and c their adjoint recursion, the sum of
 * squares changes by −2 Σ c_t r_{t−i} with a multiplied-out φ_i, by −2 Σ c_t ê_{t−j} with θ_j, and by −c′(dC)c over its first m places with
 * the covariance of the past (the envelope theorem: ĝ, β̂ and σ̂² do not contribute); for ln |V| see `StartGradient`. Only dC, which touches
 * neither the record nor the response to the past, is differenced numerically. ln |F′V⁻¹F| of the columns for missing readings is the same
 * with each of their orthonormal combinations in the place of r. Costs about two evaluations, and one more for each missing reading.
 */
export class FastGradient {
  private readonly residual: Float64Array;
  private readonly shocks: Float64Array;
  private readonly adjoint: Float64Array;
  private readonly start: StartGradient;
  private readonly near: Float64Array;
  /** Σ scale·c c′ over what was probed. */
  private readonly past: Float64Array;
  private readonly byAr: Float64Array;
  private readonly byMa: Float64Array;
  private readonly sums = new Float64Array(4);
  /** Lags of the multiplied-out MA polynomial that the coefficients can reach. */
  private readonly maLags: readonly number[];

  constructor(
    private readonly engine: FastEngine,
    private readonly order: Order,
    private readonly readings: number,
    private readonly pulses: GapPulses | null = null,
  ) {
    const { observed: n, pad } = engine;
    const { p, q, P, Q, s } = order;
    this.residual = new Float64Array(n + pad);
    this.shocks = new Float64Array(n + pad);
    this.adjoint = new Float64Array(n + 2 * pad);
    const { m } = engine.start;
    this.start = new StartGradient(n, m);
    this.near = new Float64Array(m * m);
    this.past = new Float64Array(m * m);
    this.byAr = new Float64Array(p + s * P + 1);
    this.byMa = new Float64Array(q + s * Q + 1);
    const lags = new Set<number>();
    for (let j = 0; j <= Q; j++) for (let i = 0; i <= q; i++) lags.add(i + j * s);
    lags.delete(0);
    this.maLags = [...lags];
  }

  /** After the engine has evaluated `factors` and `gls` was solved. */
  write(factors: Factors, gls: ProfileGls, gradient: Float64Array): void {
    const { p, q, P, Q, s } = this.order;
    const { profile } = gls;
    this.byAr.fill(0);
    this.byMa.fill(0);
    this.past.fill(0);
    const { flat, count, start, sparseMa } = this.engine;
    const weights = new Float64Array(count);
    weights[0] = 1;
    for (let i = 1; i < count; i++) weights[i] = -profile.weights[i - 1]!;
    this.probe(factors, weights, this.readings / profile.rss);
    for (let k = 0; k < flat; k++) {
      const combination = gls.flatCombination(k);
      if (combination === null) continue;
      weights.fill(0);
      weights.set(combination, 1);
      this.probe(factors, weights, 1);
    }
    if (start.m > 0) this.start.add(start, sparseMa, this.maLags, this.byMa);
    chain(factors.seasonalAr, p, s, -1, this.byAr, gradient, 0);
    chain(factors.seasonalMa, q, s, 1, this.byMa, gradient, p);
    chainSeasonal(factors.ar, P, s, -1, this.byAr, gradient, p + q);
    chainSeasonal(factors.ma, Q, s, 1, this.byMa, gradient, p + q + P);
    if (start.m > 0) this.addCovariance(factors, gradient);
    this.pulses?.addSlopes(factors, gradient);
  }

  /** Adds −½·scale·d(x′V⁻¹x) for a combination x of the series, lag by lag, and its part of the start. */
  private probe(factors: Factors, weights: Float64Array, scale: number): void {
    const { engine, residual, shocks, adjoint, past, byAr, byMa, sums } = this;
    const { start, pad, observed: n, sparseMa } = engine;
    const c = this.addPast(this.combine(weights));
    if (byAr.length <= 3 && byMa.length <= 3 && pad > 0) {
      shortAdjoint(residual, shocks, pad, n, sparseMa, sums);
      for (let lag = 1; lag < byAr.length; lag++) byAr[lag]! += scale * sums[lag - 1]!;
      for (let lag = 1; lag < byMa.length; lag++) byMa[lag]! += scale * sums[lag + 1]!;
    } else {
      adjointRecursion(shocks, adjoint, pad, n, sparseMa);
      this.byLag(factors.ar, factors.seasonalAr, residual, byAr, scale);
      this.byLag(factors.ma, factors.seasonalMa, shocks, byMa, scale);
    }
    const { m } = start;
    for (let i = 0; i < m; i++) for (let k = 0; k < m; k++) past[i * m + k]! += scale * c[i]! * c[k]!;
  }

  /** x and its e⁰; returns its v. */
  private combine(weights: Float64Array): Float64Array {
    const { engine, residual, shocks, pulses } = this;
    const { m } = engine.start;
    const v = new Float64Array(m);
    let first = true;
    weights.forEach((value, i) => {
      if (value === 0) return;
      accumulate(residual, engine.series[i]!, value, first);
      if (pulses === null) accumulate(shocks, engine.innovations[i]!, value, first);
      accumulate(v, engine.shrunk[i]!, value);
      first = false;
    });
    if (first) {
      residual.fill(0);
      shocks.fill(0);
    }
    if (pulses === null) return v;
    pulses.complete(weights, residual);
    engine.filter(residual, shocks);
    return engine.past(shocks).subarray(m);
  }

  /** Adds H ĝ to the innovations and returns c over the first m places, c = L M⁻¹ y = L R′⁻¹ v. */
  private addPast(v: Float64Array): Float64Array {
    const { engine, shocks } = this;
    const { start, pad } = engine;
    const { m, gram, mixed, covariance, impulse } = start;
    backward(mixed, m, v);
    const c = new Float64Array(m);
    for (let i = 0; i < m; i++) for (let k = 0; k <= i; k++) c[i]! += gram[i * m + k]! * v[k]!;
    for (let i = 0; i < m; i++) {
      let g = 0;
      for (let k = 0; k < m; k++) g -= covariance[i * m + k]! * c[k]!;
      const steps = Math.min(engine.observed - i, start.reach);
      for (let t = 0; t < steps; t++) shocks[pad + i + t]! += impulse[t]! * g;
    }
    return c;
  }

  /** Σ c_t x_{t−lag}·scale for every lag the factors can reach. */
  private byLag(
    plain: ArrayLike<number>,
    seasonal: ArrayLike<number>,
    x: Float64Array,
    by: Float64Array,
    scale: number,
  ): void {
    const { pad, observed: n } = this.engine;
    const { s } = this.order;
    for (let j = 0; j <= seasonal.length; j++) {
      for (let i = 0; i <= plain.length; i++) {
        const lag = i + j * s;
        if (lag > 0) by[lag]! += scale * lagDot(this.adjoint, x, pad, n, lag);
      }
    }
  }

  /** What the covariance of the past adds: ½ tr((Σ scale·cc′ − A) dC), A of `StartGradient`. */
  private addCovariance(factors: Factors, gradient: Float64Array): void {
    const { past, near, order } = this;
    const { observed: n, start } = this.engine;
    const { m } = start;
    for (let i = 0; i < m * m; i++) past[i]! -= this.start.forCovariance[i]!;
    const here = halfTrace(past, start.covariance);
    let at = 0;
    for (const name of ['ar', 'ma', 'seasonalAr', 'seasonalMa'] as const) {
      const own = Float64Array.from(factors[name]);
      const step = name === 'ma' || name === 'seasonalMa' ? WIDE : factorStep(own, false, n);
      for (let i = 0; i < own.length; i++, at++) {
        const centre = own[i]!;
        const value = (shift: number): number | null => {
          own[i] = centre + shift;
          const { ar, ma } = expandPolynomials({ ...factors, [name]: own }, order.s);
          return startCovariance(ar, ma, m, near) ? halfTrace(past, near) : null;
        };
        const above = value(step);
        const below = value(-step);
        own[i] = centre;
        const sides = (above === null ? 0 : 1) + (below === null ? 0 : 1);
        if (sides > 0) gradient[at]! += ((above ?? here) - (below ?? here)) / (step * sides);
      }
    }
  }
}

function halfTrace(one: Float64Array, other: Float64Array): number {
  let trace = 0;
  for (let i = 0; i < one.length; i++) trace += one[i]! * other[i]!;
  return trace / 2;
}

/** Derivatives by the plain factor from those by multiplied-out lag. */
function chain(
  seasonal: ArrayLike<number>,
  count: number,
  s: number,
  sign: 1 | -1,
  by: Float64Array,
  gradient: Float64Array,
  at: number,
): void {
  for (let i = 1; i <= count; i++) {
    let sum = by[i]!;
    for (let j = 1; j <= seasonal.length; j++) sum += sign * seasonal[j - 1]! * by[i + j * s]!;
    gradient[at + i - 1] = sum;
  }
}

/** The same by the seasonal factor. */
function chainSeasonal(
  plain: ArrayLike<number>,
  count: number,
  s: number,
  sign: 1 | -1,
  by: Float64Array,
  gradient: Float64Array,
  at: number,
): void {
  for (let j = 1; j <= count; j++) {
    let sum = by[j * s]!;
    for (let i = 1; i <= plain.length; i++) sum += sign * plain[i - 1]! * by[i + j * s]!;
    gradient[at + j - 1] = sum;
  }
}
