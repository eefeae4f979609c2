/**
 * Inverse of a small matrix and the logarithm of its determinant's size, by Gauss–Jordan elimination with partial pivoting.
 *
 * Source: Golub & Van Loan, Matrix Computations, 4th ed., section 3.4.
 *
 * @param matrix k×k row-major; destroyed; @param inverse receives k×k
 * @returns ln |det|; −Infinity where a pivot is 0, and then the inverse is of no use. 0 for k = 0
 */
export function smallInverse(matrix: Float64Array, k: number, inverse: Float64Array): number {
  inverse.fill(0);
  for (let i = 0; i < k; i++) inverse[i * k + i] = 1;
  let logDeterminant = 0;
  for (let column = 0; column < k; column++) {
    let pivot = column;
    for (let i = column + 1; i < k; i++)
      if (Math.abs(matrix[i * k + column]!) > Math.abs(matrix[pivot * k + column]!)) pivot = i;
    const value = matrix[pivot * k + column]!;
    if (!(Math.abs(value) > 0)) return -Infinity;
    logDeterminant += Math.log(Math.abs(value));
    for (let j = 0; j < k; j++) {
      const [a, b] = [matrix[pivot * k + j]!, inverse[pivot * k + j]!];
      matrix[pivot * k + j] = matrix[column * k + j]!;
      inverse[pivot * k + j] = inverse[column * k + j]!;
      matrix[column * k + j] = a / value;
      inverse[column * k + j] = b / value;
    }
    for (let i = 0; i < k; i++) {
      const factor = matrix[i * k + column]!;
      if (i === column || factor === 0) continue;
      for (let j = 0; j < k; j++) {
        matrix[i * k + j]! -= factor * matrix[column * k + j]!;
        inverse[i * k + j]! -= factor * inverse[column * k + j]!;
      }
    }
  }
  return logDeterminant;
}
