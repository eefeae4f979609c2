import { describe, expect, it } from 'vitest';
import { brentMinimise } from '../../../workers/numeric/brentMinimise.ts';
import { brentRoot } from '../../../workers/numeric/brentRoot.ts';

/**
 * Brent 1973, Algorithms for Minimization without Derivatives, ch. 5: Σ_{i=1}^{20} ((2i − 5)/(x − i²))² has one minimum in each (i², (i + 1)²).
 * Their places, the zeros of its derivative, by 50-digit arithmetic.
 */
const minima = [
  3.02291534727306, 6.68375356080808, 11.2387016550022, 19.6760000806234, 29.8282273265048, 41.9061161952894,
  55.9535958001431, 71.9856655865878, 90.0088685391667, 110.02653274833, 132.040551671841, 156.052114446618,
  182.062060429367, 210.071101002434, 240.080048316579, 272.090266917927, 306.10512334312, 342.136945443932,
  380.268709696605,
];
const terms = Array.from({ length: 20 }, (_, i) => i + 1);
const height = (x: number) => terms.reduce((sum, i) => sum + ((2 * i - 5) / (x - i * i)) ** 2, 0);
const slope = (x: number) => terms.reduce((sum, i) => sum - (2 * (2 * i - 5) ** 2) / (x - i * i) ** 3, 0);

describe('brentRoot', () => {
  it.each([
    ['Wallis’ cubic x³ − 2x − 5', (x: number) => x ** 3 - 2 * x - 5, 2, 3, 2.0945514815423265, 1e-15],
    ['cos x = x (OEIS A003957)', (x: number) => Math.cos(x) - x, 1, 0, 0.7390851332151607, 1e-15],
    // Within the 36th root of the smallest number the ninth power is 0.
    ['a flat ninth power', (x: number) => (x - 1) ** 9, 0, 3, 1, 1e-9],
    ['a jump', (x: number) => (x < 0.3 ? -1 : 1), 0, 1, 0.3, 1e-15],
    ['a function infinite at one end', (x: number) => Math.log(x) + 7, 0, 1, Math.exp(-7), 1e-15],
  ])('%s', (_name, f, from, to, exact, tolerance) => {
    const found = brentRoot(f, from, to)!;
    expect(Math.abs(found.x / exact - 1)).toBeLessThan(tolerance);
    expect(found.value).toBe(f(found.x));
    expect(found.evaluations).toBeLessThan(200);
  });

  it.each(minima.map((exact, i) => [i + 1, exact]))(
    'Brent’s derivative between the poles %i² and the next',
    (i, exact) => {
      const found = brentRoot(slope, i * i + 1e-9, (i + 1) ** 2 - 1e-9)!;
      expect(Math.abs(found.x / exact - 1)).toBeLessThan(3e-15);
      expect(found.evaluations).toBeLessThan(120);
    },
  );

  it('stops at the accuracy asked for', () => {
    const rough = brentRoot((x) => x * x - 2, 0, 2, 1e-3)!;
    expect(Math.abs(rough.x - Math.SQRT2)).toBeLessThan(1e-3);
    expect(rough.evaluations).toBeLessThan(brentRoot((x) => x * x - 2, 0, 2)!.evaluations);
  });

  it('takes a zero at an end, and refuses an interval without a change of sign', () => {
    expect(brentRoot((x) => x, 0, 1)!.x).toBe(0);
    expect(brentRoot((x) => x - 1, 0, 1)!.x).toBe(1);
    expect(brentRoot((x) => x * x + 1, -1, 1)).toBeNull();
    expect(brentRoot(() => NaN, 0, 1)).toBeNull();
    expect(brentRoot((x) => (x > 0.2 && x < 0.8 ? NaN : x - 0.5), 0, 1)).toBeNull();
  });
});

describe('brentMinimise', () => {
  it.each(minima.map((exact, i) => [i + 1, exact]))(
    'Brent’s example between the poles %i² and the next',
    (i, exact) => {
      const found = brentMinimise(height, i * i, (i + 1) ** 2, 1e-7);
      expect(Math.abs(found.x - exact)).toBeLessThan(1e-6);
      expect(found.value).toBe(height(found.x));
    },
  );

  it('goes to the end where the function falls towards it', () => {
    const { x } = brentMinimise((at) => at, 2, 5, 1e-6);
    expect(x - 2).toBeLessThan(1e-5);
  });
});
