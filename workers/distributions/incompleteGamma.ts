import { logGamma } from './logGamma.ts';
import { logMinusLinear } from './logMinusLinear.ts';
import { stirlingRemainder } from './stirlingRemainder.ts';

const TINY = 1e-300;
const MOST = 1_000_000;

/**
 * Regularised incomplete gamma functions P(a, x) and Q(a, x) = 1 − P.
 *
 * Method: the power series for x < a + 1 (NIST DLMF 8.11.4), the continued fraction by the modified Lentz method above (8.9.2); for a < 1
 * and x < a + 1, where 1 − P would cancel, Q from the series of x^{−a}γ(a, x) (8.7.1). The factor x^a e^{−x}/Γ(a) is written with the remainder
 * of Stirling's formula and ln r − (r − 1), so that large a costs no digits.
 *
 * @param a > 0, finite; @param x ≥ 0
 * @returns both, each to its own relative accuracy, about 1e−13 for a up to 1e8; NaN outside the domain
 * @example a = 1: lower 1 − e^{−x}, upper e^{−x}
 */
export function incompleteGamma(a: number, x: number): { lower: number; upper: number } {
  if (!(a > 0 && a < Infinity && x >= 0)) return { lower: NaN, upper: NaN };
  if (x === 0) return { lower: 0, upper: 1 };
  if (x === Infinity) return { lower: 1, upper: 0 };
  if (x >= a + 1) {
    const upper = factor(a, x) * fraction(a, x);
    return { lower: 1 - upper, upper };
  }
  const lower = factor(a, x) * series(a, x);
  return { lower, upper: a < 1 ? smallUpper(a, x) : 1 - lower };
}

/** x^a e^{−x}/Γ(a). */
function factor(a: number, x: number): number {
  if (a < 1) return a * Math.exp(a * Math.log(x) - x - logGamma(a + 1));
  return Math.sqrt(a / (2 * Math.PI)) * Math.exp(a * logMinusLinear(x / a, (x - a) / a) - stirlingRemainder(a));
}

function series(a: number, x: number): number {
  let term = 1 / a;
  let sum = term;
  for (let n = 1; n < MOST && term > sum * 1e-17; n++) {
    term *= x / (a + n);
    sum += term;
  }
  return sum;
}

/** Q = 1 − x^a/Γ(1 + a) · (1 + Σ (−x)ⁿ a/((a + n) n!)), in parts that are small when Q is. */
function smallUpper(a: number, x: number): number {
  const exponent = a * Math.log(x) - logGamma(a + 1);
  let power = 1;
  let sum = 0;
  for (let n = 1; n < MOST; n++) {
    power *= -x / n;
    const term = (power * a) / (a + n);
    sum += term;
    if (Math.abs(term) <= 1e-17 * Math.abs(sum)) break;
  }
  return -Math.expm1(exponent) - Math.exp(exponent) * sum;
}

function fraction(a: number, x: number): number {
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
    if (Math.abs(change - 1) < 2.3e-16) break;
  }
  return h;
}
