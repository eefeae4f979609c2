import type { Criteria } from '../contract/fit.ts';

/** Differences of one fit to the best comparable one, and its Akaike weight. */
export interface CriteriaDifference {
  readonly differences: Criteria;
  readonly weight: number;
}

export interface CriteriaDifferences {
  /** AICc, or AIC where AICc is undefined for one of the fits. */
  readonly weightBy: 'aicc' | 'aic';
  /** One entry a fit, in the order given. */
  readonly entries: readonly CriteriaDifference[];
}

/**
 * Differences of the criteria to the smallest among comparable fits, and Akaike weights.
 *
 * Method: w_i = exp(−Δ_i/2)/Σ exp(−Δ_j/2) (Akaike 1978, J. R. Stat. Soc. D 27, 217–235; Burnham & Anderson 2002, §2.9).
 *
 * @param criteria of fits that share a comparability key
 * @returns differences ≥ 0, 0 for the best by each criterion; weights sum to 1
 * @example AIC 100 and 102: differences 0 and 2, weights e/(1 + e) = .731 and .269
 */
export function criteriaDifferences(criteria: readonly Criteria[]): CriteriaDifferences {
  const least = (name: keyof Criteria) => Math.min(...criteria.map((one) => one[name] ?? Infinity));
  const best = { aic: least('aic'), aicc: least('aicc'), bic: least('bic'), hq: least('hq') };
  const weightBy = criteria.every(({ aicc }) => aicc !== null) ? 'aicc' : 'aic';
  const likelihoods = criteria.map((one) => Math.exp((best[weightBy] - (one[weightBy] ?? Infinity)) / 2));
  const total = likelihoods.reduce((sum, one) => sum + one, 0);
  const entries = criteria.map((one, i) => ({
    differences: {
      aic: one.aic - best.aic,
      aicc: one.aicc === null ? null : one.aicc - best.aicc,
      bic: one.bic - best.bic,
      hq: one.hq - best.hq,
    },
    weight: likelihoods[i]! / total,
  }));
  return { weightBy, entries };
}
