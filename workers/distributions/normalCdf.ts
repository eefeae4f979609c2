import { normalUpperTail } from './normalUpperTail.ts';

/** P(Z ≤ x) of the standard normal; see `normalUpperTail`. */
export function normalCdf(x: number): number {
  return normalUpperTail(-x);
}
