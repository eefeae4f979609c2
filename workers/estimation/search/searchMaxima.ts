import type { Candidate, FitRequest, Parameters } from '../../contract/candidate.ts';
import { createRandom } from '../../numeric/random.ts';
import { startingPoints, withCancellingPair } from '../starts/startingPoints.ts';
import type { Terrain } from './climb.ts';
import { climbFromBest, exploreMaxima, type Exploration } from './exploreMaxima.ts';
import { polish } from './polish.ts';

/** Maxima this far below the best in ln L are reported with it. */
const WITHIN = 2;

/**
 * Local maxima of ln L over the coefficients of a candidate, those within 2 of the best polished to rounding.
 *
 * @param terrain space and profile likelihood
 * @param centred the (differenced, transformed) record less its level, for starting values
 * @param request seed, effort and further starts
 * @returns maxima, highest first; of the inadmissible ones only those above the best admissible one
 */
export function searchMaxima(
  terrain: Terrain,
  candidate: Candidate,
  centred: Float64Array,
  request: Pick<FitRequest, 'seed' | 'effort' | 'starts'>,
): Exploration {
  const { space } = terrain;
  const own = startingPoints(space, candidate, centred);
  const given = request.starts ?? [];
  const embedded = given.map((start) => space.locate(start));
  const found =
    request.effort === 'first'
      ? climbFromBest(terrain, [...own, ...embedded])
      : exploreMaxima(terrain, [...own, ...ridges(terrain, candidate, given)], embedded, createRandom(request.seed));
  return withPolish(terrain, found);
}

function ridges({ space }: Terrain, candidate: Candidate, given: readonly Parameters[]): Float64Array[] {
  return given.flatMap((start) => withCancellingPair(space, candidate, start));
}

function withPolish(terrain: Terrain, found: Exploration): Exploration {
  const best = found.summits.find(({ admissible }) => admissible) ?? found.summits[0];
  if (best === undefined) return found;
  const top = best.landing.logLikelihood;
  let evaluations = found.evaluations;
  const summits = found.summits
    .filter(({ landing, admissible }) => landing.logLikelihood >= (admissible ? top - WITHIN : top))
    .map((summit) => {
      if (!summit.admissible) return summit;
      const landing = polish(terrain, summit.landing);
      evaluations += landing.evaluations - summit.landing.evaluations;
      return { ...summit, landing };
    })
    .sort((one, other) => other.landing.logLikelihood - one.landing.logLikelihood);
  return { ...found, summits, evaluations };
}
