import type { Dialect } from '../../contract/dialect.ts';
import { findMonths, monthOf } from './findMonths.ts';
import { DEFAULT_TOLERANCE, EXACT, findStep } from './findStep.ts';

export type Grid = NonNullable<Dialect['grid']>;

/** The grid of a record and its first point (seconds, months or count, as the kind says). */
export interface GridFound {
  readonly grid: Grid;
  readonly start: number;
  readonly places: number;
  /** Stamps that do not fit, of `stamps` distinct ones. */
  readonly bad: number;
  readonly stamps: number;
  /** Whether the stamps lie on the grid but for rounding. */
  readonly exact: boolean;
}

/** Distinct readable stamps in ascending order. */
export function distinctTimes(times: Float64Array): Float64Array {
  let sorted = new Float64Array(times.length);
  let [count, ascending] = [0, true];
  for (let i = 0; i < times.length; i++) {
    const time = times[i]!;
    if (Number.isNaN(time)) continue;
    if (count > 0 && time < sorted[count - 1]!) ascending = false;
    sorted[count++] = time;
  }
  sorted = sorted.subarray(0, count);
  if (!ascending) sorted.sort();
  let kept = 0;
  for (let i = 0; i < count; i++) if (i === 0 || sorted[i] !== sorted[i - 1]) sorted[kept++] = sorted[i]!;
  return sorted.subarray(0, kept);
}

/** First point of a grid through `phase` that is not after the first stamp by more than half a step. */
const startFrom = (first: number, phase: number, step: number): number =>
  phase + Math.round((first - phase) / step) * step;

/**
 * The grid of a record: kind, step, first point.
 *
 * Method: months where the day of the month stays the same, else the regular step that fits best (`findStep`), else months
 * with varying days. A step the person has fixed is kept; bins of `binMean` begin, and those of `last` end, at whole
 * multiples of the step.
 *
 * @param times stamps in seconds or counts, any order, NaN where unreadable
 * @param calendar whether they are seconds of a clock
 * @param wanted grid the person has fixed, or null
 * @returns the grid; null where fewer than two distinct stamps can be read
 */
export function findGrid(times: Float64Array, calendar: boolean, wanted: Grid | null): GridFound | null {
  const distinct = distinctTimes(times);
  const stamps = distinct.length;
  if (stamps < 2) return null;
  const [first, last] = [distinct[0]!, distinct.at(-1)!];
  const monthly = (
    step: number,
    bad: number,
    rule: Grid['rule'] = 'nearest',
    tolerance = DEFAULT_TOLERANCE,
  ): GridFound => {
    const start = monthOf(first);
    const places = Math.floor((monthOf(last) - start) / step) + 1;
    return { grid: { kind: 'months', step, rule, tolerance }, start, places, bad, stamps, exact: false };
  };
  if (wanted !== null && wanted.kind !== 'index' && calendar) {
    if (wanted.kind === 'months')
      return monthly(Math.max(1, Math.round(wanted.step)), 0, wanted.rule, wanted.tolerance);
    return regular(distinct, true, wanted);
  }
  const months = calendar ? findMonths(distinct) : null;
  if (months?.exact === true) return monthly(months.step, months.bad);
  const found = regular(distinct, calendar, wanted);
  if (months !== null && !found.exact && months.bad <= found.bad) return monthly(months.step, months.bad);
  return found;
}

function regular(distinct: Float64Array, calendar: boolean, wanted: Grid | null): GridFound {
  const kind = calendar ? 'seconds' : 'index';
  const [first, last] = [distinct[0]!, distinct.at(-1)!];
  const stamps = distinct.length;
  if (wanted !== null && wanted.rule !== 'nearest') {
    const { step } = wanted;
    const whole = wanted.rule === 'binMean' ? Math.floor : Math.ceil;
    const start = whole(first / step) * step;
    return { grid: { ...wanted, kind }, start, places: whole((last - start) / step) + 1, bad: 0, stamps, exact: false };
  }
  const found = findStep(distinct, calendar, wanted?.step);
  const grid: Grid = { kind, step: found.step, rule: 'nearest', tolerance: wanted?.tolerance ?? DEFAULT_TOLERANCE };
  const start = startFrom(first, found.phase, found.step);
  const places = Math.round((last - start) / found.step) + 1;
  return { grid, start: Number(start.toPrecision(15)), places, bad: found.bad, stamps, exact: found.distance < EXACT };
}
