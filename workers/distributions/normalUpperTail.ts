import { incompleteGamma } from './incompleteGamma.ts';

/**
 * P(Z > x) of the standard normal, relative accuracy in the tail about 1e−14.
 *
 * Method: ½ Q(½, x²/2) for x ≥ 0 (NIST DLMF 7.11.2), its complement below.
 *
 * @returns NaN for NaN; 0 and 1 at the infinities
 */
export function normalUpperTail(x: number): number {
  const { lower, upper } = incompleteGamma(0.5, 0.5 * x * x);
  return x >= 0 ? 0.5 * upper : 0.5 * (1 + lower);
}
