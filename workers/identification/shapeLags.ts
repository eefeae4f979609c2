import type { ShapeLags } from '../contract/shape.ts';
import { normalQuantile } from '../distributions/normalQuantile.ts';
import { autocorrelation } from './autocorrelation.ts';
import { partialAutocorrelation } from './partialAutocorrelation.ts';

const FEWEST = 16;
const MOST = 360;

/**
 * Correlogram and partial correlogram of a differenced record with two bands.
 *
 * Method: `autocorrelation`, `partialAutocorrelation`. For independent readings r_k has variance (1 − k/n)²/pairs, as it is the mean of that many products
 * times (1 − k/n). If the memory ended before lag k it is (1 + 2 Σ_{j<k} r_j²)/N (Bartlett 1946, J. R. Stat. Soc. Suppl. 8, 27–41). Lags:
 * 10 log₁₀ n or two seasons and two more, at least 16, at most 360 and a quarter of the record.
 *
 * @param differenced gaps as NaN; @param season readings in a season, 0: none; @param coverage of the bands, in (0, 1)
 */
export function shapeLags(differenced: Float64Array, season: number, coverage: number): ShapeLags {
  const n = differenced.length;
  const wanted = Math.max(FEWEST, Math.ceil(10 * Math.log10(Math.max(n, 1))), season > 1 ? 2 * season + 2 : 0);
  const lags = Math.max(1, Math.min(wanted, MOST, Math.floor(n / 4)));
  const { correlations, pairs, observed } = autocorrelation(differenced, lags);
  const deviate = normalQuantile(0.5 + coverage / 2);
  let sum = 0;
  const endedBand = correlations.map((r) => {
    const band = deviate * Math.sqrt((1 + 2 * sum) / observed);
    if (!Number.isNaN(r)) sum += r * r;
    return band;
  });
  const independentBand = Float64Array.from(pairs, (count, i) =>
    count > 0 ? (deviate * (1 - (i + 1) / n)) / Math.sqrt(count) : NaN,
  );
  return {
    correlations,
    partials: partialAutocorrelation(correlations),
    pairs,
    independentBand,
    endedBand,
    coverage,
  };
}
