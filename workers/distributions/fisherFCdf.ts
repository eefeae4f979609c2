import { fisherFTails } from './fisherFTails.ts';

/**
 * P(F ≤ x), accurate in the lower tail; see `fisherFTails`.
 *
 * @param x any number; @param d1, d2 degrees of freedom of numerator and denominator, > 0, finite, not necessarily whole
 * @returns 0 for x ≤ 0, 1 for Infinity; NaN where d1 or d2 ≤ 0 or an argument is NaN
 * @example fisherFCdf(1, 7, 7) = .5
 */
export function fisherFCdf(x: number, d1: number, d2: number): number {
  return fisherFTails(x, d1, d2).cdf;
}
