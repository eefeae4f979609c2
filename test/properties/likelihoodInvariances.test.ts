import { describe, expect, test } from 'vitest';
import type { Candidate, Order, Parameters } from '../../workers/contract/candidate.ts';
import { exactLogLikelihood } from '../../workers/estimation/exactLikelihood.ts';
import { prepareLikelihood } from '../../workers/estimation/prepareLikelihood.ts';
import { candidateOf } from '../../workers/model/candidateOf.ts';
import { createRandom } from '../../workers/numeric/random.ts';
import { publishedSeries } from '../helpers/publishedSeries.ts';

const order = (p: number, d: number, q: number, P = 0, D = 0, Q = 0, s = 0): Order => ({ p, d, q, P, D, Q, s });
const parameters = (part: Partial<Parameters>): Parameters => ({
  ar: [],
  ma: [],
  seasonalAr: [],
  seasonalMa: [],
  mean: 0,
  regression: [],
  innovationVariance: 1,
  ...part,
});
type Settings = Partial<Candidate> & { order: Order };

const record = (n: number, gaps: readonly number[]) => {
  const random = createRandom(n + 1);
  let level = 3;
  return Float64Array.from({ length: n }, (_, t) => {
    level = 0.7 * level + random.normal() + 1;
    return gaps.includes(t) ? NaN : level;
  });
};

const models: [string, Settings, Parameters, number[]][] = [
  ['AR(2) with mean', { order: order(2, 0, 0), level: 'mean' }, parameters({ ar: [0.5, 0.2], mean: 3.1 }), []],
  [
    'ARMA(1,1), gaps',
    { order: order(1, 0, 1), level: 'mean' },
    parameters({ ar: [0.8], ma: [-0.4], mean: 3 }),
    [5, 6, 20],
  ],
  ['(0,1,1)', { order: order(0, 1, 1) }, parameters({ ma: [-0.6] }), []],
  ['(0,2,2), gaps', { order: order(0, 2, 2) }, parameters({ ma: [-1.1, 0.3] }), [3, 9, 10]],
  [
    '(0,1,1)(0,1,1)₄, gaps',
    { order: order(0, 1, 1, 0, 1, 1, 4) },
    parameters({ ma: [-0.5], seasonalMa: [-0.6] }),
    [4, 17, 18],
  ],
];
const within = (a: number, b: number, n: number) =>
  expect(Math.abs(a - b)).toBeLessThan(1e-10 * Math.max(n, Math.abs(b)));

/** Identities of the Gaussian likelihood; they hold for any record. */
describe.each(models)('%s', (_name, settings, at, gaps) => {
  const values = record(40, gaps);
  const candidate = candidateOf(settings);
  const here = exactLogLikelihood(values, candidate, at);
  const { order: o } = candidate;
  const used = 40 - gaps.length - o.d - o.s * o.D;

  test.each([1e-12, 1e-3, 1e6, 1e15])('times %f: ln L falls by N ln a', (a) => {
    const scaled = exactLogLikelihood(
      values.map((value) => a * value),
      candidate,
      { ...at, mean: a * at.mean, innovationVariance: a * a * at.innovationVariance },
    );
    within(scaled, here - used * Math.log(a), 40);
  });

  test('turned round in time it is the same', () => {
    within(exactLogLikelihood(values.slice().reverse(), candidate, at), here, 40);
  });

  test('turned upside down it is the same', () => {
    within(
      exactLogLikelihood(
        values.map((value) => -value),
        candidate,
        { ...at, mean: -at.mean },
      ),
      here,
      40,
    );
  });

  test('an offset goes into the mean or is differenced away', () => {
    const offset = 2 ** 20;
    const moved = values.map((value) => value + offset);
    const back = moved.map((value) => value - offset);
    const shifted = { ...at, mean: candidate.level === 'mean' ? at.mean + offset : 0 };
    within(exactLogLikelihood(moved, candidate, shifted), exactLogLikelihood(back, candidate, at), 40);
  });

  test('gaps put at the ends say nothing', () => {
    within(exactLogLikelihood(Float64Array.from([NaN, NaN, ...values, NaN]), candidate, at), here, 40);
  });
});

describe('profiled likelihood', () => {
  const concentrated = (values: Float64Array, settings: Settings, ma: number[]) => {
    const made = prepareLikelihood({ values, candidate: candidateOf(settings) });
    if (!made.ok) throw new Error(made.failure.code);
    return made.value.concentrated({ ar: [], ma, seasonalAr: [], seasonalMa: [] });
  };

  test('θ and 1/θ have one profile: overshorts, −.8 and −1.25 both −298.5071922903 (dense, 34 digits)', () => {
    const values = publishedSeries('overshorts');
    const settings: Settings = { order: order(0, 0, 1), level: 'mean' };
    expect(concentrated(values, settings, [-0.8]).logLikelihood).toBeCloseTo(-298.5071922903, 9);
    expect(concentrated(values, settings, [-1.25]).logLikelihood).toBeCloseTo(-298.5071922903, 9);
  });

  test('the determinant of MA(1): (1 − θ^{2n+2})/(1 − θ²), and n + 1 with its root on the circle', () => {
    // σ² = 1 and a record of zeros but one: ln L = −½(n ln 2π + ln|V| + v), with v = 0 in the limit of a small reading.
    const n = 5;
    const tiny = Float64Array.from({ length: n }, (_, t) => (t === 0 ? 1e-12 : 0));
    const determinant = (theta: number) =>
      Math.exp(
        -2 * exactLogLikelihood(tiny, candidateOf({ order: order(0, 0, 1) }), parameters({ ma: [theta] })) -
          n * Math.log(2 * Math.PI),
      );
    expect(determinant(0.6)).toBeCloseTo(1.5590987776, 10);
    expect(determinant(1)).toBeCloseTo(6, 10);
    expect(determinant(-1)).toBeCloseTo(6, 10);
  });
});

/** Fixed parameters, no search: 34-digit arithmetic on the definition (dense covariance). */
describe('published series at fixed parameters', () => {
  const huron = publishedSeries('lakeHuron');

  test('Lake Huron, ARMA(1,1) and AR(2)', () => {
    expect(
      exactLogLikelihood(
        huron,
        candidateOf({ order: order(1, 0, 1), level: 'mean' }),
        parameters({ ar: [0.75], ma: [0.3], mean: 579, innovationVariance: 0.5 }),
      ),
    ).toBeCloseTo(-103.3375495330626, 10);
    expect(
      exactLogLikelihood(
        huron,
        candidateOf({ order: order(2, 0, 0), level: 'mean' }),
        parameters({ ar: [1.04, -0.25], mean: 579, innovationVariance: 0.48 }),
      ),
    ).toBeCloseTo(-103.6462584316791, 10);
  });

  test('the log of a record: ln L of the logs less Σ ln y over the readings used', () => {
    const airline = publishedSeries('airline');
    const at = parameters({ ma: [-0.4], seasonalMa: [-0.55], innovationVariance: 0.00135 });
    const o = order(0, 1, 1, 0, 1, 1, 12);
    let jacobian = 0;
    for (let t = 13; t < 144; t++) jacobian -= Math.log(airline[t]!);
    const logged = exactLogLikelihood(airline, candidateOf({ order: o, transform: { kind: 'log' } }), at);
    const plain = exactLogLikelihood(airline.map(Math.log), candidateOf({ order: o }), at);
    expect(logged).toBeCloseTo(plain + jacobian, 9);
  });
});
