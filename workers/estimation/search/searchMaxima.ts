import type { Candidate, FitRequest, Parameters } from '../../contract/candidate.ts';
import { createRandom } from '../../numeric/random.ts';
import { oscillationStarts } from '../starts/oscillationStarts.ts';
import { startingPoints, withCancellingPair } from '../starts/startingPoints.ts';
import { isAdmissible } from './admissibility.ts';
import type { Terrain } from './climb.ts';
import { climbFromBest, exploreMaxima } from './exploreMaxima.ts';
import type { Exploration, Summit } from './survey.ts';
import { polish } from './polish.ts';

/** Maxima this far below the best in ln L are reported with it. */
const WITHIN = 2;

/**
 * Local maxima of ln L over the coefficients of a candidate, those within 2 of the best polished to rounding.
 *
 * @param terrain space and profile likelihood
 * @param centred the (differenced, transformed) record less its level, for starting values
 * @param request seed, effort and further starts
 * @returns maxima, highest first; of inadmissible ones above them only the highest
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
  if (request.effort === 'first') return withPolish(terrain, climbFromBest(terrain, own, embedded));
  const found = exploreMaxima(
    terrain,
    {
      reasoned: own,
      oscillating: oscillationStarts(space, candidate, centred),
      ridges: ridges(terrain, candidate, given),
      given: embedded,
    },
    createRandom(request.seed),
  );
  return withPolish(terrain, found);
}

function ridges({ space }: Terrain, candidate: Candidate, given: readonly Parameters[]): Float64Array[] {
  return given.flatMap((start) => withCancellingPair(space, candidate, start));
}

function withPolish(terrain: Terrain, found: Exploration): Exploration {
  const { space, season } = terrain;
  const highest = (summits: readonly Summit[]) =>
    summits.reduce(
      (most, { landing, admissible }) => (admissible ? Math.max(most, landing.logLikelihood) : most),
      -Infinity,
    );
  const before = highest(found.summits);
  let evaluations = found.evaluations;
  const polished = found.summits
    .filter(({ landing, admissible }) => admissible && landing.logLikelihood >= before - WITHIN)
    .map((summit) => {
      const landing = polish(terrain, summit.landing);
      evaluations += landing.evaluations - summit.landing.evaluations;
      // A climb that had not ended may still move far, even out of the admissible set: then it stays as it was.
      return space.place(landing.x) && isAdmissible(space.coefficients, season) ? { ...summit, landing } : summit;
    });
  const top = highest(polished);
  // Climbs towards a spurious pair end where they are given up, at no definite place: the highest stands for them.
  const excluded = found.summits.filter(({ landing, admissible }) => !admissible && landing.logLikelihood > top);
  const reached = excluded.reduce((sum, summit) => sum + summit.reached, 0);
  const within = polished.filter(({ landing }) => landing.logLikelihood >= top - WITHIN);
  const summits = [...excluded.slice(0, 1).map((summit) => ({ ...summit, reached })), ...within].sort(
    (one, other) => other.landing.logLikelihood - one.landing.logLikelihood,
  );
  return { ...found, summits, evaluations };
}
