import type { Landing, Terrain } from './climb.ts';

/** Ends of two climbs to one maximum differ by no more than this in ln L. */
const LEVEL = 1e-5;
/** And by no more than this in a coefficient. */
const NEAR = 2e-3;

/**
 * Whether two climbs ended on one maximum: equally high, and either close to each other or joined by a straight ridge
 * that nowhere dips (a flat likelihood, such as that of a cancelling AR–MA pair, is one maximum and not many). Closeness
 * is judged by coefficients too: with all roots of a factor on the circle several partials stand for one polynomial.
 */
export function samePlace({ space, height }: Terrain, one: Landing, other: Landing): boolean {
  if (Math.abs(one.logLikelihood - other.logLikelihood) > LEVEL) return false;
  space.place(other.x);
  const coefficients = space.coefficients.all.slice();
  space.place(one.x);
  if (space.coefficients.all.every((value, i) => Math.abs(value - coefficients[i]!) < NEAR)) return true;
  const floor = Math.min(one.logLikelihood, other.logLikelihood) - LEVEL;
  return [0.25, 0.5, 0.75].every((part) => {
    const between = one.x.map((x, i) => x + part * (other.x[i]! - x));
    return space.place(between) && height(space.coefficients) >= floor;
  });
}
