import type { BadCandidateReason, Failure } from '../contract/failures.ts';
import type { Candidate, Regressor } from '../contract/candidate.ts';
import type { Result } from '../contract/result.ts';

/** Largest orders and season accepted: beyond them a fit is neither estimable nor affordable. */
const MOST = { p: 60, q: 60, P: 12, Q: 12, d: 3, D: 2, s: 100_000 } as const;

const bad = (field: string, reason: BadCandidateReason): { ok: false; failure: Failure } => ({
  ok: false,
  failure: { code: 'badCandidate', field, reason },
});

/**
 * Checks every setting of a candidate once, in one place.
 *
 * @param candidate complete, as `candidateOf` leaves it
 * @param readings length of the record, for events; Infinity where it is not known
 * @returns the candidate, or a `badCandidate` failure that names the field and the reason
 */
export function checkCandidate(candidate: Candidate, readings = Infinity): Result<Candidate> {
  const { order, level, transform, zeroLags, regressors, estimator } = candidate;
  for (const field of ['p', 'd', 'q', 'P', 'D', 'Q', 's'] as const) {
    const value = order[field];
    if (!Number.isInteger(value)) return bad(field, 'notAWholeNumber');
    if (value < 0) return bad(field, 'negative');
    if (value > MOST[field]) return bad(field, 'tooLarge');
  }
  if (order.s === 1) return bad('s', 'seasonTooShort');
  if (order.s === 0 && order.P + order.D + order.Q > 0) return bad('s', 'seasonMissing');
  const differences = order.d + order.D;
  if (level === 'mean' && differences > 0) return bad('level', 'meanWithDifferencing');
  if (level === 'drift' && differences === 0) return bad('level', 'driftWithoutDifferencing');
  if (transform.kind === 'boxCox' && transform.lambda !== 'estimate' && !Number.isFinite(transform.lambda))
    return bad('transform', 'transform');
  const lags = [
    ['ar', order.p],
    ['ma', order.q],
    ['seasonalAr', order.P],
    ['seasonalMa', order.Q],
  ] as const;
  for (const [factor, most] of lags) {
    const outside = zeroLags[factor].some((lag) => !Number.isInteger(lag) || lag < 1 || lag > most);
    // The highest lag of a factor may not be held at zero: the order would not be what it says.
    if (outside || zeroLags[factor].includes(most)) return bad(`zeroLags.${factor}`, 'zeroLagOutOfRange');
  }
  const closedForm = estimator === 'yuleWalker' || estimator === 'burg' || estimator === 'leastSquares';
  const pureAr = order.q + order.Q + order.P === 0 && order.p > 0 && regressors.length === 0;
  if (closedForm && !pureAr) return { ok: false, failure: { code: 'estimatorNeedsPureAr', estimator } };
  for (const regressor of regressors) {
    const reason = troubleOf(regressor, readings);
    if (reason !== null) return bad(`regressors.${regressor.kind}`, reason);
  }
  return { ok: true, value: candidate };
}

function troubleOf(regressor: Regressor, readings: number): BadCandidateReason | null {
  if (regressor.kind === 'column') {
    if (!Number.isInteger(regressor.lag)) return 'notAWholeNumber';
    return regressor.lag < 0 ? 'negative' : null;
  }
  if (regressor.kind === 'harmonic') {
    if (!Number.isInteger(regressor.k) || regressor.k < 1) return 'notAWholeNumber';
    return regressor.period >= 2 && regressor.k <= regressor.period / 2 ? null : 'seasonTooShort';
  }
  if (!Number.isInteger(regressor.at)) return 'notAWholeNumber';
  return regressor.at < 0 || regressor.at >= readings ? 'eventOutside' : null;
}
