import type { Candidate, Level } from '../contract/candidate.ts';
import type { Axis } from '../contract/series.ts';
import type { AdviceReason, ShapeAdvice, ShapeSpectrum, SpreadAgainstLevel } from '../contract/shape.ts';
import { candidateOf } from '../model/candidateOf.ts';
import { differencingPolynomial } from '../model/differencingPolynomial.ts';
import { differenceRecord } from '../series/differenceRecord.ts';
import { transformRecord } from '../series/transformRecord.ts';
import { adviseDifferencing } from './adviseDifferencing.ts';
import { adviseOrders } from './adviseOrders.ts';
import { adviseSeason } from './adviseSeason.ts';
import { adviseTransform } from './adviseTransform.ts';
import { boxCoxLambda } from './boxCoxLambda.ts';
import { differencingTable } from './differencingTable.ts';
import { meanError } from './meanError.ts';

/** Standard errors that the mean of the differences must be from 0 to be called a drift. */
const DRIFTS = 3;
const MOST_CANDIDATES = 4;

export interface AdvisedShape {
  readonly advice: ShapeAdvice;
  readonly lambda: SpreadAgainstLevel['lambda'];
}

/**
 * What to try first on a record, with reasons and how sure that is.
 *
 * Method: season, then differencing, then transform (looked at again on the transformed record where there is one), then orders: `adviseSeason`,
 * `adviseDifferencing`, `adviseTransform`, `adviseOrders`. First guesses for the fits to decide on; where the differencing is open, candidates
 * of both kinds are given.
 *
 * @param values readings of the window, gaps as NaN; @param axis its start that of the first of them
 * @param spectrum of these values without differencing; @param spread of the same
 * @returns at least one candidate, at most four
 */
export function shapeAdvice(
  values: Float64Array,
  axis: Axis,
  spectrum: ShapeSpectrum,
  spread: (season: number) => SpreadAgainstLevel,
): AdvisedShape {
  const season = adviseSeason(values, axis, spectrum);
  const { s, D } = season;
  const first = adviseDifferencing(values, D, s, differencingTable(values, s));
  // Beside a seasonal difference at least one ordinary one: a level that still wanders would be taken for skewness.
  const lambda = boxCoxLambda(values, { d: Math.max(first.d, D), D, s });
  const scale = adviseTransform({ ...spread(s), lambda });
  const transformed = transformRecord(values, scale.transform);
  const scaled = transformed.ok ? transformed.value.values : values;
  const steady =
    scale.transform.kind === 'none' ? first : adviseDifferencing(scaled, D, s, differencingTable(scaled, s));
  const { d } = steady;
  const differenced = differenceRecord(scaled, differencingPolynomial({ d, D, s }));
  const arma = adviseOrders(differenced, s, D);
  const level = levelOf(differenced, d + D);
  const { regressors } = season;
  const of = (differences: number, orders: (typeof arma.orders)[number], own: Level) =>
    candidateOf({
      order: { ...orders, d: differences, D, s: D + orders.P + orders.Q > 0 ? s : 0 },
      level: own,
      transform: scale.transform,
      regressors,
    });
  const candidates = arma.orders.map((orders) => of(d, orders, level.level));
  if (steady.sureness === 'open') {
    const otherwise = d === 0 ? 1 : d - 1;
    const other = differenceRecord(scaled, differencingPolynomial({ d: otherwise, D, s }));
    const orders = adviseOrders(other, s, D).orders[0]!;
    candidates.splice(1, 0, of(otherwise, orders, levelOf(other, otherwise + D).level));
  }
  return {
    lambda,
    advice: {
      order: { d, D, s },
      transform: scale.transform,
      sureness: {
        d: steady.sureness,
        season: season.sureness,
        transform: scale.sureness,
        orders: arma.sureness,
      },
      reasons: [...season.reasons, ...steady.reasons, ...scale.reasons, ...arma.reasons, ...level.reasons],
      candidates: distinct(candidates).slice(0, MOST_CANDIDATES),
    },
  };
}

/** A mean without differencing; with it a drift where the differences' mean stands clear of 0, else nothing. */
function levelOf(differenced: Float64Array, differences: number): { level: Level; reasons: readonly AdviceReason[] } {
  if (differences === 0) return { level: 'mean', reasons: [] };
  const { mean, error } = meanError(differenced);
  if (!(Math.abs(mean) > DRIFTS * error)) return { level: 'none', reasons: [] };
  return { level: 'drift', reasons: [{ about: 'level', code: 'drift', numbers: { mean, error } }] };
}

function distinct(candidates: readonly Candidate[]): Candidate[] {
  const seen = new Set<string>();
  return candidates.filter((candidate) => {
    const key = JSON.stringify(candidate);
    if (seen.has(key)) return false;
    seen.add(key);
    return true;
  });
}
