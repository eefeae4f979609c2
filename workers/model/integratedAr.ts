/**
 * φ(B)∇ᵈ∇ₛᴰ multiplied out, as the coefficients α of y_t = Σ α_i y_{t−i} + e_t + ….
 *
 * @param ar multiplied-out φ, index 0 is lag 1; @param differencing c_0 = 1, c_1 … c_m
 * @returns length p + m, index 0 is lag 1
 * @example φ = .5 and one difference: 1.5, −.5
 */
export function integratedAr(ar: Float64Array, differencing: Float64Array): Float64Array {
  const p = ar.length;
  const m = differencing.length - 1;
  const alpha = new Float64Array(p + m);
  for (let j = 0; j <= m; j++) {
    const c = differencing[j]!;
    if (c === 0) continue;
    if (j > 0) alpha[j - 1]! -= c;
    for (let i = 1; i <= p; i++) alpha[i + j - 1]! += c * ar[i - 1]!;
  }
  return alpha;
}
