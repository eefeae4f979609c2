import type { Finding } from '../contract/forensics.ts';
import type { Axis, RepairChange, Span } from '../contract/series.ts';

/** So many readings in a row with one distance are an interval of their own. */
const IN_A_ROW = 10;
/** Both intervals must be used by at least this share of the readings. */
const SHARE = 0.05;

/**
 * A change of the sampling interval: stretches in which only every k-th place holds a reading.
 *
 * Method: runs of at least 10 equal distances k ≥ 2 between neighbouring readings, beside stretches of another distance. Gaps by
 * chance, a share g of the places, give such a run with probability (g(1 − g))¹⁰ at each reading.
 *
 * @param values gaps as NaN; @param axis of the record
 * @returns a finding whose places are the stretches with the longer interval, or null; `numbers`: shorter, longer (in the unit of the
 *   axis). Offered: the longer interval throughout, by its nearest reading or by means
 */
export function findIntervalChange(values: Float64Array, axis: Axis): Finding | null {
  const at: number[] = [];
  values.forEach((value, t) => {
    if (!Number.isNaN(value)) at.push(t);
  });
  const places: Span[] = [];
  const used = new Map<number, number>();
  for (let i = 1, run = 1; i < at.length; i++) {
    const stride = at[i]! - at[i - 1]!;
    const goes = i + 1 < at.length && at[i + 1]! - at[i]! === stride;
    if (goes) {
      run++;
      continue;
    }
    if (run >= IN_A_ROW) {
      used.set(stride, (used.get(stride) ?? 0) + run);
      if (stride > 1) places.push({ from: at[i - run]!, to: at[i]! + 1 });
    }
    run = 1;
  }
  const strides = [...used].filter(([, count]) => count >= SHARE * at.length).map(([stride]) => stride);
  const longest = strides.reduce((most, one) => Math.max(most, one), 0);
  const shortest = strides.reduce((least, one) => Math.min(least, one), Infinity);
  if (strides.length < 2 || longest < 2) return null;
  const step = longest * axis.step;
  const offered: RepairChange[] = [
    { kind: 'regrid', step, rule: 'nearest' },
    { kind: 'regrid', step, rule: 'binMean' },
  ];
  return {
    code: 'intervalChange',
    count: places.length,
    places,
    numbers: { shorter: shortest * axis.step, longer: step },
    effect: 'mixedIntervals',
    offered,
  };
}
