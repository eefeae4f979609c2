/**
 * Quantiles of weighted values: the distribution function rises linearly from the middle of one value's weight to the middle of the next.
 *
 * @param values any order; NaN are left out with their weights
 * @param weights ≥ 0, as many
 * @param probabilities in (0, 1)
 * @returns one quantile each, NaN where nothing has weight; and the share of the weight that is not NaN
 * @example values 1, 2, 3 with equal weights: the median is 2
 */
export function weightedQuantiles(
  values: ArrayLike<number>,
  weights: ArrayLike<number>,
  probabilities: readonly number[],
): { readonly quantiles: number[]; readonly share: number } {
  const order = new Uint32Array(values.length).map((_, i) => i).filter((i) => !Number.isNaN(values[i]!));
  const sorted = order.sort((a, b) => values[a]! - values[b]!);
  let all = 0;
  for (let i = 0; i < values.length; i++) all += weights[i]!;
  // Cumulative weight up to the middle of each value's own.
  const middles = new Float64Array(sorted.length);
  let total = 0;
  sorted.forEach((i, n) => {
    middles[n] = total + weights[i]! / 2;
    total += weights[i]!;
  });
  if (!(total > 0)) return { quantiles: probabilities.map(() => NaN), share: 0 };
  const quantiles = probabilities.map((p) => {
    const at = middles.findIndex((middle) => middle >= p * total);
    if (at < 0) return values[sorted[sorted.length - 1]!]!;
    const value = values[sorted[at]!]!;
    if (at === 0 || !Number.isFinite(value)) return value;
    const before = values[sorted[at - 1]!]!;
    return before + ((p * total - middles[at - 1]!) / (middles[at]! - middles[at - 1]!)) * (value - before);
  });
  return { quantiles, share: total / all };
}
