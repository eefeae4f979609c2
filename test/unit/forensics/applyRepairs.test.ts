import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Repair, RepairChange, Series } from '../../../workers/contract/series.ts';
import { applyRepairs, repairRecord } from '../../../workers/forensics/applyRepairs.ts';
import { gapRunsOf } from '../../../workers/forensics/gapRunsOf.ts';
import { hashValues } from '../../../workers/series/hashValues.ts';

const seriesOf = (values: ArrayLike<number>, step = 60): Series => ({
  values: Float64Array.from(values),
  axis: { kind: 'seconds', start: 1_700_000_000, step, zone: null },
  unit: 'bar',
  hash: hashValues(Float64Array.from(values)),
});
const repairOf = (change: RepairChange, id = 'a'): Repair => ({
  id,
  at: '2025-01-01T00:00:00Z',
  why: 'test',
  ...change,
});
const done = (raw: Series, ...changes: RepairChange[]): Series => {
  const result = applyRepairs(
    raw,
    changes.map((change, i) => repairOf(change, `r${i}`)),
  );
  if (!result.ok) throw new Error(result.failure.reason);
  return result.value;
};
const count = (n: number) => Float64Array.from({ length: n }, (_, i) => i);

describe('what repairs do, worked by hand', () => {
  test('a gap takes its stretch, ends by the half-open rule', () => {
    const { values } = done(seriesOf(count(12)), { kind: 'gap', from: 2, to: 4 });
    expect([...values]).toEqual([0, 1, NaN, NaN, 4, 5, 6, 7, 8, 9, 10, 11]);
  });

  test('gaps are written as alternating lengths', () => {
    const spans = [
      { from: 3, to: 5 },
      { from: 8, to: 9 },
    ];
    expect(gapRunsOf(spans)).toEqual([3, 2, 3, 1]);
    const { values } = done(seriesOf(count(12)), { kind: 'gaps', runs: [3, 2, 3, 1] });
    expect([...values]).toEqual([0, 1, 2, NaN, NaN, 5, 6, 7, NaN, 9, 10, 11]);
  });

  test('a scale changes readings and unit: 25 °C is 77 °F', () => {
    const after = done(seriesOf([25, ...count(9)]), { kind: 'scale', factor: 1.8, offset: 32, unit: '°F' });
    expect(after.values[0]).toBe(77);
    expect(after.unit).toBe('°F');
  });

  test('regridding by each rule: 31 readings a minute apart to every 4 minutes', () => {
    const raw = seriesOf(count(31));
    expect([...done(raw, { kind: 'regrid', step: 240, rule: 'nearest' }).values]).toEqual([
      0, 4, 8, 12, 16, 20, 24, 28,
    ]);
    // Mean of 0 1 2 3 is 1.5, stamped with the beginning.
    expect([...done(raw, { kind: 'regrid', step: 240, rule: 'binMean' }).values]).toEqual([
      1.5, 5.5, 9.5, 13.5, 17.5, 21.5, 25.5, 29,
    ]);
    // The interval before the first stamp holds the first reading alone; the last, cut short, ends with reading 30.
    expect([...done(raw, { kind: 'regrid', step: 240, rule: 'last' }).values]).toEqual([
      0, 4, 8, 12, 16, 20, 24, 28, 30,
    ]);
    expect(done(raw, { kind: 'regrid', step: 240, rule: 'last' }).axis.step).toBe(240);
  });

  test('a bin mean is that of the readings observed; an empty bin is a gap', () => {
    const values = count(36);
    values[1] = NaN;
    values.fill(NaN, 4, 8);
    const after = done(seriesOf(values), { kind: 'regrid', step: 240, rule: 'binMean' }).values;
    expect(after[0]).toBeCloseTo(5 / 3, 14);
    expect(after[1]).toBeNaN();
  });

  test('the columns beside it follow a regrid and nothing else', () => {
    const room = count(35).map((x) => 2 * x);
    const made = repairRecord(
      seriesOf(count(35)),
      [repairOf({ kind: 'gap', from: 0, to: 2 }), repairOf({ kind: 'regrid', step: 240, rule: 'nearest' }, 'b')],
      { room },
    );
    if (!made.ok) throw new Error('refused');
    expect([...made.value.columns['room']!]).toEqual([0, 8, 16, 24, 32, 40, 48, 56, 64]);
    expect(made.value.series.values[0]).toBeNaN();
  });
});

describe('what is refused, with the id', () => {
  const raw = seriesOf(count(12));
  const cases: [RepairChange, string][] = [
    [{ kind: 'gap', from: 5, to: 13 }, 'outside'],
    [{ kind: 'gap', from: 5, to: 5 }, 'number'],
    [{ kind: 'gap', from: 0.5, to: 2 }, 'number'],
    [{ kind: 'gap', from: 0, to: 6 }, 'tooFew'],
    [{ kind: 'gaps', runs: [3, 2, 8] }, 'number'],
    [{ kind: 'gaps', runs: [3, 2, 8, 1] }, 'outside'],
    [{ kind: 'scale', factor: 0, offset: 1, unit: '' }, 'number'],
    [{ kind: 'scale', factor: 1e308, offset: 0, unit: '' }, 'overflow'],
    [{ kind: 'regrid', step: 30, rule: 'last' }, 'finer'],
    [{ kind: 'regrid', step: 0, rule: 'last' }, 'number'],
    [{ kind: 'regrid', step: 600, rule: 'binMean' }, 'tooFew'],
  ];
  test.each(cases)('%j: %s', (change, reason) => {
    const scale = repairOf({ kind: 'scale', factor: 2, offset: 0, unit: 'mbar' }, 'fine');
    const answer = applyRepairs(raw, [scale, repairOf(change, 'bad')]);
    expect(answer.ok ? null : answer.failure).toMatchObject({ code: 'repairRefused', id: 'bad', place: 2, reason });
  });
});

/** Properties: what replaying means. */
describe('replay', () => {
  const change = fc.oneof(
    fc
      .record({ kind: fc.constant('gap' as const), from: fc.nat(60), length: fc.integer({ min: 1, max: 4 }) })
      .map(({ kind, from, length }) => ({ kind, from, to: from + length })),
    fc.record({
      kind: fc.constant('scale' as const),
      factor: fc.constantFrom(2, -0.1, 1.8),
      offset: fc.constantFrom(0, 32),
      unit: fc.constantFrom('K', '°F'),
    }),
    fc.record({
      kind: fc.constant('regrid' as const),
      step: fc.constantFrom(60, 90, 120, 240),
      rule: fc.constantFrom('nearest' as const, 'binMean' as const, 'last' as const),
    }),
    fc
      .array(fc.integer({ min: 1, max: 9 }), { minLength: 2, maxLength: 6 })
      .map((runs) => ({ kind: 'gaps' as const, runs: runs.slice(0, runs.length & ~1) })),
  );
  const record = fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), { minLength: 40, maxLength: 80 });

  test('is deterministic, leaves the raw record alone, and without its last repair gives the record before it bit for bit', () => {
    fc.assert(
      fc.property(record, fc.array(change, { minLength: 1, maxLength: 5 }), (values, changes) => {
        const raw = seriesOf(values);
        const kept = raw.values.slice();
        const repairs = changes.map((one, i) => repairOf(one, `r${i}`));
        const before = applyRepairs(raw, repairs.slice(0, -1));
        const after = applyRepairs(raw, repairs);
        expect(applyRepairs(raw, repairs)).toEqual(after);
        expect(new Uint8Array(raw.values.buffer)).toEqual(new Uint8Array(kept.buffer));
        if (!before.ok) {
          // A list that fails fails at the same repair whatever follows.
          expect(after).toEqual(before);
          return;
        }
        const again = applyRepairs(raw, repairs.slice(0, -1));
        expect(again.ok && new Uint8Array(again.value.values.buffer)).toEqual(
          new Uint8Array(before.value.values.buffer),
        );
        if (after.ok) {
          expect(after.value.hash).toBe(hashValues(after.value.values));
          expect(applyRepairs(before.value, repairs.slice(-1))).toEqual(after);
        } else expect(after.failure).toMatchObject({ id: repairs.at(-1)!.id, place: repairs.length });
      }),
      { numRuns: 300 },
    );
  });
});
