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
  /**
   * Columns that hold year, month, day, hour, minute and second where the parts of the stamp stand apart, in this order and
   * as many as there are (at least two); the first is `timeColumn`. null: the stamp stands in `timeColumn` as a whole.
   */
  readonly stampColumns: readonly number[] | null;
  readonly stamp: StampForm | null;
  /** IANA zone the stamps are read in; null is the plant clock as logged. */
  readonly zone: string | null;
  readonly valueColumn: number;
  /** Keep only rows whose status cell is one of `keep`. */
  readonly status: { readonly column: number; readonly keep: readonly string[] } | null;
  /** Texts read as a gap, compared without case and outer blanks. The empty cell always is one. */
  readonly gapWords: readonly string[];
  /** Texts read as below a detection limit, compared without case and outer blanks; `<0.05` and `≤0.05` always are. Kept as gaps. */
  readonly limitWords: readonly string[];
  /** Which reading stays where a time repeats with another one: the first or last in the file, or none (`gap`). */
  readonly repeats: 'first' | 'last' | 'gap';
  /** Sheet of a workbook that the text was taken from; null for text files. */
  readonly sheet: string | null;
  /** Grid of the record: `step` in seconds or months by `kind`; stamps off the grid follow `rule`. */
  readonly grid: {
    readonly kind: 'seconds' | 'months' | 'index';
    readonly step: number;
    readonly rule: 'nearest' | 'binMean' | 'last';
    /** Largest distance from a grid point, as a fraction of the step, that `nearest` accepts. */
    readonly tolerance: number;
  } | null;
}
