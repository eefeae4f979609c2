import type { Candidate } from '../../../workers/contract/candidate.ts';
import { prepareLikelihood } from '../../../workers/estimation/prepareLikelihood.ts';
import { isAdmissible } from '../../../workers/estimation/search/admissibility.ts';
import { climb, type Terrain } from '../../../workers/estimation/search/climb.ts';
import { SearchSpace } from '../../../workers/estimation/search/searchSpace.ts';
import { settleOnFace } from '../../../workers/estimation/search/settleOnFace.ts';
import { createRandom } from '../../../workers/numeric/random.ts';

const OPTIONS = { maximumIterations: 150, gain: 1e-8 };

/**
 * The highest admissible maximum that many climbs from random places find, half of them along a random face of the MA
 * set: no screening, no reasons, only patience. −Infinity where none converged.
 */
export function widestSearch(values: Float64Array, candidate: Candidate, climbs: number, seed: number): number {
  const prepared = prepareLikelihood({ values, candidate });
  if (!prepared.ok) throw new Error(JSON.stringify(prepared.failure));
  const likelihood = prepared.value;
  const space = new SearchSpace(candidate.order, candidate.zeroLags);
  const terrain: Terrain = {
    space,
    likelihood: (coefficients, gradient) => likelihood.concentratedWithGradient(coefficients, gradient),
    height: (coefficients) => likelihood.concentrated(coefficients).logLikelihood,
    readings: likelihood.readingsUsed,
    season: candidate.order.s,
  };
  const random = createRandom(seed);
  const faces = space.faces();
  let best = -Infinity;
  for (let i = 0; i < climbs; i++) {
    const x = Float64Array.from({ length: space.dimension }, () => 1.98 * (random.uniform() - 0.5));
    const held = new Int8Array(space.dimension);
    if (i % 2 === 1 && faces.length > 0) {
      const { coordinate, value } = faces[random.integer(faces.length)]!;
      held[coordinate] = value;
      x[coordinate] = value;
    }
    const end = settleOnFace(terrain, climb(terrain, x, held, OPTIONS), OPTIONS);
    if (end.status !== 'converged' || !space.place(end.x)) continue;
    if (isAdmissible(space.coefficients, candidate.order.s)) best = Math.max(best, end.logLikelihood);
  }
  return best;
}
