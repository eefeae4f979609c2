import type { Axis } from '../../workers/contract/series.ts';
import { timeAt } from './axisTime.ts';

/**
 * The reading that a typed time or number means: the first at or after it.
 *
 * @param text as the page writes times (2025-03-04 16:20, or a part of it from the left), or a reading's number where there is no time
 * @param length readings of the record
 * @returns its index; null where the text is no such thing or lies outside the record
 */
export function placeOf(axis: Axis, text: string, length: number): number | null {
  const typed = text.trim().replace('T', ' ');
  if (axis.kind === 'index') {
    const number = Number(typed);
    const place = Math.ceil((number - axis.start) / axis.step);
    return typed !== '' && Number.isFinite(number) && place >= 0 && place < length ? place : null;
  }
  if (!/^\d{4}(-\d\d(-\d\d( \d\d(:\d\d(:\d\d)?)?)?)?)?$/u.test(typed)) return null;
  // Times are written in ISO 8601 order, in which text and time sort alike.
  let low = 0;
  let high = length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (timeAt(axis, middle) < typed) low = middle + 1;
    else high = middle;
  }
  return low < length && (low > 0 || timeAt(axis, 0).startsWith(typed)) ? low : null;
}
