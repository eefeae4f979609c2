export interface BurgEnd {
  /** φ_1…φ_p. */
  readonly coefficients: Float64Array;
  readonly partials: Float64Array;
  readonly variance: number;
}

/**
 * Burg's estimator of an autoregression: at each order the partial autocorrelation that minimises the sum of squared
 * forward and backward prediction errors; every |partial| ≤ 1.
 *
 * Method: Burg 1967, Maximum entropy spectral analysis; Brockwell & Davis, Introduction to Time Series and Forecasting,
 * section 5.1.2. O(n·p).
 *
 * @param centred readings less their mean, without gaps
 * @param order p, below the number of readings
 * @returns coefficients, partials and the innovation variance of section 5.1.2, (5.1.21)
 */
export function burg(centred: Float64Array, order: number): BurgEnd {
  const n = centred.length;
  const forward = centred.slice();
  const backward = centred.slice();
  const coefficients = new Float64Array(order);
  const partials = new Float64Array(order);
  const previous = new Float64Array(order);
  let squares = 0;
  for (const value of centred) squares += value * value;
  let variance = squares / n;
  for (let k = 1; k <= order; k++) {
    let product = 0;
    let energy = 0;
    for (let t = k; t < n; t++) {
      const ahead = forward[t]!;
      const behind = backward[t - 1]!;
      product += ahead * behind;
      energy += ahead * ahead + behind * behind;
    }
    const partial = energy > 0 ? (2 * product) / energy : 0;
    // Errors of order k, written from the end so that backward[t − 1] is still that of order k − 1.
    for (let t = n - 1; t >= k; t--) {
      const ahead = forward[t]!;
      const behind = backward[t - 1]!;
      forward[t] = ahead - partial * behind;
      backward[t] = behind - partial * ahead;
    }
    previous.set(coefficients);
    for (let i = 0; i < k - 1; i++) coefficients[i] = previous[i]! - partial * previous[k - 2 - i]!;
    coefficients[k - 1] = partial;
    partials[k - 1] = partial;
    variance = (energy / (2 * (n - k))) * (1 - partial * partial);
  }
  return { coefficients, partials, variance };
}
