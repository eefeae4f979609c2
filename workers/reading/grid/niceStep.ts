import { medianDifference } from './medianDifference.ts';

const MINUTE = 60;
const HOUR = 3600;
const DAY = 86400;
/** Widths of bins that a clock has. */
const widths = [1, 2, 5, 10, 15, 20, 30]
  .flatMap((n) => [n, n * MINUTE])
  .concat([HOUR, 2 * HOUR, 4 * HOUR, 6 * HOUR, 8 * HOUR, 12 * HOUR, DAY, 7 * DAY])
  .sort((a, b) => a - b);
/** Share of bins that must hold a stamp. */
const FULL = 0.9;

/**
 * The narrowest bin of a clock that hardly leaves an empty place under irregular stamps.
 *
 * @param times ascending, distinct seconds, at least two
 * @returns a width of at least the median distance of which nine bins in ten hold a stamp; null where even a week is too narrow
 */
export function niceStep(times: Float64Array): number | null {
  const median = medianDifference(times);
  const [first, last] = [times[0]!, times.at(-1)!];
  for (const width of widths) {
    if (width < median) continue;
    const places = Math.floor(last / width) - Math.floor(first / width) + 1;
    let [filled, before] = [0, NaN];
    for (const time of times) {
      const place = Math.floor(time / width);
      if (place !== before) filled++;
      before = place;
    }
    if (filled >= FULL * places) return width;
  }
  return null;
}
