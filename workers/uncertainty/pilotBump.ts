import { cholesky } from '../numeric/cholesky.ts';
import { choleskySolve } from '../numeric/choleskySolve.ts';
import { bumpOf, type Bump } from './bump.ts';

/** The fall of ln density over a step at which curvature is measured: as far as the bump is to reach, not at a point. */
const FALL = 0.6;
/** Widest step tried, in radians (or units of a coefficient). */
const WIDEST = 1.2;

/**
 * A first bump about a maximum of a density, as wide as the density is there.
 *
 * Method: in each coordinate the step over which ln density falls by about 0.6 is found by doubling and halving; second differences over
 * these steps give the scale matrix. They see the shape of a maximum that is flatter than a parabola (an MA root on the circle) or lies
 * beside an edge, where a Hessian at the point does not. Where they are not those of a maximum, the steps alone give it.
 *
 * @param logDensity may be −Infinity; @param at a maximum, or near one
 */
export function pilotBump(logDensity: (at: Float64Array) => number, at: Float64Array): Bump {
  const k = at.length;
  const top = logDensity(at);
  const near = (changes: readonly (readonly [number, number])[]) => {
    const place = at.slice();
    for (const [i, change] of changes) place[i]! += change;
    return Math.min(top + 5, Math.max(top - 50, logDensity(place)));
  };
  const fall = (i: number, step: number) => top - (near([[i, step]]) + near([[i, -step]])) / 2;
  const steps = Array.from({ length: k }, (_, i) => stepFor((step) => fall(i, step)));
  const curvature = new Float64Array(k * k);
  for (let i = 0; i < k; i++) {
    const own = steps[i]!;
    curvature[i * k + i] = Math.max(0.2, 2 * fall(i, own)) / own ** 2;
    for (let j = 0; j < i; j++) {
      const other = steps[j]!;
      // Half steps, so that the corners do not leave what the axes have measured.
      const cross = (a: 1 | -1, b: 1 | -1) =>
        near([
          [i, (a * own) / 2],
          [j, (b * other) / 2],
        ]);
      const mixed = (cross(1, 1) - cross(1, -1) - cross(-1, 1) + cross(-1, -1)) / (own * other);
      curvature[i * k + j] = curvature[j * k + i] = -mixed;
    }
  }
  const joint = inverse(curvature, k);
  const alone = Float64Array.from({ length: k * k }, (_, p) => (Math.floor(p / k) === p % k ? steps[p % k]! ** 2 : 0));
  return (joint && bumpOf(at, joint)) ?? bumpOf(at, alone)!;
}

function stepFor(fall: (step: number) => number): number {
  let step = 0.1;
  for (let attempt = 0; attempt < 40; attempt++) {
    const now = fall(step);
    if (now > 2 * FALL) step /= now > 20 * FALL ? 4 : 1.6;
    else if (now < FALL / 2 && step < WIDEST) step = Math.min(WIDEST, step * (now < FALL / 20 ? 3 : 1.5));
    else break;
  }
  return step;
}

function inverse(matrix: Float64Array, k: number): Float64Array | null {
  const factor = matrix.slice();
  if (!cholesky(factor, k)) return null;
  for (let i = 0; i < k; i++) if (factor[i * k + i]! ** 2 < 0.02 * matrix[i * k + i]!) return null;
  const result = new Float64Array(k * k);
  for (let i = 0; i < k; i++) {
    const column = new Float64Array(k);
    column[i] = 1;
    choleskySolve(factor, k, column);
    for (let j = 0; j < k; j++) result[j * k + i] = column[j]!;
  }
  return result;
}
