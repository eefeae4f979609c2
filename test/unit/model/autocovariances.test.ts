import { describe, expect, test } from 'vitest';
import { autocovariances } from '../../../workers/model/autocovariances.ts';
import { partialToCoefficients } from '../../../workers/model/partialToCoefficients.ts';
import { oracleAutocovariances } from '../../helpers/denseOracle.ts';

const near = (got: ArrayLike<number>, wanted: readonly number[], digits: number) =>
  wanted.forEach((value, i) => expect(got[i]).toBeCloseTo(value, digits));

describe('autocovariances', () => {
  test('ARMA(1,1), φ = .8, θ = −.5: 1.25 .5 .4 .32 (closed form)', () => {
    near(autocovariances(Float64Array.of(0.8), Float64Array.of(-0.5), 3)!, [1.25, 0.5, 0.4, 0.32], 14);
  });

  test('ARMA(2,3) of Brockwell & Davis, section 5.3: 7.17133 6.44139 5.0603 3.614', () => {
    const gamma = autocovariances(Float64Array.of(1, -0.24), Float64Array.of(0.4, 0.2, 0.1), 3)!;
    near(gamma, [7.17133, 6.44139], 5);
    expect(gamma[2]).toBeCloseTo(5.0603, 4);
    expect(gamma[3]).toBeCloseTo(3.614, 3);
  });

  test('an MA is cut off behind its order', () => {
    near(autocovariances(new Float64Array(0), Float64Array.of(0.6), 3)!, [1.36, 0.6, 0, 0], 15);
  });

  test('a root of .999999 costs no digits: γ0 = 1/(1 − φ²)', () => {
    const phi = 1 - 2 ** -20;
    const gamma = autocovariances(Float64Array.of(phi), new Float64Array(0), 2)!;
    const exact = 1 / (2 ** -20 * (2 - 2 ** -20));
    expect(Math.abs(gamma[0]! / exact - 1)).toBeLessThan(1e-15);
    expect(Math.abs(gamma[2]! / (exact * phi * phi) - 1)).toBeLessThan(1e-15);
  });

  test('outside the region there are none', () => {
    expect(autocovariances(Float64Array.of(1), new Float64Array(0), 2)).toBeNull();
    expect(autocovariances(Float64Array.of(0.7, 0.4), new Float64Array(0), 2)).toBeNull();
  });

  test.each([
    [[0.5, -0.3, 0.2], [0.4]],
    [
      [0.9, -0.8],
      [-0.7, 0.2, 0.1],
    ],
    [[-0.6], []],
    [
      [0.3, 0.3, 0.3, -0.9],
      [0.5, 0.5],
    ],
  ])('partials %j with θ %j: the linear system of the definition', (partial, ma) => {
    const ar = new Float64Array(partial.length);
    partialToCoefficients(partial, ar);
    const wanted = oracleAutocovariances([...ar], ma, 12);
    const got = autocovariances(ar, Float64Array.from(ma), 12)!;
    wanted.forEach((value, k) => expect(Math.abs(got[k]! - value)).toBeLessThan(1e-12 * wanted[0]!));
  });
});
