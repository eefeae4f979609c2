/**
 * Coefficients of the AR polynomial with given partial autocorrelations.
 *
 * Method: Durbin–Levinson step-up (Barndorff-Nielsen & Schou 1973, J. Multivariate Anal. 3, 408–419).
 *
 * @param partial r_1…r_p, each in [−1, 1]; |r| < 1 for all is exactly the stationary region
 * @param coefficients receives φ of 1 − Σ φ_i Bⁱ, index 0 is lag 1; length ≥ p. For an MA part the result is −θ.
 * @example (.5, −.3, .2) gives φ = (.71, −.43, .20)
 */
export function partialToCoefficients(partial: ArrayLike<number>, coefficients: Float64Array): void {
  for (let k = 0; k < partial.length; k++) {
    const r = partial[k]!;
    for (let i = 0, j = k - 1; i <= j; i++, j--) {
      const a = coefficients[i]!;
      const b = coefficients[j]!;
      coefficients[i] = a - r * b;
      if (i !== j) coefficients[j] = b - r * a;
    }
    coefficients[k] = r;
  }
}
