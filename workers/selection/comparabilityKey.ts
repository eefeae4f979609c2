import type { Fit } from '../contract/fit.ts';
import type { Comparability } from '../contract/selection.ts';

/**
 * Which fits a fit may be compared with by criteria: those with the same key.
 *
 * The key holds the readings used (record, fit window, number used), d and D with the season that D acts on, the likelihood kind, and
 * the events found by search. Level, ARMA orders, regressors and transforms may differ: a transform's Jacobian is in ln L. The season
 * of a purely seasonal ARMA factor does not enter either, since it changes no reading.
 *
 * @param fit an estimated candidate; @param searchedEvents identifiers of events accepted after a search, in any order
 * @returns the key and its parts, so that two that differ can be told apart in words
 */
export function comparabilityKey(fit: Fit, searchedEvents: readonly string[] = []): Comparability {
  const { d, D, s } = fit.candidate.order;
  const parts = {
    readings: `${fit.seriesHash}:${fit.window.from}-${fit.window.to}:${fit.readingsUsed}`,
    d,
    D,
    s: D > 0 ? s : 0,
    likelihood: fit.candidate.estimator,
    events: [...searchedEvents].sort().join(' '),
  };
  const key = [parts.readings, d, D, parts.s, parts.likelihood, parts.events].join('|');
  return { key, ...parts };
}
