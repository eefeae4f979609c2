import { fisherFTails } from './fisherFTails.ts';

/**
 * P(F > x), accurate in the tail. Method: I_y(d2/2, d1/2) with y = d2/(d2 + d1 x) (Abramowitz & Stegun 26.6.2).
 *
 * @param x ≥ 0 (1 below); @param d1, d2 degrees of freedom > 0, not necessarily whole; NaN otherwise
 */
export function fisherFUpperTail(x: number, d1: number, d2: number): number {
  return fisherFTails(x, d1, d2).lower;
}
