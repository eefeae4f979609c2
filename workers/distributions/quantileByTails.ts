import { brentRoot } from '../numeric/brentRoot.ts';

/** A law by both tails, each accurate where it is small. */
export interface Tails {
  readonly cdf: (x: number) => number;
  readonly upperTail: (x: number) => number;
}

const MOST_DOUBLINGS = 1020;

/**
 * Quantile of a continuous law on (low, ∞).
 *
 * Method: a bracket by doubling and halving the distance from low, then Brent's zero finder on the logarithm of the smaller tail.
 *
 * @param tails of the law; @param p in [0, 1]; @param low finite, where the law begins or where the search may
 * @param upper true: p is the upper tail
 * @returns the quantile as accurately as the tails are; low and Infinity at the ends; NaN outside [0, 1] or where a tail is NaN
 * @example the exponential law, whose upper tail is exp(−x), with p = ½: ln 2
 */
export function quantileByTails(tails: Tails, p: number, low: number, upper = false): number {
  if (!(p >= 0 && p <= 1)) return NaN;
  if (p === 0) return upper ? Infinity : low;
  if (p === 1) return upper ? low : Infinity;
  const useUpper = upper ? p <= 0.5 : p > 0.5;
  // 1 − p is exact for p ≥ ½, the only place it is used.
  const share = upper === useUpper ? p : 1 - p;
  // The logarithm of the ratio, not the difference of logarithms, which would round at the size of ln p.
  const height = (x: number) => (useUpper ? -Math.log(tails.upperTail(x) / share) : Math.log(tails.cdf(x) / share));
  let width = 1;
  for (let i = 0; i < MOST_DOUBLINGS && height(low + width) < 0; i++) width *= 2;
  for (let i = 0; i < MOST_DOUBLINGS && height(low + width / 2) >= 0; i++) width /= 2;
  return brentRoot(height, low + width / 2, low + width)?.x ?? NaN;
}
