import { incompleteGamma } from './incompleteGamma.ts';

/**
 * erf x = 2/√π ∫₀ˣ exp(−t²) dt.
 *
 * Method: ±P(½, x²) (NIST DLMF 7.11.1), see `incompleteGamma`.
 *
 * @param x any number
 * @returns relative error below 1e−14; ±1 at the infinities, NaN for NaN
 * @example errorFunction(1) = 0.8427007929497149
 */
export function errorFunction(x: number): number {
  const { lower } = incompleteGamma(0.5, x * x);
  // x itself below the smallest square: erf x = 2x/√π there.
  if (Math.abs(x) < 1e-150) return (2 / Math.sqrt(Math.PI)) * x;
  return x < 0 ? -lower : lower;
}
