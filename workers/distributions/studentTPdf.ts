import { logGamma } from './logGamma.ts';

/** Density of Student's t with df > 0 degrees of freedom. */
export function studentTPdf(t: number, df: number): number {
  const front = logGamma((df + 1) / 2) - logGamma(df / 2) - 0.5 * Math.log(df * Math.PI);
  return Math.exp(front - ((df + 1) / 2) * Math.log1p((t * t) / df));
}
