import { normalCdf } from './normalCdf.ts';
import { normalUpperTail } from './normalUpperTail.ts';
import { quantileByTails } from './quantileByTails.ts';

/**
 * Quantile of the standard normal.
 *
 * @param p lower-tail probability in [0, 1]; ±Infinity at the ends, NaN outside
 * @example normalQuantile(.975) = 1.959963984540054
 */
export function normalQuantile(p: number): number {
  if (p === 0.5) return 0;
  if (p > 0.5) return quantileByTails({ cdf: normalCdf, upperTail: normalUpperTail }, 1 - p, 0, true);
  return p >= 0 ? -quantileByTails({ cdf: normalCdf, upperTail: normalUpperTail }, p, 0, true) : NaN;
}
