import { describe, expect, it } from 'vitest';
import { asymptoticInformation } from '../../../workers/estimation/asymptoticInformation.ts';
import { SearchSpace } from '../../../workers/estimation/search/searchSpace.ts';
import { candidateOf } from '../../../workers/model/candidateOf.ts';

const ORDER = { p: 0, d: 0, q: 0, P: 0, D: 0, Q: 0, s: 0 };
const coefficientsOf = (order: Partial<typeof ORDER>, values: readonly number[]) => {
  const full = { ...ORDER, ...order };
  const { coefficients } = new SearchSpace(full, candidateOf({ order: full }).zeroLags);
  coefficients.all.set(values);
  return coefficients;
};
const expectMatrix = (actual: Float64Array, expected: readonly number[]) => {
  expected.forEach((value, i) => expect(actual[i]).toBeCloseTo(value, 9));
};

/** Closed forms: Box & Jenkins 1970, section 7.2.6; Brockwell & Davis, Time Series: Theory and Methods, section 8.8. */
describe('asymptoticInformation', () => {
  it('of AR(1) and MA(1) is 1/(1 − φ²)', () => {
    expectMatrix(asymptoticInformation(coefficientsOf({ p: 1 }, [0.6]), 1, [0], 1000), [1 / 0.64]);
    expectMatrix(asymptoticInformation(coefficientsOf({ q: 1 }, [0.6]), 1, [0], 1000), [1 / 0.64]);
  });

  it('of AR(2) is the inverse of [1 − φ2², −φ1(1 + φ2); ·, 1 − φ2²]', () => {
    const [one, two] = [0.5, 0.3];
    const [a, b] = [1 - two * two, -one * (1 + two)];
    const det = a * a - b * b;
    const information = asymptoticInformation(coefficientsOf({ p: 2 }, [one, two]), 1, [0, 1], 2000);
    expectMatrix(information, [a / det, -b / det, -b / det, a / det]);
  });

  it('of ARMA(1,1) is [1/(1 − φ²), 1/(1 + φθ); ·, 1/(1 − θ²)]', () => {
    const [phi, theta] = [0.8, -0.3];
    const cross = 1 / (1 + phi * theta);
    const information = asymptoticInformation(coefficientsOf({ p: 1, q: 1 }, [phi, theta]), 1, [0, 1], 2000);
    expectMatrix(information, [1 / (1 - phi * phi), cross, cross, 1 / (1 - theta * theta)]);
  });

  it('of a seasonal factor stands at lags of the season: θ and Θ of (0,1,1)×(0,1,1)₁₂', () => {
    // Cross term Σ_k b_{k−1} B_{k−12}: responses (−θ)^k and (−Θ)^k every 12: (−θ)¹¹/(1 − Θ(−θ)¹²·(−1)).
    const [theta, big] = [-0.4, -0.55];
    const cross = (-theta) ** 11 / (1 + big * (-theta) ** 12);
    const information = asymptoticInformation(coefficientsOf({ q: 1, Q: 1, s: 12 }, [theta, big]), 12, [0, 1], 3000);
    expectMatrix(information, [1 / (1 - theta ** 2), cross, cross, 1 / (1 - big ** 2)]);
  });

  it('stays finite with a root on the circle: n terms of 1', () => {
    expectMatrix(asymptoticInformation(coefficientsOf({ q: 1 }, [-1]), 1, [0], 50), [49]);
  });
});
