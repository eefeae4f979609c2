/**
 * Applies a differencing polynomial; a gap makes a gap of every value it enters.
 *
 * @param values length n, gaps as NaN; @param polynomial c_0…c_m as `differencingPolynomial` gives it
 * @returns Σ c_i z_{t−i} for t = m…n−1; length n − m, or 0 where the record is shorter
 */
export function differenceRecord(values: ArrayLike<number>, polynomial: Float64Array): Float64Array {
  const m = polynomial.length - 1;
  const result = new Float64Array(Math.max(values.length - m, 0));
  const lags: number[] = [];
  for (let i = 0; i <= m; i++) if (polynomial[i] !== 0) lags.push(i);
  for (let t = m; t < values.length; t++) {
    let sum = 0;
    for (const lag of lags) sum += polynomial[lag]! * values[t - lag]!;
    result[t - m] = sum;
  }
  return result;
}
