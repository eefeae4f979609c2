import { incompleteBeta } from './incompleteBeta.ts';

/**
 * Both tails of F from the incomplete beta function; see `fisherFUpperTail`. `lower` is P(F > x), `upper` P(F ≤ x) by the names of I_y.
 */
export function fisherFTails(x: number, d1: number, d2: number): { lower: number; upper: number } {
  if (!(d1 > 0 && d2 > 0) || Number.isNaN(x)) return { lower: NaN, upper: NaN };
  if (x <= 0) return { lower: 1, upper: 0 };
  if (x === Infinity) return { lower: 0, upper: 1 };
  const whole = d2 + d1 * x;
  return incompleteBeta(d2 / 2, d1 / 2, d2 / whole, (d1 * x) / whole);
}
