/**
 * ψ weights of an ARMA process, z_t = Σ ψ_j e_{t−j}, or with the polynomials exchanged and signs turned its π weights.
 *
 * Method: the recursion ψ_j = θ_j + Σ φ_i ψ_{j−i} (Box & Jenkins, Time Series Analysis, ch. 5).
 *
 * @param ar multiplied-out φ (differencing included if wanted), index 0 is lag 1; @param ma multiplied-out θ
 * @param count number of weights, ψ_0 = 1 first
 * @example φ = (.5, .3), θ = .4: 1, .9, .75, .645, .5475
 */
export function psiWeights(ar: Float64Array, ma: Float64Array, count: number): Float64Array {
  const lags: number[] = [];
  for (let i = 0; i < ar.length; i++) if (ar[i] !== 0) lags.push(i + 1);
  const psi = new Float64Array(count);
  for (let j = 0; j < count; j++) {
    let sum = j === 0 ? 1 : j <= ma.length ? ma[j - 1]! : 0;
    for (const lag of lags) {
      if (lag > j) break;
      sum += ar[lag - 1]! * psi[j - lag]!;
    }
    psi[j] = sum;
  }
  return psi;
}
