import { describe, expect, it } from 'vitest';
import type { Axis } from '../../../workers/contract/series.ts';
import type { IntegratedIntervals } from '../../../workers/contract/uncertainty.ts';
import { derivedLines, intervalAssumptions, intervalEnds } from '../../../src/format/intervalText.ts';
import { coverageColumns, coverageRows } from '../../../src/format/measuredCoverage.ts';

const minutes: Axis = { kind: 'seconds', start: 0, step: 600, zone: null };

const intervals: IntegratedIntervals = {
  coverage: 0.95,
  seed: 1,
  coefficients: [],
  sigma: { about: 'sigma', lower: 1, upper: 2, median: 1.5 },
  derived: [
    { about: 'constant', lower: 1, upper: 2, median: 1.5, estimate: 1.4, share: 1 },
    { about: 'timeConstant', lower: 3, upper: 4.5, median: 4, estimate: 4, share: 1 },
    { about: 'arPeriod', lower: 8, upper: 12, median: 9, estimate: NaN, share: 0.4 },
  ],
  points: 1500,
  effectiveSize: 1200.4,
  largestArModulus: 0.9967,
  nearLimit: 0.2,
  draws: [],
};

describe('intervals in words', () => {
  it('rounds the ends to the length', () => {
    expect(intervalEnds(0.83512, 0.90188)).toBe('0.835 … 0.902');
    expect(intervalEnds(-3, Infinity)).toBe('−3 … ∞');
    expect(intervalEnds(-Infinity, Infinity)).toBe('no limit');
  });

  it('gives times in the record’s unit, once', () => {
    const [time, period] = derivedLines(intervals, minutes);
    expect(time).toMatchObject({ name: 'time constant', value: '40 minutes', interval: '30 … 45 minutes' });
    expect(period).toMatchObject({ value: 'none', note: 'where the roots oscillate, 40 % of the weight' });
  });

  it('says what they assume, and where the assumption decides', () => {
    const words = intervalAssumptions(intervals).join(' ');
    expect(words).toContain('0.9967');
    expect(words).toContain('20 % of the weight');
    expect(words).toContain('worth 1200 independent');
    expect(intervalAssumptions({ ...intervals, nearLimit: 0 }).join(' ')).not.toContain('unit root');
  });

  it('shows a measured coverage for every design', () => {
    expect(coverageRows).toHaveLength(12);
    for (const row of coverageRows) expect(row).toHaveLength(coverageColumns.length);
  });
});
