import { describe, expect, it, test } from 'vitest';
import { eigenvalues, inverseSymmetric, solveLinear, symmetricEigen } from '../../../workers/numeric/matrix.ts';

const square = (n: number, at: (i: number, j: number) => number) => ({
  n,
  values: Float64Array.from({ length: n * n }, (_, k) => at(Math.floor(k / n), k % n)),
});

describe('symmetricEigen', () => {
  it('has A·V = V·D and VᵀV = 1, eigenvalues ascending, for the second difference matrix', () => {
    // Eigenvalues 2 − 2 cos(kπ/(n + 1)), a textbook result.
    const n = 9;
    const matrix = square(n, (i, j) => (i === j ? 2 : Math.abs(i - j) === 1 ? -1 : 0));
    const { values, vectors } = symmetricEigen(matrix);
    for (let k = 0; k < n; k++) {
      expect(Math.abs(values[k]! - (2 - 2 * Math.cos(((k + 1) * Math.PI) / (n + 1))))).toBeLessThan(1e-14);
      for (let i = 0; i < n; i++) {
        let product = 0;
        let dot = 0;
        for (let j = 0; j < n; j++) {
          product += matrix.values[i * n + j]! * vectors[j * n + k]!;
          dot += vectors[j * n + i]! * vectors[j * n + k]!;
        }
        expect(Math.abs(product - values[k]! * vectors[i * n + k]!)).toBeLessThan(1e-14);
        expect(Math.abs(dot - Number(i === k))).toBeLessThan(1e-14);
      }
    }
  });

  it('tells Wilkinson’s close pair apart', () => {
    // Wilkinson 1965, The Algebraic Eigenvalue Problem, ch. 5 §45: the largest two eigenvalues of W₂₁⁺ are 10.746194182903322 and …393.
    const { values } = symmetricEigen(
      square(21, (i, j) => (i === j ? Math.abs(10 - i) : Math.abs(i - j) === 1 ? 1 : 0)),
    );
    expect(Math.abs(values[20]! - 10.746194182903393)).toBeLessThan(2e-14);
    expect(Math.abs(values[19]! - 10.746194182903322)).toBeLessThan(2e-14);
  });

  it('counts only the symmetric part', () => {
    expect([...symmetricEigen({ n: 2, values: Float64Array.of(2, 2, 0, 2) }).values].map(Math.round)).toEqual([1, 3]);
  });
});

describe('eigenvalues', () => {
  it('of a rotation are i and −i', () => {
    const found = eigenvalues({ n: 2, values: Float64Array.of(0, -1, 1, 0) });
    found.forEach(({ re }) => expect(Math.abs(re)).toBeLessThan(1e-15));
    expect(found.map(({ im }) => im).sort((a, b) => a - b)).toEqual([-1, 1]);
  });

  it('of the companion matrix of (x − 1)(x − 2)(x − 3)(x − 4) are 4, 3, 2, 1', () => {
    const coefficients = [-24, 50, -35, 10];
    const found = eigenvalues(square(4, (i, j) => (j === 3 ? coefficients[i]! : i === j + 1 ? 1 : 0)));
    found.forEach(({ re, im }, k) => {
      expect(Math.abs(re - (4 - k))).toBeLessThan(1e-12);
      expect(im).toBe(0);
    });
  });
});

describe('inverseSymmetric', () => {
  it('of the Hilbert matrix of order 5 is the known one in whole numbers', () => {
    // Savage & Lukacs 1954, Nat. Bur. Stand. Appl. Math. Ser. 39, 105–108.
    const expected = [
      [25, -300, 1050, -1400, 630],
      [-300, 4800, -18900, 26880, -12600],
      [1050, -18900, 79380, -117600, 56700],
      [-1400, 26880, -117600, 179200, -88200],
      [630, -12600, 56700, -88200, 44100],
    ];
    const found = inverseSymmetric(square(5, (i, j) => 1 / (i + j + 1)))!;
    // Condition number 4.8e5.
    expected.flat().forEach((value, k) => expect(Math.abs(found.values[k]! / value - 1)).toBeLessThan(1e-10));
    expect(found.values[1]).toBe(found.values[5]);
  });

  it('takes an indefinite matrix, refuses a singular one, knows the empty one', () => {
    expect([...inverseSymmetric({ n: 2, values: Float64Array.of(0, 2, 2, 0) })!.values]).toEqual([0, 0.5, 0.5, 0]);
    expect(inverseSymmetric({ n: 2, values: Float64Array.of(1, 2, 2, 4) })).toBeNull();
    expect(inverseSymmetric({ n: 1, values: Float64Array.of(NaN) })).toBeNull();
    expect(inverseSymmetric({ n: 0, values: new Float64Array(0) })!.n).toBe(0);
  });
});

test('a general system; null for a singular one', () => {
  expect([...solveLinear({ n: 2, values: Float64Array.of(0, 2, 3, 1) }, Float64Array.of(4, 5))!]).toEqual([1, 2]);
  expect(solveLinear({ n: 2, values: Float64Array.of(1, 2, 2, 4) }, Float64Array.of(1, 1))).toBeNull();
});
