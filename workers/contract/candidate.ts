import type { Fit } from './fit.ts';
import type { Span } from './series.ts';

/** Orders in Box and Jenkins' notation (p,d,q)×(P,D,Q)ₛ. s = 0: no season, and then P = D = Q = 0. */
export interface Order {
  readonly p: number;
  readonly d: number;
  readonly q: number;
  readonly P: number;
  readonly D: number;
  readonly Q: number;
  readonly s: number;
}

/**
 * What is estimated beside the ARMA part. `mean`: only where d + D = 0. `drift`: only where d + D ≥ 1; the mean of the
 * differenced record, in units per step (per season where only D acts).
 */
export type Level = 'none' | 'mean' | 'drift';

/** Applied to the readings before differencing; the Jacobian is kept in ln L. `estimate`: λ counts as a parameter. */
export type Transform =
  | { readonly kind: 'none' }
  | { readonly kind: 'log' }
  | { readonly kind: 'boxCox'; readonly lambda: number | 'estimate' };

export type Estimator = 'exact' | 'conditional' | 'yuleWalker' | 'burg' | 'leastSquares';

/** Lags held at zero, 1-based, in each of the four factors (seasonal ones counted in seasons). */
export interface ZeroLags {
  readonly ar: readonly number[];
  readonly ma: readonly number[];
  readonly seasonalAr: readonly number[];
  readonly seasonalMa: readonly number[];
}

/**
 * A known input estimated along with the model. `at` is an index into the record. `step`: 0 before `at`, 1 from it on;
 * `pulse`: 1 at `at` only; `ramp`: 0 up to `at`, then rising by 1 a reading. `harmonic`: a cosine and a sine of
 * frequency k/period (the sine is left out where k = period/2). `column`: values of a covariate, `lag` readings earlier.
 */
export type Regressor =
  | { readonly kind: 'step' | 'pulse' | 'ramp'; readonly at: number }
  | { readonly kind: 'harmonic'; readonly period: number; readonly k: number }
  | { readonly kind: 'column'; readonly id: string; readonly lag: number };

/** One model under consideration with its settings. `workers/model/candidateOf.ts` fills every default. */
export interface Candidate {
  readonly order: Order;
  readonly level: Level;
  readonly transform: Transform;
  readonly estimator: Estimator;
  readonly zeroLags: ZeroLags;
  readonly regressors: readonly Regressor[];
}

/**
 * Values of the parameters. Lengths are p, q, P, Q (lags held at zero stand in their places as 0). `mean` is the mean of
 * the (differenced, transformed) record, never the constant of the difference equation; 0 where level is none.
 * `regression` has one value for each column of the regressors in order (a harmonic has two: cosine, sine).
 * Signs: z_t = Σ φ_i z_{t−i} + e_t + Σ θ_j e_{t−j}.
 */
export interface Parameters {
  readonly ar: readonly number[];
  readonly ma: readonly number[];
  readonly seasonalAr: readonly number[];
  readonly seasonalMa: readonly number[];
  readonly mean: number;
  readonly regression: readonly number[];
  readonly innovationVariance: number;
  /** Box–Cox λ where the candidate estimates it. */
  readonly lambda?: number;
}

/** What a fit is asked for. `values` is the whole record; `window` the part used (all of it when left out). */
export interface FitRequest {
  readonly values: Float64Array;
  readonly candidate: Candidate;
  readonly seed: number;
  readonly window?: Span;
  /** Values of the covariates named by `column` regressors, each as long as `values`. */
  readonly columns?: Readonly<Record<string, Float64Array>>;
  /** Parameters to start from beside the program's own starts, such as those of a smaller or neighbouring candidate. */
  readonly starts?: readonly Parameters[];
  /** Fits of other candidates on the same record: those nested in this one lend their parameters as starts. */
  readonly neighbours?: readonly Fit[];
  /** `first`: the quick answer; `thorough`: the wide search that corrects it (the default). */
  readonly effort?: 'first' | 'thorough';
  /** Hash of `values` where the caller knows it; computed otherwise. */
  readonly seriesHash?: string;
}
