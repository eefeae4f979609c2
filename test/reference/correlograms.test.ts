import { describe, expect, it } from 'vitest';
import { autocorrelation } from '../../workers/identification/autocorrelation.ts';
import { bartlettVariance } from '../../workers/identification/bartlettVariance.ts';
import { partialAutocorrelation } from '../../workers/identification/partialAutocorrelation.ts';
import { differencingPolynomial } from '../../workers/model/differencingPolynomial.ts';
import { differenceRecord } from '../../workers/series/differenceRecord.ts';
import { publishedSeries } from '../helpers/publishedSeries.ts';

const rounded = (values: Float64Array, decimals: number) =>
  Array.from(values, (value) => Number(value.toFixed(decimals)) + 0);

describe('published correlograms', () => {
  it('Series F, NIST/SEMATECH e-Handbook 6.4.4.9, to nine decimals', () => {
    const { correlations } = autocorrelation(publishedSeries('seriesF'), 35);
    const printed = [-0.389878319, 0.304394082, -0.165554717, 0.070719321, -0.097039288];
    printed.forEach((value, i) => {
      expect(Math.abs(correlations[i]! - value)).toBeLessThanOrEqual(6e-10);
    });
    expect(Math.abs(correlations[34]! - 0.026101117)).toBeLessThanOrEqual(6e-10);
  });

  it('Series F, Box & Jenkins, Time Series Analysis, table 2.2: lags 1–15', () => {
    const { correlations } = autocorrelation(publishedSeries('seriesF'), 15);
    const printed = [-0.39, 0.3, -0.17, 0.07, -0.1, -0.05, 0.04, -0.04, -0.01, 0.01, 0.11, -0.07, 0.15, 0.04, -0.01];
    // Lag 9 rounds to 0 and is printed as −.01: half a unit is allowed, there a little more.
    printed.forEach((value, i) => {
      expect(Math.abs(correlations[i]! - value)).toBeLessThanOrEqual(i === 8 ? 0.0054 : 0.005);
    });
  });

  it('Series F, Box & Jenkins, table 3.1: partial autocorrelations at lags 1–10', () => {
    const partial = partialAutocorrelation(autocorrelation(publishedSeries('seriesF'), 10).correlations);
    expect(rounded(partial, 2)).toEqual([-0.39, 0.18, 0, -0.04, -0.07, -0.12, 0.02, 0, -0.06, 0]);
    // The same from an independent computation, four decimals.
    expect(rounded(partial, 4)).toEqual([
      -0.3899, 0.1797, 0.0023, -0.0443, -0.0694, -0.1206, 0.0197, 0.0049, -0.0565, 0.0037,
    ]);
  });

  it('Series A, Box & Jenkins, chapter 6: lags 1–10', () => {
    const { correlations } = autocorrelation(publishedSeries('seriesA'), 10);
    expect(rounded(correlations, 2)).toEqual([0.57, 0.5, 0.4, 0.36, 0.33, 0.35, 0.39, 0.32, 0.3, 0.25]);
  });

  it('∇∇₁₂ ln G, Box & Jenkins, chapter 9: lags 1–12 and the variance', () => {
    const twice = differencingPolynomial({ d: 1, D: 1, s: 12 });
    const { correlations, variance } = autocorrelation(
      differenceRecord(publishedSeries('airline').map(Math.log), twice),
      12,
    );
    const printed = [-0.34, 0.11, -0.2, 0.02, 0.06, 0.03, -0.06, 0, 0.18, -0.08, 0.06, -0.39];
    expect(rounded(correlations, 2)).toEqual(printed);
    expect(variance).toBeCloseTo(0.00208602, 8);
  });

  it('first ten of Series F by hand, Box & Jenkins §2.1.5: r₁ = −0.79', () => {
    const { mean, variance, correlations } = autocorrelation(publishedSeries('seriesF').slice(0, 10), 1);
    expect(mean).toBe(51);
    expect(variance).toBeCloseTo(189.6, 12);
    expect(correlations[0]! * variance).toBeCloseTo(-149.7, 10);
  });
});

describe('Bartlett’s formula against its closed forms (Box & Jenkins §2.1.6; Brockwell & Davis §7.2)', () => {
  const firstOrder = (phi: number) => Float64Array.from({ length: 400 }, (_, k) => phi ** (k + 1));

  it.each([0.5, -0.7, 0.9])('AR(1) φ = %f: n var r₁ = 1 − φ²', (phi) => {
    expect(bartlettVariance(firstOrder(phi), 1)).toBeCloseTo(1 - phi ** 2, 10);
  });

  it('AR(1) φ = .5 at lag 2: 1.3125', () => {
    expect(bartlettVariance(firstOrder(0.5), 2)).toBeCloseTo(1.3125, 10);
  });

  it('MA(1) ρ = .4: n var r₁ = 1 − 3ρ² + 4ρ⁴; beyond its order 1 + 2ρ²', () => {
    expect(bartlettVariance(Float64Array.of(0.4), 1)).toBeCloseTo(0.6224, 12);
    expect(bartlettVariance(Float64Array.of(0.4), 2)).toBeCloseTo(1.32, 12);
  });
});
