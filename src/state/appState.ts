import type { Candidate } from '../../workers/contract/candidate.ts';
import type { Dialect } from '../../workers/contract/dialect.ts';
import type { Judgement } from '../../workers/contract/diagnostics.ts';
import type { View } from '../../workers/contract/envelope.ts';
import type { Failure } from '../../workers/contract/failures.ts';
import type { Fit } from '../../workers/contract/fit.ts';
import type { ForensicReport } from '../../workers/contract/forensics.ts';
import type { Prediction } from '../../workers/contract/prediction.ts';
import type { JoinedPart, JoinRequest, ReadAnswer, ReadRecord, WorkbookText } from '../../workers/contract/reading.ts';
import type { ComparisonGroup, SweepMode, SweepRange, SweepRanking } from '../../workers/contract/selection.ts';
import type { Result } from '../../workers/contract/result.ts';
import type { IntegratedIntervals, InvertedInterval } from '../../workers/contract/uncertainty.ts';
import type { Repair, Span } from '../../workers/contract/series.ts';

/** How far a candidate row has come. */
export type RowProgress =
  | { readonly kind: 'waiting' }
  | { readonly kind: 'fitting' }
  | { readonly kind: 'fitted'; readonly fit: Fit; readonly judgement: Judgement | null }
  | { readonly kind: 'failed'; readonly failure: Failure };

/** A result with its evidence, where that is known already. */
export interface RowResult {
  readonly fit: Fit;
  readonly judgement: Judgement | null;
}

export interface Row {
  readonly id: string;
  readonly candidate: Candidate;
  readonly progress: RowProgress;
  /** The result before the last edit, kept beside the new one until that is judged. */
  readonly grey: RowResult | null;
}

/** A file being looked at before a record is taken from it. */
export interface Arrival {
  readonly fileName: string;
  readonly fileHash: string;
  readonly text: string;
  /** Settings the person changed; the rest is detected. */
  readonly settings: Partial<Dialect>;
  /** The last answer, kept while other settings are tried; null before the first. */
  readonly answer: ReadAnswer | null;
  readonly reading: boolean;
  readonly fraction: number;
  /** Files it came from, kept to be decoded again another way; none for pasted text. */
  readonly files: readonly File[];
  /** Texts that `text` was joined of, and where each begins in it; none for a single one. */
  readonly pieces: JoinRequest['files'];
  readonly parts: readonly JoinedPart[];
  /** Sheets of a workbook; none for text. */
  readonly sheets: WorkbookText['sheets'];
}

/** Where a record's readings are. `wanted`: the session came from a link and the file has not been given yet. */
export type Source =
  | {
      readonly kind: 'loaded';
      readonly fileName: string;
      readonly text: string;
      /** The record as it is worked on, repairs included. */
      readonly record: ReadRecord;
      /** The record as read from the file; repairs are replayed from it, and nothing changes it. */
      readonly raw: ReadRecord;
      /** One of the invented examples that come with the page. */
      readonly example: boolean;
    }
  | { readonly kind: 'wanted' };

export interface RecordState {
  readonly id: string;
  readonly fileHash: string;
  readonly seriesHash: string;
  readonly dialect: Dialect;
  readonly repairs: readonly Repair[];
  readonly window: Span;
  readonly holdOut: Span | null;
  readonly rows: readonly Row[];
  readonly source: Source;
}

/** Answer of the core about rows: `rowIds[i]` is the row that a member's `index` i speaks of. */
export interface Comparison {
  readonly rowIds: readonly string[];
  readonly groups: readonly ComparisonGroup[];
}

/** A sweep over a range of orders, under way or done. */
export interface SweepState {
  readonly recordId: string;
  readonly range: SweepRange;
  readonly mode: SweepMode;
  /** Candidates of the range. */
  readonly size: number;
  readonly fits: readonly Fit[];
  readonly failed: number;
  readonly passedOver: number;
  readonly running: boolean;
  /** Null until it is done. */
  readonly ranking: SweepRanking | null;
  readonly failure: Failure | null;
}

/** Intervals of one fit, which they belong to whatever row shows it. */
export interface FitIntervals {
  readonly fit: Fit;
  readonly answer: Result<IntegratedIntervals>;
}

/** One parameter's interval checked by simulation; `answer` null while it is under way. */
export interface IntervalCheck {
  readonly fit: Fit;
  readonly about: string;
  readonly fraction: number;
  readonly answer: Result<InvertedInterval> | null;
}

/** The report on one state of a record, which its hash names. */
export interface Inspection {
  readonly seriesHash: string;
  readonly answer: Result<ForensicReport>;
}

/** A message to the person; stays until dismissed. `failure` says what, where and what to do through `format`. */
export interface Notice {
  readonly id: string;
  readonly tone: 'trouble' | 'note';
  readonly failure: Failure | null;
  readonly text: string;
}

export interface AppState {
  readonly records: readonly RecordState[];
  /** Id of the active record; null shows the empty sheet. */
  readonly active: string | null;
  readonly view: View;
  readonly arrival: Arrival | null;
  readonly notices: readonly Notice[];
  readonly undoDepth: number;
  readonly redoDepth: number;
  /** Which rows may be compared by criteria, and their differences; of the rows fitted when it was made. */
  readonly comparison: Comparison;
  /** Prediction for the chosen candidate, or null where none was asked for yet. */
  readonly prediction: { readonly rowId: string; readonly fit: Fit; readonly prediction: Prediction } | null;
  /** Index of the reading clicked in the record's chart. */
  readonly picked: number | null;
  readonly sweep: SweepState | null;
  readonly intervals: readonly FitIntervals[];
  readonly checks: readonly IntervalCheck[];
  /** What the logger did to the active record, repairs included; null until it is known. */
  readonly forensics: Inspection | null;
  /** True until an autosaved session or the link has been looked at. */
  readonly opening: boolean;
}
