import type { Candidate, Order, Transform } from '../../workers/contract/candidate.ts';
import type { Dialect } from '../../workers/contract/dialect.ts';
import type { View } from '../../workers/contract/envelope.ts';
import type { SweepRange } from '../../workers/contract/selection.ts';
import type { RepairChange } from '../../workers/contract/series.ts';
import type { Result } from '../../workers/contract/result.ts';
import type { Shape } from '../../workers/contract/shape.ts';

/** Everything the page can ask for. Panels call these and nothing else; they never touch `workerClient`. */
export interface Actions {
  /** A dropped or picked file; starts an arrival. Never throws: trouble becomes a notice, the work is kept. */
  readonly openFile: (file: File) => Promise<void>;
  /** Several files of one export: put together in the order of time, overlaps reported. */
  readonly openFiles: (files: readonly File[]) => Promise<void>;
  /** Pasted text: a CSV, or a session link from any origin, of which only the hash is used. */
  readonly openText: (text: string, name: string) => Promise<void>;
  readonly openExample: (name: string) => Promise<void>;
  /** Changes how the arriving file is read, and reads it again. */
  readonly changeDialect: (settings: Partial<Dialect>) => Promise<void>;
  /** Takes the record from the arrival and fits the first three candidates (or those that a link brought). */
  readonly acceptArrival: () => void;
  /** Stops reading: goes back to what was read last, or dismisses the file. */
  readonly stopReading: () => void;
  readonly dismissArrival: () => void;
  readonly forgetRecord: () => void;

  /** The shape of the active record before any model, for this differencing and transform; `cancelled` where a newer question replaced it. */
  readonly describeShape: (order: Pick<Order, 'd' | 'D' | 's'>, transform: Transform) => Promise<Result<Shape>>;
  /** Adds those that are not in the table yet, as one step to undo, and chooses the first of them. */
  readonly addCandidates: (candidates: readonly Candidate[]) => void;
  readonly addCandidate: (candidate: Candidate) => void;
  readonly duplicateCandidate: (rowId: string) => void;
  readonly removeCandidate: (rowId: string) => void;
  /** Changes one candidate and refits that row only. */
  readonly changeCandidate: (rowId: string, part: Partial<Candidate>) => void;
  readonly fitAll: () => void;
  /** Stops every running job; rows that were waiting or fitting say so and can be fitted again. */
  readonly cancel: () => void;
  readonly choose: (rowId: string | null) => void;
  /** Asks for a prediction of the chosen candidate. */
  readonly predict: (horizon: number) => void;

  /** Marks a reading of the record as the one spoken of. */
  readonly pick: (index: number | null) => void;
  /** Fits every candidate of a range of orders; transform, estimator and inputs are those of the chosen candidate. */
  readonly sweep: (range: SweepRange) => void;
  readonly stopSweep: () => void;

  /** Checks the interval of one parameter of the chosen candidate by simulation. */
  readonly checkInterval: (about: string) => void;
  readonly stopCheck: (about: string) => void;

  /** Makes a repair at the end of the list; fits are made again. Trouble becomes a notice, and nothing changes. */
  readonly repair: (change: RepairChange, why: string) => Promise<void>;
  readonly removeRepair: (id: string) => Promise<void>;
  /** Exchanges a repair with the one before (−1) or behind it (1). */
  readonly moveRepair: (id: string, by: -1 | 1) => Promise<void>;
  /** Writes down why a repair was made. */
  readonly explainRepair: (id: string, why: string) => void;

  readonly changeView: (part: Partial<View>) => void;
  readonly undo: () => void;
  readonly redo: () => void;
  readonly dismissNotice: (id: string) => void;

  /** The session link; `inline` puts the readings in where they are few enough. `tooLong`: offer a file instead. */
  readonly sessionLink: (inline: boolean) => Promise<{ readonly url: string; readonly tooLong: boolean }>;
  /** Copies the link to the clipboard and says so in a notice. */
  readonly copySessionLink: (inline: boolean) => Promise<void>;
  /** Downloads the session as a file of the same content as the link. */
  readonly saveSessionFile: () => Promise<void>;
  /** Writes the dossier of the chosen candidate and downloads it. */
  readonly saveDossier: () => Promise<void>;
}
