/**
 * Large-sample variance of a sample autocorrelation, times n, for a process with given autocorrelations.
 *
 * Method: Bartlett 1946, J. R. Stat. Soc. Suppl. 8, 27–41:
 * n var(r_k) = Σ_v [ρ_v² + ρ_{v+k} ρ_{v−k} − 4 ρ_k ρ_v ρ_{v−k} + 2 ρ_v² ρ_k²], v over all integers.
 *
 * @param correlations ρ_1, ρ_2 …, index 0 is lag 1; lags beyond the array count as 0, so give as many as matter
 * @param lag k ≥ 1
 * @returns n var(r_k)
 * @example white noise: 1; an AR(1) at lag 1: 1 − φ²
 */
export function bartlettVariance(correlations: Float64Array, lag: number): number {
  const m = correlations.length;
  const rho = (k: number) => {
    const at = Math.abs(k);
    return at === 0 ? 1 : (correlations[at - 1] ?? 0);
  };
  const own = rho(lag);
  let sum = 0;
  for (let v = -m - lag; v <= m + lag; v++) {
    const here = rho(v);
    sum += here * here * (1 + 2 * own * own) + rho(v + lag) * rho(v - lag) - 4 * own * here * rho(v - lag);
  }
  return sum;
}
