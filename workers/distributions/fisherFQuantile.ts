import { fisherFCdf } from './fisherFCdf.ts';
import { fisherFUpperTail } from './fisherFUpperTail.ts';
import { quantileByTails } from './quantileByTails.ts';

/** Quantile of F for a lower-tail probability p; 0 and Infinity at the ends, NaN outside. */
export function fisherFQuantile(p: number, d1: number, d2: number): number {
  if (!(d1 > 0 && d2 > 0)) return NaN;
  return quantileByTails({ cdf: (x) => fisherFCdf(x, d1, d2), upperTail: (x) => fisherFUpperTail(x, d1, d2) }, p, 0);
}
