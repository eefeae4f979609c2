import type { Fit } from './fit.ts';
import type { Comparability } from './selection.ts';

/**
 * Innovations of a fit. Arrays are as long as the record; NaN where there is none (a gap, a reading outside the window,
 * or one spent on starting values).
 */
export interface Innovations {
  /** In the record's unit (transformed, if the candidate transforms). */
  readonly values: Float64Array;
  /** Each innovation's own standard deviation. */
  readonly standardDeviations: Float64Array;
  /** values / standardDeviations. */
  readonly standardised: Float64Array;
}

/** Autocorrelations at lags 1…m. `pairs` are the pairs of readings observed at each lag. */
export interface Correlogram {
  readonly lags: Int32Array;
  readonly correlations: Float64Array;
  readonly pairs: Int32Array;
  /** Half-width of the band at each lag for the stated coverage, and what law it rests on. */
  readonly bands: Float64Array;
  readonly bandLaw: 'independent' | 'residuals';
  readonly coverage: number;
}

/** Portmanteau statistic and p-value by lag; p is NaN where lag ≤ number of ARMA coefficients. */
export interface Portmanteau {
  readonly method: 'ljungBox' | 'monti' | 'mcLeodLi';
  readonly lags: Int32Array;
  readonly statistics: Float64Array;
  readonly degreesOfFreedom: Int32Array;
  readonly pValues: Float64Array;
  /** `chiSquare`: lag less coefficients; `weighted`: weighted chi-squares of McLeod's covariance; `simulated`. */
  readonly law: 'chiSquare' | 'weighted' | 'simulated';
}

/** A root of φ(B)Φ(Bˢ) or θ(B)Θ(Bˢ) by the modulus of its inverse and its period in readings (Infinity: none; 2: alternating). */
export interface RootPoint {
  readonly polynomial: 'ar' | 'ma';
  readonly modulus: number;
  readonly period: number;
  /** Readings in which its effect falls to 1/e: −1/ln modulus; Infinity on the circle. */
  readonly timeConstant: number;
}

/** The difference equation in numbers: coefficients of the multiplied-out polynomials, mean and constant both. */
export interface Equation {
  /** φ(B)Φ(Bˢ) multiplied out, without the differencing: z_t = Σ ar_i z_{t−i} + …; index 0 is lag 1. */
  readonly ar: Float64Array;
  /** θ(B)Θ(Bˢ) multiplied out; index 0 is lag 1. */
  readonly ma: Float64Array;
  readonly mean: number;
  /** mean · φ(1)Φ(1). */
  readonly constant: number;
}

/** Everything computed to accept or reject one fit. */
export interface Evidence {
  readonly fit: Fit;
  readonly innovations: Innovations;
  readonly correlogram: Correlogram;
  readonly partial: Correlogram;
  readonly portmanteau: Portmanteau;
  readonly roots: readonly RootPoint[];
  readonly equation: Equation;
}

export type VerdictReason =
  'notWhite' | 'white' | 'warning' | 'largeInnovations' | 'needlessCoefficient' | 'fewReadings' | 'noWaldNumbers';

/**
 * One sentence of the verdict as data, most important first. `panel` is the panel it rests on; `about` names coefficients, and
 * for `warning` the warning's code first. Numbers by reason:
 * `notWhite`, `white`: p (joint over `lags` lags), lag, statistic, degreesOfFreedom, pAtLag: the lag that speaks loudest;
 * `largeInnovations`: count, largest (signed), index, limit, p; `needlessCoefficient`: estimate, standardError, p;
 * `fewReadings`: readings, and wanted and parameters where the number of parameters is the reason;
 * `warning`, `noWaldNumbers`: those of the warning.
 */
export interface VerdictItem {
  readonly reason: VerdictReason;
  readonly weight: 'unsound' | 'doubtful' | 'supports';
  readonly numbers: Readonly<Record<string, number>>;
  readonly about?: readonly string[];
  readonly panel: 'record' | 'innovations' | 'lags' | 'estimates' | 'roots';
}

export interface Verdict {
  readonly standing: 'sound' | 'doubtful' | 'unsound';
  readonly items: readonly VerdictItem[];
}

/** Evidence with the verdict drawn from it. */
export interface Judgement {
  readonly evidence: Evidence;
  readonly verdict: Verdict;
  /** Which fits this one may be compared with by criteria. */
  readonly comparability: Comparability;
}

export interface DiagnoseRequest {
  readonly fit: Fit;
  readonly values: Float64Array;
  readonly columns?: Readonly<Record<string, Float64Array>>;
  readonly coverage: number;
  /** Largest lag; chosen from the number of readings and the season when left out. */
  readonly lags?: number;
  /** Law of the portmanteau p-values; `chiSquare` when left out. */
  readonly portmanteauLaw?: 'chiSquare' | 'weighted';
}
