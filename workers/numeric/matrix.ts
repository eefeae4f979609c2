import type { Square } from '../contract/result.ts';
import type { Complex } from './polynomialRoots.ts';
import { EigenvalueDecomposition, LuDecomposition, Matrix } from 'ml-matrix';

/*
 * The one place that knows ml-matrix. Matrices come and go as row-major arrays. Not for inner loops: a 3×3 product costs
 * about a microsecond there.
 */

/**
 * Eigenvalues and eigenvectors of a symmetric matrix.
 *
 * Method: ml-matrix's Householder tridiagonalisation and QL iteration (after EISPACK tred2, tql2).
 *
 * @param matrix n ≥ 1 rows; only its symmetric part counts
 * @returns `values` ascending; `vectors` row-major with eigenvector j in column j
 */
export function symmetricEigen({ n, values: given }: Square): { values: Float64Array; vectors: Float64Array } {
  const matrix = new Matrix(n, n);
  for (let i = 0; i < n; i++)
    for (let j = 0; j < n; j++) matrix.set(i, j, 0.5 * (given[i * n + j]! + given[j * n + i]!));
  const found = new EigenvalueDecomposition(matrix, { assumeSymmetric: true });
  const order = found.realEigenvalues.map((value, index) => ({ value, index })).sort((a, b) => a.value - b.value);
  const vectors = new Float64Array(n * n);
  order.forEach(({ index }, j) => {
    for (let i = 0; i < n; i++) vectors[i * n + j] = found.eigenvectorMatrix.get(i, index);
  });
  return { values: Float64Array.from(order, ({ value }) => value), vectors };
}

/**
 * Eigenvalues of a general real matrix.
 *
 * Method: ml-matrix's reduction to Hessenberg form and QR iteration (after EISPACK orthes, hqr2).
 *
 * @param matrix n ≥ 1 rows
 * @returns n eigenvalues, complex ones in conjugate pairs, largest modulus first
 * @example the rotation (0, −1; 1, 0) has i and −i
 */
export function eigenvalues(matrix: Square): Complex[] {
  const { realEigenvalues, imaginaryEigenvalues } = new EigenvalueDecomposition(unpacked(matrix));
  return realEigenvalues
    .map((re, i) => ({ re, im: imaginaryEigenvalues[i]! }))
    .sort((a, b) => Math.hypot(b.re, b.im) - Math.hypot(a.re, a.im));
}

/**
 * Inverse of a symmetric matrix, definite or not.
 *
 * Method: LU with row exchanges (ml-matrix), the answer made symmetric to the last place.
 *
 * @param matrix n ≥ 0 rows
 * @returns null where the matrix is singular to the last place
 * @example (2, 1; 1, 1) gives (1, −1; −1, 2)
 */
export function inverseSymmetric(matrix: Square): Square | null {
  const { n } = matrix;
  if (n === 0) return { n, values: new Float64Array(0) };
  const lu = new LuDecomposition(unpacked(matrix));
  if (lu.isSingular()) return null;
  const found = lu.solve(Matrix.eye(n, n));
  const values = new Float64Array(n * n);
  for (let i = 0; i < n; i++) for (let j = 0; j < n; j++) values[i * n + j] = 0.5 * (found.get(i, j) + found.get(j, i));
  return values.every((value) => Number.isFinite(value)) ? { n, values } : null;
}

function unpacked({ n, values }: Square): Matrix {
  const matrix = new Matrix(n, n);
  for (let i = 0; i < n; i++) for (let j = 0; j < n; j++) matrix.set(i, j, values[i * n + j]!);
  return matrix;
}

/**
 * Solves a general square system by LU with row exchanges (ml-matrix).
 *
 * @param matrix n rows; @param right n
 * @returns the solution, or null where the matrix is singular
 */
export function solveLinear(matrix: Square, right: Float64Array): Float64Array | null {
  const lu = new LuDecomposition(unpacked(matrix));
  if (lu.isSingular()) return null;
  return Float64Array.from(lu.solve(Matrix.columnVector(right)).to1DArray());
}
