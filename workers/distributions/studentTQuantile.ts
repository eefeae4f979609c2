import { normalQuantile } from './normalQuantile.ts';
import { quantileByTails } from './quantileByTails.ts';
import { studentTCdf } from './studentTCdf.ts';
import { studentTUpperTail } from './studentTUpperTail.ts';

/**
 * Quantile of Student's t.
 *
 * Method: inversion of the upper tail on t > 0, see `quantileByTails`.
 *
 * @param p lower-tail probability in [0, 1]. For a small upper tail q use −studentTQuantile(q, df): 1 − q has lost its digits.
 * @param df degrees of freedom, > 0, not necessarily whole; Infinity is the normal law
 * @returns relative error about 1e−13 away from p = ½; ±Infinity at the ends; NaN outside the domain
 * @example studentTQuantile(.75, 1) = 1
 */
export function studentTQuantile(p: number, df: number): number {
  if (!(df > 0) || !(p >= 0 && p <= 1)) return NaN;
  if (df === Infinity) return normalQuantile(p);
  if (p === 0.5) return 0;
  const tails = { cdf: (x: number) => studentTCdf(x, df), upperTail: (x: number) => studentTUpperTail(x, df) };
  // 1 − p is exact for p ≥ ½.
  return p > 0.5 ? quantileByTails(tails, 1 - p, 0, true) : -quantileByTails(tails, p, 0, true);
}
