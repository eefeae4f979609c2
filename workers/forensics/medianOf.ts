/**
 * Median of the values that are not NaN: the mean of the two middle ones where their number is even.
 *
 * @returns NaN for none
 * @example 4, NaN, 1, 3 gives 3
 */
export function medianOf(values: Float64Array): number {
  const sorted = values.filter((value) => !Number.isNaN(value)).sort();
  const half = sorted.length >> 1;
  if (sorted.length === 0) return NaN;
  return sorted.length % 2 === 1 ? sorted[half]! : (sorted[half - 1]! + sorted[half]!) / 2;
}
