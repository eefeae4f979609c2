import { expect, test } from 'vitest';
import { multiplyPolynomials } from '../../../workers/numeric/multiplyPolynomials.ts';
import { polynomialRoots, type Complex } from '../../../workers/numeric/polynomialRoots.ts';

const sorted = (roots: Complex[]) => [...roots].sort((a, b) => a.re - b.re || a.im - b.im);

test.each([
  ['linear', [-6, 2], [[3, 0]]],
  [
    'two real',
    [6, -5, 1],
    [
      [2, 0],
      [3, 0],
    ],
  ],
  [
    'a complex pair',
    [5, -2, 1],
    [
      [1, -2],
      [1, 2],
    ],
  ],
  [
    'zeros at both ends',
    [0, 0, 6, -5, 1, 0],
    [
      [0, 0],
      [0, 0],
      [2, 0],
      [3, 0],
    ],
  ],
  // Wilkinson's example at degree 5: (x − 1)…(x − 5).
  [
    '1…5',
    [-120, 274, -225, 85, -15, 1],
    [
      [1, 0],
      [2, 0],
      [3, 0],
      [4, 0],
      [5, 0],
    ],
  ],
])('%s', (_name, coefficients, expected) => {
  const roots = sorted(polynomialRoots(coefficients));
  expect(roots.length).toBe(expected.length);
  roots.forEach((root, i) => {
    expect(root.re).toBeCloseTo(expected[i]![0]!, 11);
    expect(root.im).toBeCloseTo(expected[i]![1]!, 11);
  });
});

test('the roots of unity at a seasonal degree', () => {
  const coefficients = new Float64Array(169);
  coefficients[0] = -1;
  coefficients[168] = 1;
  for (const { re, im } of polynomialRoots(coefficients)) expect(Math.hypot(re, im)).toBeCloseTo(1, 12);
});

test('a double root is found to the square root of rounding', () => {
  for (const { re, im } of polynomialRoots([0.81, -1.8, 1])) {
    expect(Math.hypot(re - 0.9, im)).toBeLessThan(1e-7);
  }
});

test('NaN in, NaN out; a constant has none', () => {
  expect(polynomialRoots([1, NaN, 1]).every(({ re }) => Number.isNaN(re))).toBe(true);
  expect(polynomialRoots([4])).toEqual([]);
});

test('Chebyshev’s T₂₀ has the roots cos((2k − 1)π/40) (Abramowitz & Stegun 22.16.4)', () => {
  let before: Float64Array = Float64Array.of(1);
  let last: Float64Array = Float64Array.of(0, 1);
  for (let n = 2; n <= 20; n++) {
    const next = multiplyPolynomials([0, 2], last);
    before.forEach((value, i) => (next[i]! -= value));
    [before, last] = [last, next];
  }
  const roots = polynomialRoots(last)
    .map(({ re, im }) => {
      expect(im).toBe(0);
      return re;
    })
    .sort((a, b) => b - a);
  // The coefficients reach 6.6e6 times the polynomial’s own size: that many units in the last place may be lost.
  roots.forEach((root, k) => expect(Math.abs(root - Math.cos(((2 * k + 1) * Math.PI) / 40))).toBeLessThan(1e-9));
});

test('a seasonal polynomial of degree 193: (1 − .8x)(1 − .9x¹⁶⁸)(1 − .5x²⁴) has the moduli of its factors', () => {
  const seasonal = (coefficient: number, s: number) => {
    const factor = new Float64Array(s + 1);
    factor[0] = 1;
    factor[s] = -coefficient;
    return factor;
  };
  const product = multiplyPolynomials(multiplyPolynomials(seasonal(0.8, 1), seasonal(0.9, 168)), seasonal(0.5, 24));
  const moduli = polynomialRoots(product)
    .map(({ re, im }) => Math.hypot(re, im))
    .sort((a, b) => a - b);
  const expected = [
    ...new Array<number>(168).fill(0.9 ** (-1 / 168)),
    ...new Array<number>(24).fill(0.5 ** (-1 / 24)),
    1 / 0.8,
  ].sort((a, b) => a - b);
  moduli.forEach((modulus, i) => expect(Math.abs(modulus - expected[i]!)).toBeLessThan(1e-12));
});

test('complex roots come in exactly conjugate pairs, clusters on the axis included', () => {
  let sixfold: Float64Array = Float64Array.of(1);
  for (let i = 0; i < 6; i++) sixfold = multiplyPolynomials(sixfold, [-0.9, 1]);
  const doublePair = multiplyPolynomials([1, -1, 0.5], [1, -1, 0.5]);
  for (const coefficients of [sixfold, doublePair, Float64Array.of(3, -1, 4, 1, -5, 9, 2, -6)]) {
    const roots = polynomialRoots(coefficients);
    expect(roots).toHaveLength(coefficients.length - 1);
    for (const { re, im } of roots) expect(roots.some((other) => other.re === re && other.im === -im)).toBe(true);
  }
});

test('coefficients of any size; infinite ones have no roots', () => {
  expect(sorted(polynomialRoots([6e300, -5e300, 1e300])).map(({ re }) => re)).toEqual([2, 3]);
  expect(sorted(polynomialRoots([6e-310, -5e-310, 1e-310])).map(({ re }) => Math.round(re))).toEqual([2, 3]);
  const apart = sorted(polynomialRoots([1, 1e200, 1]));
  expect(apart[0]!.re / -1e200).toBeCloseTo(1, 14);
  expect(apart[1]!.re / -1e-200).toBeCloseTo(1, 14);
  expect(polynomialRoots([1, Infinity, 1]).every(({ re }) => Number.isNaN(re))).toBe(true);
  expect(polynomialRoots([0, 0, 0])).toEqual([]);
  expect(polynomialRoots([0, 0, 5])).toHaveLength(2);
  expect(polynomialRoots([])).toEqual([]);
});
