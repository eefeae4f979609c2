export interface LevinsonSteps {
  /** Coefficients a_1…a_m of the last order reached: prediction Σ a_i z_{t−i}. */
  readonly coefficients: Float64Array;
  /** Partial autocorrelations at lags 1…m. */
  readonly partials: Float64Array;
  /** Prediction variance at orders 0…m. */
  readonly variances: Float64Array;
}

/**
 * Solves the Yule–Walker equations of every order up to m by the Levinson–Durbin recursion.
 *
 * Method: Durbin 1960, Revue de l'Institut International de Statistique 28, 233–244; Brockwell & Davis, Time Series:
 * Theory and Methods, 2nd ed. 1991, proposition 5.2.1. O(m²).
 *
 * @param autocovariances γ_0…γ_m, γ_0 > 0
 * @returns coefficients, partials and variances. Where the sequence is not positive definite the recursion stops at the
 *   last order with |partial| < 1, and the arrays are that long.
 */
export function levinson(autocovariances: ArrayLike<number>): LevinsonSteps {
  const m = autocovariances.length - 1;
  let current = new Float64Array(m);
  let previous = new Float64Array(m);
  const partials = new Float64Array(m);
  const variances = new Float64Array(m + 1);
  variances[0] = autocovariances[0]!;
  let reached = 0;
  for (let order = 1; order <= m; order++) {
    let numerator = autocovariances[order]!;
    for (let i = 1; i < order; i++) numerator -= previous[i - 1]! * autocovariances[order - i]!;
    const partial = numerator / variances[order - 1]!;
    if (!(Math.abs(partial) < 1)) break;
    for (let i = 1; i < order; i++) current[i - 1] = previous[i - 1]! - partial * previous[order - i - 1]!;
    current[order - 1] = partial;
    partials[order - 1] = partial;
    variances[order] = variances[order - 1]! * (1 - partial * partial);
    [current, previous] = [previous, current];
    reached = order;
  }
  return {
    coefficients: previous.slice(0, reached),
    partials: partials.slice(0, reached),
    variances: variances.slice(0, reached + 1),
  };
}
