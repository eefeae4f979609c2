/**
 * Sample quantile of sorted values.
 *
 * Definition: linear between the order statistics at p(n + 1), the ends where that falls outside 1…n (definition 6 of Hyndman & Fan 1996,
 * Am. Stat. 50, 361–365; NIST/SEMATECH e-Handbook 7.2.6.2). Under it a further draw from the same law lies below the p-quantile of n
 * with probability p on average, which is what a limit found by simulation must do.
 *
 * @param sorted ascending, without NaN; @param p in [0, 1]
 * @returns NaN for no values or p outside [0, 1]
 * @example (1, 2, 3) with p = .5 gives 2, with p = .25 gives 1
 */
export function sortedQuantile(sorted: ArrayLike<number>, p: number): number {
  const n = sorted.length;
  if (n === 0 || !(p >= 0 && p <= 1)) return NaN;
  const place = Math.min(Math.max(p * (n + 1), 1), n);
  const below = Math.floor(place);
  const low = sorted[below - 1]!;
  const share = place - below;
  return share === 0 ? low : low + share * (sorted[below]! - low);
}
