import { fisherFTails } from './fisherFTails.ts';

/** P(F ≤ x); arguments as `fisherFUpperTail`. */
export function fisherFCdf(x: number, d1: number, d2: number): number {
  return fisherFTails(x, d1, d2).upper;
}
