import { expect, test } from 'vitest';
import { cholesky } from '../../../workers/numeric/cholesky.ts';
import { choleskySolve } from '../../../workers/numeric/choleskySolve.ts';

test('a textbook factor in whole numbers, and a system solved with it', () => {
  // (4 12 −16; 12 37 −43; −16 −43 98) = L Lᵀ with L = (2; 6 1; −8 5 3): by multiplication.
  const matrix = Float64Array.of(4, 12, -16, 12, 37, -43, -16, -43, 98);
  expect(cholesky(matrix, 3)).toBe(true);
  expect([matrix[0], matrix[3], matrix[4], matrix[6], matrix[7], matrix[8]]).toEqual([2, 6, 1, -8, 5, 3]);
  const right = Float64Array.of(4 + 24 - 48, 12 + 74 - 129, -16 - 86 + 294);
  choleskySolve(matrix, 3, right);
  expect([...right]).toEqual([1, 2, 3]);
});

test('the factor of the Hilbert matrix of order 8 has its determinant', () => {
  // det H_n = c⁴/(c of 2n) with c_k = ∏_{i<k} i! (Hilbert 1894); for n = 8: 2.73705011379151e−33.
  const n = 8;
  const matrix = Float64Array.from({ length: n * n }, (_, at) => 1 / (Math.floor(at / n) + (at % n) + 1));
  expect(cholesky(matrix, n)).toBe(true);
  let determinant = 1;
  for (let i = 0; i < n; i++) determinant *= matrix[i * n + i]! ** 2;
  expect(Math.abs(determinant / 2.73705011379151e-33 - 1)).toBeLessThan(1e-6);
});

test('an indefinite, a singular and a NaN matrix are refused, an empty one is not', () => {
  expect(cholesky(Float64Array.of(1, 2, 2, 1), 2)).toBe(false);
  expect(cholesky(Float64Array.of(1, 1, 1, 1), 2)).toBe(false);
  expect(cholesky(Float64Array.of(0), 1)).toBe(false);
  expect(cholesky(Float64Array.of(1, 0, NaN, 1), 2)).toBe(false);
  expect(cholesky(new Float64Array(0), 0)).toBe(true);
});
