import { chiSquareCdf } from './chiSquareCdf.ts';
import { chiSquareUpperTail } from './chiSquareUpperTail.ts';
import { quantileByTails } from './quantileByTails.ts';

/** Quantile of chi-square for a lower-tail probability p; 0 and Infinity at the ends, NaN outside. */
export function chiSquareQuantile(p: number, df: number): number {
  if (!(df > 0)) return NaN;
  return quantileByTails({ cdf: (x) => chiSquareCdf(x, df), upperTail: (x) => chiSquareUpperTail(x, df) }, p, 0);
}
