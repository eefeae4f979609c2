import { brentRoot } from '../numeric/brentRoot.ts';

/**
 * Quantile of a mixture from its distribution function.
 *
 * Method: a bracket grown from a first guess, then Brent's root (see `brentRoot`).
 *
 * @param cdf of the mixture, increasing; @param p in (0, 1)
 * @param guess @param scale where to start and how far to step first, > 0
 * @param tolerance part of the scale to which it is found; @param lowest the mixture has nothing below it
 * @returns the quantile; NaN where no bracket is found
 */
export function mixtureQuantile(
  cdf: (x: number) => number,
  p: number,
  guess: number,
  scale: number,
  tolerance: number,
  lowest = -Infinity,
): number {
  const above = (x: number) => cdf(x) - p;
  let low = Math.max(lowest, guess - scale / 2);
  let high = guess + scale / 2;
  for (let step = scale, tries = 0; above(low) > 0 && low > lowest; step *= 2) {
    if (++tries > 200) return NaN;
    high = low;
    low = Math.max(lowest, low - step);
  }
  for (let step = scale, tries = 0; above(high) < 0; step *= 2) {
    if (++tries > 200) return NaN;
    low = high;
    high += step;
  }
  return brentRoot(above, low, high, tolerance * scale)?.x ?? NaN;
}
