import { autocovariances } from '../../model/autocovariances.ts';

/**
 * Covariance of what the past before the record puts into its first m values.
 *
 * With g_t = Σ_{i≥t} φ_i w_{t−i} + Σ_{j≥t} θ_j e_{t−j} (t = 1…m, m = max(p, q)), the values of the record before its start enter the
 * recursion e_t = w_t − Σφw − Σθe only through g. It is also the stationary covariance of the one-step predictor state.
 *
 * Method: for a pure MA the sum of products of its coefficients; otherwise Cov(x) − Cov(y), with x_t = w_t − Σ_{i<t} φ_i w_{t−i}
 * and y_t = e_t + Σ_{j<t} θ_j e_{t−j}, since x = g + y and g, y are independent.
 *
 * @param ar multiplied-out φ; @param ma multiplied-out θ; unit innovation variance
 * @param m rows wanted, 0 < m ≤ max(p, q)
 * @param result receives the m×m matrix, row-major, both triangles
 * @returns false where the AR part is not stationary
 */
export function startCovariance(ar: Float64Array, ma: Float64Array, m: number, result: Float64Array): boolean {
  const q = ma.length;
  if (ar.length === 0) {
    for (let i = m; i >= 1; i--) {
      for (let j = m; j >= i; j--) {
        let sum = 0;
        if (i === m || j === m) for (let k = 0; j + k <= q; k++) sum += ma[i + k - 1]! * ma[j + k - 1]!;
        else sum = result[i * m + j]! + ma[i - 1]! * ma[j - 1]!;
        result[(i - 1) * m + j - 1] = sum;
        result[(j - 1) * m + i - 1] = sum;
      }
    }
    return true;
  }
  const gamma = autocovariances(ar, ma, m);
  if (gamma === null) return false;
  const lags: number[] = [];
  for (let i = 0; i < ar.length; i++) if (ar[i] !== 0) lags.push(i + 1);
  // Rows: Cov(x_i, w_j).
  const mixed = new Float64Array(m * m);
  for (let i = 0; i < m; i++) {
    for (let j = 0; j < m; j++) {
      let sum = gamma[Math.abs(i - j)]!;
      for (const lag of lags) {
        if (lag > i) break;
        sum -= ar[lag - 1]! * gamma[Math.abs(i - lag - j)]!;
      }
      mixed[i * m + j] = sum;
    }
  }
  const own = new Float64Array(m * m);
  for (let i = 0; i < m; i++) {
    for (let j = 0; j <= i; j++) {
      let sum = mixed[i * m + j]!;
      for (const lag of lags) {
        if (lag > j) break;
        sum -= ar[lag - 1]! * mixed[i * m + j - lag]!;
      }
      const before = i > 0 && j > 0 ? own[(i - 1) * m + j - 1]! : 0;
      own[i * m + j] = before + weight(ma, i) * weight(ma, j);
      sum -= own[i * m + j]!;
      result[i * m + j] = sum;
      result[j * m + i] = sum;
    }
  }
  return true;
}

/** θ_k with θ_0 = 1 and 0 beyond the order. */
function weight(ma: Float64Array, k: number): number {
  return k === 0 ? 1 : (ma[k - 1] ?? 0);
}
