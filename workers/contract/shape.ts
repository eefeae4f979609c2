import type { Candidate, Order, Transform } from './candidate.ts';
import type { Axis, Span } from './series.ts';

/** The shape of a record before any model: everything for the readings of `window` after `order`'s differencing. */
export interface ShapeRequest {
  /** The whole record after its repairs, gaps as NaN. */
  readonly values: Float64Array;
  readonly axis: Axis;
  readonly window?: Span;
  readonly order: Pick<Order, 'd' | 'D' | 's'>;
  /** Applied before differencing; none when left out. */
  readonly transform?: Transform;
  /** Of the bands; 0.95 when left out. */
  readonly coverage?: number;
}

/** What a differenced record looks like over the lag. Arrays have one element a lag, lags 1…m. */
export interface ShapeLags {
  readonly correlations: Float64Array;
  readonly partials: Float64Array;
  /** Pairs of readings observed at each lag. */
  readonly pairs: Int32Array;
  /** Half-width for independent readings at each lag, from the pairs observed. */
  readonly independentBand: Float64Array;
  /** Half-width at lag k if the memory ended at lag k − 1 (Bartlett). */
  readonly endedBand: Float64Array;
  readonly coverage: number;
}

/** A length of time that people keep. */
export type CalendarPeriod = 'hour' | 'shift' | 'day' | 'week' | 'quarter' | 'year';

/** A period that stands out of its surroundings in the periodogram. */
export interface NamedPeriod {
  /** Cycles per reading, refined between the Fourier frequencies. */
  readonly frequency: number;
  /** Readings in one cycle. */
  readonly period: number;
  /** The calendar period it cannot be told from, and which harmonic of it (1: itself). */
  readonly calendar: { readonly name: CalendarPeriod; readonly readings: number; readonly harmonic: number } | null;
  /** Share of the sum of squares about the mean in this peak. */
  readonly share: number;
  /** Ordinate over its surroundings. */
  readonly contrast: number;
  /** Probability of a contrast this large anywhere, were there no period. */
  readonly pValue: number;
}

export interface ShapeSpectrum {
  /** Cycles per reading; at most some 1 200 of them, the largest ordinate of its stretch at each. */
  readonly frequencies: Float64Array;
  readonly ordinates: Float64Array;
  /** What the surroundings of each of these frequencies would give without a period. */
  readonly background: Float64Array;
  readonly periods: readonly NamedPeriod[];
  /** Readings averaged into one before the transform, on long records; 1: none. Periods below twice this are not looked for. */
  readonly averaged: number;
  /** Fisher's test of the largest ordinate against independent readings. */
  readonly fisher: { readonly statistic: number; readonly pValue: number; readonly ordinates: number };
}

/**
 * Means of what a reading departs from the mean of its own cycle. `hour`: by hour of the day; `weekday`: from Monday;
 * `month`: from January; `phase`: by place in a season of `places` readings, from the first reading of the record.
 */
export interface SeasonalView {
  readonly by: 'hour' | 'weekday' | 'month' | 'phase';
  readonly places: number;
  /** Readings in a cycle. */
  readonly period: number;
  readonly means: Float64Array;
  /** Standard error of each mean from the scatter between cycles; NaN from fewer than two cycles. */
  readonly standardErrors: Float64Array;
  readonly cycles: number;
  /** Share of the variance within cycles that the means account for, less what chance alone would give; 0…1. */
  readonly share: number;
}

/** How the spread of the readings goes with their level, over blocks. */
export interface SpreadAgainstLevel {
  readonly block: number;
  readonly means: Float64Array;
  readonly deviations: Float64Array;
  /** Slope of log deviation on log mean with its standard error; NaN where a reading is not positive. */
  readonly slope: number;
  readonly slopeError: number;
  /** Largest block mean over the smallest; NaN where a reading is not positive. */
  readonly levelRatio: number;
  /** Box–Cox λ of highest ln L with its 95 % interval, ends at the limits searched; null where a reading is not positive. */
  readonly lambda: { readonly value: number; readonly from: number; readonly to: number } | null;
}

export interface DifferencingLine {
  readonly d: number;
  readonly D: number;
  readonly variance: number;
  readonly lagOne: number;
  /** Autocorrelation at the season; NaN without one. */
  readonly lagSeason: number;
  readonly readings: number;
}

/** A unit-root test with constant, or constant and trend. Critical values at 1, 5 and 10 %. */
export interface UnitRootTest {
  readonly trend: 'constant' | 'trend';
  readonly statistic: number;
  readonly critical: readonly [number, number, number];
  /** NaN where only the critical values speak. */
  readonly pValue: number;
  /** Lagged differences in the regression, or lags of the long-run variance. */
  readonly lags: number;
  readonly readings: number;
  /** At 5 %. */
  readonly rejects: boolean;
}

/** `stationary`: only the unit root is rejected; `unitRoot`: only stationarity; `neither`: both; `open`: none. */
export type UnitRootOutcome = 'stationary' | 'unitRoot' | 'neither' | 'open';

export interface UnitRootPair {
  /** Null hypothesis: a unit root. */
  readonly dickeyFuller: UnitRootTest;
  /** Null hypothesis: stationary about a constant or a trend. */
  readonly kpss: UnitRootTest;
  readonly outcome: UnitRootOutcome;
}

export type Sureness = 'clear' | 'likely' | 'open';

/**
 * One reason of the advice as data. Numbers by code:
 * `unitRoot`, `stationary`, `bothRejected`, `neitherRejected`: d, D (of the series tested), adf, adfCritical, kpss, kpssCritical; `varianceFalls`, `varianceRises`: d (after), before, after;
 * `overDifferenced`: d, lagOne; `tooFew`: readings; `noSeason`: none; `periodStands`: period, share, pValue; `lagSeason`: s, r;
 * `seasonPersists`, `seasonFixed`: s, r; `seasonTooLong`: period, most; `seasonNotWhole`: period; `spreadGrows`: slope, error, ratio;
 * `spreadEven`: slope, error; `levelsAlike`: ratio; `notPositive`: none; `lambda`: value, from, to; `white`: lags;
 * `partialsEnd`, `correlationsEnd`: lag, band; `bothDecay`: partialLag, correlationLag; `seasonalMemory`: s, r; `drift`: mean, error.
 */
export interface AdviceReason {
  readonly about: 'd' | 'D' | 's' | 'transform' | 'orders' | 'level';
  readonly code:
    | 'unitRoot'
    | 'stationary'
    | 'bothRejected'
    | 'neitherRejected'
    | 'varianceFalls'
    | 'varianceRises'
    | 'overDifferenced'
    | 'tooFew'
    | 'noSeason'
    | 'periodStands'
    | 'lagSeason'
    | 'seasonPersists'
    | 'seasonFixed'
    | 'seasonTooLong'
    | 'seasonNotWhole'
    | 'spreadGrows'
    | 'spreadEven'
    | 'levelsAlike'
    | 'notPositive'
    | 'lambda'
    | 'white'
    | 'partialsEnd'
    | 'correlationsEnd'
    | 'bothDecay'
    | 'seasonalMemory'
    | 'drift';
  readonly numbers: Readonly<Record<string, number>>;
}

/** What to try first. Advice on the whole record, whatever differencing is on show. */
export interface ShapeAdvice {
  readonly order: Pick<Order, 'd' | 'D' | 's'>;
  readonly transform: Transform;
  readonly sureness: {
    readonly d: Sureness;
    readonly season: Sureness;
    readonly transform: Sureness;
    readonly orders: Sureness;
  };
  readonly reasons: readonly AdviceReason[];
  /** The first is the one advised; the others are what to hold against it. */
  readonly candidates: readonly Candidate[];
}

export interface Shape {
  /** The request's settings, filled. */
  readonly order: Pick<Order, 'd' | 'D' | 's'>;
  readonly transform: Transform;
  readonly window: Span;
  readonly readings: number;
  readonly gaps: number;
  readonly lags: ShapeLags;
  readonly spectrum: ShapeSpectrum;
  readonly seasonal: readonly SeasonalView[];
  readonly spread: SpreadAgainstLevel;
  readonly differencing: readonly DifferencingLine[];
  /** Of the readings as shown, `averaged` of them taken as one on long records; null where too few are left. */
  readonly unitRoots: {
    readonly constant: UnitRootPair;
    readonly trend: UnitRootPair;
    readonly averaged: number;
  } | null;
  readonly advice: ShapeAdvice;
}
