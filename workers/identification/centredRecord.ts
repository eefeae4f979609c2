/** A record less its mean, with what was found on the way. */
export interface CentredRecord {
  readonly centred: Float64Array;
  readonly mean: number;
  /** Readings observed. */
  readonly count: number;
  /** Σ (x − mean)² over the readings observed. */
  readonly sumOfSquares: number;
}

/**
 * Centres a record in two passes, so that an offset of 1e9 costs no more digits than the readings themselves have lost.
 *
 * Method: corrected two-pass algorithm (Chan, Golub & LeVeque 1983, Am. Stat. 37, 242–247, equation 1.7).
 *
 * @param values gaps as NaN stay gaps
 * @returns NaN mean where nothing is observed
 * @example 10000001, 10000003, 10000002: mean 10000002, sum of squares 2
 */
export function centredRecord(values: Float64Array): CentredRecord {
  let sum = 0;
  let count = 0;
  for (const value of values) {
    if (Number.isNaN(value)) continue;
    sum += value;
    count++;
  }
  const first = sum / count;
  let rest = 0;
  for (const value of values) if (!Number.isNaN(value)) rest += value - first;
  const mean = first + rest / count;
  const centred = new Float64Array(values.length);
  let squares = 0;
  let left = 0;
  for (let t = 0; t < values.length; t++) {
    const deviation = values[t]! - mean;
    centred[t] = deviation;
    if (Number.isNaN(deviation)) continue;
    squares += deviation * deviation;
    left += deviation;
  }
  return { centred, mean, count, sumOfSquares: count > 0 ? squares - (left * left) / count : 0 };
}
