/**
 * Cholesky factor of a symmetric positive definite matrix, in place.
 *
 * Method: row by row (Golub & Van Loan, Matrix Computations, 4th ed., §4.2). ml-matrix does not throw on an indefinite
 * matrix and costs too much in an inner loop.
 *
 * @param matrix row-major, at least n²; its lower triangle is read and becomes L with A = L Lᵀ. The upper is left alone.
 * @param n rows, ≥ 0
 * @returns false where a pivot is not positive (or is NaN): the matrix is not positive definite to rounding.
 */
export function cholesky(matrix: Float64Array, n: number): boolean {
  for (let i = 0; i < n; i++) {
    const row = i * n;
    for (let j = 0; j < i; j++) {
      const other = j * n;
      let sum = matrix[row + j]!;
      for (let k = 0; k < j; k++) sum -= matrix[row + k]! * matrix[other + k]!;
      matrix[row + j] = sum / matrix[other + j]!;
    }
    let pivot = matrix[row + i]!;
    for (let k = 0; k < i; k++) pivot -= matrix[row + k]! * matrix[row + k]!;
    if (!(pivot > 0)) return false;
    matrix[row + i] = Math.sqrt(pivot);
  }
  return true;
}
