import { expect, test } from 'vitest';
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
