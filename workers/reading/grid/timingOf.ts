import type { Timing } from '../../contract/reading.ts';
import type { Grid, GridFound } from './findGrid.ts';
import { distinctTimes } from './findGrid.ts';
import { niceStep } from './niceStep.ts';
import type { Placement } from './placeOnGrid.ts';

const KEPT = 8;
/** Distances this near to the step, as a fraction of it, are the step. */
const SAME = 1e-6;

/** How often each distance between neighbours occurs, alike to a millionth of the step, as a tidy number. */
function countIntervals(distinct: Float64Array, step: number): [interval: number, count: number][] {
  const unit = step * SAME;
  const counts = new Map<number, number>();
  let [run, key] = [0, NaN];
  // Neighbours mostly lie equally far apart: a run of equal distances is counted once.
  for (let i = 1; i <= distinct.length; i++) {
    const next = i < distinct.length ? Math.round((distinct[i]! - distinct[i - 1]!) / unit) : NaN;
    if (next === key) {
      run++;
      continue;
    }
    if (run > 0) counts.set(key, (counts.get(key) ?? 0) + run);
    [run, key] = [1, next];
  }
  return [...counts].map(([times, count]) => [Number((times * unit).toPrecision(6)), count]);
}

/** The grid in use first, then the other rules with its step, and bins wide enough that hardly one is empty. */
function offersFor(grid: Grid, distinct: Float64Array): Grid[] {
  const offers: Grid[] = [grid];
  const add = (offer: Grid) => {
    if (!offers.some(({ rule, step }) => rule === offer.rule && Math.abs(step - offer.step) <= SAME * step))
      offers.push(offer);
  };
  const wide = grid.kind === 'seconds' ? niceStep(distinct) : null;
  for (const step of [grid.step, ...(wide === null ? [] : [wide])])
    // A mean interval with a fraction is no width for bins.
    for (const rule of Number.isInteger(step) ? (['binMean', 'last'] as const) : []) add({ ...grid, step, rule });
  if (grid.rule !== 'nearest') add({ ...grid, rule: 'nearest' });
  return offers;
}

/**
 * How the stamps follow one another, and which grids can be laid under them.
 *
 * Method: distances between neighbouring distinct stamps are counted; where rows jitter, repeat, lie off the grid or lie at
 * several distances, or where the person has chosen a grid, every rule is offered at the step in use, and the mean and the
 * last reading of the narrowest usual bin of which nine in ten hold a stamp.
 *
 * @param times stamps of the record, any order; @param found its grid; @param placement its rows on it; null where it failed
 * @param chosen whether the person has settled the grid
 * @returns the report; months are counted in seconds between stamps, as written
 */
export function timingOf(times: Float64Array, found: GridFound, placement: Placement | null, chosen: boolean): Timing {
  const distinct = distinctTimes(times);
  const { grid } = found;
  // Months are counted in the seconds between their stamps.
  const monthly = grid.kind === 'months';
  const counts = countIntervals(distinct, monthly ? grid.step * 86400 : grid.step);
  const intervals = counts
    .toSorted((a, b) => b[1] - a[1] || a[0] - b[0])
    .slice(0, KEPT)
    .map(([interval, count]) => ({ interval, count }));
  let regular = 0;
  for (const [interval, count] of counts) if (Math.abs(interval - grid.step) <= SAME * grid.step) regular += count;
  const count = distinct.length - 1;
  let repeats = -distinct.length;
  for (const time of times) if (!Number.isNaN(time)) repeats++;
  const varies = monthly ? found.bad > 0 : regular < 0.9 * count;
  const odd = placement === null || placement.jitterCount + placement.offGridCount + placement.duplicateCount > 0;
  return {
    kind: grid.kind,
    intervals,
    count,
    regular: monthly ? count - found.bad : regular,
    jitter: placement?.jitter ?? 0,
    offGrid: placement?.offGridCount ?? found.bad,
    repeats,
    crowded: Math.max(0, (placement?.duplicateCount ?? 0) - repeats),
    reversals: placement?.reversedCount ?? 0,
    offers: varies || odd || chosen ? offersFor(grid, distinct) : [],
  };
}
