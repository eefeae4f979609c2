import { logGamma } from './logGamma.ts';

const TINY = 1e-300;
const MOST = 100_000;

/**
 * Regularised incomplete beta function I_x(a, b) and its complement.
 *
 * Method: the continued fraction NIST DLMF 8.17.22 by the modified Lentz method, on the side of the mean where it converges, so that the
 * smaller of the two keeps its relative accuracy.
 *
 * @param a > 0; @param b > 0; @param x in [0, 1]; @param y = 1 − x where the caller knows it better than by subtraction
 * @returns NaN outside the domain
 */
export function incompleteBeta(a: number, b: number, x: number, y = 1 - x): { lower: number; upper: number } {
  if (!(a > 0 && b > 0 && x >= 0 && x <= 1)) return { lower: NaN, upper: NaN };
  if (x === 0) return { lower: 0, upper: 1 };
  if (y === 0) return { lower: 1, upper: 0 };
  const front = Math.exp(a * Math.log(x) + b * Math.log(y) - logBeta(a, b));
  if (x < (a + 1) / (a + b + 2)) {
    const lower = (front * fraction(a, b, x)) / a;
    return { lower, upper: 1 - lower };
  }
  const upper = (front * fraction(b, a, y)) / b;
  return { lower: 1 - upper, upper };
}

/** ln B(a, b). */
function logBeta(a: number, b: number): number {
  return logGamma(a) + logGamma(b) - logGamma(a + b);
}

function fraction(a: number, b: number, x: number): number {
  let c = 1;
  let d = 1 - ((a + b) * x) / (a + 1);
  if (Math.abs(d) < TINY) d = TINY;
  d = 1 / d;
  let h = d;
  for (let m = 1; m < MOST; m++) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 + even * d;
    if (Math.abs(d) < TINY) d = TINY;
    c = 1 + even / c;
    if (Math.abs(c) < TINY) c = TINY;
    d = 1 / d;
    h *= d * c;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 + odd * d;
    if (Math.abs(d) < TINY) d = TINY;
    c = 1 + odd / c;
    if (Math.abs(c) < TINY) c = TINY;
    d = 1 / d;
    const change = d * c;
    h *= change;
    if (Math.abs(change - 1) < 1e-16) break;
  }
  return h;
}
