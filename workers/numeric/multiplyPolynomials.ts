/**
 * Product of two polynomials.
 *
 * Method: convolution of the coefficients; zeros of `a` are skipped, so that a sparse seasonal factor costs only its terms.
 *
 * @param a, b coefficients c_0 + c_1 x + …
 * @returns length a + b − 1; empty where either is empty
 * @example (1, −1)·(1, 1) = (1, 0, −1)
 */
export function multiplyPolynomials(a: ArrayLike<number>, b: ArrayLike<number>): Float64Array {
  if (a.length === 0 || b.length === 0) return new Float64Array(0);
  const product = new Float64Array(a.length + b.length - 1);
  for (let i = 0; i < a.length; i++) {
    const factor = a[i]!;
    if (factor === 0) continue;
    for (let j = 0; j < b.length; j++) product[i + j]! += factor * b[j]!;
  }
  return product;
}
