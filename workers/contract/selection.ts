import type { Candidate, Estimator, Level } from './candidate.ts';
import type { Criteria, Fit } from './fit.ts';
import type { Span } from './series.ts';

/** What two fits must share before their criteria may be compared, and the key made of it. */
export interface Comparability {
  readonly key: string;
  /** Fingerprint of the record, fit window and number of readings used. */
  readonly readings: string;
  readonly d: number;
  readonly D: number;
  /** Season of the seasonal difference; 0 where D = 0. */
  readonly s: number;
  readonly likelihood: Estimator;
  /** Identifiers of events accepted after a search, joined. */
  readonly events: string;
}

/**
 * Standing of one fit among those it may be compared with. `differences`: each criterion less the smallest of its group
 * (aicc null where undefined). `weight`: Akaike weight by AICc, by AIC where AICc is undefined for one of the group.
 */
export interface Standing {
  /** Index into the fits given. */
  readonly index: number;
  readonly comparability: Comparability;
  readonly differences: Criteria;
  readonly weight: number;
}

/** Fits that may be compared with each other, largest group first; members by AICc (AIC), best first. */
export interface ComparisonGroup {
  readonly key: string;
  /** Which parts of the key differ from those of the first group. */
  readonly differsIn: readonly ('readings' | 'differencing' | 'likelihood' | 'events')[];
  readonly weightBy: 'aicc' | 'aic';
  readonly members: readonly Standing[];
}

/** Orders a sweep goes over, ends included. A level that a differencing does not allow is left out there. */
export interface SweepRange {
  readonly p: readonly [least: number, most: number];
  readonly q: readonly [least: number, most: number];
  readonly P: readonly [least: number, most: number];
  readonly Q: readonly [least: number, most: number];
  readonly d: readonly number[];
  readonly D: readonly number[];
  /** 0: no season, and then P, D and Q are 0. */
  readonly s: number;
  readonly levels: readonly Level[];
}

/** `all`: every candidate of the range; `walk`: from neighbour to neighbour towards the best. */
export type SweepMode = 'all' | 'walk';

/** What a sweep will do: one list of candidates for each worker to fit, warm-started from one another. */
export interface SweepPlan {
  readonly mode: SweepMode;
  /** Candidates of the whole range. */
  readonly size: number;
  readonly parts: readonly (readonly Candidate[])[];
}

export interface SweepRequest {
  readonly values: Float64Array;
  readonly window?: Span;
  readonly columns?: Readonly<Record<string, Float64Array>>;
  readonly candidates: readonly Candidate[];
  /** With `walk` the candidates are places to start from, and `range` bounds the walk. */
  readonly mode: SweepMode;
  readonly range: SweepRange;
  readonly seed: number;
  readonly seriesHash?: string;
}

/** What has been done since the last report. */
export interface SweepReport {
  readonly fits: readonly Fit[];
  /** Candidates that could not be fitted. */
  readonly failed: number;
  /** Candidates passed over: no fit of theirs could come near the best. */
  readonly passedOver: number;
}

/** Fits of a sweep in their standing, larger ones that say nothing new folded into the smaller. */
export interface SweepRanking {
  readonly groups: readonly ComparisonGroup[];
  readonly folded: readonly { readonly index: number; readonly into: number }[];
  /** Of the first group: how many stand within 2 of the best, and the best's share of the weight among those not folded. */
  readonly near: number;
  readonly weight: number;
}
