import type { Candidate, FitRequest } from './candidate.ts';
import type { DiagnoseRequest, Judgement } from './diagnostics.ts';
import type { Fit } from './fit.ts';
import type { ForensicReport, RepairedRecord } from './forensics.ts';
import type { Prediction, PredictRequest } from './prediction.ts';
import type {
  JoinedFiles,
  JoinRequest,
  ReadAnswer,
  ReadingNote,
  ReadRequest,
  WorkbookRequest,
  WorkbookText,
} from './reading.ts';
import type { Result } from './result.ts';
import type { ComparisonGroup, SweepPlan, SweepRange, SweepRanking, SweepReport, SweepRequest } from './selection.ts';
import type { Repair, Series } from './series.ts';
import type { IntegratedIntervals, IntervalsRequest, InversionRequest, InvertedInterval } from './uncertainty.ts';
import type { Shape, ShapeRequest } from './shape.ts';

/** Every worker answers `ready` once its code has loaded. */
interface Readiness {
  ready(): true;
}

/** `workers/entry/modelling.worker.ts`: fits, evidence with verdict and predictions of one candidate. */
export interface ModellingApi extends Readiness {
  fit(request: FitRequest): Result<Fit>;
  diagnose(request: DiagnoseRequest): Result<Judgement>;
  predict(request: PredictRequest): Result<Prediction>;
  /** The shape of the record before any model, with advice what to try first. */
  shape(request: ShapeRequest): Result<Shape>;
  /** Which of these fits may be compared by criteria, with differences and weights within each group. */
  compare(fits: readonly Fit[]): Result<readonly ComparisonGroup[]>;
  /** The candidates of a range, shared out to so many workers. */
  planSweep(range: SweepRange, like: Candidate, workers: number): Result<SweepPlan>;
  /** Fits one part of a plan. `report` is a Comlink proxy, called some times a second with what is new. */
  sweep(request: SweepRequest, report?: (news: SweepReport) => void): Result<null>;
  /** The standing of a sweep's fits. */
  rankSweep(fits: readonly Fit[]): Result<SweepRanking>;
  /** What the logger did to a record; `notes` are those from reading its file. */
  inspect(series: Series, notes?: readonly ReadingNote[]): Result<ForensicReport>;
  /** Replays repairs from the raw record; `columns` stand on the same places and follow a regrid. */
  repair(
    raw: Series,
    repairs: readonly Repair[],
    columns?: Readonly<Record<string, Float64Array>>,
  ): Result<RepairedRecord>;
  /** Intervals that hold where an estimate ± 2 standard errors does not. */
  intervals(request: IntervalsRequest): Result<IntegratedIntervals>;
  /** The same for one parameter by simulation. `progress` is a Comlink proxy, called with 0…1. */
  invert(request: InversionRequest, progress?: (fraction: number) => void): Result<InvertedInterval>;
}

/** `workers/entry/reading.worker.ts`: a file's text to a record. `progress` is a Comlink proxy, called with 0…1. */
export interface ReadingApi extends Readiness {
  read(request: ReadRequest, progress?: (fraction: number) => void): ReadAnswer;
  /** Several files to one text in the order of time. */
  join(request: JoinRequest): Result<JoinedFiles>;
}

/** `workers/entry/workbook.worker.ts`: lives for one workbook, so that its memory is given back. */
export interface WorkbookApi extends Readiness {
  read(request: WorkbookRequest): Promise<Result<WorkbookText>>;
}
