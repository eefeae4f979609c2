/**
 * Sample autocovariances of a centred record with gaps: mean product of the pairs observed, tapered by (1 − k/n) as
 * the usual divisor n does for a record without gaps (Parzen 1963, Sankhyā A 25, 383–392, amplitude modulation).
 *
 * @param centred readings less their mean; NaN is a gap
 * @param most largest lag, below the number of readings
 * @returns γ_0…γ_most; 0 at lags no pair is observed at. Not necessarily positive definite where there are gaps.
 */
export function pairwiseAutocovariances(centred: Float64Array, most: number): Float64Array {
  const n = centred.length;
  const result = new Float64Array(most + 1);
  const gaps = centred.some((value) => Number.isNaN(value));
  for (let lag = 0; lag <= most; lag++) {
    let sum = 0;
    let pairs = 0;
    if (!gaps) {
      for (let t = lag; t < n; t++) sum += centred[t]! * centred[t - lag]!;
      pairs = n - lag;
    } else {
      for (let t = lag; t < n; t++) {
        const product = centred[t]! * centred[t - lag]!;
        if (product === product) {
          sum += product;
          pairs++;
        }
      }
    }
    result[lag] = pairs === 0 ? 0 : (sum / pairs) * (1 - lag / n);
  }
  return result;
}
