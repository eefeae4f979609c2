import { levinson } from '../numeric/levinson.ts';

/**
 * Sample partial autocorrelations at lags 1…m from the autocorrelations.
 *
 * Method: the Durbin–Levinson recursion on the sample autocorrelations, that is the last coefficient of the Yule–Walker
 * autoregressions of each order (Durbin 1960; Box & Jenkins, Time Series Analysis, §3.2.5).
 *
 * @param correlations r_1…r_m, index 0 is lag 1, as `autocorrelation` gives them
 * @returns length m; NaN from the lag on at which the correlations are not those of any process (possible with gaps only)
 *   or a correlation is NaN
 * @example r = ρ^k, an AR(1): ρ, 0, 0 …
 */
export function partialAutocorrelation(correlations: Float64Array): Float64Array {
  const known = correlations.findIndex((value) => Number.isNaN(value));
  const usable = known < 0 ? correlations : correlations.subarray(0, known);
  const result = new Float64Array(correlations.length).fill(NaN);
  result.set(levinson(Float64Array.of(1, ...usable)).partials);
  return result;
}
