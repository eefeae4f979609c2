import { fisherFTails } from './fisherFTails.ts';

/**
 * P(F > x), accurate in the tail; see `fisherFTails`.
 *
 * @param x any number; @param d1, d2 degrees of freedom of numerator and denominator, > 0, finite, not necessarily whole
 * @returns 1 for x ≤ 0, 0 for Infinity; NaN where d1 or d2 ≤ 0 or an argument is NaN
 * @example fisherFUpperTail(161.4476387975881, 1, 1) = .05
 */
export function fisherFUpperTail(x: number, d1: number, d2: number): number {
  return fisherFTails(x, d1, d2).upperTail;
}
