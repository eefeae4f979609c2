import type { Factors } from '../../model/expandPolynomials.ts';
import { dot } from './fastEngine.ts';

/** A weight of a response below this is nothing beside its first, which is 1. */
const NOTHING = 1e-18;

/**
 * What one unit of the past does to the innovations of a multiplicative seasonal model: the response of 1/Θ(Bˢ), by season, and that of
 * Φ(Bˢ)/Θ(Bˢ)/θ(B), by step; and the sums of a record against them.
 */
export class SeasonalResponse {
  /** Response of 1/Θ from season to season, and how many seasons of it are something. */
  readonly seasonal: Float64Array;
  seasons = 0;
  private readonly response: Float64Array;
  /** Steps of the other that are something. */
  private reach = 0;
  /** How many of them at the start of every season. */
  private burst = 0;

  /** @param n steps; @param s season; @param g order of the regular factors; @param M of the seasonal ones */
  constructor(
    private readonly n: number,
    private readonly s: number,
    private readonly g: number,
    private readonly M: number,
  ) {
    this.response = new Float64Array(g > 0 ? n : 0);
    this.seasonal = new Float64Array(Math.ceil(n / s) + 1);
  }

  /** Steps from the start after which the past has no effect. */
  get furthest(): number {
    return Math.max(this.reach, (this.seasons + this.M) * this.s) + this.g;
  }

  set(factors: Factors): void {
    this.respondSeasonally(factors.seasonalMa);
    if (this.g > 0) this.respond(factors);
  }

  /** D′ of the response delayed by `delay` steps. */
  foldOwn(delay: number, result: Float64Array): void {
    this.fold(this.response, -delay, result, this.burst === this.s ? this.s : this.burst + delay);
  }

  /** Products of the responses delayed by each of g delays, g×g; the lower triangle. */
  products(result: Float64Array): void {
    const { g, n, response: h, reach } = this;
    const at = (k: number) => (k < reach ? h[k]! : 0);
    for (let j = 0; j < g; j++) {
      result[j * g] = this.against(h, j, n - j);
      for (let i = 1; i + j < g; i++)
        result[(i + j) * g + i] = result[(i + j - 1) * g + i - 1]! - at(n - i - j) * at(n - i);
    }
  }

  /** D′x of values that start at `offset` of x (before it nothing), by r and phase; nothing in x beyond so many phases. */
  fold(x: Float64Array, offset: number, result: Float64Array, phases = this.s): void {
    const { n, s, seasonal, seasons } = this;
    const { M } = this;
    result.fill(0);
    for (let r = 0; r < M; r++) {
      for (let j = 0; j < seasons; j++) {
        const from = (j + r) * s;
        const weight = seasonal[j]!;
        if (weight === 0) continue;
        const least = Math.max(0, -offset - from);
        const count = Math.min(phases, n - from);
        if (count <= 0) break;
        for (let k = least, at = r * s + least, t = from + offset + least; k < count; k++, at++, t++)
          result[at]! += weight * x[t]!;
      }
    }
  }

  /**
   * Response of Φ(Bˢ)/Θ(Bˢ)/θ(B) to one unit of γ. Where that of 1/θ(B) is over before a season is, the whole is a burst every
   * season, and nothing between.
   */
  private respond({ ma, seasonalAr, seasonalMa }: Factors): void {
    const { response, n, s, g, seasons } = this;
    const q = ma.length;
    let quiet = 0;
    let end = n;
    for (let t = 0; t < n; t++) {
      let now = t === 0 ? 1 : 0;
      for (let j = 1; j <= Math.min(q, t); j++) now -= ma[j - 1]! * response[t - j]!;
      response[t] = now;
      quiet = Math.abs(now) < NOTHING ? quiet + 1 : 0;
      if (quiet > g) {
        end = t + 1;
        break;
      }
    }
    this.burst = end + g < s ? end : s;
    this.reach = Math.min(n, end + (seasons + seasonalAr.length) * s);
    response.fill(0, end, n);
    if (seasonalAr.length > 0) this.seasonally(seasonalAr, true);
    this.seasonally(seasonalMa, false);
  }

  /** The response through one seasonal factor, in place: its own values before, or the outputs, as they are overwritten. */
  private seasonally(coefficients: ArrayLike<number>, fromInputs: boolean): void {
    const { response, s, reach, burst } = this;
    const count = Math.ceil(reach / s);
    for (let j = 1; j < count; j++) {
      const season = fromInputs ? count - j : j;
      const to = Math.min(reach, season * s + burst);
      for (let i = 1; i <= Math.min(coefficients.length, season); i++) {
        const value = coefficients[i - 1]!;
        for (let t = season * s, from = t - i * s; t < to; t++, from++) response[t]! -= value * response[from]!;
      }
    }
  }

  /** Σ_t h_t x_{t+shift} over t < count, h the response. */
  against(x: Float64Array, shift: number, count: number): number {
    const { response, s, burst, reach } = this;
    const end = Math.min(count, reach);
    if (burst === s) return end > 0 ? dot(response, x.subarray(shift), 0, end) : 0;
    let sum = 0;
    for (let base = 0; base < end; base += s) {
      const to = Math.min(base + burst, end);
      for (let t = base; t < to; t++) sum += response[t]! * x[t + shift]!;
    }
    return sum;
  }

  private respondSeasonally(ma: ArrayLike<number>): void {
    const { seasonal } = this;
    let quiet = 0;
    this.seasons = seasonal.length;
    for (let t = 0; t < seasonal.length; t++) {
      let now = t === 0 ? 1 : 0;
      for (let j = 1; j <= Math.min(ma.length, t); j++) now -= ma[j - 1]! * seasonal[t - j]!;
      seasonal[t] = now;
      quiet = Math.abs(now) < NOTHING ? quiet + 1 : 0;
      if (quiet > ma.length) {
        this.seasons = t;
        return;
      }
    }
  }
}
