import { logGamma } from './logGamma.ts';

const TINY = 1e-300;
const MOST = 100_000;

/**
 * Regularised incomplete gamma functions P(a, x) and Q(a, x) = 1 − P.
 *
 * Method: the power series for x < a + 1, the continued fraction by the modified Lentz method above (NIST DLMF 8.11.4, 8.9.2), so that
 * the smaller of the two keeps its relative accuracy, about 1e−14·max(1, x, a).
 *
 * @param a > 0; @param x ≥ 0
 * @returns NaN outside the domain
 */
export function incompleteGamma(a: number, x: number): { lower: number; upper: number } {
  if (!(a > 0) || !(x >= 0)) return { lower: NaN, upper: NaN };
  if (x === 0) return { lower: 0, upper: 1 };
  if (x === Infinity) return { lower: 1, upper: 0 };
  const front = Math.exp(a * Math.log(x) - x - logGamma(a));
  if (x < a + 1) {
    let term = 1 / a;
    let sum = term;
    for (let n = 1; n < MOST; n++) {
      term *= x / (a + n);
      sum += term;
      if (term < sum * 1e-17) break;
    }
    const lower = sum * front;
    return { lower, upper: 1 - lower };
  }
  let b = x + 1 - a;
  let c = 1 / TINY;
  let d = 1 / b;
  let h = d;
  for (let i = 1; i < MOST; i++) {
    const an = -i * (i - a);
    b += 2;
    d = an * d + b;
    if (Math.abs(d) < TINY) d = TINY;
    c = b + an / c;
    if (Math.abs(c) < TINY) c = TINY;
    d = 1 / d;
    const change = d * c;
    h *= change;
    if (Math.abs(change - 1) < 1e-16) break;
  }
  const upper = front * h;
  return { lower: 1 - upper, upper };
}
