/**
 * Where the readings stand in time. `seconds`: `start` is epoch seconds of the plant clock and `step` seconds;
 * `months`: `start` counts months since January 1970 and `step` is in months; `index`: no time, readings are numbered
 * from `start`. `zone` is an IANA name, and then `start` is true epoch seconds; null is the plant clock as logged (no
 * daylight saving), and then `start` counts the seconds that clock shows. Formatted in `zone ?? 'UTC'` both read right.
 */
export interface Axis {
  readonly kind: 'seconds' | 'months' | 'index';
  readonly start: number;
  readonly step: number;
  readonly zone: string | null;
}

/** A regular record. NaN in `values` is a gap, and NaN is allowed nowhere else. `hash` is that of `values`. */
export interface Series {
  readonly values: Float64Array;
  readonly axis: Axis;
  readonly unit: string;
  readonly hash: string;
}

/** Half-open stretch of readings by index: `from` is in, `to` is out. */
export interface Span {
  readonly from: number;
  readonly to: number;
}

/**
 * What a repair does to the readings. `gaps` holds the lengths of alternating stretches from the first reading on: kept,
 * made a gap, kept, … ; what follows the last is kept. `scale` gives factor · reading + offset. `regrid`: `step` in the
 * unit of the axis.
 */
export type RepairChange =
  | { readonly kind: 'gap'; readonly from: number; readonly to: number }
  | { readonly kind: 'gaps'; readonly runs: readonly number[] }
  | { readonly kind: 'scale'; readonly factor: number; readonly offset: number; readonly unit: string }
  | { readonly kind: 'regrid'; readonly step: number; readonly rule: 'nearest' | 'binMean' | 'last' };

/** One recorded, reversible change to the readings, replayed from the raw file. `at` is an ISO stamp, `why` free text. */
export type Repair = { readonly id: string; readonly at: string; readonly why: string } & RepairChange;
