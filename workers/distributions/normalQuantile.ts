import { incompleteGamma } from './incompleteGamma.ts';
import { normalPdf } from './normalPdf.ts';
import { normalUpperTail } from './normalUpperTail.ts';

const MOST = 10;
/** Above this tail probability the quantile is found from its distance to ½. */
const CENTRAL = 0.4;

/**
 * Quantile of the standard normal.
 *
 * Method: Hastings' rational start, within 4.5e−4 (Abramowitz & Stegun 26.2.23), then Halley steps on the tail: each triples the digits; near p = ½ the linear start √(2π)(p − ½).
 *
 * @param p lower-tail probability in [0, 1]. For a small upper tail q use −normalQuantile(q): 1 − q has lost its digits.
 * @returns relative error below 1e−14; ±Infinity at the ends, NaN outside
 * @example normalQuantile(.975) = 1.959963984540054
 */
export function normalQuantile(p: number): number {
  if (!(p >= 0 && p <= 1)) return NaN;
  if (p === 0.5) return 0;
  // 1 − p is exact for p ≥ ½.
  return p > 0.5 ? upperQuantile(1 - p) : -upperQuantile(p);
}

/** x > 0 with P(Z > x) = q, q < ½. */
function upperQuantile(q: number): number {
  if (q === 0) return Infinity;
  const t = Math.sqrt(-2 * Math.log(q));
  const top = 2.515517 + t * (0.802853 + t * 0.010328);
  const bottom = 1 + t * (1.432788 + t * (0.189269 + t * 0.001308));
  let x = q > CENTRAL ? Math.sqrt(2 * Math.PI) * (0.5 - q) : t - top / bottom;
  for (let i = 0; i < MOST; i++) {
    // f = Q(x) − q has f′ = −φ and f″ = xφ. Near the centre f = (½ − q) − P(0 < Z < x), in which nothing cancels.
    const off = q > CENTRAL ? 0.5 - q - 0.5 * incompleteGamma(0.5, 0.5 * x * x).lower : normalUpperTail(x) - q;
    const newton = off / normalPdf(x);
    const step = newton / (1 - 0.5 * x * newton);
    x += step;
    // The error left is of the order of the step's cube.
    if (Math.abs(step) <= 1e-6 * x) break;
  }
  return x;
}
