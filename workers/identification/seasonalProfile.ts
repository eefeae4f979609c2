import type { Axis } from '../contract/series.ts';
import type { SeasonalView } from '../contract/shape.ts';
import { plantClock } from './plantClock.ts';

const DAY = 86_400;
const YEAR = 365.2425 * DAY;
const FEWEST_CYCLES = 3;
/** Share of its places that a cycle must have observed. */
const WHOLE = 0.75;
const MOST_PLACES = 120;

/**
 * Seasonal means: what a reading departs from the mean of its own cycle, by its place in the cycle.
 *
 * Method: means by place within each cycle, less their mean over the cycle, so that a wandering level does not enter; averaged over the cycles, with a
 * standard error from the scatter between them. Cycles with less than three quarters of their places observed are left out. The share is
 * the mean square of the seasonal means over that of all departures, less what C cycles give by chance, (r − 1/C)/(1 − 1/C). Elementary
 * two-way means (Box & Jenkins, Time Series Analysis, §9.1.1 shows the layout).
 *
 * @param values gaps as NaN; @param axis of the record, its start that of the first value
 * @param by how places are told; `hour`, `weekday` and `month` follow the record's wall clock
 * @param season readings in a season, for `phase` (above 120 phases are taken together)
 * @returns null where the interval is too long for this view or fewer than three cycles are whole
 */
export function seasonalProfile(
  values: Float64Array,
  axis: Axis,
  by: SeasonalView['by'],
  season = 0,
): SeasonalView | null {
  const layout = layoutOf(axis, by, season);
  if (layout === null || values.length < FEWEST_CYCLES * WHOLE * layout.period) return null;
  const { places, placeOf, period } = layout;
  const sums = new Float64Array(places);
  const squares = new Float64Array(places);
  const counts = new Int32Array(places);
  const sum = new Float64Array(places);
  const seen = new Int32Array(places);
  let cycles = 0;
  let current = NaN;
  const close = () => {
    const full = seen.reduce((total, count) => total + (count > 0 ? 1 : 0), 0);
    if (full >= WHOLE * places && full > 1) {
      cycles++;
      let middle = 0;
      for (let i = 0; i < places; i++) if (seen[i]! > 0) middle += sum[i]! / seen[i]! / full;
      for (let i = 0; i < places; i++) {
        if (seen[i] === 0) continue;
        const departure = sum[i]! / seen[i]! - middle;
        sums[i]! += departure;
        squares[i]! += departure * departure;
        counts[i]! += 1;
      }
    }
    sum.fill(0);
    seen.fill(0);
  };
  for (let t = 0; t < values.length; t++) {
    const value = values[t]!;
    if (Number.isNaN(value)) continue;
    const { place, cycle } = placeOf(t);
    if (cycle !== current) {
      if (!Number.isNaN(current)) close();
      current = cycle;
    }
    sum[place]! += value;
    seen[place]! += 1;
  }
  close();
  if (cycles < FEWEST_CYCLES) return null;
  const means = sums.map((total, i) => total / counts[i]!);
  const standardErrors = squares.map((total, i) => {
    const count = counts[i]!;
    return count < 2 ? NaN : Math.sqrt(Math.max(0, total / count - means[i]! ** 2) / (count - 1));
  });
  return { by, places, period, means, standardErrors, cycles, share: shareOf(means, squares, counts, cycles) };
}

function shareOf(means: Float64Array, squares: Float64Array, counts: Int32Array, cycles: number): number {
  let regular = 0;
  let all = 0;
  for (let i = 0; i < means.length; i++) {
    if (counts[i] === 0) continue;
    regular += counts[i]! * means[i]! ** 2;
    all += squares[i]!;
  }
  return all > 0 ? Math.max(0, (regular / all - 1 / cycles) / (1 - 1 / cycles)) : 0;
}

interface Layout {
  readonly places: number;
  readonly period: number;
  readonly placeOf: (t: number) => { place: number; cycle: number };
}

function layoutOf(axis: Axis, by: SeasonalView['by'], season: number): Layout | null {
  if (by === 'phase') {
    if (!(season >= 2)) return null;
    const places = Math.min(season, MOST_PLACES);
    return {
      places,
      period: season,
      placeOf: (t) => ({ place: Math.floor(((t % season) * places) / season), cycle: Math.floor(t / season) }),
    };
  }
  if (axis.kind === 'months') {
    if (by !== 'month' || ![1, 2, 3, 4, 6].includes(axis.step)) return null;
    const places = 12 / axis.step;
    const first = ((axis.start % axis.step) + axis.step) % axis.step;
    return {
      places,
      period: places,
      placeOf: (t) => {
        const month = axis.start + t * axis.step - first;
        const year = Math.floor(month / 12);
        return { place: (month - 12 * year) / axis.step, cycle: year };
      },
    };
  }
  if (axis.kind !== 'seconds' || axis.step > (by === 'hour' ? 3600 : by === 'weekday' ? DAY : 31 * DAY)) return null;
  const clock = plantClock(axis);
  const dayOf = (t: number) => Math.floor(clock(t) / DAY);
  if (by === 'hour')
    return {
      places: 24,
      period: DAY / axis.step,
      placeOf: (t) => {
        const seconds = clock(t);
        const day = Math.floor(seconds / DAY);
        return { place: Math.floor((seconds - day * DAY) / 3600), cycle: day };
      },
    };
  if (by === 'weekday')
    return {
      places: 7,
      period: (7 * DAY) / axis.step,
      placeOf: (t) => {
        // 1 January 1970 was a Thursday, three days into its week.
        const day = dayOf(t) + 3;
        const week = Math.floor(day / 7);
        return { place: day - 7 * week, cycle: week };
      },
    };
  let known = NaN;
  let answer = { place: 0, cycle: 0 };
  return {
    places: 12,
    period: YEAR / axis.step,
    placeOf: (t) => {
      const day = dayOf(t);
      if (day !== known) {
        known = day;
        const date = new Date(1000 * DAY * day);
        answer = { place: date.getUTCMonth(), cycle: date.getUTCFullYear() };
      }
      return answer;
    },
  };
}
