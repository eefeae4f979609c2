import { coefficientsToPartial } from './coefficientsToPartial.ts';

/**
 * Autocovariances γ_0…γ_m of a stationary ARMA process with unit innovation variance.
 *
 * Method: the AR part's from its partial autocorrelations, γ_0 = ∏ 1/(1 − r²) and the Levinson recursion upward (no linear
 * system, nothing to become singular near a unit root), then filtered by the MA polynomial: γ_k = Σ_i Σ_j θ_i θ_j g_{k+i−j}.
 * Brockwell & Davis, Time Series: Theory and Methods, 2nd ed., §3.3.
 *
 * @param ar multiplied-out φ, index 0 is lag 1; @param ma multiplied-out θ; @param most m ≥ 0
 * @returns length m + 1, or null where the AR part is not stationary
 * @example ARMA(1,1), φ = .8, θ = −.5: 1.25, .5, .4, .32
 */
export function autocovariances(ar: Float64Array, ma: Float64Array, most: number): Float64Array | null {
  const own = autoregressive(ar, most + ma.length);
  if (own === null) return null;
  const q = ma.length;
  // c_k = Σ_j θ_j θ_{j+k}, the autocovariances of the MA part alone, θ_0 = 1.
  const gains: number[] = [];
  const lags: number[] = [];
  for (let k = 0; k <= q; k++) {
    let sum = k === 0 ? 1 : ma[k - 1]!;
    for (let j = 0; j + k < q; j++) sum += ma[j]! * ma[j + k]!;
    if (sum !== 0) {
      gains.push(sum);
      lags.push(k);
    }
  }
  const result = new Float64Array(most + 1);
  for (let k = 0; k <= most; k++) {
    let sum = 0;
    for (let i = 0; i < gains.length; i++) {
      const lag = lags[i]!;
      sum += gains[i]! * (lag === 0 ? own[k]! : own[k + lag]! + own[Math.abs(k - lag)]!);
    }
    result[k] = sum;
  }
  return result;
}

function autoregressive(ar: Float64Array, most: number): Float64Array | null {
  const p = ar.length;
  const partial = new Float64Array(p);
  if (!coefficientsToPartial(ar, partial)) return null;
  let variance = 1;
  for (let k = p - 1; k >= 0; k--) variance /= (1 - partial[k]!) * (1 + partial[k]!);
  const gamma = new Float64Array(Math.max(most, p) + 1);
  gamma[0] = variance;
  const phi = new Float64Array(p);
  for (let k = 1; k <= p; k++) {
    const r = partial[k - 1]!;
    let sum = r * variance;
    for (let i = 1; i < k; i++) sum += phi[i - 1]! * gamma[k - i]!;
    gamma[k] = sum;
    for (let i = 0, j = k - 2; i <= j; i++, j--) {
      const a = phi[i]!;
      const b = phi[j]!;
      phi[i] = a - r * b;
      if (i !== j) phi[j] = b - r * a;
    }
    phi[k - 1] = r;
    variance *= (1 - r) * (1 + r);
  }
  const lags: number[] = [];
  for (let i = 0; i < p; i++) if (ar[i] !== 0) lags.push(i + 1);
  for (let k = p + 1; k <= most; k++) {
    let sum = 0;
    for (const lag of lags) sum += ar[lag - 1]! * gamma[k - lag]!;
    gamma[k] = sum;
  }
  return gamma;
}
