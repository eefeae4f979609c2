/**
 * Expected failures: a code and the numbers needed to explain it. Row and column numbers are counted from 1 as a
 * person sees them in the file; indices into a record are counted from 0. The words are in `src/format`.
 */
export type Failure =
  | { readonly code: 'internal'; readonly message: string }
  | { readonly code: 'cancelled' }
  | { readonly code: 'workerDied'; readonly reason: string }
  | { readonly code: 'timeout'; readonly seconds: number }
  | { readonly code: 'notFinite'; readonly what: string; readonly index: number }
  | { readonly code: 'badCandidate'; readonly field: string; readonly reason: BadCandidateReason }
  | {
      readonly code: 'tooFewReadings';
      readonly readings: number;
      readonly needed: number;
      readonly coefficients: number;
    }
  | { readonly code: 'noVariation'; readonly value: number; readonly afterDifferencing: boolean }
  | { readonly code: 'deterministic'; readonly spread: number; readonly resolution: number }
  | { readonly code: 'conditionalWithGaps'; readonly gaps: number }
  | { readonly code: 'estimatorNeedsPureAr'; readonly estimator: string }
  | { readonly code: 'estimatorNeedsNoGaps'; readonly estimator: string; readonly gaps: number }
  | {
      readonly code: 'transformDomain';
      readonly transform: string;
      readonly index: number;
      readonly value: number;
      readonly count: number;
    }
  | { readonly code: 'columnNotEstimable'; readonly column: string; readonly reason: ColumnReason }
  | { readonly code: 'columnMissing'; readonly column: string }
  | { readonly code: 'columnLength'; readonly column: string; readonly length: number; readonly needed: number }
  | { readonly code: 'columnGap'; readonly column: string; readonly index: number }
  | { readonly code: 'searchFailed'; readonly starts: number }
  | { readonly code: 'noAdmissibleMaximum'; readonly logLikelihood: number }
  | { readonly code: 'startingValuesLost'; readonly observed: number; readonly needed: number }
  /** Intervals from the likelihood need a fit by the exact likelihood. */
  | { readonly code: 'intervalsNotExact'; readonly estimator: string }
  /** Too few of the parameter points carried weight to tell an interval from them. */
  | {
      readonly code: 'intervalsUnreliable';
      readonly effectiveSize: number;
      readonly needed: number;
      readonly drawn: number;
    }
  /** A parameter that the fit does not have. */
  | { readonly code: 'noSuchParameter'; readonly name: string }
  | LinkFailure
  | ReadingFailure
  | RepairFailure;

export type BadCandidateReason =
  | 'notAWholeNumber'
  | 'negative'
  | 'tooLarge'
  | 'seasonTooShort'
  | 'seasonMissing'
  | 'meanWithDifferencing'
  | 'driftWithoutDifferencing'
  | 'zeroLagOutOfRange'
  | 'parameterLength'
  | 'variance'
  | 'window'
  | 'nonstationary'
  | 'eventOutside'
  | 'transform';

export type ColumnReason = 'annihilated' | 'inGap' | 'collinear';

/** What can be wrong with a file. `line` is counted from 1 in the file, `column` from 1. */
export type ReadingFailure =
  | { readonly code: 'emptyFile' }
  /** The browser could not get at the bytes: moved, removed or locked since it was picked. */
  | { readonly code: 'fileUnreadable'; readonly reason: string }
  | { readonly code: 'binaryFile'; readonly kind: string }
  | { readonly code: 'fileTooLarge'; readonly bytes: number; readonly limit: number }
  | {
      readonly code: 'noNumbers';
      readonly lines: number;
      readonly example: string;
      readonly line: number;
      readonly column: number;
    }
  | { readonly code: 'noSuchColumn'; readonly column: number; readonly columns: number }
  | { readonly code: 'tooFewRows'; readonly readings: number; readonly needed: number }
  | { readonly code: 'allGaps'; readonly column: string; readonly rows: number }
  | { readonly code: 'constantColumn'; readonly column: string; readonly value: number }
  | {
      readonly code: 'badStamp';
      readonly line: number;
      readonly column: number;
      readonly text: string;
      readonly count: number;
    }
  | { readonly code: 'ambiguousDates'; readonly line: number; readonly text: string }
  | { readonly code: 'noRegularAxis'; readonly rows: number; readonly interval: number; readonly offGrid: number }
  | { readonly code: 'gridTooLong'; readonly places: number; readonly limit: number; readonly line: number }
  /** Many rows share a stamp with a row of another value: the stamps are cut off, or several tags stand in one column. */
  | { readonly code: 'repeatedStamps'; readonly line: number; readonly text: string; readonly count: number }
  | { readonly code: 'unclosedQuote'; readonly line: number }
  /** Unpacked, the workbook would take this many bytes. */
  | { readonly code: 'workbookTooLarge'; readonly bytes: number; readonly limit: number }
  | { readonly code: 'workbookDamaged'; readonly reason: string }
  | { readonly code: 'workbookEmpty'; readonly sheets: readonly string[] }
  | { readonly code: 'noSuchSheet'; readonly sheet: string; readonly sheets: readonly string[] }
  /** Files that cannot be joined: what is different, in the first and in this one. */
  | {
      readonly code: 'filesDiffer';
      readonly fileName: string;
      readonly firstName: string;
      readonly what: 'columns' | 'decimal' | 'stamp' | 'time';
      readonly expected: string;
      readonly found: string;
    }
  /** Fields are separated by commas and numbers carry unquoted decimal commas: the columns cannot be told apart. */
  | { readonly code: 'decimalCommaClash'; readonly line: number; readonly text: string };

/** What can be wrong with a session link or file, and with the record given for it. */
export type LinkFailure =
  | { readonly code: 'exampleMissing'; readonly name: string }
  | { readonly code: 'linkForeign' }
  | { readonly code: 'linkDamaged'; readonly where: string }
  | { readonly code: 'linkTooLarge'; readonly characters: number; readonly limit: number }
  | { readonly code: 'linkNewer'; readonly version: number; readonly known: number }
  | { readonly code: 'recordMismatch'; readonly fileName: string; readonly sameFile: boolean };

/** A repair that cannot be replayed: its id, its place in the list (from 1), and the readings there were at that point. */
export interface RepairFailure {
  readonly code: 'repairRefused';
  readonly id: string;
  readonly place: number;
  readonly kind: 'gap' | 'gaps' | 'scale' | 'regrid';
  readonly reason: RepairReason;
  readonly readings: number;
}

/**
 * `outside`: it names readings beyond the record; `number`: a number that means nothing there (a factor of 0, a broken
 * index); `finer`: a regrid below the present interval; `tooFew`: too few readings would be left; `overflow`: a scale
 * beyond what numbers hold.
 */
export type RepairReason = 'outside' | 'number' | 'finer' | 'tooFew' | 'overflow';
