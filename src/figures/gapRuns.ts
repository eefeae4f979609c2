import type { Span } from '../../workers/contract/series.ts';

/** Stretches without a usable reading, by index. */
export function gapRuns(values: Float64Array): Span[] {
  const runs: Span[] = [];
  let from = -1;
  for (let t = 0; t <= values.length; t += 1) {
    const gap = t < values.length && Number.isNaN(values[t]!);
    if (gap && from < 0) from = t;
    if (!gap && from >= 0) {
      runs.push({ from, to: t });
      from = -1;
    }
  }
  return runs;
}
