import type { Dialect, StampForm } from '../../contract/dialect.ts';
import { joinStampParts } from '../stamps/joinStampParts.ts';
import { CellReader } from '../cells/cellReader.ts';
import { StampReader, type OrderTally } from '../stamps/stampReader.ts';
import { isRule } from '../sniff/sniffLayout.ts';
import { ColumnTally } from './columnTally.ts';
import { GrowingFloats, GrowingInts } from './growable.ts';
import { splitRows } from './splitRows.ts';
import { timeColumns } from './timeColumns.ts';

/** Everything known about a file before its rows are read in earnest. */
export interface RowPlan {
  readonly text: string;
  readonly dialect: Omit<Dialect, 'grid' | 'valueColumn'>;
  /** First character behind the preamble, and its line. */
  readonly from: number;
  readonly line: number;
  readonly columns: number;
  /** What every number of a column is followed by (`7.31 pH`); empty for most. */
  readonly suffixes: readonly string[];
}

/** Shape of a row: as it should be, with cells missing at its end, or with cells too many. */
export const rowShape = { whole: 0, short: 1, long: 2 } as const;

/** First row of a piece of the text, to find rows again. */
export interface Mark {
  readonly row: number;
  readonly from: number;
  readonly line: number;
}

export interface RawRow {
  readonly row: number;
  readonly line: number;
  readonly cells: readonly string[];
}

/** The rows of a file as columns. */
export interface RowsRead {
  readonly rows: number;
  readonly lines: Int32Array;
  readonly columns: readonly ColumnTally[];
  /** Seconds, or counts, as the stamps are written; NaN where unreadable. null: no time column. */
  readonly times: Float64Array | null;
  /** Minutes east of Greenwich named by the stamps; `noOffset` where one names none; null where none does. */
  readonly offsets: Int32Array | null;
  readonly badStamps: readonly RawRow[];
  readonly badStampCount: number;
  /** Stamps that were a time of day without a date. */
  readonly dateless: number;
  readonly order: OrderTally;
  readonly shapes: Uint8Array;
  readonly emptyLines: readonly number[];
  readonly emptyCount: number;
  /** Index into `tagNames` of each row in the long layout. */
  readonly tags: Int32Array | null;
  readonly tagNames: readonly string[];
  /** 1 where the status column says to leave the row out. */
  readonly leftOut: Uint8Array | null;
  readonly marks: readonly Mark[];
  readonly first: readonly RawRow[];
  readonly openQuote: number;
}

export const noOffset = -0x8000;
const PLACES_KEPT = 8;
const FIRST_KEPT = 12;

const isBlankRow = (cells: readonly string[]): boolean => cells.every((cell) => cell.trim() === '');

/** Reads rows one after the other into growing columns. */
class RowCollector {
  readonly lines = new GrowingInts();
  readonly times = new GrowingFloats();
  readonly offsets = new GrowingInts();
  readonly shapes = new GrowingInts();
  readonly tags = new GrowingInts();
  readonly out = new GrowingInts();
  readonly columns: ColumnTally[];
  readonly tagIndex = new Map<string, number>();
  readonly first: RawRow[] = [];
  readonly badStamps: RawRow[] = [];
  readonly emptyLines: number[] = [];
  badStampCount = 0;
  emptyCount = 0;
  dateless = 0;
  anyOffset = false;
  rows = 0;
  /** Rows up to the last that is not blank. */
  filled = 0;
  readonly stamps: StampReader;
  private readonly cells: CellReader;
  private readonly keep: ReadonlySet<string>;
  private readonly plan: RowPlan;
  private readonly isTime: readonly boolean[];

  constructor(plan: RowPlan) {
    this.plan = plan;
    const times = timeColumns(plan.dialect);
    this.isTime = plan.suffixes.map((_, j) => times.has(j));
    this.columns = plan.suffixes.map((suffix) => new ColumnTally(suffix));
    this.stamps = new StampReader((plan.dialect.stamp ?? 'number') satisfies StampForm, plan.dialect.decimal);
    this.cells = new CellReader(plan.dialect);
    this.keep = new Set(plan.dialect.status?.keep.map((word) => word.trim()));
  }

  take(cells: string[], line: number): void {
    const { dialect, columns } = this.plan;
    const blank = cells.length === 1 ? cells[0]!.trim() === '' : isBlankRow(cells);
    if (blank && columns > 1) {
      this.emptyCount++;
      if (this.emptyLines.length < PLACES_KEPT) this.emptyLines.push(line);
      return;
    }
    const row = this.rows++;
    if (!blank) this.filled = this.rows;
    this.lines.push(line);
    if (this.first.length < FIRST_KEPT) this.first.push({ row, line, cells });
    let shape: number = rowShape.whole;
    if (cells.length < columns) shape = rowShape.short;
    else if (cells.length > columns && !isBlankRow(cells.slice(columns))) shape = rowShape.long;
    this.shapes.push(shape);
    if (dialect.timeColumn !== null) this.takeStamp(cells, line, row);
    if (dialect.tagColumn !== null) this.takeTag(cells[dialect.tagColumn]?.trim() ?? '');
    if (dialect.status !== null) this.out.push(this.keep.has(cells[dialect.status.column]?.trim() ?? '') ? 0 : 1);
    for (let j = 0; j < columns; j++) {
      if (this.isTime[j]!) continue;
      this.columns[j]!.take(shape === rowShape.long ? undefined : cells[j], row, this.cells);
    }
  }

  private takeStamp(cells: string[], line: number, row: number): void {
    const { timeColumn, clockColumn, stampColumns } = this.plan.dialect;
    let text = stampColumns === null ? (cells[timeColumn!] ?? '') : joinStampParts(cells, stampColumns);
    if (clockColumn !== null) text = `${text.trim()} ${cells[clockColumn] ?? ''}`;
    const time = this.stamps.read(text);
    this.times.push(time);
    if (Number.isNaN(time)) {
      this.badStampCount++;
      if (this.badStamps.length < PLACES_KEPT) this.badStamps.push({ row, line, cells });
    } else if (this.stamps.hasClock && !this.stamps.hasDate) this.dateless++;
    const named = !Number.isNaN(this.stamps.offset);
    if (named) this.anyOffset = true;
    this.offsets.push(named ? this.stamps.offset : noOffset);
  }

  private takeTag(tag: string): void {
    let index = this.tagIndex.get(tag);
    if (index === undefined) this.tagIndex.set(tag, (index = this.tagIndex.size));
    this.tags.push(index);
  }
}

/**
 * Reads all rows of a file in one pass into typed columns.
 *
 * Every column but the time is read as numbers, whichever of them will be the record, so that choosing another value
 * column or judging the columns needs no second pass. Rows with cells too many give their time but no values, since it is
 * not known which cell was split; rows with cells missing at the end give those they have. Blank rows are counted and
 * skipped, except in a file of one column, where a blank line is a gap.
 *
 * @param plan the text and how it is written
 * @param progress called with the fraction done
 * @returns columns, stamps, and what was odd, with places
 */
export function readRows(plan: RowPlan, progress?: (fraction: number) => void): RowsRead {
  const { text, dialect, from, line } = plan;
  const collector = new RowCollector(plan);
  const marks: Mark[] = [];
  let told = 0;
  let heading = (dialect.header ? 1 : 0) + (dialect.unitsRow ? 1 : 0);
  const end = splitRows(
    { text, delimiter: dialect.delimiter, quote: dialect.quote, from, line },
    {
      piece: (at, lineThere) => {
        marks.push({ row: collector.rows, from: at, line: lineThere });
        if (at - told > text.length / 100) {
          told = at;
          progress?.(at / text.length);
        }
        return true;
      },
      row: (cells, lineThere) => {
        if (heading > 0) {
          if (!isBlankRow(cells)) heading--;
        } else if (collector.rows > 0 || !isRule(cells)) collector.take(cells, lineThere);
        return true;
      },
    },
  );
  const rows = collector.filled;
  return {
    rows,
    lines: collector.lines.view().subarray(0, rows),
    columns: collector.columns,
    times: dialect.timeColumn === null ? null : collector.times.view().subarray(0, rows),
    offsets: collector.anyOffset ? collector.offsets.view().subarray(0, rows) : null,
    badStamps: collector.badStamps,
    badStampCount: collector.badStampCount,
    dateless: collector.dateless,
    order: collector.stamps.tally,
    shapes: Uint8Array.from(collector.shapes.view().subarray(0, rows)),
    emptyLines: collector.emptyLines,
    emptyCount: collector.emptyCount,
    tags: dialect.tagColumn === null ? null : collector.tags.view().subarray(0, rows),
    tagNames: [...collector.tagIndex.keys()],
    leftOut: dialect.status === null ? null : Uint8Array.from(collector.out.view().subarray(0, rows)),
    marks,
    first: collector.first,
    openQuote: end.openQuote,
  };
}
