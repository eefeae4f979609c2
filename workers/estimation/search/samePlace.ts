import type { Landing } from './climb.ts';

/** Ends of two climbs to one maximum differ by no more than this in ln L. */
const LEVEL = 1e-5;

/**
 * Whether two climbs ended on one maximum: equally high, and either close to each other or joined by a straight ridge
 * that nowhere dips (a flat likelihood, such as that of a cancelling AR–MA pair, is one maximum and not many).
 *
 * @param height ln L at given coordinates
 */
export function samePlace(height: (x: Float64Array) => number, one: Landing, other: Landing): boolean {
  if (Math.abs(one.logLikelihood - other.logLikelihood) > LEVEL) return false;
  let apart = 0;
  for (let i = 0; i < one.x.length; i++) apart = Math.max(apart, Math.abs(one.x[i]! - other.x[i]!));
  if (apart < 1e-3) return true;
  const floor = Math.min(one.logLikelihood, other.logLikelihood) - LEVEL;
  return [0.25, 0.5, 0.75].every((part) => height(one.x.map((x, i) => x + part * (other.x[i]! - x))) >= floor);
}
