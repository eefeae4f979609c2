import type { Portmanteau } from '../contract/diagnostics.ts';

/** One reading of the portmanteau p-values over a stated set of lags. */
export interface JointWhiteness {
  /** Of the hypothesis that nothing is left at any of the lags. */
  readonly p: number;
  readonly lags: readonly number[];
  /** The lag whose p-value decides. */
  readonly lag: number;
}

/**
 * One p-value over several lags of a portmanteau test that does not punish looking at many.
 *
 * Method: Simes 1986, Biometrika 73, 751–754: min over i of K p_(i)/i, of size at most nominal for positively dependent statistics
 * (Sarkar 1998, Ann. Stat. 26, 494–504), as nested portmanteau statistics are. The lags are chosen beforehand: three more than the
 * coefficients (memory just after the model's own), ten more, the longest of 24 lags, and where there is a season one season and two.
 *
 * @param portmanteau by lag; @param coefficients ARMA coefficients estimated; @param season readings in a season, 0 for none
 * @returns null where no p-value stands at any of those lags
 */
export function jointWhiteness(portmanteau: Portmanteau, coefficients: number, season: number): JointWhiteness | null {
  const most = portmanteau.lags.length;
  const wanted = [coefficients + 3, coefficients + 10, 24, season, 2 * season];
  const lags = [...new Set(wanted.map((lag) => Math.min(lag, most)))]
    .filter((lag) => lag > coefficients && Number.isFinite(portmanteau.pValues[lag - 1]!))
    .sort((one, other) => one - other);
  if (lags.length === 0) return null;
  const ranked = lags.map((lag) => ({ lag, p: portmanteau.pValues[lag - 1]! })).sort((one, other) => one.p - other.p);
  let best = { lag: ranked[0]!.lag, p: Infinity };
  ranked.forEach(({ lag, p }, i) => {
    const joint = (p * ranked.length) / (i + 1);
    if (joint < best.p) best = { lag, p: joint };
  });
  return { p: Math.min(best.p, 1), lags, lag: best.lag };
}
