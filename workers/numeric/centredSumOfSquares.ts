import { mean } from './mean.ts';

/**
 * Σ (x − x̄)² over the entries that are numbers. Divide by n or n − 1 for a variance: no divisor is applied here.
 *
 * Method: corrected two-pass algorithm (Chan, Golub & LeVeque 1983, Am. Stat. 37, 242–247, equation 1.7).
 *
 * @param values any length, NaN entries (gaps) are left out; @param centre x̄, if known already
 * @returns 0 for a single number; NaN where there is none or an entry is infinite
 * @example 10000001, 10000003, 10000002 gives 2
 */
export function centredSumOfSquares(values: ArrayLike<number>, centre = mean(values)): number {
  let squares = 0;
  let left = 0;
  let count = 0;
  for (let i = 0; i < values.length; i++) {
    if (Number.isNaN(values[i]!)) continue;
    const deviation = values[i]! - centre;
    squares += deviation * deviation;
    left += deviation;
    count++;
  }
  return count === 0 ? NaN : squares - (left * left) / count;
}
