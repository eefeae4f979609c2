import type { Parameters } from './candidate.ts';
import type { Fit } from './fit.ts';

/** What an interval is for: `about` a coefficient by its name in `Fit.names`, `sigma`, or something derived from them. */
export type DerivedQuantity =
  'constant' | 'gain' | 'timeConstant' | 'arModulus' | 'arPeriod' | 'maModulus' | 'maPeriod';

/** A central interval of the stated coverage. */
export interface Interval {
  readonly about: string;
  readonly lower: number;
  readonly upper: number;
  readonly median: number;
}

/** An interval for something computed from the coefficients. */
export interface DerivedInterval extends Interval {
  readonly about: DerivedQuantity;
  /** Its value at the estimates; NaN where it does not exist there (no oscillating root). */
  readonly estimate: number;
  /** Share of the weight where it exists (a period needs a complex pair of roots). */
  readonly share: number;
}

/**
 * Intervals from the likelihood integrated over parameter points (see `workers/uncertainty/integratedIntervals.ts`). `coefficients`
 * are in the order of `Fit.names`; `sigma` is the innovations' standard deviation in the (transformed) record's unit. Time
 * constants and periods are in readings.
 */
export interface IntegratedIntervals {
  readonly coverage: number;
  readonly seed: number;
  readonly coefficients: readonly Interval[];
  readonly sigma: Interval;
  readonly derived: readonly DerivedInterval[];
  /** Parameter points weighed, and how many independent ones they are worth. */
  readonly points: number;
  readonly effectiveSize: number;
  /** The assumption on stationarity: no AR root is nearer to the unit circle than this modulus, exp(−1/(3n)). */
  readonly largestArModulus: number;
  /** Share of the weight whose AR root is so near to that limit (beyond exp(−1/n)) that the limit itself decides about the level. */
  readonly nearLimit: number;
  /** Equally likely whole parameter sets, where asked for. */
  readonly draws: readonly Parameters[];
}

export interface IntervalsRequest {
  readonly fit: Fit;
  /** The record the fit was made from. */
  readonly values: Float64Array;
  readonly columns?: Readonly<Record<string, Float64Array>>;
  readonly coverage: number;
  readonly seed: number;
  /** Equally likely parameter sets wanted; none when left out. */
  readonly draws?: number;
}

/** One value of one parameter put to the test by simulation. */
export interface InversionRequest {
  readonly fit: Fit;
  readonly values: Float64Array;
  readonly columns?: Readonly<Record<string, Float64Array>>;
  /** A name of `Fit.names`. */
  readonly about: string;
  readonly coverage: number;
  readonly seed: number;
  /** Records simulated at each value tried; 199 when left out. */
  readonly replicates?: number;
}

/** A value that was tried: its likelihood ratio and how often a record simulated under it gave a larger one. */
export interface TriedValue {
  readonly value: number;
  /** 2(ln L at the estimates − ln L with the parameter held at the value). */
  readonly ratio: number;
  /** (1 + larger ones)/(1 + simulated ones). */
  readonly p: number;
}

/** All values that the simulated likelihood-ratio test does not reject at 1 − coverage. */
export interface InvertedInterval {
  readonly about: string;
  readonly coverage: number;
  readonly seed: number;
  readonly replicates: number;
  /** ∓Infinity, or the edge of the region, where no value on that side was rejected. */
  readonly lower: number;
  readonly upper: number;
  readonly tried: readonly TriedValue[];
}
