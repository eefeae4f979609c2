import {
  climb,
  freeCoordinates,
  climbSlope,
  toSearch,
  type ClimbOptions,
  type Landing,
  type Terrain,
} from './climb.ts';

/** Interior and face count as equally high within this much of ln L: an end so near the face is the face. */
const LEVEL = 1e-8;

/**
 * Puts a climb that ran towards the unit circle onto it: where a free MA partial ended within about 2/n of ±1 (the
 * scale on which the likelihood turns flat there), the climb is repeated with it held at ±1, and the higher end kept.
 */
export function settleOnFace(terrain: Terrain, landing: Landing, options: ClimbOptions): Landing {
  let best = landing;
  for (;;) {
    const near = freeCoordinates(best.held)
      .filter((i) => terrain.space.mayReachCircle(i) && 1 - Math.abs(best.x[i]!) < reach(terrain, i, 2))
      .sort((i, j) => Math.abs(best.x[j]!) - Math.abs(best.x[i]!));
    const onFace = near
      .map((i) => {
        const held = best.held.slice();
        held[i] = best.x[i]! > 0 ? 1 : -1;
        const face = climb(terrain, best.x, held, options);
        return {
          ...face,
          evaluations: face.evaluations + best.evaluations,
          iterations: face.iterations + best.iterations,
        };
      })
      .find((face) => face.logLikelihood >= best.logLikelihood - LEVEL);
    if (onFace === undefined) return best;
    best = onFace;
  }
}

/**
 * Whether an end on faces is a maximum of the whole space. The slope across a face of the MA set is 0 wherever the
 * slopes along it are (a root and its reciprocal give the same likelihood), so the second difference decides: each
 * held partial is moved in by 0.05/n, the others following by one quasi-Newton step.
 */
export function isMaximumAcross(terrain: Terrain, landing: Landing): boolean {
  const heldAt = Array.from(landing.held, (_, i) => i).filter((i) => landing.held[i] !== 0);
  return heldAt.every((i) => {
    const inside = landing.x.slice();
    inside[i] = landing.held[i]! * (1 - reach(terrain, i, 0.05));
    return heightBeside(terrain, inside, i, landing) < landing.logLikelihood;
  });
}

/** ln L with coordinate i just off its face, plus the gain the other free coordinates still promise there. */
function heightBeside(terrain: Terrain, inside: Float64Array, i: number, landing: Landing): number {
  const others = freeCoordinates(landing.held);
  const held = landing.held.slice();
  held[i] = 0;
  const { objective } = climbSlope(terrain, held);
  const free = freeCoordinates(held);
  const u = Float64Array.from(free, (j) => toSearch(terrain.space, j, inside[j]!, 1e-15));
  const gradient = new Float64Array(free.length);
  const value = -objective(u, gradient);
  const slopes = others.map((j) => gradient[free.indexOf(j)]!);
  const size = others.length;
  let gain = 0;
  for (let a = 0; a < size; a++) {
    for (let b = 0; b < size; b++) gain += slopes[a]! * landing.inverseHessian[a * size + b]! * slopes[b]!;
  }
  return value + gain / 2;
}

function reach({ readings, season, space }: Terrain, i: number, scale: number): number {
  return Math.min(0.02, (scale * (space.isSeasonal(i) ? season : 1)) / readings);
}
