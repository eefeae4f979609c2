import { describe, expect, test } from 'vitest';
import type { Finding, FindingCode } from '../../../workers/contract/forensics.ts';
import type { Axis, Series } from '../../../workers/contract/series.ts';
import { findClockChange } from '../../../workers/forensics/findClockChange.ts';
import { findIntervalChange } from '../../../workers/forensics/findIntervalChange.ts';
import { inspectRecord } from '../../../workers/forensics/inspectRecord.ts';
import { medianOf } from '../../../workers/forensics/medianOf.ts';
import { resolutionOf } from '../../../workers/forensics/resolutionOf.ts';
import { robustScale } from '../../../workers/forensics/robustScale.ts';
import { innovationsBy, whitenRecord } from '../../../workers/forensics/whitenRecord.ts';
import { simulateRecord } from '../../../workers/model/simulateRecord.ts';
import { createRandom } from '../../../workers/numeric/random.ts';
import { publishedSeries } from '../../helpers/publishedSeries.ts';

const index: Axis = { kind: 'index', start: 1, step: 1, zone: null };
const seriesOf = (values: Float64Array, axis: Axis = index): Series => ({ values, axis, unit: '', hash: 'h' });
const found = (values: Float64Array, axis: Axis = index): readonly Finding[] => {
  const report = inspectRecord(seriesOf(values, axis));
  if (!report.ok) throw new Error(report.failure.code);
  return report.value.findings;
};
const codes = (values: Float64Array): FindingCode[] => found(values).map(({ code }) => code);

/** An AR(1) record about 40 with innovations of standard deviation 1. */
const record = (n: number, phi: number, seed: number): Float64Array =>
  simulateRecord({
    order: { p: 1, d: 0, q: 0, P: 0, D: 0, Q: 0, s: 0 },
    at: { ar: [phi], ma: [], seasonalAr: [], seasonalMa: [], mean: 40, regression: [], innovationVariance: 1 },
    length: n,
    random: createRandom(seed),
  });

describe('parts', () => {
  // Worked by hand.
  test('median and robust scale', () => {
    expect(medianOf(Float64Array.of(4, NaN, 1, 3))).toBe(3);
    expect(medianOf(Float64Array.of(4, 1, 3, 2))).toBe(2.5);
    expect(medianOf(new Float64Array())).toBeNaN();
    // Deviations from 3 are 2 1 0 1 97, their median 1; 1/Φ⁻¹(¾) = 1.4826022 (Abramowitz & Stegun, table 26.5 inverted).
    expect(robustScale(Float64Array.of(1, 2, 3, 4, 100))).toBeCloseTo(1.4826022, 7);
  });

  test('the smallest step, whether decimal or of a converter printed with few digits', () => {
    const random = createRandom(5);
    const normals = Float64Array.from({ length: 500 }, () => random.normal());
    expect(resolutionOf(normals)).toBe(0);
    expect(resolutionOf(normals.map((x) => Math.round(x * 100) / 100))).toBeCloseTo(0.01, 10);
    expect(resolutionOf(normals.map((x) => Math.round(x * 4) / 4))).toBe(0.25);
    // 10 V over 12 bits is 2.44140625 mV a step; printed in mV with two decimals.
    expect(resolutionOf(normals.map((x) => Number((Math.round(x * 100) * 2.44140625).toFixed(2))))).toBeCloseTo(
      2.44,
      1,
    );
    expect(resolutionOf(normals.map((x) => Number(x.toFixed(6))))).toBeCloseTo(1e-6, 12);
  });

  test('innovations of a known autoregression, by hand', () => {
    // x − 1 = 1 2 3; e_2 = 2 − ½·1, e_3 = 3 − ½·2.
    expect([...innovationsBy(Float64Array.of(2, 3, 4), Float64Array.of(0.5), 1)]).toEqual([NaN, 1.5, 2]);
  });

  test('whitening finds coefficient and scale of the simulated law', () => {
    const { coefficients, scale } = whitenRecord(record(20_000, 0.7, 3))!;
    // Asymptotic standard errors: √((1 − φ²)/n) = .005 for φ; .0117·σ for a scale by the median absolute deviation (Hampel 1974: efficiency 37 %).
    expect(Math.abs(coefficients[0]! - 0.7)).toBeLessThan(0.04);
    expect(Math.abs(scale - 1)).toBeLessThan(0.04);
  });
});

describe('each item on a record that has it', () => {
  const clean = record(400, 0.7, 11);

  test('a clean record has none, rounded or not', () => {
    expect(codes(clean)).toEqual([]);
    expect(codes(clean.map((x) => Math.round(x * 10) / 10))).toEqual([]);
  });

  test('codes for no reading, and an exact count of them', () => {
    const values = clean.slice();
    for (const t of [10, 11, 300]) values[t] = -999;
    const [finding] = found(values);
    expect(finding).toMatchObject({ code: 'sentinel', count: 3, numbers: { value: -999 } });
    expect(finding!.places).toEqual([
      { from: 10, to: 12 },
      { from: 300, to: 301 },
    ]);
    expect(finding!.offered).toEqual([{ kind: 'gaps', runs: [10, 2, 288, 1] }]);
  });

  test('a code inside the range of the readings is a reading', () => {
    expect(codes(clean.map((x) => x + 60))).toEqual([]); // about 100: 99 is nothing special there
  });

  test('a frozen stretch keeps its first reading', () => {
    const values = clean.map((x) => Math.round(x * 4) / 4);
    values.fill(values[100]! + 0, 100, 115);
    const finding = found(values).find(({ code }) => code === 'frozen')!;
    const place = finding.places.find(({ from }) => from <= 101 && from > 95)!;
    expect(place.to).toBeGreaterThanOrEqual(115);
    expect(finding.numbers['longest']).toBeGreaterThanOrEqual(15);
  });

  test('drawn lines are found where they are, and the kept readings are not among them', () => {
    const values = clean.slice();
    for (let t = 200; t < 240; t += 5)
      for (let k = 1; k < 5; k++) values[t + k] = values[t]! + ((values[t + 5]! - values[t]!) * k) / 5;
    const finding = found(values).find(({ code }) => code === 'interpolated')!;
    expect(finding.count).toBe(8);
    expect(finding.places[0]).toEqual({ from: 201, to: 205 });
    expect(finding.numbers['readings']).toBe(32);
  });

  test('one wild reading by its place and size; a step of the process that lives on is none', () => {
    const values = clean.slice();
    values[150]! += 9;
    const [finding] = found(values);
    expect(finding).toMatchObject({ code: 'outlier', count: 1, places: [{ from: 150, to: 151 }] });
    expect(Math.abs(finding!.numbers['largest']! - 9)).toBeLessThan(2.5);
    const jumped = clean.map((x, t) => (t >= 150 ? x + 9 * 0.7 ** (t - 150) : x));
    expect(codes(jumped)).not.toContain('outlier');
  });

  test('a step of the level by its place and size, offered as no repair', () => {
    const [finding] = found(clean.map((x, t) => (t >= 150 ? x + 5 : x)));
    expect(finding).toMatchObject({ code: 'levelStep', count: 1, places: [{ from: 150, to: 151 }], offered: [] });
    expect(Math.abs(finding!.numbers['size']! - 5)).toBeLessThan(1.5);
  });

  test('a change of variance near its place', () => {
    const finding = found(clean.map((x, t) => (t >= 200 ? 40 + 2.5 * (x - 40) : x))).find(
      ({ code }) => code === 'varianceChange',
    )!;
    expect(Math.abs(finding.places[0]!.from - 200)).toBeLessThan(30);
    expect(finding.numbers['ratio']).toBeGreaterThan(1.7);
  });

  test('coarse rounding against the innovations', () => {
    const [finding] = found(clean.map(Math.round));
    expect(finding).toMatchObject({ code: 'quantised', numbers: { step: 1 } });
    expect(Math.abs(finding!.numbers['inDeviations']! - 1)).toBeLessThan(0.25);
  });

  test('readings cut off at the end of a range', () => {
    const [finding] = found(clean.map((x) => Math.min(x, 41.5)));
    expect(finding).toMatchObject({ code: 'clipped', numbers: { value: 41.5, ends: 1 } });
  });

  test('averages over five readings', () => {
    const long = record(1004, 0.5, 4);
    const means = Float64Array.from(
      { length: 1000 },
      (_, t) => long.subarray(t, t + 5).reduce((sum, x) => sum + x, 0) / 5,
    );
    expect(found(means).find(({ code }) => code === 'averaged')).toMatchObject({ numbers: { window: 5 } });
  });
});

describe('items of the time axis', () => {
  test('a change of the sampling interval', () => {
    const values = record(200, 0.5, 2).map((x, t) => (t > 100 && t % 4 !== 0 ? NaN : x));
    const finding = findIntervalChange(values, { kind: 'seconds', start: 0, step: 60, zone: null })!;
    expect(finding).toMatchObject({
      count: 1,
      places: [{ from: 100, to: 197 }],
      numbers: { shorter: 60, longer: 240 },
    });
    expect(finding.offered).toContainEqual({ kind: 'regrid', step: 240, rule: 'nearest' });
    expect(
      findIntervalChange(
        record(200, 0.5, 2).map((x, t) => (t % 7 === 3 ? NaN : x)),
        index,
      ),
    ).toBeNull();
  });

  test('the hour that the clock was put forward: 31 March 2024, 02:00 in Central Europe (Directive 2000/84/EC)', () => {
    const start = Date.UTC(2024, 2, 30) / 1000;
    const axis: Axis = { kind: 'seconds', start, step: 600, zone: null };
    const values = record(432, 0.5, 2);
    const hour = (Date.UTC(2024, 2, 31, 2) / 1000 - start) / 600;
    values.fill(NaN, hour, hour + 6);
    expect(findClockChange(values, axis, [])).toMatchObject({ count: 1, places: [{ from: hour, to: hour + 6 }] });
    expect(findClockChange(values, { ...axis, start: start + 86_400 }, [])).toBeNull();
    expect(findClockChange(values, { ...axis, zone: 'Europe/Berlin' }, [])).toBeNull();
    const note = { kind: 'clockChange', count: 6, lines: [3], texts: [] } as const;
    expect(findClockChange(record(432, 0.5, 2), axis, [note])).toMatchObject({ numbers: { missing: 0, repeated: 6 } });
  });
});

describe('records without the item, and records too short', () => {
  test('published records: no code, drawn line, cut range or average in Lake Huron, the Nile and Series A', () => {
    for (const name of ['lakeHuron', 'nile', 'seriesA'] as const) {
      const list = codes(publishedSeries(name));
      expect(
        list.filter((code) => ['sentinel', 'interpolated', 'clipped', 'averaged'].includes(code)),
        name,
      ).toEqual([]);
    }
  });

  // Cobb 1978, Biometrika 65, 243–251: the Nile's flow at Aswan fell after 1898, reading 28 from 0, when the dam was begun.
  test('the Nile: if a step is seen it is that of 1898 or 1899', () => {
    const step = found(publishedSeries('nile')).find(({ code }) => code === 'levelStep');
    for (const place of step?.places ?? []) expect([27, 28, 29]).toContain(place.from);
  });

  test('a short record is not inspected and says so; an infinity is refused with its index', () => {
    const short = inspectRecord(seriesOf(record(20, 0.5, 1)));
    expect(short.ok && short.value.findings).toEqual([]);
    expect(short.ok && short.value.untested.every(({ reason }) => reason === 'fewReadings')).toBe(true);
    const broken = record(50, 0.5, 1);
    broken[7] = Infinity;
    expect(inspectRecord(seriesOf(broken))).toMatchObject({ ok: false, failure: { code: 'notFinite', index: 7 } });
  });
});
