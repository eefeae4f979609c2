import { chiSquareCdf } from './chiSquareCdf.ts';
import { chiSquareUpperTail } from './chiSquareUpperTail.ts';
import { quantileByTails } from './quantileByTails.ts';

/**
 * Quantile of chi-square.
 *
 * Method: inversion of the smaller tail, see `quantileByTails`.
 *
 * @param p lower-tail probability in [0, 1]; @param df degrees of freedom, > 0, finite, not necessarily whole
 * @param upper true: p is the upper tail
 * @returns relative error about 1e−13; 0 and Infinity at the ends; NaN outside the domain
 * @example chiSquareQuantile(.95, 1) = 3.841458820694124
 */
export function chiSquareQuantile(p: number, df: number, upper = false): number {
  if (!(df > 0 && df < Infinity)) return NaN;
  const tails = { cdf: (x: number) => chiSquareCdf(x, df), upperTail: (x: number) => chiSquareUpperTail(x, df) };
  return quantileByTails(tails, p, 0, upper);
}
