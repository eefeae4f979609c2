import type { Dialect } from '../../../workers/contract/dialect.ts';
import type { Judgement } from '../../../workers/contract/diagnostics.ts';
import type { View } from '../../../workers/contract/envelope.ts';
import type { Fit } from '../../../workers/contract/fit.ts';
import type { Prediction } from '../../../workers/contract/prediction.ts';
import type { ReadRecord } from '../../../workers/contract/reading.ts';
import type { Result } from '../../../workers/contract/result.ts';
import type { IntegratedIntervals, InvertedInterval } from '../../../workers/contract/uncertainty.ts';
import type { Repair } from '../../../workers/contract/series.ts';

/** What a dossier is made from: the inputs that produced the fit, never the current form. */
export interface ReportInput {
  readonly fileName: string;
  readonly fileHash: string;
  readonly example: boolean;
  readonly dialect: Dialect;
  readonly repairs: readonly Repair[];
  readonly record: ReadRecord;
  /** The record as read from the file, before any repair. */
  readonly raw?: ReadRecord;
  readonly fit: Fit;
  readonly judgement: Judgement;
  readonly prediction: Prediction | null;
  /** Null before they are known. */
  readonly intervals: Result<IntegratedIntervals> | null;
  /** Intervals of single parameters checked by simulation. */
  readonly checks: readonly InvertedInterval[];
  readonly view: View;
  readonly madeAt: Date;
}
