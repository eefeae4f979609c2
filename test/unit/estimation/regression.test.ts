import { describe, expect, test } from 'vitest';
import type { Candidate, Order, Parameters, Regressor } from '../../../workers/contract/candidate.ts';
import { exactLogLikelihood } from '../../../workers/estimation/exactLikelihood.ts';
import { prepareLikelihood } from '../../../workers/estimation/prepareLikelihood.ts';
import { candidateOf } from '../../../workers/model/candidateOf.ts';
import { differencingPolynomial } from '../../../workers/model/differencingPolynomial.ts';
import { createRandom } from '../../../workers/numeric/random.ts';
import { multiplied, oracleLogLikelihood } from '../../helpers/denseOracle.ts';

const order = (p: number, d: number, q: number, P = 0, D = 0, Q = 0, s = 0): Order => ({ p, d, q, P, D, Q, s });
const n = 48;
const feed = Float64Array.from({ length: n }, (_, t) => 20 + 3 * Math.sin(t * t));

interface Case {
  name: string;
  candidate: Candidate;
  at: Parameters;
  gaps: number[];
  /** What the regression adds to each reading, by its own formula. */
  added: (t: number) => number;
}

const make = (
  name: string,
  o: Order,
  coefficients: Partial<Parameters>,
  level: Candidate['level'],
  mean: number,
  regressors: Regressor[],
  regression: number[],
  gaps: number[],
  added: (t: number) => number,
): Case => ({
  name,
  candidate: candidateOf({ order: o, level, regressors }),
  at: {
    ar: [],
    ma: [],
    seasonalAr: [],
    seasonalMa: [],
    mean,
    regression,
    innovationVariance: 1.3,
    ...coefficients,
  },
  gaps,
  added,
});

const cases: Case[] = [
  make('mean', order(1, 0, 1), { ar: [0.7], ma: [0.3] }, 'mean', 12, [], [], [], () => 12),
  make(
    'mean and a step, gaps',
    order(1, 0, 0),
    { ar: [0.8] },
    'mean',
    12,
    [{ kind: 'step', at: 30 }],
    [4],
    [3, 29, 30],
    (t) => (t >= 30 ? 16 : 12),
  ),
  make(
    'ramp, pulse and a covariate two readings late',
    order(2, 0, 0),
    { ar: [0.9, -0.3] },
    'mean',
    5,
    [
      { kind: 'ramp', at: 10 },
      { kind: 'pulse', at: 25 },
      { kind: 'column', id: 'feed', lag: 2 },
    ],
    [0.2, -3, 0.5],
    [40],
    (t) => 5 + 0.2 * Math.max(0, t - 10) - (t === 25 ? 3 : 0) + 0.5 * (feed[t - 2] ?? NaN),
  ),
  make('drift', order(0, 1, 1), { ma: [-0.5] }, 'drift', 0.4, [], [], [], (t) => 0.4 * t),
  make('drift and gaps', order(1, 1, 1), { ar: [0.3], ma: [-0.5] }, 'drift', 0.4, [], [], [1, 20, 21], (t) => 0.4 * t),
  make('drift of second differences', order(0, 2, 1), { ma: [-0.5] }, 'drift', 0.1, [], [], [], (t) => 0.05 * t * t),
  make(
    'seasonal differences, drift a season, a step',
    order(0, 0, 1, 0, 1, 1, 7),
    { ma: [0.4], seasonalMa: [-0.6] },
    'drift',
    0.7,
    [{ kind: 'step', at: 20 }],
    [2],
    [9, 22],
    (t) => 0.1 * t + (t >= 20 ? 2 : 0),
  ),
  make(
    'harmonics of a period that is no whole number',
    order(1, 0, 0),
    { ar: [0.5] },
    'mean',
    3,
    [{ kind: 'harmonic', period: 12.5, k: 1 }],
    [1.5, -0.7],
    [11, 12],
    (t) => 3 + 1.5 * Math.cos((2 * Math.PI * t) / 12.5) - 0.7 * Math.sin((2 * Math.PI * t) / 12.5),
  ),
];

const recordOf = ({ gaps }: Case) => {
  const random = createRandom(31);
  let level = 0;
  return Float64Array.from({ length: n }, (_, t) => {
    level = 0.8 * level + random.normal();
    return gaps.includes(t) ? NaN : 12 + level;
  });
};

describe.each(cases.map((each) => [each.name, each] as const))('%s', (_name, each) => {
  const { candidate, at, added } = each;
  const values = recordOf(each);
  const first = candidate.regressors.some((one) => one.kind === 'column') ? 2 : 0;
  const model = {
    ar: multiplied([...at.ar], [...at.seasonalAr], candidate.order.s, 1),
    ma: multiplied([...at.ma], [...at.seasonalMa], candidate.order.s, -1),
    differencing: [...differencingPolynomial(candidate.order)],
    variance: at.innovationVariance,
  };

  test('ln L is that of the record less its regression, by the dense covariance', () => {
    const rest = Array.from(values, (value, t) => value - added(t)).slice(first);
    const exact = oracleLogLikelihood(rest, model);
    expect(Math.abs(exactLogLikelihood(values, candidate, at, { feed }) - exact)).toBeLessThan(
      1e-11 * Math.max(n, Math.abs(exact)),
    );
  });

  test('the profiled values maximise it, and their information is its curvature', () => {
    const made = prepareLikelihood({ values, candidate, columns: { feed } });
    if (!made.ok) throw new Error(made.failure.code);
    const { beta, innovationVariance, logLikelihood, betaInformation } = made.value.concentrated(at);
    const hasLevel = candidate.level !== 'none';
    const height = (coefficients: ArrayLike<number>, variance = innovationVariance) =>
      exactLogLikelihood(
        values,
        candidate,
        {
          ...at,
          mean: hasLevel ? coefficients[0]! : 0,
          regression: Array.from(coefficients).slice(hasLevel ? 1 : 0),
          innovationVariance: variance,
        },
        { feed },
      );
    expect(height(beta)).toBeCloseTo(logLikelihood, 8);
    expect(height(beta, innovationVariance * 1.01)).toBeLessThan(logLikelihood);
    expect(height(beta, innovationVariance / 1.01)).toBeLessThan(logLikelihood);
    // ln L is a parabola in β: two unequal steps give its curvature exactly, and along both axes its mixed part.
    const k = beta.length;
    const step = (i: number) => 1 / Math.sqrt(betaInformation[i * k + i]!);
    for (let i = 0; i < k; i++) {
      for (let j = 0; j <= i; j++) {
        const moved = (a: number, b: number) =>
          height(beta.map((value, l) => value + (l === i ? a * step(i) : 0) + (l === j ? b * step(j) : 0)));
        const curvature = (moved(1, 1) - moved(1, -1) - moved(-1, 1) + moved(-1, -1)) / (4 * step(i) * step(j));
        const wanted = -betaInformation[i * k + j]!;
        expect(Math.abs(curvature - wanted) * step(i) * step(j)).toBeLessThan(1e-6);
      }
    }
  });
});

describe('columns that cannot be estimated are named', () => {
  const refuse = (candidate: Candidate, values: Float64Array, columns: Record<string, Float64Array> = {}) => {
    const made = prepareLikelihood({ values, candidate, columns });
    return made.ok ? null : made.failure;
  };
  const values = recordOf(cases[0]!);

  test('a constant covariate beside differencing', () => {
    const candidate = candidateOf({ order: order(0, 1, 1), regressors: [{ kind: 'column', id: 'feed', lag: 0 }] });
    expect(refuse(candidate, values, { feed: new Float64Array(n).fill(7) })).toEqual({
      code: 'columnNotEstimable',
      column: 'β1',
      reason: 'annihilated',
    });
  });

  test('a pulse in a gap', () => {
    const holed = values.slice();
    holed[20] = NaN;
    const candidate = candidateOf({ order: order(1, 0, 0), level: 'mean', regressors: [{ kind: 'pulse', at: 20 }] });
    expect(refuse(candidate, holed)).toEqual({ code: 'columnNotEstimable', column: 'β1', reason: 'inGap' });
    const differenced = candidateOf({ order: order(0, 1, 1), regressors: [{ kind: 'pulse', at: 20 }] });
    expect(refuse(differenced, holed)).toEqual({ code: 'columnNotEstimable', column: 'β1', reason: 'inGap' });
  });

  test('a step at the first reading is the mean again', () => {
    const candidate = candidateOf({ order: order(1, 0, 0), level: 'mean', regressors: [{ kind: 'step', at: 0 }] });
    expect(refuse(candidate, values)).toMatchObject({ code: 'columnNotEstimable', column: 'β1' });
  });

  test('the same covariate twice', () => {
    const candidate = candidateOf({
      order: order(1, 0, 0),
      level: 'mean',
      regressors: [
        { kind: 'column', id: 'feed', lag: 0 },
        { kind: 'column', id: 'copy', lag: 0 },
      ],
    });
    expect(refuse(candidate, values, { feed, copy: feed.map((value) => 2 * value + 1) })).toEqual({
      code: 'columnNotEstimable',
      column: 'β2',
      reason: 'collinear',
    });
  });

  test('a covariate with a gap where the record has a reading', () => {
    const holed = feed.slice();
    holed[13] = NaN;
    const candidate = candidateOf({ order: order(1, 0, 0), regressors: [{ kind: 'column', id: 'feed', lag: 1 }] });
    expect(refuse(candidate, values, { feed: holed })).toEqual({ code: 'columnGap', column: 'β1', index: 14 });
  });
});
