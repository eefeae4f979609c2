/**
 * Solves L Lᵀ x = b in place.
 *
 * Method: forward, then backward substitution (Golub & Van Loan, 4th ed., §3.1).
 *
 * @param factor row-major lower factor as `cholesky` leaves it
 * @param n rows, ≥ 0
 * @param right b on entry, x on return; length ≥ n
 */
export function choleskySolve(factor: Float64Array, n: number, right: Float64Array): void {
  for (let i = 0; i < n; i++) {
    let sum = right[i]!;
    for (let k = 0; k < i; k++) sum -= factor[i * n + k]! * right[k]!;
    right[i] = sum / factor[i * n + i]!;
  }
  for (let i = n - 1; i >= 0; i--) {
    let sum = right[i]!;
    for (let k = i + 1; k < n; k++) sum -= factor[k * n + i]! * right[k]!;
    right[i] = sum / factor[i * n + i]!;
  }
}
