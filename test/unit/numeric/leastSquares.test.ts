import { describe, expect, it } from 'vitest';
import { leastSquares } from '../../../workers/numeric/leastSquares.ts';

/**
 * NIST Statistical Reference Datasets, linear regression, LONGLEY (J. W. Longley 1967, JASA 62, 819–841): certified coefficients, their
 * standard deviations, residual sum of squares. The data and all 14 numbers were checked by solving in 50-digit arithmetic.
 */
const employed = [
  60323, 61122, 60171, 61187, 63221, 63639, 64989, 63761, 66019, 67857, 68169, 66513, 68655, 69564, 69331, 70551,
];
const longley = [
  new Array<number>(16).fill(1),
  [83.0, 88.5, 88.2, 89.5, 96.2, 98.1, 99.0, 100.0, 101.2, 104.6, 108.4, 110.8, 112.6, 114.2, 115.7, 116.9],
  [
    234289, 259426, 258054, 284599, 328975, 346999, 365385, 363112, 397469, 419180, 442769, 444546, 482704, 502601,
    518173, 554894,
  ],
  [2356, 2325, 3682, 3351, 2099, 1932, 1870, 3578, 2904, 2822, 2936, 4681, 3813, 3931, 4806, 4007],
  [1590, 1456, 1616, 1650, 3099, 3594, 3547, 3350, 3048, 2857, 2798, 2637, 2552, 2514, 2572, 2827],
  [
    107608, 108632, 109773, 110929, 112075, 113270, 115094, 116219, 117388, 118734, 120445, 121950, 123366, 125368,
    127852, 130081,
  ],
  Array.from({ length: 16 }, (_, i) => 1947 + i),
];
const certified: [number, number][] = [
  [-3482258.63459582, 890420.383607373],
  [15.0618722713733, 84.9149257747669],
  [-0.035819179292591, 0.0334910077722432],
  [-2.02022980381683, 0.488399681651699],
  [-1.03322686717359, 0.214274163161675],
  [-0.0511041056535807, 0.22607320006937],
  [1829.15146461355, 455.478499142212],
];

describe('leastSquares', () => {
  it('reproduces the certified values of Longley’s collinear data to ten digits', () => {
    const found = leastSquares(longley, employed);
    expect(found.rank).toBe(7);
    expect(Math.abs(found.residualSumOfSquares / 836424.055505915 - 1)).toBeLessThan(1e-10);
    certified.forEach(([estimate, deviation], i) => {
      expect(Math.abs(found.coefficients[i]! / estimate - 1)).toBeLessThan(1e-10);
      const ours = Math.sqrt((found.residualSumOfSquares / 9) * found.inverse.values[i * 8]!);
      expect(Math.abs(ours / deviation - 1)).toBeLessThan(1e-10);
    });
  });

  it.each([
    ['WAMPLER1', [1, 1, 1, 1, 1, 1], 1e-8],
    ['WAMPLER2', [1, 0.1, 0.01, 0.001, 0.0001, 0.00001], 1e-11],
  ])('%s of the same collection: a polynomial of degree 5 through 21 points', (_name, exact, tolerance) => {
    const x = Array.from({ length: 21 }, (_, i) => i);
    const y = x.map((at) => exact.reduce((sum, coefficient, k) => sum + coefficient * at ** k, 0));
    const found = leastSquares(
      exact.map((_, k) => x.map((at) => at ** k)),
      y,
    );
    exact.forEach((value, k) => expect(Math.abs(found.coefficients[k]! - value)).toBeLessThan(tolerance));
  });

  it('names the later of dependent columns and fits the rest', () => {
    const ones = [1, 1, 1, 1, 1, 1];
    const step = [0, 0, 0, 1, 1, 1];
    const rest = step.map((value) => 1 - value);
    const ramp = [0, 1, 2, 3, 4, 5];
    const found = leastSquares([ones, step, rest, [0, 0, 0, 0, 0, 0], ramp], ramp);
    expect(found.dependent).toEqual([2, 3]);
    expect(found.rank).toBe(3);
    [0, 0, 0, 0, 1].forEach((value, i) => expect(Math.abs(found.coefficients[i]! - value)).toBeLessThan(1e-14));
    expect(found.inverse.values[2 * 5 + 2]).toBeNaN();
    expect(found.inverse.values[4 * 5 + 4]).toBeGreaterThan(0);
  });

  it('does not take a small or a far-off column for a dependent one', () => {
    const tiny = [1e-12, 2e-12, 4e-12];
    expect(leastSquares([[1, 1, 1], tiny], [1, 2, 3]).dependent).toEqual([]);
    const late = Array.from({ length: 50 }, (_, i) => 1e9 + i);
    expect(leastSquares([new Array<number>(50).fill(1), late], late).dependent).toEqual([]);
  });

  it('copes with extreme units, more columns than rows, no columns and no rows', () => {
    const huge = leastSquares([[1e200, 2e200, 4e200]], [1e-100, 2e-100, 4e-100]);
    expect(Math.abs(huge.coefficients[0]! / 1e-300 - 1)).toBeLessThan(1e-14);
    expect(leastSquares([[1], [2], [3]], [4])).toMatchObject({ rank: 1, dependent: [1, 2], residualSumOfSquares: 0 });
    expect(leastSquares([], [3, 4])).toMatchObject({ rank: 0, residualSumOfSquares: 25 });
    expect(leastSquares([[]], [])).toMatchObject({ rank: 0, dependent: [0] });
  });

  it('passes NaN on and refuses a wrong length', () => {
    expect(leastSquares([[1, NaN, 1]], [1, 2, 3]).coefficients[0]).toBeNaN();
    expect(() => leastSquares([[1, 1, 1], [1]], [1, 2, 3])).toThrow(/Column 1 has 1 values where 3/);
  });
});
