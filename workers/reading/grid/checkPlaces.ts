import { distinctTimes, type GridFound } from './findGrid.ts';

/** A grid may have this many places in any case, this many a reading, and never more than the last. */
const FREE_PLACES = 100_000;
const PLACES_A_READING = 20;
const MOST_PLACES = 20_000_000;
/** A few stamps at an end that lie this many lengths of the rest away are misprints, not a pause. */
const FAR = 10;
const FEW = 3;

/** A grid out of proportion, with the row whose stamp makes it so. */
export interface TooLong {
  readonly places: number;
  readonly limit: number;
  readonly row: number;
}

/** Ends of the bulk of the stamps: a few at either end that are far from all others cut off. */
function bulk(sorted: Float64Array): [number, number] {
  let [from, to] = [0, sorted.length - 1];
  for (let cut = 1; cut <= FEW && sorted.length > 2 * FEW + 2; cut++) {
    if (sorted[cut]! - sorted[cut - 1]! > FAR * (sorted.at(-1)! - sorted[cut]!)) from = cut;
    const k = sorted.length - 1 - cut;
    if (sorted[k + 1]! - sorted[k]! > FAR * (sorted[k]! - sorted[0]!)) to = k;
  }
  return [sorted[from]!, sorted[to]!];
}

/**
 * Whether a grid is out of proportion to its readings, as it becomes when the year of a stamp is mistyped.
 *
 * @param times stamps in the order of the file; @param found the grid
 * @returns places, limit, and the row of the stamp farthest from the middle; null where the grid is in proportion
 */
export function checkPlaces(times: Float64Array, found: GridFound): TooLong | null {
  const sorted = distinctTimes(times);
  const [low, high] = bulk(sorted);
  const most = Math.min(MOST_PLACES, Math.max(FREE_PLACES, PLACES_A_READING * found.stamps));
  const inOne = low === sorted[0] && high === sorted.at(-1);
  if (found.places <= most && inOne) return null;
  // A stamp far off: what the places of the others would allow.
  const share = (high - low) / (sorted.at(-1)! - sorted[0]!);
  const limit = inOne ? most : Math.min(most, Math.ceil(FAR * share * found.places));
  const middle = sorted[Math.floor(sorted.length / 2)]!;
  let [row, far] = [0, -1];
  for (let i = 0; i < times.length; i++) {
    const distance = Math.abs(times[i]! - middle);
    if (distance > far) [row, far] = [i, distance];
  }
  return { places: found.places, limit, row };
}
