/**
 * Means of blocks of readings.
 *
 * @param values gaps as NaN; @param block readings in a block, ≥ 1; 1 gives the record itself
 * @returns length ⌊n/block⌋, the rest at the end left out; each the mean of the readings observed, NaN for a block without any
 * @example (1, 3, NaN, 5, 7) by 2: 2, 5
 */
export function averagedRecord(values: Float64Array, block: number): Float64Array {
  if (block <= 1) return values;
  return Float64Array.from({ length: Math.floor(values.length / block) }, (_, i) => {
    let sum = 0;
    let count = 0;
    for (let t = i * block; t < (i + 1) * block; t++) {
      if (Number.isNaN(values[t]!)) continue;
      sum += values[t]!;
      count++;
    }
    return sum / count;
  });
}
