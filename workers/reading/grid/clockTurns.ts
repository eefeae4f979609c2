import type { Grid } from './findGrid.ts';
import type { Placement } from './placeOnGrid.ts';

const HOUR = 3600;
const DAY = 86400;
/** 1 January 1970 was a Thursday, four days after a Sunday. */
const THURSDAY = 4;

/**
 * Rows where a clock without zone was put back by an hour.
 *
 * Method: the stamp falls behind its place by just an hour. In hourly records it merely repeats, which counts only in the
 * first three hours of a Sunday, when clocks are changed.
 *
 * @param times seconds of the clock by row; @param placement rows on the grid; @param grid of the record
 * @returns row numbers among the first rows that turn back or repeat; none for steps longer than an hour
 */
export function clockTurns(times: Float64Array, placement: Placement, grid: Grid): number[] {
  if (grid.kind !== 'seconds' || grid.step > HOUR) return [];
  const back = (row: number) => times[row - 1]! + grid.step - times[row]!;
  const anHour = (row: number) => row > 0 && Math.abs(back(row) - HOUR) < grid.step * 0.5;
  const onSunday = (row: number) =>
    (Math.floor(times[row]! / DAY) + THURSDAY) % 7 === 0 && times[row]! % DAY <= 3 * HOUR;
  const repeated = placement.duplicates.filter((row) => times[row] === times[row - 1] && anHour(row) && onSunday(row));
  return [...placement.reversed.filter(anHour), ...repeated];
}
