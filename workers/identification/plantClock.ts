import type { Axis } from '../contract/series.ts';

/** Zones change their offset at the half hour at the earliest. */
const STRETCH = 1800;

/**
 * Seconds that the wall clock of a record shows, counted from 1970-01-01 00:00 as if it never changed its offset.
 *
 * Method: the axis itself where it is the plant clock as logged; else the offset of its IANA zone, asked of the platform once in a half hour
 * of the record.
 *
 * @param axis of kind `seconds`
 * @returns a function of the place t
 */
export function plantClock(axis: Axis): (t: number) => number {
  const { start, step, zone } = axis;
  if (zone === null) return (t) => start + t * step;
  const format = new Intl.DateTimeFormat('en-GB', {
    timeZone: zone,
    year: 'numeric',
    month: 'numeric',
    day: 'numeric',
    hour: 'numeric',
    minute: 'numeric',
    second: 'numeric',
    hourCycle: 'h23',
  });
  const offsetAt = (seconds: number): number => {
    const part: Record<string, number> = {};
    for (const { type, value } of format.formatToParts(1000 * seconds)) part[type] = Number(value);
    const shown = Date.UTC(
      part['year']!,
      part['month']! - 1,
      part['day'],
      part['hour'],
      part['minute'],
      part['second'],
    );
    return shown / 1000 - Math.floor(seconds);
  };
  let known = NaN;
  let offset = 0;
  return (t) => {
    const seconds = start + t * step;
    const stretch = Math.floor(seconds / STRETCH);
    if (stretch !== known) {
      known = stretch;
      offset = offsetAt(seconds);
    }
    return seconds + offset;
  };
}
