import { describe, expect, test } from 'vitest';
import type { Order } from '../../../workers/contract/candidate.ts';
import { FastEngine } from '../../../workers/estimation/engine/fastEngine.ts';
import { FastGradient } from '../../../workers/estimation/engine/fastGradient.ts';
import { GapFilter } from '../../../workers/estimation/engine/gapFilter.ts';
import { ProfileGls } from '../../../workers/estimation/engine/profileGls.ts';
import { SeasonalEngine } from '../../../workers/estimation/engine/seasonalEngine.ts';
import { SeasonalGradient } from '../../../workers/estimation/engine/seasonalGradient.ts';
import { expandPolynomials, type Factors } from '../../../workers/model/expandPolynomials.ts';
import { createRandom } from '../../../workers/numeric/random.ts';

const order = (p: number, q: number, P: number, Q: number, s: number): Order => ({ p, d: 0, q, P, D: 0, Q, s });
const factors = (ar: number[], ma: number[], seasonalAr: number[] = [], seasonalMa: number[] = []): Factors => ({
  ar,
  ma,
  seasonalAr,
  seasonalMa,
});

/** The filter and the dense start effect are two other ways to the same numbers, themselves held to 34-digit references. */
const cases: [string, Order, Factors, number][] = [
  ['(0,1)(0,1)₁₂', order(0, 1, 0, 1, 12), factors([], [-0.4], [], [-0.6]), 150],
  ['(0,0)(1,0)₁₂', order(0, 0, 1, 0, 12), factors([], [], [0.6]), 100],
  ['(1,0)(1,0)₇', order(1, 0, 1, 0, 7), factors([0.7], [], [0.6]), 120],
  ['(1,1)(1,1)₇, the last season cut', order(1, 1, 1, 1, 7), factors([0.7], [0.3], [0.6], [-0.3]), 123],
  ['(2,1)(1,2)₈', order(2, 1, 1, 2, 8), factors([1.2, -0.4], [0.3], [0.6], [-0.3, 0.2]), 131],
  ['(1,2)(2,1)₈', order(1, 2, 2, 1, 8), factors([0.9], [0.3, -0.2], [0.6, -0.3], [-0.3]), 125],
  ['(3,2)(2,2)₁₂', order(3, 2, 2, 2, 12), factors([0.9, -0.3, 0.2], [0.4, 0.2], [0.6, 0.2], [0.4, 0.3]), 100],
  ['(1,1)(1,1)₁₂ near all edges', order(1, 1, 1, 1, 12), factors([0.97], [-0.5], [0.9], [-0.97]), 200],
  ['(1,1)(1,1)₆, one factor that cancels', order(1, 1, 1, 1, 6), factors([0.5], [0.3], [0.4], [-0.4]), 100],
];
const onCircle: typeof cases = [
  ['(0,1)(0,1)₁₂, all MA roots on the circle', order(0, 1, 0, 1, 12), factors([], [-1], [], [-1]), 150],
  ['(1,1)(0,1)₆, a regular MA root on the circle', order(1, 1, 0, 1, 6), factors([0.5], [1], [], [-0.9]), 90],
];

function seriesOf(n: number): Float64Array[] {
  const random = createRandom(7);
  let x = 0;
  const record = Float64Array.from({ length: n }, () => (x = 0.7 * x + random.normal()));
  return [record, Float64Array.from({ length: n }, (_, t) => (t > n / 3 ? 1 : 0)), new Float64Array(n).fill(1)];
}

function logLikelihood(cross: Float64Array, logDeterminant: number, n: number) {
  const gls = new ProfileGls(3, 0);
  if (!gls.solve(cross)) throw new Error('outside');
  return { gls, value: -0.5 * (n * Math.log(gls.profile.rss) + logDeterminant) };
}

describe.each([...cases, ...onCircle])('%s', (_name, o, at, n) => {
  test('three engines give one likelihood and one regression', () => {
    const series = seriesOf(n);
    const { ar, ma } = expandPolynomials(at, o.s);
    const seasonal = new SeasonalEngine(series, o);
    const fast = new FastEngine(series, ar.length, ma.length);
    const filter = new GapFilter(series, ar.length, ma.length, Float64Array.of(1));
    expect(seasonal.evaluate(at, o.s)).toBe(true);
    expect(fast.evaluate(ar, ma)).toBe(true);
    expect(filter.evaluate(ar, ma)).toBe(true);
    const own = logLikelihood(seasonal.cross, seasonal.logDeterminant, n);
    for (const { cross, logDeterminant } of [fast, filter]) {
      const other = logLikelihood(cross, logDeterminant, n);
      expect(Math.abs(own.value - other.value)).toBeLessThan(1e-11 * Math.max(n, Math.abs(other.value)));
      own.gls.profile.beta.forEach((beta, i) =>
        expect(Math.abs(beta - other.gls.profile.beta[i]!)).toBeLessThan(1e-9 * (1 + Math.abs(beta))),
      );
    }
  });
});

describe.each(cases)('%s', (_name, o, at, n) => {
  test('the gradient is that of the other engine, with a column integrated out', () => {
    const series = seriesOf(n).slice(0, 2);
    const { ar, ma } = expandPolynomials(at, o.s);
    const seasonal = new SeasonalEngine(series, o, 1);
    const fast = new FastEngine(series, ar.length, ma.length, 1);
    const [one, other] = [new ProfileGls(2, 1), new ProfileGls(2, 1)];
    expect(seasonal.evaluate(at, o.s) && one.solve(seasonal.cross)).toBe(true);
    expect(fast.evaluate(ar, ma) && other.solve(fast.cross)).toBe(true);
    const size = o.p + o.q + o.P + o.Q;
    const [mine, theirs] = [new Float64Array(size), new Float64Array(size)];
    new SeasonalGradient(seasonal, o, n).write(at, one, mine);
    new FastGradient(fast, o, n).write(at, other, theirs);
    // Near the edges of the region the differences of the start effect lose digits.
    mine.forEach((value, i) =>
      expect(Math.abs(value - theirs[i]!)).toBeLessThan(1e-6 * Math.max(10, Math.abs(theirs[i]!))),
    );
  });
});

test('outside the stationary region nothing is evaluated', () => {
  const engine = new SeasonalEngine(seriesOf(100), order(1, 0, 1, 0, 6));
  expect(engine.evaluate(factors([1.01], [], [0.5]), 6)).toBe(false);
  expect(engine.evaluate(factors([0.5], [], [-1.01]), 6)).toBe(false);
  expect(engine.evaluate(factors([0.5], [], [0.5]), 6)).toBe(true);
});
