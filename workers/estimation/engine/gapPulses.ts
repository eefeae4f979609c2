import {
  expandPolynomials,
  sparsePolynomial,
  type Factors,
  type SparsePolynomial,
} from '../../model/expandPolynomials.ts';
import { integratedAr } from '../../model/integratedAr.ts';
import { EnvelopeMatrix } from './envelopeMatrix.ts';
import { dot } from './fastEngine.ts';
import { factorStep } from './numericGradient.ts';
import { adjointRecursion } from './steadyRecursion.ts';

/** A weight of the response to a pulse below this is nothing beside its first, which is 1. */
const NOTHING = 1e-17;
/** Products that one evaluation may take in the matrix of the pulses: beyond, the filter is cheaper. */
const MOST_WORK = 4e7;
/** Beyond this ratio of the sum of squares with what stands in the gaps to that without, too many digits are lost. */
const CANCELLATION = 1e7;

/** The engine without gaps that the pulses stand beside: its series, and what the unknown past does to their products. */
export interface PulseHost {
  readonly count: number;
  readonly observed: number;
  readonly pad: number;
  readonly cross: Float64Array;
  readonly logDeterminant: number;
  /** Innovations of each series, padded, started from nothing. */
  readonly innovations: readonly Float64Array[];
  /** Steps from the start after which the past has no effect. */
  readonly pastReach: number;
  /** Makes the effect of the past ready, without touching the series; false outside the region. */
  settle(factors: Factors, s: number): boolean;
  /** What the past needs to know of padded innovations; `pastProduct` of two is what it takes off their product. */
  past(innovations: Float64Array): Float64Array;
  pastOf(series: number): Float64Array;
  pastProduct(one: Float64Array, other: Float64Array): number;
}

/**
 * Missing readings as pulses with a flat prior, none of them written out as a column: the innovations of a pulse are the same response
 * π(B) = c(B)φ(B)Φ(Bˢ)/θ(B)Θ(Bˢ) wherever it stands, c of the differencing.
 *
 * Their products with each other are sums over π, those with a series come from its adjoint recursion, and only near the start of the
 * record does the past take something off. Eliminated by Cholesky within the envelope of what is not nothing, they leave the products of
 * the series given the readings there are. Source: see `columnsForGaps`.
 */
export class GapPulses {
  readonly cross: Float64Array;
  logDeterminant = 0;
  private readonly response: Float64Array;
  private reach = 0;
  private early = 0;
  private readonly adjoint: Float64Array;
  private readonly work: Float64Array;
  private readonly shared = new Map<number, number>();
  private matrix: EnvelopeMatrix | null = null;
  /** L⁻¹F′V⁻¹ of each series. */
  private readonly solved: readonly Float64Array[];

  /** @param places of the pulses in the differenced record, ascending; @param differencing c_0…c_m₀; @param s season */
  constructor(
    private readonly host: PulseHost,
    private readonly near: () => PulseHost,
    private readonly places: Int32Array,
    private readonly differencing: Float64Array,
    private readonly s: number,
    degree: number,
  ) {
    const { count, observed: n, pad } = host;
    this.cross = new Float64Array(count ** 2);
    this.response = new Float64Array(n);
    this.adjoint = new Float64Array(n + pad + degree);
    this.work = new Float64Array(n + pad);
    this.solved = Array.from({ length: count }, () => new Float64Array(places.length));
  }

  /** After the host has evaluated `factors`: sets `cross` and `logDeterminant` of the readings there are. False where it cannot. */
  evaluate(factors: Factors): boolean {
    const { host, places, cross, solved } = this;
    const { count, pad, observed: n } = host;
    const { alpha, theta } = this.polynomials(factors);
    this.reach = this.respond(alpha, theta, n);
    this.early = places.findIndex((place) => place >= host.pastReach);
    if (this.early < 0) this.early = places.length;
    const first = this.envelope();
    if (first === null) return false;
    const matrix = new EnvelopeMatrix(first);
    const pasts = this.pastsOf(host);
    this.fill(matrix, host, pasts);
    if (!matrix.factor()) return false;
    this.matrix = matrix;
    for (let j = 0; j < count; j++) {
      adjointRecursion(host.innovations[j]!, this.adjoint, pad, n, theta);
      const past = host.pastOf(j);
      const column = solved[j]!;
      for (let b = 0; b < places.length; b++) {
        const place = places[b]!;
        let sum = this.adjoint[pad + place]!;
        for (let k = 0; k < alpha.lags.length && place + alpha.lags[k]! < n; k++)
          sum -= alpha.values[k]! * this.adjoint[pad + place + alpha.lags[k]!]!;
        column[b] = b < this.early ? sum - host.pastProduct(pasts[b]!, past) : sum;
      }
      matrix.forward(column);
    }
    for (let i = 0; i < count; i++) {
      for (let j = 0; j <= i; j++) {
        const value = host.cross[i * count + j]! - dot(solved[i]!, solved[j]!, 0, places.length);
        cross[i * count + j] = value;
        cross[j * count + i] = value;
      }
      if (!(host.cross[i * count + i]! <= CANCELLATION * cross[i * count + i]!)) return false;
    }
    this.logDeterminant = host.logDeterminant + matrix.logDeterminant();
    return true;
  }

  /** Puts the most likely values into the gaps of a combination of the series, given padded and differenced. */
  complete(weights: Float64Array, residual: Float64Array): void {
    const { places, differencing, solved, host } = this;
    const values = new Float64Array(places.length);
    weights.forEach((weight, j) => {
      if (weight !== 0) for (let b = 0; b < values.length; b++) values[b]! += weight * solved[j]![b]!;
    });
    this.matrix!.backward(values);
    for (let b = 0; b < places.length; b++) {
      const end = Math.min(differencing.length, host.observed - places[b]!);
      for (let i = 0; i < end; i++)
        if (differencing[i] !== 0) residual[host.pad + places[b]! + i]! -= values[b]! * differencing[i]!;
    }
  }

  /** Adds the slopes of −½ ln |F′V⁻¹F|: ½ tr of its inverse with the matrix differenced. */
  addSlopes(factors: Factors, gradient: Float64Array): void {
    const { early } = this;
    const inverse = this.matrix!.inverseWithin();
    const other = new EnvelopeMatrix(inverse.first);
    const reach = this.reach;
    const height = (at: Factors): number | null => {
      const { alpha, theta } = this.polynomials(at);
      this.respond(alpha, theta, reach);
      let host = this.host;
      if (early > 0) {
        host = this.near();
        if (!host.settle(at, this.s)) return null;
      }
      this.fill(other, host, this.pastsOf(host));
      return -other.traceWith(inverse) / 2;
    };
    let at = 0;
    for (const name of ['ar', 'ma', 'seasonalAr', 'seasonalMa'] as const) {
      const own = Float64Array.from(factors[name]);
      const step = factorStep(own, name === 'ma' || name === 'seasonalMa', this.host.observed);
      for (let i = 0; i < own.length; i++, at++) {
        const centre = own[i]!;
        const value = (shift: number) => {
          own[i] = centre + shift;
          return height({ ...factors, [name]: own });
        };
        const above = value(step);
        const below = value(-step);
        own[i] = centre;
        if (above !== null && below !== null) gradient[at]! += (above - below) / (2 * step);
        else if (above !== null || below !== null) {
          const here = height(factors)!;
          gradient[at]! += above !== null ? (above - here) / step : (here - below!) / step;
        }
      }
    }
  }

  private polynomials(factors: Factors): { alpha: SparsePolynomial; theta: SparsePolynomial } {
    const { ar, ma } = expandPolynomials(factors, this.s);
    return { alpha: sparsePolynomial(integratedAr(ar, this.differencing)), theta: sparsePolynomial(ma) };
  }

  /** π up to where it is nothing, at most `most` values; returns how many. */
  private respond(alpha: SparsePolynomial, { lags, values, degree }: SparsePolynomial, most: number): number {
    const { response } = this;
    let quiet = 0;
    let next = 0;
    for (let t = 0; t < most; t++) {
      let now = t === 0 ? 1 : 0;
      if (alpha.lags[next] === t) now -= alpha.values[next++]!;
      for (let k = 0; k < lags.length && lags[k]! <= t; k++) now -= values[k]! * response[t - lags[k]!]!;
      response[t] = now;
      quiet = Math.abs(now) < NOTHING ? quiet + 1 : 0;
      if (quiet > degree && next === alpha.lags.length) return t + 1;
    }
    return most;
  }

  /** First pulse that each has a product with; null where there are too many. */
  private envelope(): Int32Array | null {
    const { places, reach, early } = this;
    const first = new Int32Array(places.length);
    let from = 0;
    let work = 0;
    for (let i = 0; i < places.length; i++) {
      while (places[i]! - places[from]! >= reach) from++;
      first[i] = i < early ? 0 : from;
      const width = i - first[i]!;
      work += width * width;
      if (this.host.observed - places[i]! < reach || i < early) work += width * reach;
    }
    return work > MOST_WORK ? null : first;
  }

  private pastsOf(host: PulseHost): Float64Array[] {
    const { work, response, reach, places, early } = this;
    return Array.from({ length: early }, (_, b) => {
      work.fill(0);
      const from = host.pad + places[b]!;
      work.set(response.subarray(0, Math.min(reach, work.length - from)), from);
      return host.past(work);
    });
  }

  private fill(matrix: EnvelopeMatrix, host: PulseHost, pasts: readonly Float64Array[]): void {
    const { places, early, shared } = this;
    shared.clear();
    for (let i = 0; i < places.length; i++) {
      const row = matrix.rows[i]!;
      const first = matrix.first[i]!;
      for (let j = first; j <= i; j++) {
        const product = this.product(places[i]!, places[j]!);
        row[j - first] = i < early ? product - host.pastProduct(pasts[i]!, pasts[j]!) : product;
      }
    }
  }

  /** Σ_t π_{t−later} π_{t−earlier} over the record. */
  private product(later: number, earlier: number): number {
    const { response, reach, shared } = this;
    const lag = later - earlier;
    const left = this.host.observed - later;
    if (lag >= reach) return 0;
    if (left < reach - lag) return dot(response, response.subarray(lag), 0, left);
    const known = shared.get(lag);
    if (known !== undefined) return known;
    const value = dot(response, response.subarray(lag), 0, reach - lag);
    shared.set(lag, value);
    return value;
  }
}
