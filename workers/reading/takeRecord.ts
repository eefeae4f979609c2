import type { Dialect } from '../contract/dialect.ts';
import type { Failure } from '../contract/failures.ts';
import type { ColumnProfile, JoinedPart, ReadingNote, ReadRecord, Timing } from '../contract/reading.ts';
import { hashValues } from '../series/hashValues.ts';
import { checkPlaces } from './grid/checkPlaces.ts';
import { clockTurns } from './grid/clockTurns.ts';
import { fillGrid } from './grid/fillGrid.ts';
import { findGrid, type Grid, type GridFound } from './grid/findGrid.ts';
import { placeOnGrid, type Placement } from './grid/placeOnGrid.ts';
import { timingOf } from './grid/timingOf.ts';
import { limitPlaces } from './limitPlaces.ts';
import { noteOf } from './noteBook.ts';
import { otherColumns } from './otherColumns.ts';
import { overlapNote } from './overlapNote.ts';
import { findRows } from './rows/findRows.ts';
import { rowShape, type RowPlan, type RowsRead } from './rows/readRows.ts';
import { columnValues, gather, rowsOfTag } from './selectRows.ts';
import { trueTimes } from './stamps/trueTimes.ts';

/** Fewer readings than this carry no information about dependence between them. */
export const NEEDED_READINGS = 8;
/** Unreadable stamps beyond this share: they are read the wrong way, or it is no time column. */
const MOST_BAD_STAMPS = 0.2;
/** Stamps off the grid beyond this share: the record has no regular axis. */
const MOST_OFF_GRID = 0.1;
/** The same where the person has settled the grid or which row is to stay: then it is left out or settled as asked. */
const MOST_OFF_CHOSEN = 0.5;
/** Rows that repeat a stamp with another reading beyond this share: it is not known which to keep. */
const MOST_CONFLICTS = 0.2;
const INDEX_GRID: Grid = { kind: 'index', step: 1, rule: 'nearest', tolerance: 0.25 };

/** What the record is taken from. */
export interface TakeRequest {
  readonly plan: RowPlan;
  readonly read: RowsRead;
  readonly profiles: readonly ColumnProfile[];
  readonly valueColumn: number;
  readonly tag: number;
  readonly grid: Dialect['grid'];
  /** Whether the person has said which of two readings of one time stays. */
  readonly repeatsSettled: boolean;
  readonly parts: readonly JoinedPart[];
}

/** The record, or why there is none; with the rows that did not fit, for the preview. */
export interface Taken {
  readonly record: Omit<ReadRecord, 'dialect'> | null;
  readonly grid: Grid | null;
  readonly failure: Failure | null;
  readonly notes: readonly ReadingNote[];
  readonly offGrid: readonly number[];
  readonly duplicates: readonly number[];
  readonly reversed: readonly number[];
  /** Stamps as the axis counts them, one a row of the file. */
  readonly times: Float64Array | null;
  readonly timing: Timing | null;
}

/** Rows on their grid. */
interface Laid {
  readonly found: GridFound;
  readonly placement: Placement;
  readonly zone: string | null;
}

function notUsable(values: Float64Array, column: string): Failure | null {
  let [numbers, first] = [0, NaN];
  let constant = true;
  for (const value of values) {
    if (Number.isNaN(value)) continue;
    if (numbers++ === 0) first = value;
    else if (value !== first) constant = false;
  }
  if (numbers === 0) return { code: 'allGaps', column, rows: values.length };
  if (numbers < NEEDED_READINGS) return { code: 'tooFewRows', readings: numbers, needed: NEEDED_READINGS };
  return constant ? { code: 'constantColumn', column, value: first } : null;
}

/** A record without time: one reading a row. */
function numbered(rows: number): Laid {
  const found: GridFound = { grid: INDEX_GRID, start: 1, places: rows, bad: 0, stamps: rows, exact: true };
  const counts = Float64Array.from({ length: rows }, (_, i) => i + 1);
  return { found, placement: placeOnGrid(counts, new Float64Array(rows), found), zone: null };
}

/** Places without a row, and the first row behind each of the first stretches of them. */
function absentPlaces({ owner }: Placement): { count: number; rows: number[] } {
  let count = 0;
  const rows: number[] = [];
  for (let k = 0; k < owner.length; k++) {
    if (owner[k]! !== -1) continue;
    count++;
    if (k + 1 < owner.length && owner[k + 1]! >= 0 && rows.length < 8) rows.push(owner[k + 1]!);
  }
  return { count, rows };
}

/** The taking of one record, step by step; rows are those of the chosen tag unless they are called rows of the file. */
class Taking {
  readonly notes: (ReadingNote | null)[] = [];
  times: Float64Array | null = null;
  timing: Timing | null = null;
  placement: Placement | null = null;
  /** The grid tried, also where the rows do not lie on it. */
  grid: Grid | null = null;
  readonly values: Float64Array;
  readonly name: string;
  readonly rows: Int32Array | null;
  private readonly request: TakeRequest;

  constructor(request: TakeRequest) {
    const { read, profiles, valueColumn, tag } = request;
    this.request = request;
    this.rows = rowsOfTag(read, tag);
    this.values = gather(columnValues(read, valueColumn), this.rows);
    this.name = read.tags === null ? profiles[valueColumn]!.name : (read.tagNames[tag] ?? '');
  }

  fileRow(row: number): number {
    return this.rows === null ? row : this.rows[row]!;
  }

  lineOf(row: number): number {
    return this.request.read.lines[this.fileRow(row)]!;
  }

  /** Lays the rows on the grid of their stamps, or says why they have none. */
  lay(): Laid | Failure {
    const { read, plan } = this.request;
    if (read.times === null) return notUsable(this.values, this.name) ?? numbered(this.rowsBeforeFooter());
    const time = trueTimes(read, plan.dialect);
    this.times = time.times;
    const changes = [...time.clockChanges, ...time.skipped];
    const fileLines = (rows: readonly number[]) => rows.map((row) => read.lines[row]!);
    this.notes.push(noteOf('clockChange', changes.length, fileLines(changes)));
    this.notes.push(noteOf('noOffset', time.unplaced.length, fileLines(time.unplaced.slice(0, 8))));
    if (read.dateless * 2 > read.rows) this.notes.push(noteOf('noDate', read.dateless, fileLines([0])));
    if (read.badStampCount > MOST_BAD_STAMPS * read.rows) return badStamp(read, plan.dialect.timeColumn!);
    const early = notUsable(this.values, this.name);
    if (early !== null) return early;
    const stamps = gather(this.times, this.rows);
    const found = findGrid(stamps, plan.dialect.stamp !== 'number', this.request.grid);
    const rows = stamps.length;
    if (found === null) return { code: 'noRegularAxis', rows, interval: 0, offGrid: rows };
    this.grid = found.grid;
    const tooLong = checkPlaces(stamps, found);
    if (tooLong !== null) {
      this.timing = timingOf(stamps, found, null, true);
      return { code: 'gridTooLong', places: tooLong.places, limit: tooLong.limit, line: this.lineOf(tooLong.row) };
    }
    const { repeats } = plan.dialect;
    const placement = placeOnGrid(stamps, this.values, found, repeats);
    this.placement = placement;
    const chosen = this.request.grid !== null;
    this.timing = timingOf(stamps, found, placement, chosen);
    const { conflictCount, offGridCount } = placement;
    if (conflictCount > MOST_CONFLICTS * rows && !this.request.repeatsSettled) return this.repeated(placement);
    if (offGridCount > (chosen ? MOST_OFF_CHOSEN : MOST_OFF_GRID) * rows)
      return { code: 'noRegularAxis', rows, interval: found.grid.step, offGrid: offGridCount };
    this.noteTimes(stamps, found, placement, time.zone);
    return { found, placement, zone: time.zone };
  }

  /** In a record without time, words or torn rows behind the last reading (sums, remarks) are no places. */
  private rowsBeforeFooter(): number {
    const { read, valueColumn } = this.request;
    const odd = new Set(read.columns[valueColumn]!.oddRows);
    const isFooter = (row: number) => odd.has(row) || read.shapes[row] === rowShape.long;
    let rows = this.values.length;
    while (rows > 0 && Number.isNaN(this.values[rows - 1]!) && isFooter(this.fileRow(rows - 1))) rows--;
    return rows;
  }

  private repeated({ duplicates, conflictCount }: Placement): Failure {
    const { plan, read } = this.request;
    const row = this.fileRow(duplicates[0]!);
    const text = findRows(plan, read, [row])[0]?.cells[plan.dialect.timeColumn!] ?? '';
    return { code: 'repeatedStamps', line: read.lines[row]!, text, count: conflictCount };
  }

  private noteTimes(stamps: Float64Array, found: GridFound, placement: Placement, zone: string | null): void {
    const lines = (list: readonly number[]) => list.map((row) => this.lineOf(row));
    const absent = absentPlaces(placement);
    this.notes.push(
      noteOf('gapsInserted', absent.count, lines(absent.rows)),
      noteOf('duplicateTimes', placement.duplicateCount, lines(placement.duplicates)),
      noteOf('conflictingTimes', placement.conflictCount, lines(placement.conflicts), [
        this.request.plan.dialect.repeats,
      ]),
      noteOf('sharedPlaces', placement.sharedCount, [], [found.grid.rule]),
      noteOf('reversedTimes', placement.reversedCount, lines(placement.reversed)),
      noteOf('jitter', placement.jitterCount, [], [placement.jitter.toPrecision(2)]),
      noteOf('offGrid', placement.offGridCount, lines(placement.offGrid)),
    );
    this.notes.push(overlapNote(stamps, (row) => this.lineOf(row), this.request.parts));
    if (zone !== null) return;
    const turned = clockTurns(stamps, placement, found.grid);
    this.notes.push(noteOf('clockChange', turned.length, lines(turned)));
  }
}

function badStamp(read: RowsRead, column: number): Failure {
  const { line, cells } = read.badStamps[0]!;
  return { code: 'badStamp', line, column: column + 1, text: cells[column] ?? '', count: read.badStampCount };
}

/**
 * Takes the record out of the rows of a file.
 *
 * Method: rows of the chosen tag, their true times, the grid that fits them, every numeric column laid on it. Each thing
 * that was not as it should be becomes a note with its count and first lines; nothing is repaired silently.
 *
 * @param request rows, chosen column and tag, grid the person has fixed
 * @returns the record on its grid, or the failure that says why there is none
 */
export function takeRecord(request: TakeRequest): Taken {
  const taking = new Taking(request);
  const laid = taking.lay();
  const { times, name } = taking;
  const notes = () => taking.notes.filter((note) => note !== null);
  const failed = (failure: Failure): Taken => {
    const { grid, timing, placement } = taking;
    const fileRows = (list: readonly number[] = []) => list.map((row) => taking.fileRow(row));
    const places = {
      offGrid: fileRows(placement?.offGrid),
      duplicates: fileRows(placement?.duplicates),
      reversed: fileRows(placement?.reversed),
    };
    return { record: null, grid, ...places, failure, times, notes: notes(), timing };
  };
  if ('code' in laid) return failed(laid);
  const { found, placement, zone } = laid;
  const values = fillGrid(taking.values, placement, found.grid.rule);
  const unusable = notUsable(values, name);
  if (unusable !== null) return failed(unusable);
  const axis = { kind: found.grid.kind, start: found.start, step: found.grid.step, zone };
  const unit = request.profiles[request.valueColumn]!.unit;
  const series = { values, axis, unit, hash: hashValues(values) };
  const columns = otherColumns(request, found, placement, times);
  const fileRows = (list: readonly number[]) => list.map((row) => taking.fileRow(row));
  return {
    record: {
      series,
      name,
      columns,
      notes: [],
      rows: taking.values.length,
      limitPlaces: limitPlaces(request.read.columns[request.valueColumn]!, taking.rows, placement, values),
    },
    grid: found.grid,
    failure: null,
    notes: notes(),
    offGrid: fileRows(placement.offGrid),
    duplicates: fileRows(placement.duplicates),
    reversed: fileRows(placement.reversed),
    times,
    timing: taking.timing,
  };
}
