import { incompleteBeta } from './incompleteBeta.ts';

/**
 * Both tails of F.
 *
 * Method: I_y(d2/2, d1/2) with y = d2/(d2 + d1 x) (Abramowitz & Stegun 26.6.2), y and 1 − y formed without subtraction.
 *
 * @param x any number; @param d1, d2 degrees of freedom of numerator and denominator, > 0, finite, not necessarily whole
 * @returns each tail to its own relative accuracy, about 1e−13; NaN where d1 or d2 ≤ 0 or an argument is NaN
 * @example x = 1, d1 = d2: both ½
 */
export function fisherFTails(x: number, d1: number, d2: number): { cdf: number; upperTail: number } {
  if (!(d1 > 0 && d2 > 0 && d1 + d2 < Infinity) || Number.isNaN(x)) return { cdf: NaN, upperTail: NaN };
  if (x <= 0) return { cdf: 0, upperTail: 1 };
  const ratio = (d1 / d2) * x;
  const { lower, upper } = incompleteBeta(d2 / 2, d1 / 2, 1 / (1 + ratio), 1 / (1 + 1 / ratio));
  return { cdf: upper, upperTail: lower };
}
