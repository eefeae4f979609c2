import type { Square } from '../contract/result.ts';
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
 * Solves a general square system by LU with row exchanges (ml-matrix).
 *
 * @param matrix n rows; @param right n
 * @returns the solution, or null where the matrix is singular
 */
export function solveLinear({ n, values }: Square, right: Float64Array): Float64Array | null {
  const matrix = new Matrix(n, n);
  for (let i = 0; i < n; i++) for (let j = 0; j < n; j++) matrix.set(i, j, values[i * n + j]!);
  const lu = new LuDecomposition(matrix);
  if (lu.isSingular()) return null;
  return Float64Array.from(lu.solve(Matrix.columnVector(right)).to1DArray());
}
