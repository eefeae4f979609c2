import { describe, expect, it } from 'vitest';
import { autocorrelation } from '../../../workers/identification/autocorrelation.ts';
import { periodogram } from '../../../workers/identification/periodogram.ts';
import { publishedSeries } from '../../helpers/publishedSeries.ts';

const total = (values: Float64Array) => values.reduce((sum, value) => sum + value, 0);

describe('periodogram', () => {
  it('of a cosine is n a²/2 at its own frequency and nothing elsewhere (Box & Jenkins, §2.2.1)', () => {
    const n = 90;
    const { frequencies, ordinates } = periodogram(
      Float64Array.from({ length: n }, (_, t) => 1e6 + 3 * Math.cos((2 * Math.PI * 7 * t) / n + 1)),
    );
    expect(frequencies[6]).toBe(7 / 90);
    ordinates.forEach((value, i) => {
      expect(Math.abs(value - (i === 6 ? (n * 9) / 2 : 0))).toBeLessThan(1e-6);
    });
  });

  it.each(['lakeHuron', 'colour', 'airline'] as const)('sums to the sum of squares about the mean: %s', (name) => {
    const values = publishedSeries(name);
    const { variance, observed } = autocorrelation(values, 0);
    const { ordinates } = periodogram(values);
    expect(ordinates).toHaveLength(Math.floor(values.length / 2));
    expect(total(ordinates) / (variance * observed)).toBeCloseTo(1, 12);
  });

  it('is the cosine transform of the autocovariances: I(f) = 2 [c₀ + 2 Σ c_k cos 2πfk] (Box & Jenkins, §2.2.3)', () => {
    const values = publishedSeries('seriesF');
    const n = values.length;
    const { correlations, variance } = autocorrelation(values, n - 1);
    const { frequencies, ordinates } = periodogram(values);
    for (let i = 0; i < n / 2 - 1; i++) {
      let sum = 1;
      correlations.forEach((r, k) => (sum += 2 * r * Math.cos(2 * Math.PI * frequencies[i]! * (k + 1))));
      expect(Math.abs(ordinates[i]! - 2 * variance * sum)).toBeLessThan(1e-9 * variance);
    }
  });

  it('the sunspots’ period of ten to eleven years, common knowledge: the largest ordinates of Series E are at 9 and 10/100', () => {
    const { ordinates } = periodogram(publishedSeries('seriesE'));
    const ranked = Array.from(ordinates.keys()).sort((one, other) => ordinates[other]! - ordinates[one]!);
    expect(new Set(ranked.slice(0, 2).map((i) => i + 1))).toEqual(new Set([9, 10]));
  });

  it('takes a gap as nothing, and has no ordinates where nothing is observed', () => {
    const n = 120;
    const line = Float64Array.from({ length: n }, (_, t) =>
      t % 10 === 3 ? NaN : Math.cos((2 * Math.PI * 13 * t) / n),
    );
    const { ordinates } = periodogram(line);
    expect(ordinates.indexOf(Math.max(...ordinates))).toBe(12);
    expect(periodogram(new Float64Array(4).fill(NaN)).ordinates[0]).toBeNaN();
    expect(periodogram(new Float64Array(0)).ordinates).toHaveLength(0);
    expect(periodogram(Float64Array.of(1, 3)).ordinates[0]).toBeCloseTo(2, 14);
  });
});
