import { quantileByTails } from './quantileByTails.ts';
import { studentTCdf } from './studentTCdf.ts';
import { studentTUpperTail } from './studentTUpperTail.ts';

/** Quantile of Student's t for a lower-tail probability p; ±Infinity at the ends, NaN outside. */
export function studentTQuantile(p: number, df: number): number {
  if (p === 0.5 && df > 0) return 0;
  if (!(df > 0) || !(p >= 0 && p <= 1)) return NaN;
  const tails = { cdf: (x: number) => studentTCdf(x, df), upperTail: (x: number) => studentTUpperTail(x, df) };
  return p > 0.5 ? quantileByTails(tails, 1 - p, 0, true) : -quantileByTails(tails, p, 0, true);
}
