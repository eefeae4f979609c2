import { incompleteGamma } from './incompleteGamma.ts';

/**
 * erfc x = 1 − erf x, accurate where it is small.
 *
 * Method: Q(½, x²) for x ≥ 0 (NIST DLMF 7.11.2), 1 + P(½, x²) below.
 *
 * @param x any number
 * @returns relative error below 1e−13, growing to that at x = 26, where erfc reaches 1e−296; 0 and 2 at the infinities, NaN for NaN
 * @example complementaryErrorFunction(1) = 0.15729920705028513
 */
export function complementaryErrorFunction(x: number): number {
  const { lower, upper } = incompleteGamma(0.5, x * x);
  return x < 0 ? 1 + lower : upper;
}
