/** What is known of a sample correlogram's size: readings from the first to the last, those observed, pairs by lag. */
export interface CorrelogramSize {
  readonly length: number;
  readonly observed: number;
  /** Pairs observed at lag 1, 2 …; index 0 is lag 1. */
  readonly pairs: Int32Array;
}

/**
 * Variance of a sample autocorrelation of independent readings.
 *
 * Method: (n − k)/(n (n + 2)) without gaps (Ljung & Box 1978, Biometrika 65, 297–303, equation 1.2); with gaps, where r_k is
 * the mean product of the pairs observed times (1 − k/n), the same with n readings and n − k pairs replaced by those observed
 * (Stoffer & Toloi 1992, Stat. Probab. Lett. 13, 391–396).
 *
 * @param lag k ≥ 1
 * @returns NaN where no pair is observed
 */
export function independentVariance({ length, observed, pairs }: CorrelogramSize, lag: number): number {
  const count = pairs[lag - 1] ?? 0;
  if (count === 0) return NaN;
  const taper = observed < length ? (1 - lag / length) ** 2 / count : (length - lag) / length ** 2;
  return (taper * observed) / (observed + 2);
}
