import { incompleteGamma } from './incompleteGamma.ts';

/**
 * P(Z > x) of the standard normal.
 *
 * Method: ½ Q(½, x²/2) for x ≥ 0, ½ (1 + P(½, x²/2)) below (NIST DLMF 7.11.2, Abramowitz & Stegun 26.2.29).
 *
 * @param x any number
 * @returns relative error below 1e−13 down to 1e−300 (x = 37); 0 and 1 at the infinities, NaN for NaN
 * @example normalUpperTail(1.96) = 0.024997895148220435
 */
export function normalUpperTail(x: number): number {
  const { lower, upper } = incompleteGamma(0.5, 0.5 * x * x);
  return x < 0 ? 0.5 + 0.5 * lower : 0.5 * upper;
}
