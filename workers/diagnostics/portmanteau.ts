import type { Portmanteau } from '../contract/diagnostics.ts';
import { chiSquareUpperTail } from '../distributions/chiSquareUpperTail.ts';
import { weightedChiSquareUpperTail } from '../distributions/weightedChiSquareUpperTail.ts';
import { independentVariance, type CorrelogramSize } from './independentVariance.ts';
import { quadraticWeights } from './quadraticWeights.ts';
import type { ResidualSpread } from './residualSpread.ts';

export interface PortmanteauRequest {
  /** `ljungBox` takes autocorrelations, `monti` partial autocorrelations of the standardised innovations. */
  readonly method: 'ljungBox' | 'monti';
  readonly correlations: Float64Array;
  readonly size: CorrelogramSize;
  /** ARMA coefficients estimated, seasonal ones included; level and regression take no degree of freedom. */
  readonly coefficients: number;
  /** Given: the law of the statistic is taken from it (`weighted`). Left out: chi-square with lag − coefficients degrees of freedom. */
  readonly spread?: ResidualSpread;
}

/**
 * Portmanteau statistic and p-value at every lag.
 *
 * Method: Q_m = n(n + 2) Σ_{k≤m} r_k²/(n − k) of the innovations, taken about zero (Ljung & Box 1978, Biometrika 65, 297–303), or the same sum
 * over the partial autocorrelations (Monti 1994, Biometrika 81, 776–780); with gaps each r_k² is divided by its own variance. The
 * law: chi-square with m less the coefficients, or the exact law of the quadratic form in normals with covariance I − QQ′ (McLeod 1978), a
 * weighted sum of chi-squares, in which a coefficient counts only as far as lags up to m feel it.
 *
 * @returns p is NaN where lag ≤ coefficients, and from the first lag without a pair on
 */
export function portmanteau({ method, correlations, size, coefficients, spread }: PortmanteauRequest): Portmanteau {
  const m = correlations.length;
  const statistics = new Float64Array(m);
  const pValues = new Float64Array(m).fill(NaN);
  let sum = 0;
  for (let k = 1; k <= m; k++) {
    sum += correlations[k - 1]! ** 2 / independentVariance(size, k);
    statistics[k - 1] = sum;
    if (k <= coefficients || Number.isNaN(sum)) continue;
    pValues[k - 1] = spread
      ? weightedChiSquareUpperTail(quadraticWeights(spread, k), sum)
      : chiSquareUpperTail(sum, k - coefficients);
  }
  return {
    method,
    lags: Int32Array.from({ length: m }, (_, i) => i + 1),
    statistics,
    degreesOfFreedom: Int32Array.from({ length: m }, (_, i) => i + 1 - coefficients),
    pValues,
    law: spread ? 'weighted' : 'chiSquare',
  };
}
