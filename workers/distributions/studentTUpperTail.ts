import { incompleteBeta } from './incompleteBeta.ts';
import { normalUpperTail } from './normalUpperTail.ts';

/**
 * P(T > t) of Student's t.
 *
 * Method: ½ I_x(df/2, ½) with x = df/(df + t²) (NIST DLMF 8.17; Abramowitz & Stegun 26.7.1), both x and 1 − x formed without subtraction.
 *
 * @param t any number; @param df degrees of freedom, > 0, not necessarily whole; Infinity is the normal law
 * @returns relative error about 1e−13 for |t| up to 1e150; 0 and 1 at the infinities; NaN where df ≤ 0 or an argument is NaN
 * @example studentTUpperTail(1, 1) = .25
 */
export function studentTUpperTail(t: number, df: number): number {
  if (!(df > 0) || Number.isNaN(t)) return NaN;
  if (df === Infinity) return normalUpperTail(t);
  const ratio = (t / df) * t;
  const { lower, upper } = incompleteBeta(df / 2, 0.5, 1 / (1 + ratio), 1 / (1 + 1 / ratio));
  return t >= 0 ? 0.5 * lower : 0.5 + 0.5 * upper;
}
