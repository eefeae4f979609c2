import type { RepairChange, Series, Span } from './series.ts';

/** What may have been done to a record before it arrived. */
export type FindingCode =
  /** Codes such as −999 that stand for "no reading", or one far-off value that keeps coming back. */
  | 'sentinel'
  /** The highest or lowest value repeated: readings cut off at the end of a range. */
  | 'clipped'
  | 'frozen'
  /** Straight lines between the readings that were kept. */
  | 'interpolated'
  | 'quantised'
  | 'outlier'
  | 'levelStep'
  | 'varianceChange'
  | 'intervalChange'
  | 'clockChange'
  /** Averages over several readings were logged. */
  | 'averaged';

/** What it does to a model that takes the readings as they stand. */
export type EffectCode =
  | 'meaningless'
  | 'tailsCut'
  | 'memoryInvented'
  | 'roundingNoise'
  | 'memoryHidden'
  | 'intervalsWrong'
  | 'mixedIntervals'
  | 'patternShifted'
  | 'filteredSignal';

/**
 * One item of the report. `places` are all stretches concerned, ascending, by index into the record inspected; `numbers`
 * are those the sentence needs, by name; `offered` what can be done about it, the best first; none where only the source can
 * mend it.
 */
export interface Finding {
  readonly code: FindingCode;
  readonly count: number;
  readonly places: readonly Span[];
  readonly numbers: Readonly<Record<string, number>>;
  readonly effect: EffectCode;
  readonly offered: readonly RepairChange[];
}

/** Why an item could not be looked for. */
export interface Untested {
  readonly code: FindingCode;
  readonly reason: 'fewReadings' | 'coarse' | 'gaps';
}

/** What the logger did to a record. `resolution` is the smallest step of the readings, 0 where none is seen. */
export interface ForensicReport {
  readonly seriesHash: string;
  readonly findings: readonly Finding[];
  readonly untested: readonly Untested[];
  readonly resolution: number;
  /** Robust standard deviation of one-step-ahead errors of a plain autoregression, in the record's unit; null: too few. */
  readonly innovationScale: number | null;
}

/** A record after its repairs, and the other columns on the same places. */
export interface RepairedRecord {
  readonly series: Series;
  readonly columns: Readonly<Record<string, Float64Array>>;
}
