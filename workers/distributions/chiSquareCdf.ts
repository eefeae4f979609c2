import { incompleteGamma } from './incompleteGamma.ts';

/**
 * P(X ≤ x) of chi-square.
 *
 * Method: P(df/2, x/2), see `incompleteGamma` (Abramowitz & Stegun 26.4.19).
 *
 * @param x any number; @param df degrees of freedom, > 0, finite, not necessarily whole
 * @returns relative error about 1e−13; 0 for x ≤ 0; NaN where df ≤ 0 or an argument is NaN
 * @example chiSquareCdf(3.841458820694124, 1) = .95
 */
export function chiSquareCdf(x: number, df: number): number {
  return x < 0 && df > 0 && df < Infinity ? 0 : incompleteGamma(df / 2, x / 2).lower;
}
