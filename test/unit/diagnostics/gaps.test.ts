import { describe, expect, it } from 'vitest';
import { independentVariance, type CorrelogramSize } from '../../../workers/diagnostics/independentVariance.ts';
import { autocorrelation } from '../../../workers/identification/autocorrelation.ts';
import { createRandom } from '../../../workers/numeric/random.ts';

describe('correlograms with gaps', () => {
  it('uses the pairs observed: by hand', () => {
    // Mean 0; products at lag 1: 1·(−1) and (−2)·2; c₀ = 10/4, n = 5.
    const found = autocorrelation(Float64Array.of(1, -1, NaN, -2, 2), 2);
    expect(Array.from(found.pairs)).toEqual([2, 1]);
    expect(found.correlations[0]).toBeCloseTo(((-5 / 2) * 0.8) / 2.5, 14);
    expect(found.correlations[1]).toBeCloseTo((2 * 0.6) / 2.5, 14);
  });

  it('has no correlation where no pair is observed or nothing varies', () => {
    const alternate = autocorrelation(Float64Array.of(1, NaN, 2, NaN, 4), 2);
    expect(alternate.correlations[0]).toBeNaN();
    expect(alternate.correlations[1]).not.toBeNaN();
    expect(autocorrelation(Float64Array.of(3, 3, 3), 1).correlations[0]).toBeNaN();
    expect(autocorrelation(new Float64Array(0), 1).correlations[0]).toBeNaN();
    expect(autocorrelation(Float64Array.of(1, 2), 5).pairs[4]).toBe(0);
  });

  it('the variance for independent readings is that of simulated ones, with gaps too', () => {
    const random = createRandom(20);
    const present = Array.from({ length: 60 }, (_, t) => t % 7 !== 3 && (t < 20 || t > 31));
    const lags = [1, 2, 7, 15];
    const replicates = 4000;
    const squares = lags.map(() => 0);
    let size: CorrelogramSize = { length: 60, observed: 0, pairs: new Int32Array(0) };
    for (let i = 0; i < replicates; i++) {
      const record = Float64Array.from(present, (seen) => (seen ? random.normal() : NaN));
      const { correlations, pairs, observed } = autocorrelation(record, 15, 'zero');
      size = { length: 60, observed, pairs };
      lags.forEach((lag, j) => (squares[j]! += correlations[lag - 1]! ** 2 / replicates));
    }
    // A variance from 4000 draws has a relative standard error of √(2/4000) = 2.2 %; four of them.
    lags.forEach((lag, j) => {
      expect(Math.abs(squares[j]! / independentVariance(size, lag) - 1)).toBeLessThan(0.09);
    });
  });

  it('is (n − k)/(n(n + 2)) without gaps', () => {
    const size = { length: 50, observed: 50, pairs: Int32Array.of(49, 48) };
    expect(independentVariance(size, 2)).toBeCloseTo(48 / (50 * 52), 16);
    expect(independentVariance(size, 3)).toBeNaN();
  });
});
