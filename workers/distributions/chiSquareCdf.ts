import { incompleteGamma } from './incompleteGamma.ts';

/**
 * P(X ≤ x) of chi-square. Method: P(df/2, x/2), see `incompleteGamma`.
 *
 * @param x ≥ 0 (0 below); @param df degrees of freedom > 0, not necessarily whole
 * @returns NaN where df ≤ 0 or anything is NaN
 */
export function chiSquareCdf(x: number, df: number): number {
  return x < 0 && df > 0 ? 0 : incompleteGamma(df / 2, x / 2).lower;
}
