import { logGamma } from '../distributions/logGamma.ts';

/** More terms of the alternating sum than this lose their digits; by then the first one alone is a bound within 1 %. */
const MOST_TERMS = 25;

/**
 * P(g > x) of Fisher's g, the largest of m periodogram ordinates over their sum, for independent normal readings.
 *
 * Method: Σ_{j=1}^{⌊1/x⌋} (−1)^{j−1} C(m, j) (1 − jx)^{m−1} (Fisher 1929, Proc. R. Soc. A 125, 54–59). Where the sum has more than 25 terms or its terms
 * exceed what alternating signs can carry, the probability is near 1 and is found from the extreme-value limit
 * 1 − exp(−m e^{−mx}) (Brockwell & Davis, Time Series: Theory and Methods, 2nd ed., §10.2).
 *
 * @param x in (0, 1]; @param m ordinates, those at frequencies strictly between 0 and ½
 * @returns 1 for x ≤ 1/m, 0 for x ≥ 1; NaN for NaN or m < 1
 * @example m = 2, x = 0.75: 0.5
 */
export function fisherG(x: number, m: number): number {
  if (Number.isNaN(x) || !(m >= 1)) return NaN;
  if (x >= 1) return 0;
  if (x <= 1 / m) return 1;
  const terms = Math.min(m, Math.floor(1 / x));
  let sum = 0;
  let largest = 0;
  const kept = Math.min(terms, MOST_TERMS);
  for (let j = 1; j <= kept; j++) {
    const rest = 1 - j * x;
    if (!(rest > 0)) break;
    const size = Math.exp(logGamma(m + 1) - logGamma(j + 1) - logGamma(m - j + 1) + (m - 1) * Math.log(rest));
    largest = Math.max(largest, size);
    sum += j % 2 === 1 ? size : -size;
    if (size < 1e-17 * Math.abs(sum)) break;
  }
  // Terms beyond 1e4 leave too few digits in what alternating signs cancel.
  if (largest > 1e4) return -Math.expm1(-m * Math.exp(-m * x));
  return Math.min(1, Math.max(0, sum));
}
