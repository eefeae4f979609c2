import type { Candidate, Parameters } from '../contract/candidate.ts';
import { checkCandidate } from '../model/checkCandidate.ts';
import type { Covariates } from '../series/regressionColumns.ts';
import { prepareLikelihood } from './prepareLikelihood.ts';

/**
 * The exact Gaussian ln L of a record at given parameters.
 *
 * Natural logarithm, all constants kept. With d + D > 0 it is that of the record with a flat prior on its d + sD starting
 * values: without gaps the likelihood of the differenced record, with gaps exact. A transform's Jacobian is included, summed over
 * the readings used. Method: see `prepareLikelihood`.
 *
 * @param values readings in the record's unit, gaps as NaN
 * @param candidate complete, as `candidateOf` leaves it; @param at one value for every parameter of the candidate
 * @param columns values of its covariates by id
 * @returns ln L; −Infinity where the AR part is not stationary. A λ that is to be estimated counts as 1 here.
 * @throws RangeError where parameters and candidate do not fit together, or the record cannot carry the candidate
 * @example AR(1) φ = .6, σ² = .5, mean 0, record 1, .5, −.3, .8, 1.2: −5.57376826593771
 */
export function exactLogLikelihood(
  values: Float64Array,
  candidate: Candidate,
  at: Parameters,
  columns?: Covariates,
): number {
  const checked = checkCandidate(candidate, values.length);
  if (!checked.ok) throw new RangeError(`The candidate is not valid: ${JSON.stringify(checked.failure)}`);
  const { p, q, P, Q } = candidate.order;
  const lengths = [at.ar.length, at.ma.length, at.seasonalAr.length, at.seasonalMa.length];
  if (lengths.join() !== [p, q, P, Q].join())
    throw new RangeError(
      `The candidate has ${[p, q, P, Q].join()} coefficients (φ, θ, Φ, Θ) but ${lengths.join()} were given.`,
    );
  if (!(at.innovationVariance > 0)) throw new RangeError('The innovation variance must be above 0.');
  const prepared = prepareLikelihood({ values, candidate, columns });
  if (!prepared.ok) throw new RangeError(`The record cannot carry the candidate: ${JSON.stringify(prepared.failure)}`);
  const given = (candidate.level === 'none' ? 0 : 1) + at.regression.length;
  if (given !== prepared.value.columnNames.length)
    throw new RangeError(
      `The candidate has ${prepared.value.columnNames.length} regression columns but ${given} were given.`,
    );
  return prepared.value.atParameters(at);
}
