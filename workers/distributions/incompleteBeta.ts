import { logMinusLinear } from './logMinusLinear.ts';
import { stirlingRemainder } from './stirlingRemainder.ts';

const TINY = 1e-300;
const MOST = 1_000_000;

/**
 * Regularised incomplete beta function I_x(a, b) and its complement.
 *
 * Method: the even part of the continued fraction NIST DLMF 8.17.22, in the form of DiDonato & Morris (1992, ACM Trans. Math. Softw. 18, 360–373,
 * eq. 9), by the modified Lentz method, on the side of the mean where it converges; x^a y^b/B(a, b) by remainders of Stirling's formula and
 * ln r − (r − 1). Both x and y enter, so that neither is lost beside 1.
 *
 * @param a, b > 0, finite; @param x in [0, 1]; @param y = 1 − x where the caller knows it better than by subtraction
 * @returns both, the smaller to about 1e−13 of itself for a, b in 0.1…1e8; NaN outside the domain
 * @example a = b = 1: lower x, upper y
 */
export function incompleteBeta(a: number, b: number, x: number, y = 1 - x): { lower: number; upper: number } {
  if (!(a > 0 && b > 0 && a + b < Infinity && x >= 0 && x <= 1)) return { lower: NaN, upper: NaN };
  if (x === 0) return { lower: 0, upper: 1 };
  if (y === 0) return { lower: 1, upper: 0 };
  if ((a + b + 2) * x < a + 1) {
    const lower = factor(a, b, x, y) * fraction(a, b, x, y);
    return { lower, upper: 1 - lower };
  }
  const upper = factor(a, b, x, y) * fraction(b, a, y, x);
  return { lower: 1 - upper, upper };
}

/**
 * x^a y^b/B(a, b) = √(ab/2π(a+b)) exp(a L(x(a+b)/a) + b L(y(a+b)/b) + δ(a+b) − δ(a) − δ(b)) with L(r) = ln r − (r − 1): the linear parts
 * cancel exactly.
 */
function factor(a: number, b: number, x: number, y: number): number {
  const whole = a + b;
  const off = b * x - a * y;
  const exponent = a * logMinusLinear((x * whole) / a, off / a) + b * logMinusLinear((y * whole) / b, -off / b);
  const remainder = stirlingRemainder(whole) - stirlingRemainder(a) - stirlingRemainder(b);
  return Math.sqrt((a / whole) * (b / (2 * Math.PI))) * Math.exp(exponent + remainder);
}

function fraction(a: number, b: number, x: number, y: number): number {
  const off = a * y - b * x + 1;
  let d = (a + 1) / (a * off);
  let h = d;
  let c = 1 / TINY;
  for (let n = 1; n < MOST; n++) {
    const place = a + 2 * n - 1;
    const top = (((a + n - 1) / place) * (a + b + n - 1) * n * (b - n) * x * x) / place;
    const bottom = n + (n * (b - n) * x) / place + ((a + n) * (off + n * (1 + y))) / (place + 2);
    d = top * d + bottom;
    if (Math.abs(d) < TINY) d = TINY;
    c = bottom + top / c;
    if (Math.abs(c) < TINY) c = TINY;
    d = 1 / d;
    const change = d * c;
    h *= change;
    if (Math.abs(change - 1) < 2.3e-16) break;
  }
  return h;
}
