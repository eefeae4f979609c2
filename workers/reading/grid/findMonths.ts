import { medianDifference } from './medianDifference.ts';
import { civilFromDays } from '../stamps/civilFromDays.ts';
import { daysFromCivil } from '../stamps/daysFromCivil.ts';

/** A record by calendar months. `exact`: every stamp is on the same day of the month (or its end) at the same time. */
export interface MonthsFound {
  readonly step: number;
  readonly exact: boolean;
  readonly bad: number;
}

const DAY = 86400;
const SHORTEST = 27.5 * DAY;

/** Months since January 1970 of a moment of the clock. */
export function monthOf(seconds: number): number {
  const { year, month } = civilFromDays(Math.floor(seconds / DAY));
  return (year - 1970) * 12 + month - 1;
}

/**
 * Whether a record is kept by months, quarters or years, and the step in months.
 *
 * Method: neighbouring stamps at least 27½ days apart in the median; exact where day of the month (or the end of the month)
 * and time of day never change; otherwise at most one stamp a month.
 *
 * @param times ascending, distinct seconds, at least two
 * @returns the step in months; null for a record that is not monthly
 */
export function findMonths(times: Float64Array): MonthsFound | null {
  if (medianDifference(times) < SHORTEST) return null;
  const months = Array.from(times, monthOf);
  const clock = ((times[0]! % DAY) + DAY) % DAY;
  const days = Array.from(times, (time) => civilFromDays(Math.floor(time / DAY)));
  const latest = Math.max(...days.map(({ day }) => day));
  const exact = days.every(({ year, month, day }, i) => {
    const sameClock = ((times[i]! % DAY) + DAY) % DAY === clock;
    return sameClock && (day === latest || (latest > 28 && Number.isNaN(daysFromCivil(year, month, day + 1))));
  });
  const counts = new Map<number, number>();
  for (let i = 1; i < months.length; i++) {
    const step = months[i]! - months[i - 1]!;
    if (step === 0) return null;
    counts.set(step, (counts.get(step) ?? 0) + 1);
  }
  let best: MonthsFound | null = null;
  for (const step of counts.keys()) {
    const bad = months.filter((month) => (month - months[0]!) % step !== 0).length;
    if (best === null || bad < best.bad || (bad === best.bad && step > best.step)) best = { step, exact, bad };
  }
  return best;
}
