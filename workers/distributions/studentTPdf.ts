import { normalPdf } from './normalPdf.ts';
import { stirlingRemainder } from './stirlingRemainder.ts';

/**
 * Density of Student's t.
 *
 * Method: the ratio of gamma functions from the remainders of Stirling's formula, so that many degrees of freedom cost no digits.
 *
 * @param t any number; @param df degrees of freedom, > 0, not necessarily whole; Infinity is the normal law
 * @returns 0 at the infinities; NaN where df ≤ 0 or an argument is NaN
 * @example studentTPdf(0, 1) = 1/π
 */
export function studentTPdf(t: number, df: number): number {
  if (!(df > 0)) return NaN;
  if (df === Infinity) return normalPdf(t);
  const half = df / 2;
  // ln Γ(half + ½) − ln Γ(half) − ½ ln half
  const ratio = half * Math.log1p(0.5 / half) - 0.5 + stirlingRemainder(half + 0.5) - stirlingRemainder(half);
  return Math.exp(ratio - (half + 0.5) * Math.log1p((t / df) * t)) / Math.sqrt(2 * Math.PI);
}
