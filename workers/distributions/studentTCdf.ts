import { studentTUpperTail } from './studentTUpperTail.ts';

/** P(T ≤ t); see `studentTUpperTail`. */
export function studentTCdf(t: number, df: number): number {
  return studentTUpperTail(-t, df);
}
