import { fisherFCdf } from './fisherFCdf.ts';
import { fisherFUpperTail } from './fisherFUpperTail.ts';
import { quantileByTails } from './quantileByTails.ts';

/**
 * Quantile of F.
 *
 * Method: inversion of the smaller tail, see `quantileByTails`.
 *
 * @param p lower-tail probability in [0, 1]; @param d1, d2 degrees of freedom, > 0, finite, not necessarily whole
 * @param upper true: p is the upper tail
 * @returns relative error about 1e−13; 0 and Infinity at the ends; NaN outside the domain
 * @example fisherFQuantile(.95, 1, 1) = 161.4476387975881
 */
export function fisherFQuantile(p: number, d1: number, d2: number, upper = false): number {
  if (!(d1 > 0 && d2 > 0 && d1 + d2 < Infinity)) return NaN;
  const tails = {
    cdf: (x: number) => fisherFCdf(x, d1, d2),
    upperTail: (x: number) => fisherFUpperTail(x, d1, d2),
  };
  return quantileByTails(tails, p, 0, upper);
}
