import type { Dialect } from '../contract/dialect.ts';
import type { Failure } from '../contract/failures.ts';
import type { ColumnProfile, ReadingNote, ReadRecord } from '../contract/reading.ts';
import { hashValues } from '../series/hashValues.ts';
import { fillGrid } from './grid/fillGrid.ts';
import { findGrid, type Grid, type GridFound } from './grid/findGrid.ts';
import { placeOnGrid, type Placement } from './grid/placeOnGrid.ts';
import { noteOf } from './noteBook.ts';
import { checkPlaces } from './grid/checkPlaces.ts';
import { isNumeric } from './rows/profileColumns.ts';
import type { RowPlan, RowsRead } from './rows/readRows.ts';
import { columnValues, gather, rowsOfTag } from './selectRows.ts';
import { trueTimes } from './stamps/trueTimes.ts';

/** Fewer readings than this carry no information about dependence between them. */
export const NEEDED_READINGS = 8;
/** Stamps off the grid beyond this share: the record has no regular axis. */
const MOST_OFF_GRID = 0.1;
const INDEX_GRID: Grid = { kind: 'index', step: 1, rule: 'nearest', tolerance: 0.25 };

/** What the record is taken from. */
export interface TakeRequest {
  readonly plan: RowPlan;
  readonly read: RowsRead;
  readonly profiles: readonly ColumnProfile[];
  readonly valueColumn: number;
  readonly tag: number;
  readonly grid: Dialect['grid'];
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
}

const spread = (values: Float64Array): { numbers: number; constant: number | null } => {
  let [numbers, first] = [0, NaN];
  let constant = true;
  for (const value of values) {
    if (Number.isNaN(value)) continue;
    if (numbers++ === 0) first = value;
    else if (value !== first) constant = false;
  }
  return { numbers, constant: constant && numbers > 0 ? first : null };
};

function notUsable(values: Float64Array, column: string, rows: number): Failure | null {
  const { numbers, constant } = spread(values);
  if (numbers === 0) return { code: 'allGaps', column, rows };
  if (numbers < NEEDED_READINGS) return { code: 'tooFewRows', readings: numbers, needed: NEEDED_READINGS };
  return constant === null ? null : { code: 'constantColumn', column, value: constant };
}

/** A record without time: one reading a row. */
function numbered(rows: number): { found: GridFound; placement: Placement } {
  const found: GridFound = { grid: INDEX_GRID, start: 1, places: rows, bad: 0, stamps: rows, exact: true };
  return {
    found,
    placement: placeOnGrid(
      Float64Array.from({ length: rows }, (_, i) => i + 1),
      new Float64Array(rows),
      found,
    ),
  };
}

/** Lines where rows are absent: that of the first row behind each of the first stretches without one. */
function absentPlaces({ owner }: Placement): { count: number; rows: number[] } {
  let count = 0;
  const rows: number[] = [];
  for (let k = 0; k < owner.length; k++) {
    if (owner[k]! >= 0) continue;
    count++;
    if (k + 1 < owner.length && owner[k + 1]! >= 0 && rows.length < 8) rows.push(owner[k + 1]!);
  }
  return { count, rows };
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
  const { plan, read, profiles, valueColumn } = request;
  const profile = profiles[valueColumn]!;
  const rows = rowsOfTag(read, request.tag);
  const lineOf = (row: number) => read.lines[rows === null ? row : rows[row]!]!;
  const fileRow = (row: number) => (rows === null ? row : rows[row]!);
  const name = read.tags === null ? profile.name : (read.tagNames[request.tag] ?? profile.name);
  const values = gather(columnValues(read, valueColumn), rows);
  const notes: (ReadingNote | null)[] = [];
  const none = { record: null, grid: null, offGrid: [], duplicates: [], reversed: [], times: null };
  const failed = (failure: Failure, times: Float64Array | null = null): Taken => {
    return { ...none, failure, times, notes: notes.filter((note) => note !== null) };
  };
  const early = notUsable(values, name, values.length);

  let times: Float64Array | null = null;
  let zone: string | null = null;
  let found: GridFound;
  let placement: Placement;
  let calendar = false;
  if (read.times === null) {
    if (early !== null) return failed(early);
    ({ found, placement } = numbered(values.length));
  } else {
    const { dialect } = plan;
    const time = trueTimes(read, dialect);
    times = time.times;
    zone = time.zone;
    calendar = dialect.stamp !== 'number';
    const stamps = gather(times, rows);
    notes.push(
      noteOf(
        'clockChange',
        time.clockChanges.length + time.skipped.length,
        linesOf(read, [...time.clockChanges, ...time.skipped]),
      ),
    );
    if (read.dateless * 2 > read.rows) notes.push(noteOf('noDate', read.dateless, linesOf(read, [0])));
    if (read.badStampCount > 0.2 * read.rows) return failed(badStamp(read, dialect), times);
    if (early !== null) return failed(early, times);
    const grid = findGrid(stamps, calendar, request.grid);
    if (grid === null)
      return failed({ code: 'noRegularAxis', rows: stamps.length, interval: 0, offGrid: stamps.length }, times);
    const tooLong = checkPlaces(stamps, grid);
    if (tooLong !== null)
      return failed(
        { code: 'gridTooLong', places: tooLong.places, limit: tooLong.limit, line: lineOf(tooLong.row) },
        times,
      );
    found = grid;
    placement = placeOnGrid(stamps, values, grid);
    const off = placement.offGridCount;
    if (off > MOST_OFF_GRID * stamps.length)
      return failed({ code: 'noRegularAxis', rows: stamps.length, interval: grid.grid.step, offGrid: off }, times);
  }

  const rule = found.grid.rule;
  const filled = fillGrid(values, placement, rule);
  const unusable = notUsable(filled, name, filled.length);
  if (unusable !== null) return failed(unusable, times);
  const lines = (list: readonly number[]) => list.map(lineOf);
  const absent = absentPlaces(placement);
  if (read.times !== null) {
    notes.push(noteOf('gapsInserted', absent.count, lines(absent.rows)));
    notes.push(noteOf('duplicateTimes', placement.duplicateCount, lines(placement.duplicates)));
    notes.push(noteOf('reversedTimes', placement.reversedCount, lines(placement.reversed)));
    notes.push(noteOf('jitter', placement.jitterCount, [], [placement.jitter.toPrecision(2)]));
    notes.push(noteOf('offGrid', placement.offGridCount, lines(placement.offGrid)));
    if (calendar && zone === null) {
      const turned = clockTurns(gather(times!, rows), placement, found.grid);
      notes.push(noteOf('clockChange', turned.length, lines(turned)));
    }
  }
  const series = {
    values: filled,
    axis: { kind: found.grid.kind, start: found.start, step: found.grid.step, zone },
    unit: profile.unit,
    hash: hashValues(filled),
  };
  const columns = otherColumns(request, found, placement, rows, times);
  return {
    record: { series, name, columns, notes: [], rows: values.length },
    grid: found.grid,
    failure: null,
    notes: notes.filter((note) => note !== null),
    offGrid: placement.offGrid.map(fileRow),
    duplicates: placement.duplicates.map(fileRow),
    reversed: placement.reversed.map(fileRow),
    times,
  };
}

const linesOf = (read: RowsRead, rows: readonly number[]): number[] =>
  rows.filter((row) => row < read.rows).map((row) => read.lines[row]!);

function badStamp(read: RowsRead, dialect: RowPlan['dialect']): Failure {
  const first = read.badStamps[0]!;
  const column = dialect.timeColumn!;
  return {
    code: 'badStamp',
    line: first.line,
    column: column + 1,
    text: first.cells[column] ?? '',
    count: read.badStampCount,
  };
}

/**
 * Rows where a clock without zone was put back by an hour: the stamp falls behind by just that. In hourly records the
 * stamp merely repeats, which counts only in the first hours of a Sunday, when clocks are changed.
 */
function clockTurns(times: Float64Array, placement: Placement, grid: Grid): number[] {
  if (grid.kind !== 'seconds' || grid.step > 3600) return [];
  const back = (row: number) => times[row - 1]! + grid.step - times[row]!;
  const anHour = (row: number) => row > 0 && Math.abs(back(row) - 3600) < grid.step * 0.5;
  const onSunday = (row: number) => (Math.floor(times[row]! / 86400) + 4) % 7 === 0 && times[row]! % 86400 <= 3 * 3600;
  return [...placement.reversed.filter(anHour), ...placement.duplicates.filter((row) => anHour(row) && onSunday(row))];
}

/** The other numeric columns, or the other tags, on the same grid. */
function otherColumns(
  { read, profiles, valueColumn, tag }: TakeRequest,
  found: GridFound,
  placement: Placement,
  rows: Int32Array | null,
  times: Float64Array | null,
): Record<string, Float64Array> {
  const { rule } = found.grid;
  if (rows !== null && times !== null) {
    const values = columnValues(read, valueColumn);
    return Object.fromEntries(
      read.tagNames.flatMap((name, index) => {
        const theirs = rowsOfTag(read, index)!;
        const own = gather(values, theirs);
        if (index === tag || own.every((value) => Number.isNaN(value))) return [];
        return [[name, fillGrid(own, placeOnGrid(gather(times, theirs), own, found), rule)]];
      }),
    );
  }
  const others = profiles.filter(
    ({ index, role }) => index !== valueColumn && role === 'value' && isNumeric(read.columns[index]!),
  );
  return Object.fromEntries(
    others.map(({ index, name }) => [name, fillGrid(columnValues(read, index), placement, rule)]),
  );
}
