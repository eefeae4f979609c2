import type { Correlogram } from '../contract/diagnostics.ts';
import { normalQuantile } from '../distributions/normalQuantile.ts';
import { independentVariance, type CorrelogramSize } from './independentVariance.ts';
import type { ResidualSpread } from './residualSpread.ts';

/**
 * A correlogram of innovations with the band that residuals of a fitted model keep at each lag.
 *
 * Method: half-width z √(v_k (1 − Σ_a Q_ka²)): the variance v_k for independent readings, less what fitting takes out (Box & Pierce 1970;
 * McLeod 1978), which is most at low lags. The partial autocorrelations of residuals have the same asymptotic law (Monti 1994,
 * Biometrika 81, 776–780, theorem 1), so that one band serves both.
 *
 * @param correlations autocorrelations or partial autocorrelations at lags 1…m; @param size readings and pairs they rest on
 * @param spread what fitting took out, over the same lags; @param coverage of the band at one lag, in (0, 1)
 */
export function residualCorrelogram(
  correlations: Float64Array,
  size: CorrelogramSize,
  spread: ResidualSpread,
  coverage: number,
): Correlogram {
  const z = normalQuantile((1 + coverage) / 2);
  const m = correlations.length;
  const bands = new Float64Array(m);
  for (let k = 1; k <= m; k++) {
    let taken = 0;
    for (let a = 0; a < spread.rank; a++) taken += spread.basis[(k - 1) * spread.rank + a]! ** 2;
    bands[k - 1] = z * Math.sqrt(independentVariance(size, k) * Math.max(0, 1 - taken));
  }
  return {
    lags: Int32Array.from({ length: m }, (_, i) => i + 1),
    correlations,
    pairs: size.pairs,
    bands,
    bandLaw: spread.rank > 0 ? 'residuals' : 'independent',
    coverage,
  };
}
