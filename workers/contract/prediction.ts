import type { Fit } from './fit.ts';

/** Predicted readings 1…horizon after the end of the record, on the record's scale unless the fit transforms. */
export interface Prediction {
  readonly horizon: number;
  /** Conditional mean on the scale of the model (transformed scale where the candidate transforms). */
  readonly expected: Float64Array;
  /** Standard deviation of the prediction error from the innovations alone, parameters taken as known. */
  readonly standardError: Float64Array;
  readonly coverage: number;
  /** Bounds of the band, back on the record's scale. */
  readonly lower: Float64Array;
  readonly upper: Float64Array;
  /** Median on the record's scale; equal to `expected` without a transform. */
  readonly median: Float64Array;
}

export interface PredictRequest {
  readonly fit: Fit;
  readonly values: Float64Array;
  readonly horizon: number;
  readonly coverage: number;
  /** Index of the first reading predicted, from 1 to `values.length`, which it is when left out. Later readings are not used. */
  readonly origin?: number;
  /** Covariates continued over the horizon: each `origin + horizon` long (less its lag, at least). */
  readonly columns?: Readonly<Record<string, Float64Array>>;
}
