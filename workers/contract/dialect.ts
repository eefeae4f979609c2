/** How the stamps in the time column are written. `number` is a plain count: no calendar time. */
export type StampForm =
  'iso' | 'yearFirst' | 'dayFirst' | 'monthFirst' | 'epochSeconds' | 'epochMilliseconds' | 'number';

/**
 * Everything that was detected about a file, and can be changed before anything is computed. Columns are counted from
 * 0. A dialect together with the file's bytes determines the Series completely.
 */
export interface Dialect {
  readonly encoding: 'utf-8' | 'utf-16le' | 'utf-16be' | 'windows-1252';
  readonly delimiter: ',' | ';' | '\t' | '|' | ' ';
  readonly quote: '"' | "'" | null;
  readonly decimal: '.' | ',';
  readonly thousands: ',' | '.' | ' ' | "'" | null;
  /** Lines before the header (or before the first data row where there is no header). */
  readonly preambleLines: number;
  readonly header: boolean;
  readonly unitsRow: boolean;
  /** `wide`: one column a tag. `long`: rows of time, tag, value; then `tagColumn` and `tag` choose the rows. */
  readonly layout: 'wide' | 'long';
  readonly tagColumn: number | null;
  readonly tag: string | null;
  /** null: the file has no time; readings are numbered. */
  readonly timeColumn: number | null;
  /** A second column that holds the time of day where date and time are apart. */
  readonly clockColumn: number | null;
  readonly stamp: StampForm | null;
  /** IANA zone the stamps are read in; null is the plant clock as logged. */
  readonly zone: string | null;
  readonly valueColumn: number;
  /** Keep only rows whose status cell is one of `keep`. */
  readonly status: { readonly column: number; readonly keep: readonly string[] } | null;
  /** Texts read as a gap, compared without case and outer blanks. The empty cell always is one. */
  readonly gapWords: readonly string[];
  /** Grid of the record: `step` in seconds or months by `kind`; stamps off the grid follow `rule`. */
  readonly grid: {
    readonly kind: 'seconds' | 'months' | 'index';
    readonly step: number;
    readonly rule: 'nearest' | 'binMean' | 'last';
    /** Largest distance from a grid point, as a fraction of the step, that `nearest` accepts. */
    readonly tolerance: number;
  } | null;
}
