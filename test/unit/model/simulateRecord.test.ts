import { describe, expect, test } from 'vitest';
import type { Order, Parameters } from '../../../workers/contract/candidate.ts';
import { simulateRecord } from '../../../workers/model/simulateRecord.ts';
import { createRandom } from '../../../workers/numeric/random.ts';
import { multiplied, oracleAutocovariances } from '../../helpers/denseOracle.ts';

const order = (p: number, d: number, q: number, P = 0, D = 0, Q = 0, s = 0): Order => ({ p, d, q, P, D, Q, s });
const at = (part: Partial<Parameters>): Parameters => ({
  ar: [],
  ma: [],
  seasonalAr: [],
  seasonalMa: [],
  mean: 0,
  regression: [],
  innovationVariance: 1,
  ...part,
});

/** Second moments over many short records: from the first reading on they must be the theoretical ones. */
function moments(o: Order, parameters: Parameters, shock?: (random: ReturnType<typeof createRandom>) => number) {
  const replicates = 40_000;
  const length = 6;
  const random = createRandom(77);
  const sums = new Float64Array(length);
  for (let r = 0; r < replicates; r++) {
    const values = simulateRecord({
      order: o,
      at: parameters,
      length,
      random,
      ...(shock && { shock: () => shock(random) }),
    });
    for (let k = 0; k < length; k++) sums[k]! += (values[0]! - parameters.mean) * (values[k]! - parameters.mean);
  }
  return sums.map((value) => value / replicates);
}

describe('simulated records', () => {
  test.each([
    ['AR(1) near a unit root', order(1, 0, 0), at({ ar: [0.99] })],
    ['ARMA(2,1) with a mean', order(2, 0, 1), at({ ar: [1.2, -0.72], ma: [0.5], mean: 7, innovationVariance: 2 })],
    [
      '(1,0,1)(1,0,1)₃',
      order(1, 0, 1, 1, 0, 1, 3),
      at({ ar: [0.5], ma: [-0.3], seasonalAr: [0.6], seasonalMa: [0.4] }),
    ],
    ['MA(2)', order(0, 0, 2), at({ ma: [0.4, -0.8] })],
  ])('%s: stationary from the first reading on', (_name, o, parameters) => {
    const ar = multiplied([...parameters.ar], [...parameters.seasonalAr], o.s, 1);
    const ma = multiplied([...parameters.ma], [...parameters.seasonalMa], o.s, -1);
    const gamma = oracleAutocovariances(ar, ma, 5).map((value) => value * parameters.innovationVariance);
    // Var of a product of two such normals is γ0² + γk² ≤ 2γ0²; five standard errors.
    const room = (5 * Math.SQRT2 * gamma[0]!) / Math.sqrt(40_000);
    moments(o, parameters).forEach((value, k) => expect(Math.abs(value - gamma[k]!)).toBeLessThan(room));
  });

  test('another law: the variance of a Laplace AR(1) is 1/(1 − φ²), its kurtosis above the normal', () => {
    const random = createRandom(5);
    let second = 0;
    let fourth = 0;
    const replicates = 20_000;
    for (let r = 0; r < replicates; r++) {
      const [value] = simulateRecord({
        order: order(1, 0, 0),
        at: at({ ar: [0.5] }),
        length: 1,
        random,
        shock: () => random.laplace(),
      });
      second += value! ** 2 / replicates;
      fourth += value! ** 4 / replicates;
    }
    expect(second).toBeCloseTo(4 / 3, 1);
    // Excess of the sum: 3·Σψ⁴/(Σψ²)² = 3·(1 − φ²)²/(1 − φ⁴) = 1.8.
    expect(Math.abs(fourth / second ** 2 - 4.8)).toBeLessThan(0.6);
  });

  test('differencing gives back the differenced record, and goes on from the values before', () => {
    const parameters = at({ ma: [-0.4], seasonalMa: [-0.5], mean: 0.1 });
    const before = [5, 6, 7, 5.5, 6.5];
    const values = simulateRecord({
      order: order(0, 1, 1, 0, 1, 1, 4),
      at: parameters,
      length: 50,
      random: createRandom(9),
      before,
    });
    const plain = simulateRecord({
      order: order(0, 0, 1, 0, 0, 1, 4),
      at: parameters,
      length: 50,
      random: createRandom(9),
    });
    const y = [...before, ...values];
    plain.forEach((value, t) => expect(y[t + 5]! - y[t + 4]! - y[t + 1]! + y[t]!).toBeCloseTo(value, 10));
  });

  test('the same seed, the same record', () => {
    const one = () =>
      simulateRecord({ order: order(1, 0, 1), at: at({ ar: [0.5], ma: [0.2] }), length: 20, random: createRandom(3) });
    expect([...one()]).toEqual([...one()]);
  });

  test('no record outside the stationary region, or with the wrong number of values before', () => {
    const random = createRandom(1);
    expect(() => simulateRecord({ order: order(1, 0, 0), at: at({ ar: [1] }), length: 5, random })).toThrow(
      /stationary/,
    );
    expect(() => simulateRecord({ order: order(0, 1, 0), at: at({}), length: 5, random, before: [1, 2] })).toThrow(
      /1 starting values but 2/,
    );
  });
});
