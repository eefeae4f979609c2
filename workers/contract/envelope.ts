import type { Candidate } from './candidate.ts';
import type { Dialect } from './dialect.ts';
import type { Repair, Span } from './series.ts';

/** One record of a session: the file by its hash, how it was read, what was changed, and the candidates. */
export interface RecordEntry {
  readonly id: string;
  readonly fileHash: string;
  readonly seriesHash: string;
  readonly dialect: Dialect;
  readonly repairs: readonly Repair[];
  readonly window: Span;
  readonly holdOut: Span | null;
  readonly candidates: readonly Candidate[];
}

/** The sign convention numbers are shown in. Core and files always use `plus`: θ(B) = 1 + Σ θ_j Bʲ. */
export type SignConvention = 'plus' | 'minus' | 'polynomial';

/** What is looked at and how; kept in the session but not covered by undo. */
export interface View {
  /** Index of the chosen candidate in the active record, or null. */
  readonly chosen: number | null;
  readonly sort: { readonly column: string; readonly descending: boolean };
  /** Columns of the candidate table that are shown, in order. */
  readonly columns: readonly string[];
  readonly signs: SignConvention;
  /** Coverage of intervals and bands, such as 0.95. */
  readonly coverage: number;
}

/** A whole session. Fits are a cache and are not in it. */
export interface Envelope {
  readonly format: 'lagwright-session';
  readonly version: number;
  readonly records: readonly RecordEntry[];
  readonly active: string;
  readonly view: View;
}
