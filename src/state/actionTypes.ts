import type { Candidate } from '../../workers/contract/candidate.ts';
import type { Dialect } from '../../workers/contract/dialect.ts';
import type { View } from '../../workers/contract/envelope.ts';
import type { Repair, Span } from '../../workers/contract/series.ts';

/** Everything the page can ask for. Panels call these and nothing else; they never touch `workerClient`. */
export interface Actions {
  /** A dropped or picked file; starts an arrival. Never throws: trouble becomes a notice, the work is kept. */
  openFile(file: File): Promise<void>;
  /** Pasted text: a CSV, or a session link from any origin, of which only the hash is used. */
  openText(text: string, name: string): Promise<void>;
  openExample(name: string): Promise<void>;
  /** Changes how the arriving file is read, and reads it again. */
  changeDialect(settings: Partial<Dialect>): Promise<void>;
  /** Takes the record from the arrival and fits the first three candidates (or those that a link brought). */
  acceptArrival(): void;
  dismissArrival(): void;
  forgetRecord(): void;

  addCandidate(candidate: Candidate): void;
  duplicateCandidate(rowId: string): void;
  removeCandidate(rowId: string): void;
  /** Changes one candidate and refits that row only. */
  changeCandidate(rowId: string, part: Partial<Candidate>): void;
  fitAll(): void;
  /** Stops every running job; rows that were waiting or fitting say so and can be fitted again. */
  cancel(): void;
  choose(rowId: string | null): void;
  /** Asks for a prediction of the chosen candidate. */
  predict(horizon: number): void;

  addRepair(repair: Repair): void;
  removeRepair(repairId: string): void;
  setWindow(window: Span): void;

  changeView(part: Partial<View>): void;
  undo(): void;
  redo(): void;
  dismissNotice(id: string): void;

  /** The session link; `inline` puts the readings in where they are few enough. `tooLong`: offer a file instead. */
  sessionLink(inline: boolean): Promise<{ readonly url: string; readonly tooLong: boolean }>;
  /** Copies the link to the clipboard and says so in a notice. */
  copySessionLink(inline: boolean): Promise<void>;
  /** Downloads the session as a file of the same content as the link. */
  saveSessionFile(): Promise<void>;
  /** Writes the dossier of the chosen candidate and downloads it. */
  saveDossier(): Promise<void>;
}
