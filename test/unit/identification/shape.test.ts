import { describe, expect, it } from 'vitest';
import { boxCoxLambda } from '../../../workers/identification/boxCoxLambda.ts';
import { describeShape } from '../../../workers/identification/describeShape.ts';
import { differencingTable } from '../../../workers/identification/differencingTable.ts';
import { seasonalProfile } from '../../../workers/identification/seasonalProfile.ts';
import { spreadAgainstLevel } from '../../../workers/identification/spreadAgainstLevel.ts';
import type { Shape } from '../../../workers/contract/shape.ts';
import { publishedSeries, type PublishedName } from '../../helpers/publishedSeries.ts';

const numbered = { kind: 'index', start: 1, step: 1, zone: null } as const;
const monthly = { kind: 'months', start: 0, step: 1, zone: null } as const;
const none = { d: 0, D: 0, s: 0 };

function shapeOf(values: Float64Array, axis: typeof numbered | typeof monthly = numbered, order = none): Shape {
  const answer = describeShape({ values, axis, order });
  if (!answer.ok) throw new Error(JSON.stringify(answer.failure));
  return answer.value;
}

const notation = ({ advice }: Shape, i = 0) => {
  const { p, d, q, P, D, Q, s } = advice.candidates[i]!.order;
  return `(${p},${d},${q})(${P},${D},${Q})${s}`;
};

describe('advice on published series', () => {
  // Box, Jenkins & Reinsel, Time Series Analysis: the orders the book itself arrives at by eye (chapter 6, tables 6.2 and 6.4), or one of them.
  it.each<[PublishedName, readonly string[]]>([
    ['seriesB', ['(0,1,0)(0,0,0)0', '(0,1,1)(0,0,0)0']],
    ['seriesD', ['(0,1,0)(0,0,0)0', '(0,1,1)(0,0,0)0', '(1,0,0)(0,0,0)0']],
    ['seriesF', ['(1,0,0)(0,0,0)0', '(2,0,0)(0,0,0)0']],
    ['seriesA', ['(1,0,1)(0,0,0)0', '(0,1,1)(0,0,0)0']],
  ])('%s', (name, book) => {
    const shape = shapeOf(publishedSeries(name));
    expect(shape.advice.candidates.map((_, i) => notation(shape, i)).some((one) => book.includes(one))).toBe(true);
  });

  // The airline record: logarithms, one difference of each kind, both MA (Box & Jenkins, chapter 9).
  it('the airline record: logarithms, d = D = 1, s = 12, and a moving average', () => {
    const { advice } = shapeOf(publishedSeries('airline'), monthly);
    expect(advice.transform).toEqual({ kind: 'log' });
    expect(advice.order).toEqual({ d: 1, D: 1, s: 12 });
    expect(advice.candidates.some(({ order }) => order.Q === 1 && order.q === 1)).toBe(true);
  });

  // Quarterly gas consumption: the swing grows with the level, and the logarithm is the remedy in common practice.
  it('quarterly gas: a season of four from a record without time', () => {
    const { advice } = shapeOf(publishedSeries('gasUk'));
    expect(advice.order).toMatchObject({ D: 1, s: 4 });
    expect(advice.transform).toEqual({ kind: 'log' });
  });

  // NIST/SEMATECH e-Handbook 1.4.2.5: the model of LEW is a sinusoid whose period is no whole number of readings.
  it('the beam deflections: a harmonic, since the cycle is no whole number of readings', () => {
    const { advice } = shapeOf(publishedSeries('lew'));
    expect(advice.order).toEqual(none);
    expect(advice.reasons.some(({ code }) => code === 'seasonNotWhole')).toBe(true);
    expect(advice.candidates[0]!.regressors).toMatchObject([{ kind: 'harmonic', k: 1 }]);
  });

  // NIST StRD: lottery numbers, drawn independently.
  it('numbers of a lottery want nothing', () => {
    const shape = shapeOf(publishedSeries('lottery'));
    expect(notation(shape)).toBe('(0,0,0)(0,0,0)0');
    expect(shape.spectrum.periods).toEqual([]);
    expect(shape.advice.sureness.d).toBe('clear');
  });
});

describe('kernels of the shape', () => {
  it('the differencing table agrees with c₀ and r₁ by their definitions, airline, d = 1 and d = D = 1', () => {
    const y = publishedSeries('airline');
    const lines = differencingTable(y, 12);
    expect(lines.map(({ d, D }) => [d, D])).toEqual([
      [0, 0],
      [1, 0],
      [2, 0],
      [0, 1],
      [1, 1],
      [2, 1],
    ]);
    const w = Array.from({ length: 131 }, (_, i) => y[i + 13]! - y[i + 12]! - y[i + 1]! + y[i]!);
    const mean = w.reduce((a, b) => a + b, 0) / 131;
    const c = (k: number) => w.slice(k).reduce((sum, value, i) => sum + (value - mean) * (w[i]! - mean), 0) / 131;
    const line = lines.find(({ d, D }) => d === 1 && D === 1)!;
    expect(line.variance).toBeCloseTo(c(0), 9);
    expect(line.lagOne).toBeCloseTo(c(1) / c(0), 12);
    expect(line.lagSeason).toBeCloseTo(c(12) / c(0), 12);
    expect(line.readings).toBe(131);
  });

  it('a difference too many of independent readings has lag-one correlation near −½ and twice the variance (exact for white noise)', () => {
    const [own, once] = differencingTable(publishedSeries('lottery'), 0);
    expect(once!.lagOne).toBeCloseTo(-0.5, 1);
    expect(once!.variance / own!.variance).toBeGreaterThan(1.8);
  });

  it('seasonal means of a pure pattern are the pattern, whatever the level does from cycle to cycle', () => {
    const pattern = [3, -1, 0, -2];
    const x = Float64Array.from({ length: 40 }, (_, t) => 100 * Math.floor(t / 4) + pattern[t % 4]!);
    const view = seasonalProfile(x, numbered, 'phase', 4)!;
    expect(Array.from(view.means)).toEqual(pattern);
    expect(view.share).toBeCloseTo(1, 12);
    expect(Array.from(view.standardErrors, Math.abs)).toEqual([0, 0, 0, 0]);
  });

  // The plant clock of Berlin in summer is two hours before UTC (Directive 2000/84/EC).
  it('hours are those of the wall clock of the zone, through the change of the clocks', () => {
    const start = Date.UTC(2025, 2, 20, 0) / 1000;
    const axis = { kind: 'seconds', start, step: 3600, zone: 'Europe/Berlin' } as const;
    const x = Float64Array.from({ length: 24 * 20 }, (_, t) => {
      const summer = start + 3600 * t >= Date.UTC(2025, 2, 30, 1) / 1000;
      return (t + (summer ? 2 : 1)) % 24 === 8 ? 10 : 0;
    });
    const view = seasonalProfile(x, axis, 'hour')!;
    expect(view.means.indexOf(Math.max(...view.means))).toBe(8);
    expect(view.share).toBeGreaterThan(0.95);
  });

  it('weekdays start on Monday (ISO 8601): 6 January 2025 was one', () => {
    const axis = { kind: 'seconds', start: Date.UTC(2025, 0, 6) / 1000, step: 86_400, zone: null } as const;
    const x = Float64Array.from({ length: 70 }, (_, t) => (t % 7 === 5 ? 4 : 0) + (t % 2) * 0.01);
    const view = seasonalProfile(x, axis, 'weekday')!;
    expect(view.means.indexOf(Math.max(...view.means))).toBe(5);
    expect(view.cycles).toBe(10);
  });

  it('a spread proportional to the b-th power of the level has slope b (Bartlett 1947)', () => {
    for (const b of [0, 0.5, 1, 2]) {
      const x = Float64Array.from({ length: 400 }, (_, t) => {
        const level = 10 * 1.05 ** Math.floor(t / 10);
        return level + 0.01 * level ** b * Math.cos(Math.PI * t);
      });
      const { slope, block } = spreadAgainstLevel(x, 10);
      expect(block).toBe(10);
      expect(slope).toBeCloseTo(b, 9);
    }
  });

  // Box & Cox's family under this record is near the logarithm: λ̂ = −0.3 … 0.3 is the common answer (common practice).
  it('λ of the airline record contains 0, and scales as a power does', () => {
    const y = publishedSeries('airline');
    const lambda = boxCoxLambda(y, { d: 1, D: 1, s: 12 })!;
    expect(lambda.from).toBeLessThan(0);
    expect(lambda.to).toBeGreaterThan(0);
    // A unit change multiplies the record and may not move λ.
    const scaled = boxCoxLambda(
      y.map((value) => 1000 * value),
      { d: 1, D: 1, s: 12 },
    )!;
    expect(scaled.value).toBeCloseTo(lambda.value, 3);
    // A power of the record divides λ by that power.
    const squared = boxCoxLambda(
      y.map((value) => value * value),
      { d: 1, D: 1, s: 12 },
    )!;
    expect(squared.value).toBeCloseTo(lambda.value / 2, 2);
  });
});

describe('describeShape at the ends of its domain', () => {
  const axis = numbered;
  it('refuses what it cannot describe, with its numbers', () => {
    const failure = (request: Parameters<typeof describeShape>[0]) => {
      const answer = describeShape(request);
      return answer.ok ? null : answer.failure;
    };
    expect(failure({ values: new Float64Array(12), axis, order: none })).toMatchObject({
      code: 'tooFewReadings',
      readings: 12,
    });
    expect(failure({ values: new Float64Array(40).fill(3), axis, order: none })).toMatchObject({ code: 'noVariation' });
    const ramp = Float64Array.from({ length: 40 }, (_, t) => t);
    expect(failure({ values: ramp, axis, order: { d: 1, D: 0, s: 0 } })).toMatchObject({
      code: 'noVariation',
      afterDifferencing: true,
    });
    expect(failure({ values: ramp, axis, order: { d: 0, D: 1, s: 0 } })).toMatchObject({
      code: 'badCandidate',
      field: 's',
    });
    expect(failure({ values: ramp, axis, order: none, window: { from: 5, to: 80 } })).toMatchObject({
      code: 'badCandidate',
      field: 'window',
    });
    expect(failure({ values: ramp, axis, order: none, transform: { kind: 'log' } })).toMatchObject({
      code: 'transformDomain',
      index: 0,
    });
    expect(failure({ values: new Float64Array(0), axis, order: none })).toMatchObject({
      code: 'tooFewReadings',
      readings: 0,
    });
  });

  it('keeps its answer under an offset, a unit change and a window of the same readings', () => {
    const y = publishedSeries('overshorts');
    const own = shapeOf(y);
    const moved = shapeOf(y.map((value) => 1e6 + 8 * value));
    own.lags.correlations.forEach((r, i) => expect(moved.lags.correlations[i]!).toBeCloseTo(r, 9));
    expect(moved.advice.order).toEqual(own.advice.order);
    expect(moved.unitRoots!.constant.dickeyFuller.statistic).toBeCloseTo(
      own.unitRoots!.constant.dickeyFuller.statistic,
      6,
    );
    const padded = new Float64Array(y.length + 20).fill(1e9);
    padded.set(y, 10);
    const answer = describeShape({ values: padded, axis, order: none, window: { from: 10, to: 10 + y.length } });
    expect(answer.ok && answer.value.unitRoots).toEqual(own.unitRoots);
  });

  it('takes gaps: pairs are counted and the advice stays', () => {
    const y = publishedSeries('seriesF');
    y[20] = NaN;
    y[21] = NaN;
    const { lags, gaps, readings } = shapeOf(y);
    expect([gaps, readings]).toEqual([2, 68]);
    expect(lags.pairs[0]).toBe(66);
  });
});
