import { describe, expect, test } from 'vitest';
import type { Order, Parameters } from '../../workers/contract/candidate.ts';
import { exactLogLikelihood } from '../../workers/estimation/exactLikelihood.ts';
import { candidateOf } from '../../workers/model/candidateOf.ts';
import { differencingPolynomial } from '../../workers/model/differencingPolynomial.ts';
import { partialToCoefficients } from '../../workers/model/partialToCoefficients.ts';
import { multiplied, oracleLogLikelihood } from '../helpers/denseOracle.ts';

// Models at the edges of the region: test/reference/exactLikelihood34.test.ts.

/** A small generator of its own, so that the cases do not move with the product's. */
function generator(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return (state + 0.5) / 4294967296;
  };
}

interface Case {
  name: string;
  order: Order;
  at: Parameters;
  values: number[];
}

type Gaps = 'none' | 'scattered' | 'run' | 'ends';

function makeCase(seed: number, order: Order, n: number, gaps: Gaps): Case {
  const draw = generator(seed);
  const normal = () => Math.sqrt(-2 * Math.log(draw())) * Math.cos(2 * Math.PI * draw());
  const factor = (count: number, sign: 1 | -1) => {
    const partial = Array.from({ length: count }, () => 1.6 * draw() - 0.8);
    const coefficients = new Float64Array(count);
    partialToCoefficients(partial, coefficients);
    return Array.from(coefficients, (value) => sign * value);
  };
  const at: Parameters = {
    ar: factor(order.p, 1),
    ma: factor(order.q, -1),
    seasonalAr: factor(order.P, 1),
    seasonalMa: factor(order.Q, -1),
    mean: 0,
    regression: [],
    innovationVariance: 0.5 + draw(),
  };
  let level = 0;
  const values = Array.from({ length: n }, () => {
    level = (order.d > 0 ? level : 0.6 * level) + normal();
    return level;
  });
  for (let t = 0; t < n; t++) {
    if (gaps === 'scattered' && draw() < 0.15) values[t] = NaN;
    if (gaps === 'run' && t >= Math.floor(n / 3) && t < Math.floor(n / 3) + 9) values[t] = NaN;
    if (gaps === 'ends' && (t < 3 || t >= n - 4 || t === Math.floor(n / 2))) values[t] = NaN;
  }
  return { name: `seed ${seed} ${JSON.stringify(order)} n ${n} gaps ${gaps}`, order, at, values };
}

const order = (p: number, d: number, q: number, P = 0, D = 0, Q = 0, s = 0): Order => ({ p, d, q, P, D, Q, s });
const orders = [
  order(1, 0, 0),
  order(0, 0, 1),
  order(2, 0, 1),
  order(1, 0, 2),
  order(3, 0, 3),
  order(0, 1, 1),
  order(2, 1, 1),
  order(1, 2, 2),
  order(1, 0, 1, 1, 0, 1, 4),
  order(0, 1, 1, 0, 1, 1, 7),
  order(0, 0, 2, 0, 1, 1, 5),
];
const cases: Case[] = [];
orders.forEach((each, index) => {
  (['none', 'scattered', 'run', 'ends'] as const).forEach((gaps, column) => {
    for (let depth = 0; depth < 3; depth++)
      cases.push(makeCase(1000 * index + 10 * column + depth, each, 40 + 7 * column, gaps));
  });
});

describe(`${cases.length} models against the dense covariance`, () => {
  test.each(cases.map((each) => [each.name, each] as const))('%s', (_name, { order: o, at, values }) => {
    const model = {
      ar: multiplied([...at.ar], [...at.seasonalAr], o.s, 1),
      ma: multiplied([...at.ma], [...at.seasonalMa], o.s, -1),
      differencing: [...differencingPolynomial(o)],
      variance: at.innovationVariance,
    };
    const exact = oracleLogLikelihood(values, model);
    const ours = exactLogLikelihood(Float64Array.from(values), candidateOf({ order: o }), at);
    expect(Math.abs(ours - exact)).toBeLessThan(1e-11 * Math.max(values.length, Math.abs(exact)));
  });
});
