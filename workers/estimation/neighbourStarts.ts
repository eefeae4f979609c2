import type { Candidate, Parameters, Regressor } from '../contract/candidate.ts';
import type { Fit } from '../contract/fit.ts';

/** More starts than this from smaller fits add work and no maxima. */
const MOST = 4;

/**
 * Starts for a candidate from fits already made of candidates nested in it. Given to a search, they make sure that the
 * larger candidate never ends with a lower ln L than the smaller: a nested model is a point of the larger one's space.
 *
 * @param fits fits of the same record and window; others are passed over
 * @returns parameters in the candidate's own lengths, added coefficients 0, highest ln L first; at most four
 */
export function neighbourStarts(candidate: Candidate, fits: readonly Fit[]): Parameters[] {
  return fits
    .filter((fit) => isNested(fit.candidate, candidate))
    .sort((one, other) => other.logLikelihood - one.logLikelihood)
    .slice(0, MOST)
    .map(({ parameters }) => embed(parameters, candidate));
}

/**
 * Whether every model of the smaller candidate is one of the larger: same differencing, transform and estimator, no
 * higher order, and nothing free in the smaller that the larger holds at zero or leaves out.
 */
export function isNested(smaller: Candidate, larger: Candidate): boolean {
  const { order: low } = smaller;
  const { order: high } = larger;
  const sameSeason = low.s === high.s || (low.P + low.D + low.Q === 0 && high.D === 0);
  const sameRecord =
    low.d === high.d &&
    low.D === high.D &&
    sameSeason &&
    JSON.stringify(smaller.transform) === JSON.stringify(larger.transform) &&
    smaller.estimator === larger.estimator;
  const factors = [
    ['ar', low.p, high.p],
    ['ma', low.q, high.q],
    ['seasonalAr', low.P, high.P],
    ['seasonalMa', low.Q, high.Q],
  ] as const;
  const ordersFit = factors.every(
    ([factor, count, most]) =>
      count <= most && larger.zeroLags[factor].every((lag) => lag > count || smaller.zeroLags[factor].includes(lag)),
  );
  const levelFits = smaller.level === 'none' || smaller.level === larger.level;
  const regressors = new Set(larger.regressors.map(keyOf));
  return (
    sameRecord && ordersFit && levelFits && smaller.regressors.every((regressor) => regressors.has(keyOf(regressor)))
  );
}

function embed(parameters: Parameters, candidate: Candidate): Parameters {
  const { p, q, P, Q } = candidate.order;
  const padded = (values: readonly number[], length: number) => Array.from({ length }, (_, i) => values[i] ?? 0);
  return {
    ...parameters,
    ar: padded(parameters.ar, p),
    ma: padded(parameters.ma, q),
    seasonalAr: padded(parameters.seasonalAr, P),
    seasonalMa: padded(parameters.seasonalMa, Q),
    // Level and regression are profiled out: a search needs no start for them.
    regression: [],
  };
}

function keyOf(regressor: Regressor): string {
  return JSON.stringify(Object.entries(regressor).sort(([one], [other]) => (one < other ? -1 : 1)));
}
