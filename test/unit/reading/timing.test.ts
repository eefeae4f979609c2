import { describe, expect, it } from 'vitest';
import { findGrid } from '../../../workers/reading/grid/findGrid.ts';
import { niceStep } from '../../../workers/reading/grid/niceStep.ts';
import { placeOnGrid } from '../../../workers/reading/grid/placeOnGrid.ts';
import { timingOf } from '../../../workers/reading/grid/timingOf.ts';

// Expectations are counted by hand from the stamps.
const timing = (times: number[], chosen = false) => {
  const stamps = Float64Array.from(times);
  const found = findGrid(stamps, true, null)!;
  return timingOf(stamps, found, placeOnGrid(stamps, new Float64Array(times.length), found), chosen);
};
const every = (step: number, count: number) => Array.from({ length: count }, (_, k) => 1_700_000_400 + k * step);

describe('how stamps follow one another', () => {
  it('regular stamps need no grid to be offered', () => {
    const answer = timing(every(600, 12));
    expect(answer).toMatchObject({ kind: 'seconds', count: 11, regular: 11, jitter: 0, offers: [] });
    expect(answer.intervals).toEqual([{ interval: 600, count: 11 }]);
  });

  it('gaps are distances of their own, a repeated stamp is counted, a step back too', () => {
    const times = every(60, 20).filter((_, k) => k !== 5 && k !== 11 && k !== 12);
    times.splice(3, 0, times[2]!);
    times.push(times[1]!);
    const answer = timing(times);
    expect(answer.intervals).toEqual([
      { interval: 60, count: 14 },
      { interval: 120, count: 1 },
      { interval: 180, count: 1 },
    ]);
    expect(answer).toMatchObject({ count: 16, regular: 14, repeats: 2, crowded: 0, reversals: 1 });
    expect(answer.offers.map(({ rule, step }) => [rule, step])).toEqual([
      ['nearest', 60],
      ['binMean', 60],
      ['last', 60],
      ['binMean', 120],
      ['last', 120],
    ]);
  });

  it('a person who has chosen a grid is offered the others', () => {
    expect(timing(every(600, 12), true).offers.length).toBeGreaterThan(1);
  });
});

describe('the bin that hardly leaves a place empty', () => {
  it('is at least the median distance, and one that a clock has', () => {
    expect(niceStep(Float64Array.from(every(47, 200)))).toBe(60);
    expect(niceStep(Float64Array.from(every(3600, 48)))).toBe(3600);
    expect(niceStep(Float64Array.from(every(5000, 48)))).toBe(7200);
  });
  it('does not exist for readings years apart', () => {
    expect(niceStep(Float64Array.from(every(31_557_600, 20)))).toBeNull();
  });
});

describe('two readings of one time', () => {
  const times = Float64Array.from([0, 60, 60, 120, 120, 180]);
  const values = Float64Array.from([1, 2, 3, NaN, 4, 5]);
  const grid = { kind: 'seconds', step: 60, rule: 'nearest', tolerance: 0.25 } as const;
  const found = { grid, start: 0, places: 4, bad: 0, stamps: 4, exact: true };
  it('the first, the last or none stays; a number goes before a gap in any case', () => {
    expect([...placeOnGrid(times, values, found).owner]).toEqual([0, 1, 4, 5]);
    expect([...placeOnGrid(times, values, found, 'last').owner]).toEqual([0, 2, 4, 5]);
    const none = placeOnGrid(times, values, found, 'gap');
    expect([...none.owner]).toEqual([0, -2, 4, 5]);
    expect(none).toMatchObject({ conflictCount: 1, conflicts: [2], duplicateCount: 2 });
  });
});
