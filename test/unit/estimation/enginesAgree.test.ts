import { describe, expect, test } from 'vitest';
import type { Order } from '../../../workers/contract/candidate.ts';
import { columnsForGaps, withoutGaps } from '../../../workers/estimation/engine/columnsForGaps.ts';
import type { Engine } from '../../../workers/estimation/engine/engine.ts';
import { FastEngine } from '../../../workers/estimation/engine/fastEngine.ts';
import { FastGradient } from '../../../workers/estimation/engine/fastGradient.ts';
import { GapFilter } from '../../../workers/estimation/engine/gapFilter.ts';
import { ProfileGls } from '../../../workers/estimation/engine/profileGls.ts';
import { startingValues } from '../../../workers/estimation/engine/startingValues.ts';
import { differencingPolynomial } from '../../../workers/model/differencingPolynomial.ts';
import { expandPolynomials, type Factors } from '../../../workers/model/expandPolynomials.ts';
import { createRandom } from '../../../workers/numeric/random.ts';
import { differenceRecord } from '../../../workers/series/differenceRecord.ts';

const order = (p: number, d: number, q: number, P = 0, D = 0, Q = 0, s = 0): Order => ({ p, d, q, P, D, Q, s });
const factors = (ar: number[], ma: number[], seasonalAr: number[] = [], seasonalMa: number[] = []): Factors => ({
  ar,
  ma,
  seasonalAr,
  seasonalMa,
});

const cases: [string, Order, Factors, number[]][] = [
  ['ARMA(1,1), a run of gaps', order(1, 0, 1), factors([0.8], [-0.3]), [7, 8, 9, 10, 30]],
  ['ARMA(2,1) near a unit root', order(2, 0, 1), factors([1.2, -0.2004], [0.5]), [5, 20, 21]],
  ['MA(2) on the circle', order(0, 0, 2), factors([], [-1.6, 1]), [4, 18]],
  ['(0,1,1), gaps at the start of what is known', order(0, 1, 1), factors([], [-0.7]), [1, 2, 15]],
  ['(1,2,1)', order(1, 2, 1), factors([0.5], [-0.4]), [3, 9, 22]],
  ['(0,1,1)(0,1,1)₇', order(0, 1, 1, 0, 1, 1, 7), factors([], [-0.4], [], [-0.6]), [2, 9, 16, 23, 40, 41, 42]],
  ['(1,0,1)(1,1,1)₄', order(1, 0, 1, 1, 1, 1, 4), factors([0.5], [0.3], [0.4], [-0.5]), [6, 7, 30]],
];

const n = 60;
const input = Float64Array.from({ length: n }, (_, t) => (t >= 33 ? 1 : 0));

function recordWith(gaps: readonly number[], seed: number): Float64Array {
  const random = createRandom(seed);
  let level = 0;
  return Float64Array.from({ length: n }, (_, t) => {
    level = 0.9 * level + random.normal();
    return gaps.includes(t) ? NaN : level;
  });
}

function logLikelihood(engine: Engine, gls: ProfileGls, readings: number): number {
  const { rss, flatLogDeterminant } = gls.profile;
  return (
    -0.5 * (readings * (Math.log((2 * Math.PI * rss) / readings) + 1) + engine.logDeterminant + flatLogDeterminant)
  );
}

function engines(o: Order, gaps: readonly number[], seed: number) {
  const record = recordWith(gaps, seed);
  const differencing = differencingPolynomial(o);
  const p = o.p + o.s * o.P;
  const q = o.q + o.s * o.Q;
  const columns = gaps.map((gap) => Float64Array.from({ length: n }, (_, t) => (t === gap ? 1 : 0)));
  const fast = new FastEngine(
    [withoutGaps(record), ...columns, input].map((one) => differenceRecord(one, differencing)),
    p,
    q,
    gaps.length,
  );
  const filter = new GapFilter([record, input], p, q, differencing);
  const readings = n - gaps.length - startingValues(record, differencing).rank;
  return { fast, filter, readings };
}

describe.each(cases)('%s', (_name, o, at, gaps) => {
  test('columns for the gaps and the filter give one likelihood and one regression', () => {
    const { fast, filter, readings } = engines(o, gaps, 11);
    const { ar, ma } = expandPolynomials(at, o.s);
    const [one, other] = [new ProfileGls(fast.count, fast.flat), new ProfileGls(filter.count, filter.flat)];
    expect(fast.evaluate(ar, ma) && one.solve(fast.cross)).toBe(true);
    expect(filter.evaluate(ar, ma) && other.solve(filter.cross)).toBe(true);
    const [a, b] = [logLikelihood(fast, one, readings), logLikelihood(filter, other, readings)];
    expect(Math.abs(a - b)).toBeLessThan(1e-11 * Math.max(n, Math.abs(a)));
    expect(one.profile.beta[0]).toBeCloseTo(other.profile.beta[0]!, 9);
    expect(one.profile.information[0]! / other.profile.information[0]!).toBeCloseTo(1, 9);
  });
});

// With a root on the circle the differences would leave the region.
describe.each(cases.filter(([name]) => !name.includes('circle')))('%s', (_name, o, at, gaps) => {
  test('the gradient is that of central differences', () => {
    const { fast, readings } = engines(o, gaps, 12);
    const gls = new ProfileGls(fast.count, fast.flat);
    const height = (factor: Factors) => {
      const { ar, ma } = expandPolynomials(factor, o.s);
      if (!fast.evaluate(ar, ma) || !gls.solve(fast.cross)) throw new Error('outside');
      return logLikelihood(fast, gls, readings);
    };
    height(at);
    const gradient = new Float64Array(o.p + o.q + o.P + o.Q);
    new FastGradient(fast, o, readings).write(at, gls, gradient);
    let index = 0;
    for (const name of ['ar', 'ma', 'seasonalAr', 'seasonalMa'] as const) {
      for (let i = 0; i < at[name].length; i++, index++) {
        const step = 1e-6;
        const moved = (by: number) => ({
          ...at,
          [name]: Array.from(at[name], (value, k) => (k === i ? value + by : value)),
        });
        const numeric = (height(moved(step)) - height(moved(-step))) / (2 * step);
        expect(Math.abs(gradient[index]! - numeric)).toBeLessThan(1e-5 * Math.max(10, Math.abs(numeric)));
      }
    }
  });
});

test('gaps among the starting values take columns, the others are places in the differenced record', () => {
  const long = new Float64Array(2000);
  for (const gap of [10, 100, 900]) long[gap] = NaN;
  const found = columnsForGaps(long, 24, 0)!;
  expect(found.columns.map((column) => column.indexOf(1))).toEqual([10]);
  expect([...found.places]).toEqual([76, 876]);
  expect(columnsForGaps(new Float64Array(10), 1, 1)!.columns).toEqual([]);
  expect(columnsForGaps(new Float64Array(300).fill(NaN, 1, 100), 150, 0)).toBeNull();
});

test.each([
  ['ARMA(1,1)', order(1, 0, 1), factors([0.8], [-0.4])],
  ['AR(3)', order(3, 0, 0), factors([0.5, 0.1, 0.2], [])],
  ['(1,0,2)(1,0,1)₄', order(1, 0, 2, 1, 0, 1, 4), factors([0.5], [0.3, 0.2], [0.4], [-0.3])],
] as const)('%s: stretches between gaps at once or step by step, to rounding', (_name, o, at) => {
  const random = createRandom(5);
  const record = Float64Array.from({ length: 3000 }, (_, t) =>
    [700, 701, 702, 704, 1500, 2996].includes(t) ? NaN : random.normal(),
  );
  const column = Float64Array.from({ length: 3000 }, (_, t) => Math.cos(t));
  const { ar, ma } = expandPolynomials(at, o.s);
  const whole = new GapFilter([record, column], ar.length, ma.length, Float64Array.of(1));
  let steps = 0;
  const stepwise = new GapFilter([record, column], ar.length, ma.length, Float64Array.of(1), () => (steps += 1));
  expect(whole.evaluate(ar, ma) && stepwise.evaluate(ar, ma)).toBe(true);
  expect(steps).toBe(3000);
  expect(whole.logDeterminant).toBeCloseTo(stepwise.logDeterminant, 11);
  whole.cross.forEach((value, i) => expect(Math.abs(value / stepwise.cross[i]! - 1)).toBeLessThan(1e-11));
});
