/**
 * Partial autocorrelations of a stationary AR polynomial.
 *
 * Method: Durbin–Levinson step-down (Barndorff-Nielsen & Schou 1973, J. Multivariate Anal. 3, 408–419; Monahan 1984,
 * Biometrika 71, 403–404).
 *
 * @param coefficients φ of 1 − Σ φ_i Bⁱ, index 0 is lag 1; for an MA part give −θ
 * @param partial receives r_1…r_p; length ≥ p
 * @returns true where every |r| < 1; false outside the stationary region
 * @example φ = (.71, −.43, .20) gives (.5, −.3, .2)
 */
export function coefficientsToPartial(coefficients: ArrayLike<number>, partial: Float64Array): boolean {
  const p = coefficients.length;
  const work = Float64Array.from(coefficients);
  for (let k = p; k >= 1; k--) {
    const r = work[k - 1]!;
    partial[k - 1] = r;
    if (!(Math.abs(r) < 1)) return false;
    const scale = 1 / ((1 - r) * (1 + r));
    for (let i = 0, j = k - 2; i <= j; i++, j--) {
      const a = work[i]!;
      const b = work[j]!;
      work[i] = (a + r * b) * scale;
      work[j] = (b + r * a) * scale;
    }
  }
  return true;
}
