import type { Dialect } from './dialect.ts';
import type { Failure } from './failures.ts';
import type { Series } from './series.ts';

/** A column as found in the file. */
export interface ColumnProfile {
  readonly index: number;
  readonly name: string;
  readonly unit: string;
  readonly numbers: number;
  readonly gaps: number;
  readonly texts: number;
  readonly role: 'time' | 'clock' | 'value' | 'tag' | 'status' | 'text' | 'empty';
  /** The distinct texts of a column that holds few of them, such as a status or a tag column. */
  readonly words?: readonly string[];
  /** Of a column with few distinct cells, numbers and empty ones among them: each cell and how often it stands. */
  readonly cells?: readonly { readonly text: string; readonly count: number }[];
}

/** One row of the preview, cells as they stand in the file, with how the value and stamp were read. */
export interface PreviewRow {
  /** Line in the file, counted from 1. */
  readonly line: number;
  readonly cells: readonly string[];
  /** Epoch seconds of the plant clock, months or count as read; NaN where unreadable. */
  readonly time: number;
  readonly value: number;
  /** What is wrong with the row, if anything. */
  readonly trouble:
    'none' | 'badStamp' | 'badValue' | 'belowLimit' | 'leftOut' | 'ragged' | 'duplicate' | 'reversed' | 'offGrid';
}

/** Found on reading; each with a count and the first places, by line in the file. */
export interface ReadingNote {
  readonly kind:
    | 'gapsInserted'
    | 'gapCells'
    | 'textCells'
    | 'raggedRows'
    | 'duplicateTimes'
    | 'reversedTimes'
    | 'jitter'
    | 'emptyRows'
    | 'ambiguousDates'
    | 'leftOutByStatus'
    | 'overlappingFiles'
    | 'clockChange'
    | 'offGrid'
    | 'digitsLost'
    /** Rows whose stamp could not be read; they are left out. */
    | 'badStamps'
    /** Rows whose stamp names no offset from UTC while others name different ones; they are left out. */
    | 'noOffset'
    /** Stamps are times of day without a date: days are counted from 1 January 1970. */
    | 'noDate'
    /** Cells such as `<0.05`: below a detection limit, kept as gaps. */
    | 'belowLimit'
    /** Rows that repeat a time with another reading; which stays is settled by `repeats`. */
    | 'conflictingTimes'
    /** Rows that share a place of the grid with others: averaged, or only the latest kept, by the rule of the grid. */
    | 'sharedPlaces';
  readonly count: number;
  readonly lines: readonly number[];
  /** First texts concerned, where there are any; for `conflictingTimes` which row stays, for `sharedPlaces` the rule of the grid. */
  readonly texts: readonly string[];
}

/**
 * A guess that the person should confirm. The first option is the one in use. Options are values of the setting they
 * answer: forms of `stamp`, decimal marks, columns counted from 0 (as text), tags.
 */
export interface Question {
  readonly about: 'dateOrder' | 'decimal' | 'valueColumn' | 'timeColumn' | 'tag';
  readonly options: readonly string[];
}

/** How the stamps follow one another, before any grid: distances between neighbouring distinct ones, commonest first. */
export interface Timing {
  readonly kind: 'seconds' | 'months' | 'index';
  /** Distance in seconds (or counts), rounded to 6 digits, and how often it occurs; the first eight. */
  readonly intervals: readonly { readonly interval: number; readonly count: number }[];
  /** Number of distances in all, and of those that lie a whole step apart within rounding. */
  readonly count: number;
  readonly regular: number;
  /** Largest distance of a row that is on the grid from its place, as a fraction of the step. */
  readonly jitter: number;
  readonly offGrid: number;
  /** Rows whose stamp stands in an earlier row as well; rows of another stamp that came to a place already taken. */
  readonly repeats: number;
  readonly crowded: number;
  readonly reversals: number;
  /** Grids that can be chosen, the one in use first; empty where the stamps are regular as they stand. */
  readonly offers: readonly NonNullable<Dialect['grid']>[];
}

/** A file before the record is taken from it: what was detected, the columns, a preview. */
export interface Sniffed {
  readonly dialect: Dialect;
  readonly columns: readonly ColumnProfile[];
  readonly first: readonly PreviewRow[];
  readonly worst: readonly PreviewRow[];
  readonly rows: number;
  readonly questions: readonly Question[];
  /** In the long layout: the tags found, in the order of their first row. */
  readonly tags?: readonly string[];
  /** null where there is no time. */
  readonly timing?: Timing | null;
}

/** A file read by one dialect. `columns` holds the other numeric columns on the same grid, by column name. */
export interface ReadRecord {
  readonly series: Series;
  readonly name: string;
  readonly dialect: Dialect;
  readonly columns: Readonly<Record<string, Float64Array>>;
  readonly notes: readonly ReadingNote[];
  readonly rows: number;
  /** Places of the series, ascending, that are gaps because the reading was below a detection limit. */
  readonly limitPlaces: Int32Array;
}

/** A piece of a text joined of several files: the file, the line of the whole where it begins, and which line of the file that is. */
export interface JoinedPart {
  readonly fileName: string;
  readonly line: number;
  readonly ownLine: number;
}

/** Files to be put one behind the other in the order of time. */
export interface JoinRequest {
  readonly files: readonly { readonly fileName: string; readonly text: string }[];
  readonly settings: Partial<Dialect>;
}

/** Files put together; `parts` in the order of the text. */
export interface JoinedFiles {
  readonly text: string;
  readonly parts: readonly JoinedPart[];
}

export interface WorkbookRequest {
  readonly bytes: ArrayBuffer;
  /** Name of the sheet; null takes the first that holds numbers. */
  readonly sheet: string | null;
}

/** One sheet of a workbook as text, and which sheets there are. */
export interface WorkbookText {
  readonly text: string;
  readonly sheet: string;
  readonly sheets: readonly { readonly name: string; readonly rows: number; readonly numbers: number }[];
  /** How the text is written. */
  readonly settings: Partial<Dialect>;
}

export interface ReadRequest {
  readonly text: string;
  readonly fileName: string;
  /** Where the text was joined of several files. */
  readonly parts?: readonly JoinedPart[];
  /** Settings the person has changed; the rest is detected. */
  readonly settings: Partial<Dialect>;
}

/** What the reading worker answers: always the sniffing when the file could be split into rows, and the record if it could be read. */
export interface ReadAnswer {
  readonly sniffed: Sniffed | null;
  readonly record: ReadRecord | null;
  readonly failure: Failure | null;
}
