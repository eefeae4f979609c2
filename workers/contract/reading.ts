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
  readonly trouble: 'none' | 'badStamp' | 'badValue' | 'ragged' | 'duplicate' | 'reversed' | 'offGrid';
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
    /** Stamps are times of day without a date: days are counted from 1 January 1970. */
    | 'noDate'
    /** Cells such as `<0.05`: below a detection limit, kept as gaps. */
    | 'belowLimit';
  readonly count: number;
  readonly lines: readonly number[];
  /** First texts concerned, where there are any. */
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
}

/** A file read by one dialect. `columns` holds the other numeric columns on the same grid, by column name. */
export interface ReadRecord {
  readonly series: Series;
  readonly name: string;
  readonly dialect: Dialect;
  readonly columns: Readonly<Record<string, Float64Array>>;
  readonly notes: readonly ReadingNote[];
  readonly rows: number;
}

export interface ReadRequest {
  readonly text: string;
  readonly fileName: string;
  /** Settings the person has changed; the rest is detected. */
  readonly settings: Partial<Dialect>;
}

/** What the reading worker answers: always the sniffing when the file could be split into rows, and the record if it could be read. */
export interface ReadAnswer {
  readonly sniffed: Sniffed | null;
  readonly record: ReadRecord | null;
  readonly failure: Failure | null;
}
