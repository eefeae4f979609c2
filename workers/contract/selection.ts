import type { Estimator } from './candidate.ts';
import type { Criteria } from './fit.ts';

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
