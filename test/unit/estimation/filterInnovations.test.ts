import { describe, expect, test } from 'vitest';
import type { Order, Parameters } from '../../../workers/contract/candidate.ts';
import { exactLogLikelihood } from '../../../workers/estimation/exactLikelihood.ts';
import { filterInnovations } from '../../../workers/estimation/filterInnovations.ts';
import { predictiveMoments } from '../../../workers/estimation/predictiveMoments.ts';
import { candidateOf } from '../../../workers/model/candidateOf.ts';
import { createRandom } from '../../../workers/numeric/random.ts';

const order = (p: number, d: number, q: number, P = 0, D = 0, Q = 0, s = 0): Order => ({ p, d, q, P, D, Q, s });
const at = (part: Partial<Parameters>): Parameters => ({
  ar: [],
  ma: [],
  seasonalAr: [],
  seasonalMa: [],
  mean: 0,
  regression: [],
  innovationVariance: 1.7,
  ...part,
});
const record = (n: number, gaps: readonly number[]) => {
  const random = createRandom(n);
  let level = 20;
  return Float64Array.from({ length: n }, (_, t) => {
    level += random.normal();
    return gaps.includes(t) ? NaN : level;
  });
};

/** The prediction error decomposition: −½ Σ (ln 2πs² + e²/s²) is ln L (Harvey 1989, Forecasting, Structural Time Series Models, §3.4). */
describe('innovations add up to the exact likelihood', () => {
  test.each([
    ['AR(2)', order(2, 0, 0), at({ ar: [0.5, 0.3], mean: 19 }), [] as number[]],
    ['ARMA(1,1) with gaps', order(1, 0, 1), at({ ar: [0.8], ma: [-0.4], mean: 21 }), [3, 4, 17]],
    ['(0,1,1)', order(0, 1, 1), at({ ma: [-0.6] }), []],
    ['(0,1,1) with gaps', order(0, 1, 1), at({ ma: [-0.6] }), [2, 9, 10, 11]],
    ['(1,2,1) with gaps', order(1, 2, 1), at({ ar: [0.4], ma: [-0.5] }), [6, 7, 12]],
    ['(0,1,1)(0,1,1)₄', order(0, 1, 1, 0, 1, 1, 4), at({ ma: [-0.4], seasonalMa: [-0.5] }), []],
    [
      '(0,1,1)(0,1,1)₄ with gaps',
      order(0, 1, 1, 0, 1, 1, 4),
      at({ ma: [-0.4], seasonalMa: [-0.5] }),
      [2, 5, 13, 14, 15, 16, 17],
    ],
  ])('%s', (_name, o, parameters, gaps) => {
    const values = record(40, gaps);
    const candidate = candidateOf({ order: o, level: o.d + o.D === 0 ? 'mean' : 'none' });
    const found = filterInnovations({ values, candidate, at: parameters });
    if (!found.ok) throw new Error(JSON.stringify(found.failure));
    let sum = 0;
    let used = 0;
    found.value.values.forEach((e, t) => {
      if (Number.isNaN(e)) return;
      const s = found.value.standardDeviations[t]!;
      sum -= 0.5 * (Math.log(2 * Math.PI * s * s) + (e / s) ** 2);
      used += 1;
    });
    expect(used).toBe(40 - gaps.length - o.d - o.s * o.D);
    expect(sum).toBeCloseTo(exactLogLikelihood(values, candidate, parameters), 9);
  });
});

describe('predictions', () => {
  test('IMA(1,1): standard errors σ√(1 + (h−1)(1+θ)²) (Box & Jenkins, ch. 5), one flat line', () => {
    const values = record(200, [50, 51]);
    const parameters = at({ ma: [-0.7], innovationVariance: 0.25 });
    const found = predictiveMoments({
      values,
      candidate: candidateOf({ order: order(0, 1, 1) }),
      at: parameters,
      horizon: 10,
    });
    if (!found.ok) throw new Error('failed');
    found.value.standardError.forEach((se, i) => {
      expect(se).toBeCloseTo(0.5 * Math.sqrt(1 + i * 0.09), 10);
      expect(found.value.expected[i]).toBeCloseTo(found.value.expected[0]!, 10);
    });
  });

  test('the best next value agrees with the reading that makes the innovation zero', () => {
    const values = record(60, [20]);
    const candidate = candidateOf({ order: order(1, 1, 1, 1, 0, 0, 5) });
    const parameters = at({ ar: [0.3], ma: [-0.6], seasonalAr: [0.4] });
    const found = predictiveMoments({ values, candidate, at: parameters, horizon: 1 });
    if (!found.ok) throw new Error('failed');
    const longer = Float64Array.from([...values, found.value.expected[0]!]);
    const next = filterInnovations({ values: longer, candidate, at: parameters });
    if (!next.ok) throw new Error('failed');
    expect(next.value.values[60]).toBeCloseTo(0, 10);
    expect(next.value.standardDeviations[60]).toBeCloseTo(found.value.standardError[0]!, 10);
  });

  test('a phase of the season never observed is not predicted, the others are', () => {
    const values = Float64Array.from({ length: 42 }, (_, t) => (t % 7 === 6 ? NaN : Math.sin(t) + t / 10));
    const candidate = candidateOf({ order: order(0, 0, 0, 0, 1, 1, 7) });
    const found = predictiveMoments({ values, candidate, at: at({ seasonalMa: [-0.5] }), horizon: 7 });
    if (!found.ok) throw new Error('failed');
    expect(Array.from(found.value.expected, (value) => Number.isNaN(value))).toEqual([
      false,
      false,
      false,
      false,
      false,
      false,
      true,
    ]);
  });
});
