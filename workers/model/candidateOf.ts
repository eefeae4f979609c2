import type { Candidate, Order } from '../contract/candidate.ts';

/**
 * A complete candidate from its order and whatever else is given.
 *
 * Defaults: level none, no transform, exact likelihood, no lags held at zero, no regressors.
 *
 * @example candidateOf({ order: { p: 1, d: 0, q: 0, P: 0, D: 0, Q: 0, s: 0 }, level: 'mean' })
 */
export function candidateOf(part: Partial<Candidate> & { order: Order }): Candidate {
  const { zeroLags } = part;
  return {
    order: { ...part.order },
    level: part.level ?? 'none',
    transform: part.transform ?? { kind: 'none' },
    estimator: part.estimator ?? 'exact',
    zeroLags: {
      ar: [...(zeroLags?.ar ?? [])],
      ma: [...(zeroLags?.ma ?? [])],
      seasonalAr: [...(zeroLags?.seasonalAr ?? [])],
      seasonalMa: [...(zeroLags?.seasonalMa ?? [])],
    },
    regressors: [...(part.regressors ?? [])],
  };
}
