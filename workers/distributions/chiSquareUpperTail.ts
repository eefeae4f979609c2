import { incompleteGamma } from './incompleteGamma.ts';

/**
 * P(X > x) of chi-square.
 *
 * Method: Q(df/2, x/2), see `incompleteGamma` (Abramowitz & Stegun 26.4.19).
 *
 * @param x any number; @param df degrees of freedom, > 0, finite, not necessarily whole
 * @returns relative error about 1e−13; 1 for x ≤ 0; NaN where df ≤ 0 or an argument is NaN
 * @example chiSquareUpperTail(3.841458820694124, 1) = .05
 */
export function chiSquareUpperTail(x: number, df: number): number {
  return x < 0 && df > 0 && df < Infinity ? 1 : incompleteGamma(df / 2, x / 2).upper;
}
