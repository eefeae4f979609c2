import { describe, expect, it } from 'vitest';
import type { Order, Parameters } from '../../../workers/contract/candidate.ts';
import { chiSquareUpperTail } from '../../../workers/distributions/chiSquareUpperTail.ts';
import { portmanteau } from '../../../workers/diagnostics/portmanteau.ts';
import { quadraticWeights } from '../../../workers/diagnostics/quadraticWeights.ts';
import { residualSpread, type ResidualSpread } from '../../../workers/diagnostics/residualSpread.ts';
import { candidateOf } from '../../../workers/model/candidateOf.ts';

const spreadOf = (
  order: Partial<Order>,
  coefficients: Partial<Parameters>,
  lags: number,
  zeroLags: Partial<{ ar: number[]; ma: number[] }> = {},
) =>
  residualSpread(
    candidateOf({
      order: { p: 0, d: 0, q: 0, P: 0, D: 0, Q: 0, s: 0, ...order },
      zeroLags: { ar: [], ma: [], seasonalAr: [], seasonalMa: [], ...zeroLags },
    }),
    { ar: [], ma: [], seasonalAr: [], seasonalMa: [], mean: 0, regression: [], innovationVariance: 1, ...coefficients },
    lags,
    3000,
  );

/** Entry of I − QQ′, lags from 1. */
const covariance = ({ rank, basis }: ResidualSpread, k: number, l: number) => {
  let taken = 0;
  for (let a = 0; a < rank; a++) taken += basis[(k - 1) * rank + a]! * basis[(l - 1) * rank + a]!;
  return (k === l ? 1 : 0) - taken;
};

describe('covariance of residual autocorrelations', () => {
  it.each([0.5, -0.8, 0.95])('AR(1), φ = %f: 1 − φ^(2(k−1))(1 − φ²) (Box & Pierce 1970)', (phi) => {
    const spread = spreadOf({ p: 1 }, { ar: [phi] }, 6);
    for (let k = 1; k <= 6; k++) {
      expect(covariance(spread, k, k)).toBeCloseTo(1 - phi ** (2 * (k - 1)) * (1 - phi ** 2), 10);
      expect(covariance(spread, k, 1)).toBeCloseTo((k === 1 ? 1 : 0) - phi ** (k - 1) * (1 - phi ** 2), 10);
    }
  });

  it('ARMA(1,1): I − X J⁻¹ X′ with J⁻¹ in closed form (Box & Jenkins, §7.2.6; McLeod 1978)', () => {
    const phi = 0.8;
    const theta = -0.3;
    const spread = spreadOf({ p: 1, q: 1 }, { ar: [phi], ma: [theta] }, 8);
    // n times the covariance of the estimates, φ = .8, θ = −.3.
    const inverse = [
      [0.831744, -0.995904],
      [-0.995904, 2.102464],
    ];
    const X = (k: number) => [phi ** (k - 1), (-theta) ** (k - 1)];
    for (let k = 1; k <= 8; k++) {
      for (let l = 1; l <= 8; l++) {
        let taken = 0;
        for (let a = 0; a < 2; a++) for (let b = 0; b < 2; b++) taken += X(k)[a]! * inverse[a]![b]! * X(l)[b]!;
        // The closed form is given to six decimals.
        expect(covariance(spread, k, l)).toBeCloseTo((k === l ? 1 : 0) - taken, 5);
      }
    }
  });

  it('a seasonal coefficient takes nothing below its lag and as much as a plain one at it (McLeod 1978)', () => {
    const spread = spreadOf({ P: 1, s: 12 }, { seasonalAr: [0.6] }, 24);
    for (let k = 1; k < 12; k++) expect(covariance(spread, k, k)).toBe(1);
    expect(covariance(spread, 12, 12)).toBeCloseTo(0.36, 10);
    expect(covariance(spread, 24, 24)).toBeCloseTo(1 - 0.36 * 0.64, 10);
  });

  it('lags held at zero take nothing', () => {
    const spread = spreadOf({ p: 2 }, { ar: [0, 0.5] }, 4, { ar: [1] });
    expect(spread.rank).toBe(1);
    expect(covariance(spread, 1, 1)).toBe(1);
    expect(covariance(spread, 2, 2)).toBeCloseTo(0.25, 10);
  });

  it('cancelling factors count once: an ARMA(1,1) with φ = −θ takes what an AR(1) does', () => {
    const spread = spreadOf({ p: 1, q: 1 }, { ar: [0.5], ma: [-0.5] }, 3);
    expect(spread.rank).toBe(1);
    expect(covariance(spread, 1, 1)).toBeCloseTo(0.25, 10);
  });

  it('stays finite with an MA root on the circle: almost nothing is taken', () => {
    const spread = spreadOf({ q: 1 }, { ma: [-1] }, 5);
    for (let k = 1; k <= 5; k++) expect(covariance(spread, k, k)).toBeCloseTo(1 - 1 / 3000, 12);
  });
});

describe('law of the portmanteau statistic', () => {
  const size = (m: number) => ({
    length: 200,
    observed: 200,
    pairs: Int32Array.from({ length: m }, (_, k) => 199 - k),
  });

  it('weights: AR(1) φ² at one lag; at many lags 1 but for one that is next to nothing', () => {
    const spread = spreadOf({ p: 1 }, { ar: [0.5] }, 20);
    expect(Array.from(quadraticWeights(spread, 1))).toEqual([expect.closeTo(0.25, 10)]);
    const many = quadraticWeights(spread, 20);
    const sum = many.reduce((total, weight) => total + weight, 0);
    expect(sum).toBeCloseTo(20 - (1 - 0.5 ** 40), 10);
  });

  it('the weighted law meets the chi-square at many lags and stays above it near a unit root at few', () => {
    const correlations = Float64Array.from({ length: 20 }, (_, k) => 0.1 * Math.cos(k));
    const request = { method: 'ljungBox', correlations, size: size(20), coefficients: 1 } as const;
    const plain = portmanteau(request);
    const mild = portmanteau({ ...request, spread: spreadOf({ p: 1 }, { ar: [0.5] }, 20) });
    expect(mild.law).toBe('weighted');
    expect(mild.pValues[19]).toBeCloseTo(plain.pValues[19]!, 6);
    const near = portmanteau({ ...request, spread: spreadOf({ p: 1 }, { ar: [0.98] }, 20) });
    expect(near.pValues[2]).toBeGreaterThan(plain.pValues[2]! + 0.05);
  });

  it('statistic and p by hand: n = 200, r = .1, .2: Q = 200·202·(.01/199 + .04/198)', () => {
    const found = portmanteau({
      method: 'ljungBox',
      correlations: Float64Array.of(0.1, 0.2),
      size: size(2),
      coefficients: 1,
    });
    const q = 200 * 202 * (0.01 / 199 + 0.04 / 198);
    expect(found.statistics[1]).toBeCloseTo(q, 10);
    expect(found.pValues[0]).toBeNaN();
    expect(found.pValues[1]).toBeCloseTo(chiSquareUpperTail(q, 1), 14);
    expect(Array.from(found.degreesOfFreedom)).toEqual([0, 1]);
  });
});
