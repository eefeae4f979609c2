/**
 * Arithmetic mean that keeps its digits under a large offset.
 *
 * Method: two passes, the second over the deviations from the first mean (Chan, Golub & LeVeque 1983, Am. Stat. 37, 242–247).
 *
 * @param values any length; @param skipNaN true: NaN entries (gaps) are left out; false: they make the mean NaN
 * @returns NaN where nothing is left to average or an entry is infinite
 * @example (1, NaN, 3) gives 2
 */
export function mean(values: ArrayLike<number>, skipNaN = true): number {
  let sum = 0;
  let count = 0;
  for (let i = 0; i < values.length; i++) {
    const value = values[i]!;
    if (skipNaN && Number.isNaN(value)) continue;
    sum += value;
    count++;
  }
  const first = sum / count;
  let rest = 0;
  for (let i = 0; i < values.length; i++) {
    const value = values[i]!;
    if (skipNaN && Number.isNaN(value)) continue;
    rest += value - first;
  }
  return first + rest / count;
}
