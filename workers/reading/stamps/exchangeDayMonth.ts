import { civilFromDays } from './civilFromDays.ts';
import { daysFromCivil } from './daysFromCivil.ts';

const DAY = 86400;

/**
 * The same stamps read with day and month exchanged.
 *
 * @param times seconds since 1970 by the clock, NaN where unreadable
 * @returns seconds under the other order; NaN where that is no date
 */
export function exchangeDayMonth(times: Float64Array): Float64Array {
  let lastDays = NaN;
  let lastOther = NaN;
  return times.map((time) => {
    const days = Math.floor(time / DAY);
    if (days !== lastDays) {
      lastDays = days;
      const { year, month, day } = civilFromDays(days);
      lastOther = Number.isNaN(time) ? NaN : daysFromCivil(year, day, month);
    }
    return lastOther * DAY + (time - days * DAY);
  });
}
