import { studentTUpperTail } from './studentTUpperTail.ts';

/**
 * P(T ≤ t) of Student's t: P(T > −t), see `studentTUpperTail`.
 *
 * @param t any number; @param df degrees of freedom, > 0, not necessarily whole; Infinity is the normal law
 * @returns 0 and 1 at the infinities; NaN where df ≤ 0 or an argument is NaN
 * @example studentTCdf(1, 1) = .75
 */
export function studentTCdf(t: number, df: number): number {
  return studentTUpperTail(-t, df);
}
