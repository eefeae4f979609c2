import { describe, expect, it } from 'vitest';
import { levinson } from '../../../workers/numeric/levinson.ts';

describe('levinson', () => {
  it('reproduces the autoregression of a textbook example', () => {
    // Brockwell & Davis, Introduction to Time Series and Forecasting, example 5.1.1: differenced Dow Jones index.
    const end = levinson([0.17992, 0.0759, 0.04885]);
    // The autocovariances are printed to 5 decimals, so the last printed digit may differ by one.
    const printed = [end.partials[0]! - 0.4219, end.coefficients[0]! - 0.3739, end.coefficients[1]! - 0.1138];
    for (const difference of printed) expect(Math.abs(difference)).toBeLessThan(1e-4);
    expect(end.variances[1]).toBeCloseTo(0.1479, 4);
    expect(end.variances[2]).toBeCloseTo(0.146, 4);
  });

  it('recovers coefficients from exact autocovariances', () => {
    // AR(2) with φ = (0.5, 0.3): ρ1 = φ1/(1−φ2), ρ_k = φ1ρ_{k−1} + φ2ρ_{k−2} (Yule–Walker equations).
    const rho = [1, 0.5 / 0.7];
    for (let lag = 2; lag <= 6; lag++) rho.push(0.5 * rho[lag - 1]! + 0.3 * rho[lag - 2]!);
    const end = levinson(rho);
    [0.5, 0.3, 0, 0, 0, 0].forEach((value, i) => expect(end.coefficients[i]).toBeCloseTo(value, 14));
    expect(end.partials[1]).toBeCloseTo(0.3, 14);
  });

  it('stops before an order that is not positive definite', () => {
    const end = levinson([1, 0.5, 2, 0.1]);
    expect(end.coefficients).toHaveLength(1);
    expect([...end.partials]).toEqual([0.5]);
    expect([...end.variances]).toEqual([1, 0.75]);
  });

  it('of a single autocovariance has no coefficients', () => {
    expect(levinson([3])).toEqual({
      coefficients: new Float64Array(0),
      partials: new Float64Array(0),
      variances: Float64Array.of(3),
    });
  });
});
