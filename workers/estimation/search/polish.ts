import { cholesky } from '../../numeric/cholesky.ts';
import { choleskySolve } from '../../numeric/choleskySolve.ts';
import { climbSlope, freeCoordinates, toSearch, type Landing, type Terrain } from './climb.ts';

const MAXIMUM_STEPS = 4;
/** Step of the differences in the search coordinates: the Hessian need only be good to a few digits. */
const STEP = 1e-4;
/** A step that promises less than this part of a unit in ln L moves no digit of an estimate that is printed. */
const NEGLIGIBLE = 1e-20;
const LONG = 1e-7;

/**
 * Newton steps from the end of a climb, until rounding: the quasi-Newton method ends where ln L cannot be told from
 * its maximum, which leaves half the digits of the estimates open.
 *
 * @returns the landing moved; unchanged where the Hessian is not positive definite or no step reduced the gradient
 */
export function polish(terrain: Terrain, landing: Landing): Landing {
  const free = freeCoordinates(landing.held);
  const k = free.length;
  if (k === 0) return landing;
  const { objective, coordinates } = climbSlope(terrain, landing.held);
  let u = Float64Array.from(free, (i) => toSearch(terrain.space, i, landing.x[i]!, 1e-15));
  let gradient: Float64Array = new Float64Array(k);
  let value = objective(u, gradient);
  let evaluations = 1;
  let best = { ...landing, x: coordinates(u), logLikelihood: -value, gradientNorm: largest(gradient) };
  const ahead = new Float64Array(k);
  const behind = new Float64Array(k);
  const curvature = new Float64Array(k * k);
  let stale = true;
  for (let step = 0; step < MAXIMUM_STEPS; step++) {
    if (stale) {
      for (let i = 0; i < k; i++) {
        const at = u.slice();
        at[i] = u[i]! + STEP;
        objective(at, ahead);
        at[i] = u[i]! - STEP;
        objective(at, behind);
        for (let j = 0; j < k; j++) curvature[j * k + i] = (ahead[j]! - behind[j]!) / (2 * STEP);
      }
      evaluations += 2 * k;
      for (let i = 0; i < k; i++) {
        for (let j = 0; j < i; j++) {
          const mean = (curvature[i * k + j]! + curvature[j * k + i]!) / 2;
          curvature[i * k + j] = mean;
          curvature[j * k + i] = mean;
        }
      }
    }
    const factor = curvature.slice();
    if (!cholesky(factor, k)) break;
    const move = gradient.slice();
    choleskySolve(factor, k, move);
    const promised = move.reduce((sum, m, i) => sum + m * gradient[i]!, 0) / 2;
    if (!(promised > NEGLIGIBLE)) break;
    // After a long step the Hessian has moved too; after a short one it is as good as at the maximum.
    stale = promised > LONG;
    const next = u.map((ui, i) => ui - move[i]!);
    const nextGradient = new Float64Array(k);
    const nextValue = objective(next, nextGradient);
    evaluations++;
    const noise = 1e-13 * Math.abs(value);
    if (!(nextValue <= value + noise) || !(largest(nextGradient) < largest(gradient))) break;
    u = next;
    gradient = nextGradient;
    value = nextValue;
    best = { ...best, x: coordinates(u), logLikelihood: -value, gradientNorm: largest(gradient), status: 'converged' };
  }
  return { ...best, evaluations: landing.evaluations + evaluations };
}

function largest(values: Float64Array): number {
  let most = 0;
  for (const value of values) most = Math.max(most, Math.abs(value));
  return most;
}
