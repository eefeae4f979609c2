import { normalUpperTail } from './normalUpperTail.ts';

/**
 * P(Z ≤ x) of the standard normal, accurate in its tail: P(Z > −x), see `normalUpperTail`.
 *
 * @param x any number
 * @returns 0 and 1 at the infinities, NaN for NaN
 * @example normalCdf(−1.96) = 0.024997895148220435
 */
export function normalCdf(x: number): number {
  return normalUpperTail(-x);
}
