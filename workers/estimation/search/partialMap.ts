/**
 * Coefficients of an autoregressive polynomial from its partial autocorrelations, with derivatives.
 *
 * Method: the Durbin–Levinson recursion a_j ← a_j − r_k a_{k−j}, a_k = r_k as a map of (−1, 1)^p onto the stationary
 * region (Barndorff-Nielsen & Schou 1973, J. Multivariate Analysis 3, 408–419, doi:10.1016/0047-259X(73)90030-4),
 * differentiated step by step. A partial of ±1 puts roots on the unit circle.
 *
 * @param partials p values in [−1, 1]
 * @param coefficients receives φ_1…φ_p of 1 − Σ φ_j Bʲ
 * @param jacobian receives ∂φ_j/∂r_m at [j·p + m], p×p
 */
export function partialMap(partials: Float64Array, coefficients: Float64Array, jacobian: Float64Array): void {
  const p = partials.length;
  jacobian.fill(0);
  for (let k = 0; k < p; k++) {
    const r = partials[k]!;
    // Lags j and k−1−j are updated together, in place; the middle one is its own partner.
    for (let j = 0, mirror = k - 1; j <= mirror; j++, mirror--) {
      const one = coefficients[j]!;
      const other = coefficients[mirror]!;
      for (let m = 0; m < k; m++) {
        const dOne = jacobian[j * p + m]!;
        const dOther = jacobian[mirror * p + m]!;
        jacobian[j * p + m] = dOne - r * dOther;
        jacobian[mirror * p + m] = dOther - r * dOne;
      }
      jacobian[j * p + k] = -other;
      jacobian[mirror * p + k] = -one;
      coefficients[j] = one - r * other;
      coefficients[mirror] = other - r * one;
    }
    coefficients[k] = r;
    jacobian[k * p + k] = 1;
  }
}

/**
 * Partial autocorrelations of a polynomial: the recursion of `partialMap` run backwards.
 *
 * @param coefficients φ_1…φ_p of 1 − Σ φ_j Bʲ
 * @param partials receives p values
 * @returns false where the polynomial has a root on or inside the unit circle (to rounding), and then `partials` is
 *   not to be used
 */
export function inversePartialMap(coefficients: ArrayLike<number>, partials: Float64Array): boolean {
  const p = coefficients.length;
  const current = Float64Array.from(coefficients);
  for (let k = p - 1; k >= 0; k--) {
    const r = current[k]!;
    if (!(Math.abs(r) < 1)) return false;
    partials[k] = r;
    const scale = 1 - r * r;
    for (let j = 0, mirror = k - 1; j <= mirror; j++, mirror--) {
      const one = current[j]!;
      const other = current[mirror]!;
      current[j] = (one + r * other) / scale;
      current[mirror] = (other + r * one) / scale;
    }
  }
  return true;
}
