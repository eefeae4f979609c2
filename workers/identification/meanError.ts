import { autocorrelation } from './autocorrelation.ts';

/**
 * Mean of a stationary record and its standard error.
 *
 * Method: var x̄ = c_0 [1 + 2 Σ_{j≤l} (1 − j/(l + 1)) r_j]/N with l = ⌊4 (n/100)^{2/9}⌋ (Newey & West 1987, Econometrica 55, 703–708; bandwidth as in
 * Newey & West 1994, Rev. Econ. Stud. 61, 631–653, table I), which is positive.
 *
 * @param values gaps as NaN
 * @returns NaN where nothing is observed; an error of 0 for a constant record
 */
export function meanError(values: Float64Array): { readonly mean: number; readonly error: number } {
  const n = values.length;
  const lags = Math.max(0, Math.min(n - 1, Math.floor(4 * (n / 100) ** (2 / 9))));
  const { correlations, mean, variance, observed } = autocorrelation(values, lags);
  let sum = 1;
  for (let j = 1; j <= lags; j++) {
    const r = correlations[j - 1]!;
    if (!Number.isNaN(r)) sum += 2 * (1 - j / (lags + 1)) * r;
  }
  return { mean, error: Math.sqrt((variance * Math.max(sum, 0)) / observed) };
}
