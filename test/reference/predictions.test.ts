import { describe, expect, it } from 'vitest';
import { predictReadings } from '../../workers/prediction/predictReadings.ts';
import { fitted } from '../helpers/fitted.ts';
import { heldFit } from '../helpers/heldFit.ts';
import { publishedSeries } from '../helpers/publishedSeries.ts';

describe('published predictions', () => {
  it('log airline (0,1,1)(0,1,1)₁₂, twelve months from December 1960', () => {
    // An independent computation at the exact maximum likelihood; the first value is that of the NIST/SEMATECH e-Handbook 6.4.4.10.
    const values = publishedSeries('airline');
    const fit = fitted(values, { d: 1, q: 1, D: 1, Q: 1, s: 12 }, 'none', { transform: { kind: 'log' } });
    const { expected, standardError, median, lower, upper } = predictReadings(fit, values, 12);
    const means = [
      6.11019, 6.05377, 6.17171, 6.1993, 6.23256, 6.36878, 6.50729, 6.50291, 6.3247, 6.20901, 6.06349, 6.16802,
    ];
    const errors = [
      0.03672, 0.04278, 0.04809, 0.05287, 0.05725, 0.06132, 0.06513, 0.06874, 0.07216, 0.07543, 0.07856, 0.08157,
    ];
    means.forEach((value, h) => expect(Math.abs(expected[h]! - value)).toBeLessThanOrEqual(5.1e-6));
    errors.forEach((value, h) => expect(Math.abs(standardError[h]! - value)).toBeLessThanOrEqual(5.1e-6));
    // Back on the passengers' scale: median and 95 % band of January 1961.
    expect(Math.abs(median[0]! - 450.4223)).toBeLessThan(1e-3);
    expect(Math.abs(lower[0]! - 419.147)).toBeLessThan(1e-2);
    expect(Math.abs(upper[0]! - 484.031)).toBeLessThan(1e-2);
  });

  it('Series F AR(2) with the coefficients printed in the NIST/SEMATECH e-Handbook 6.4.4.9', () => {
    // Yule–Walker estimates; the page's δ = 51.1286 is the mean. Forecasts 71–76 and the first standard error.
    const values = publishedSeries('seriesF');
    const fit = heldFit(70, { p: 2 }, 'mean', {
      ar: [-0.3198, 0.1797],
      mean: 51.1286,
      innovationVariance: 10.9479 ** 2,
    });
    const { expected, standardError } = predictReadings(fit, values, 6);
    const printed = [60.6405, 43.0317, 55.4274, 48.2987, 52.8061, 50.0835];
    // The page's forecasts rest on unrounded coefficients.
    printed.forEach((value, h) => expect(Math.abs(expected[h]! - value)).toBeLessThan(5e-4));
    expect(standardError[0]).toBeCloseTo(10.9479, 4);
  });

  it('Series A (0,1,1): standard errors at 1, 5, 10 steps are σ√(1 + (h − 1)(1 + θ)²) (Box & Jenkins, §5.4)', () => {
    const values = publishedSeries('seriesA');
    const fit = fitted(values, { d: 1, q: 1 }, 'none');
    const { expected, standardError } = predictReadings(fit, values, 10);
    // Closed form at the exact maximum likelihood θ = −.69938427, σ² = .100731488.
    const tabulated: [h: number, value: number][] = [
      [1, 0.317382],
      [5, 0.37033],
      [10, 0.427387],
    ];
    // One unit in the sixth decimal.
    for (const [h, value] of tabulated) expect(Math.abs(standardError[h - 1]! - value)).toBeLessThan(1e-6);
    // Exponential smoothing: one and the same prediction at every horizon.
    for (const value of expected) expect(value).toBeCloseTo(expected[0]!, 12);
  });

  it('Nile (0,1,1): the prediction is the exponentially weighted mean with weight 1 + θ = .267057 (Durbin & Koopman, ch. 2)', () => {
    const values = publishedSeries('nile');
    const fit = fitted(values, { d: 1, q: 1 }, 'none');
    const weight = 1 + fit.parameters.ma[0]!;
    expect(weight).toBeCloseTo(0.267057, 6);
    let smooth = values[0]!;
    for (const value of values) smooth += weight * (value - smooth);
    // The start of the smoothing has died out to .733¹⁰⁰.
    expect(predictReadings(fit, values, 1).expected[0]).toBeCloseTo(smooth, 6);
  });

  it('ARMA(2,3) example of Brockwell & Davis: one-step predictions of ten values', () => {
    // X_t = X_{t−1} − .24 X_{t−2} + Z_t + .4 Z_{t−1} + .2 Z_{t−2} + .1 Z_{t−3}, σ² = 1 (§3.3, §5.3).
    const values = Float64Array.of(1.704, 0.527, 1.041, 0.942, 0.555, -1.002, -0.585, 0.01, -0.638, 0.525);
    const fit = heldFit(10, { p: 2, q: 3 }, 'none', { ar: [1, -0.24], ma: [0.4, 0.2, 0.1] });
    const predictions = [1.5305, -0.171, 1.2428, 0.7443, 0.3138, -1.7293, -0.1688, 0.3193, -0.8731, 1.0638];
    const variances = [1.3856, 1.0057, 1.0019, 1.0016, 1.0005, 1];
    predictions.forEach((value, i) => {
      const { expected, standardError } = predictReadings(fit, values, 1, { origin: i + 1 });
      expect(Math.abs(expected[0]! - value)).toBeLessThan(1.01e-4);
      if (i < variances.length) expect(Math.abs(standardError[0]! ** 2 - variances[i]!)).toBeLessThan(1e-4);
    });
  });
});
