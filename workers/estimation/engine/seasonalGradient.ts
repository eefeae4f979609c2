import type { Order } from '../../contract/candidate.ts';
import type { Factors } from '../../model/expandPolynomials.ts';
import { accumulate, addResponse, lagDot } from './adjointSums.ts';
import type { GapPulses } from './gapPulses.ts';
import { factorStep } from './numericGradient.ts';
import type { ProfileGls } from './profileGls.ts';
import { regularRecursion, type SeasonalEngine } from './seasonalEngine.ts';
import { SeasonalStart } from './seasonalStart.ts';
import { adjointRecursion, steadyRecursion } from './steadyRecursion.ts';

/**
 * Gradient of the concentrated ln L for the seasonal engine, by the adjoints of its two recursions.
 *
 * With û and ê the outputs of the regular and the seasonal recursion of the regression residual r from the most likely α̂ and γ̂, a the
 * adjoint of ê through Θ(Bˢ) and c that through Φ(Bˢ)/Θ(Bˢ)/θ(B), ½ of the sum of squares changes by −Σ a_t ê_{t−Js} with Θ_J,
 * −Σ a_t û_{t−Is} with Φ_I, −Σ c_t û_{t−j} with θ_j and −Σ c_t r_{t−i} with φ_i (the envelope theorem), and by −½ λ′(dΠ)λ with the
 * covariance Π of (α, γ), λ = (D′ê, R′ê). dΠ and d ln |V|, which do not touch the record, are differenced numerically.
 */
export class SeasonalGradient {
  private readonly residual: Float64Array;
  private readonly between: Float64Array;
  private readonly shocks: Float64Array;
  private readonly first: Float64Array;
  private readonly second: Float64Array;
  private readonly near: SeasonalStart;
  /** Σ scale·λλ′ over what was probed: within a phase (M×M), of γ (g×g), and between γ and α. */
  private readonly alpha: Float64Array;
  private readonly gamma: Float64Array;
  private readonly mixed: Float64Array;

  constructor(
    private readonly engine: SeasonalEngine,
    private readonly order: Order,
    private readonly readings: number,
    private readonly pulses: GapPulses | null = null,
  ) {
    const { observed: n, pad, start } = engine;
    const { p, q, P, Q, s } = order;
    this.residual = new Float64Array(n + pad);
    this.between = new Float64Array(n + pad);
    this.shocks = new Float64Array(n + pad);
    this.first = new Float64Array(n + 2 * pad);
    this.second = new Float64Array(n + 2 * pad);
    this.near = new SeasonalStart(n, p, q, P, Q, s);
    const { g, size } = start;
    this.alpha = new Float64Array(start.prior.M ** 2);
    this.gamma = new Float64Array(g * g);
    this.mixed = new Float64Array(g * size);
  }

  /** After the engine has evaluated `factors` and `gls` was solved. */
  write(factors: Factors, gls: ProfileGls, gradient: Float64Array): void {
    const { flat, count } = this.engine;
    gradient.fill(0);
    this.alpha.fill(0);
    this.gamma.fill(0);
    this.mixed.fill(0);
    const weights = new Float64Array(count);
    weights[0] = 1;
    for (let i = 1; i < count; i++) weights[i] = -gls.profile.weights[i - 1]!;
    this.probe(weights, this.readings / gls.profile.rss, gradient);
    for (let k = 0; k < flat; k++) {
      const combination = gls.flatCombination(k);
      if (combination === null) continue;
      weights.fill(0);
      weights.set(combination, 1);
      this.probe(weights, 1, gradient);
    }
    this.addStart(factors, gradient);
    this.pulses?.addSlopes(factors, gradient);
  }

  /** Adds −½·scale·d(x′V⁻¹x) for a combination x of the series, but for its part through Π, which is put by. */
  private probe(weights: Float64Array, scale: number, gradient: Float64Array): void {
    const { engine, residual, between, shocks, first, second } = this;
    const { pad, observed: n, start, sparse } = engine;
    const { p, q, P, Q, s } = this.order;
    const { alpha, gamma } = this.combine(weights);
    const likely = mostLikely(start, alpha, gamma);
    regularRecursion(residual, between, pad, n, sparse);
    addResponse(between, likely.gamma, pad, n, sparse.ma);
    steadyRecursion(between, shocks, pad, n, sparse.seasonalAr, sparse.seasonalMa);
    addResponse(shocks, likely.alpha, pad, n, sparse.seasonalMa);
    adjointRecursion(shocks, first, pad, n, sparse.seasonalMa);
    let at = p + q;
    for (let i = 1; i <= P; i++) gradient[at++]! += scale * lagDot(first, between, pad, n, i * s);
    for (let j = 1; j <= Q; j++) gradient[at++]! += scale * lagDot(first, shocks, pad, n, j * s);
    if (p + q > 0) {
      const { lags, values } = sparse.seasonalAr;
      // In place, forwards: what lies ahead is not changed yet.
      for (let t = pad; t < pad + n && lags.length > 0; t++) {
        let now = first[t]!;
        for (let k = 0; k < lags.length; k++) if (t + lags[k]! < pad + n) now -= values[k]! * first[t + lags[k]!]!;
        first[t] = now;
      }
      adjointRecursion(first, second, pad, n, sparse.ma);
      at = 0;
      for (let i = 1; i <= p; i++) gradient[at++]! += scale * lagDot(second, residual, pad, n, i);
      for (let j = 1; j <= q; j++) gradient[at++]! += scale * lagDot(second, between, pad, n, j);
    }
    this.remember(alpha, gamma, scale);
  }

  /** x, and λ of it. */
  private combine(weights: Float64Array): { alpha: Float64Array; gamma: Float64Array } {
    const { engine, residual } = this;
    const { start } = engine;
    const byPhase = new Float64Array(start.size);
    const reduced = new Float64Array(2 * start.g);
    residual.fill(0);
    weights.forEach((value, i) => {
      if (value === 0) return;
      accumulate(residual, engine.series[i]!, value);
      accumulate(byPhase, engine.byPhase[i]!, value);
      accumulate(reduced, engine.reduced[i]!, value);
    });
    if (this.pulses === null) return start.pull(byPhase, reduced);
    this.pulses.complete(weights, residual);
    engine.filter(residual, this.shocks);
    const past = engine.past(this.shocks);
    return start.pull(past.subarray(0, start.size), past.subarray(start.size));
  }

  private remember(alpha: Float64Array, gamma: Float64Array, scale: number): void {
    const { g, size, prior } = this.engine.start;
    const { M } = prior;
    const { s } = this.order;
    for (let r = 0; r < M; r++) {
      for (let c = 0; c < M; c++) {
        let sum = 0;
        for (let k = 0; k < s; k++) sum += alpha[r * s + k]! * alpha[c * s + k]!;
        this.alpha[r * M + c]! += scale * sum;
      }
    }
    for (let l = 0; l < g; l++) {
      for (let v = 0; v < g; v++) this.gamma[l * g + v]! += scale * gamma[l]! * gamma[v]!;
      for (let i = 0; i < size; i++) this.mixed[l * size + i]! += scale * gamma[l]! * alpha[i]!;
    }
  }

  /** The part of the start: ½ Σ scale·λ′Πλ − ½ ln |V| differenced with respect to every coefficient. */
  private addStart(factors: Factors, gradient: Float64Array): void {
    const { near } = this;
    const here = this.height(this.engine.start);
    let at = 0;
    for (const name of ['ar', 'ma', 'seasonalAr', 'seasonalMa'] as const) {
      const own = Float64Array.from(factors[name]);
      const step = factorStep(own, name === 'ma' || name === 'seasonalMa', this.readings);
      for (let i = 0; i < own.length; i++, at++) {
        const centre = own[i]!;
        const value = (shift: number): number | null => {
          own[i] = centre + shift;
          return near.prepare({ ...factors, [name]: own }) ? this.height(near) : null;
        };
        const above = value(step);
        const below = value(-step);
        own[i] = centre;
        const sides = (above === null ? 0 : 1) + (below === null ? 0 : 1);
        if (sides > 0) gradient[at]! += ((above ?? here) - (below ?? here)) / (step * sides);
      }
    }
  }

  private height({ prior, logDeterminant }: SeasonalStart): number {
    const { alpha, gamma, mixed } = this;
    let sum = -logDeterminant;
    for (let i = 0; i < alpha.length; i++) sum += alpha[i]! * prior.seasonal[i]!;
    for (let i = 0; i < gamma.length; i++) sum += gamma[i]! * prior.regular[i]!;
    for (let i = 0; i < mixed.length; i++) sum += 2 * mixed[i]! * prior.mixed[i]!;
    return sum / 2;
  }
}

/** α̂ and γ̂ = Π λ. */
function mostLikely(start: SeasonalStart, alpha: Float64Array, gamma: Float64Array) {
  const { g, size, prior } = start;
  const { M, seasonal, regular, mixed } = prior;
  const s = M === 0 ? 0 : size / M;
  const past = new Float64Array(size);
  for (let r = 0; r < M; r++) {
    for (let c = 0; c < M; c++) {
      const value = seasonal[r * M + c]!;
      for (let k = 0; k < s; k++) past[r * s + k]! += value * alpha[c * s + k]!;
    }
  }
  const recent = new Float64Array(g);
  for (let l = 0; l < g; l++) {
    for (let v = 0; v < g; v++) recent[l]! += regular[l * g + v]! * gamma[v]!;
    for (let i = 0; i < size; i++) {
      recent[l]! += mixed[l * size + i]! * alpha[i]!;
      past[i]! += mixed[l * size + i]! * gamma[l]!;
    }
  }
  return { alpha: past, gamma: recent };
}
