/** More points than this are thinned before they are drawn. */
const MOST = 4000;
const BUCKETS = 1200;

/**
 * A record thin enough to draw: in each of 1 200 stretches the first, lowest, highest and last reading stay, in their order, so that
 * a spike of one reading is still seen. Gaps stay gaps.
 *
 * @param values readings, NaN in gaps
 * @returns indices into the record and the values there, null in gaps
 */
export function thinned(values: Float64Array): {
  readonly index: readonly number[];
  readonly value: readonly (number | null)[];
} {
  const index: number[] = [];
  if (values.length <= MOST) for (let t = 0; t < values.length; t += 1) index.push(t);
  else {
    const size = values.length / BUCKETS;
    for (let bucket = 0; bucket < BUCKETS; bucket += 1) {
      const from = Math.floor(bucket * size);
      const to = Math.min(values.length, Math.floor((bucket + 1) * size));
      index.push(...kept(values, from, to));
    }
  }
  return {
    index,
    value: index.map((t) => {
      const value = values[t]!;
      return Number.isNaN(value) ? null : value;
    }),
  };
}

function kept(values: Float64Array, from: number, to: number): number[] {
  let low = -1;
  let high = -1;
  let gap = -1;
  for (let t = from; t < to; t += 1) {
    const value = values[t]!;
    if (Number.isNaN(value)) {
      if (gap < 0) gap = t;
      continue;
    }
    if (low < 0 || value < values[low]!) low = t;
    if (high < 0 || value > values[high]!) high = t;
  }
  const places = new Set([from, low, high, gap, to - 1].filter((t) => t >= 0));
  return [...places].sort((a, b) => a - b);
}
