import { minimise, type Minimum } from '../../numeric/minimise.ts';
import { isAdmissible } from './admissibility.ts';
import { scoringInverse } from './scoringInverse.ts';
import type { Coefficients, SearchSpace } from './searchSpace.ts';

/** ln L with everything but the coefficients profiled out; writes its gradient with respect to all coefficients. */
export type ProfileLikelihood = (coefficients: Coefficients, gradient: Float64Array) => number;

/** What is searched: the space, the likelihood on it, and how many readings it rests on. */
export interface Terrain {
  readonly space: SearchSpace;
  readonly likelihood: ProfileLikelihood;
  /** ln L alone, cheaper than with its gradient; not finite outside. */
  readonly height: (coefficients: Coefficients) => number;
  readonly readings: number;
  /** Season length, or 0. */
  readonly season: number;
}

/** Where a climb ended. `held[i]` is ±1 where coordinate i is held there (a face), 0 where it is free. */
export interface Landing {
  readonly x: Float64Array;
  readonly held: Int8Array;
  readonly logLikelihood: number;
  /** `abandoned`: the climb ran to the circle with an AR root, where no admissible maximum is, or was hopeless. */
  readonly status: Minimum['status'];
  /** Largest component of the gradient with respect to the free search coordinates. */
  readonly gradientNorm: number;
  /** Inverse Hessian of −ln L over the free search coordinates, as the quasi-Newton method left it. */
  readonly inverseHessian: Float64Array;
  readonly iterations: number;
  readonly evaluations: number;
  /** Given up far below the best: no maximum of interest. */
  readonly hopeless: boolean;
}

export interface ClimbOptions {
  readonly maximumIterations: number;
  /** Gain in ln L still predicted at which a climb is done. */
  readonly gain: number;
  /** The highest end so far: a climb that is still far below it after a few iterations is given up. */
  readonly best?: number;
  /** Keeps the climb inside the admissible set, whose edge then stops it. */
  readonly fenced?: boolean;
}

/** A start this near to the circle could not move: the transform is too flat there. */
const START_MARGIN = 5e-4;
/** Iterations after which a climb is given up if it runs along an AR root on the circle; how near that is, times n. */
const PATIENCE = 20;
const AR_CIRCLE = 0.02;
/**
 * From iteration EARLY on, a climb FAR_BELOW/(iteration − EARLY + 1)² below the best is given up: only maxima within 2 of
 * the best are of interest, and a quasi-Newton climb has most of its gain behind it by then.
 */
const EARLY = 3;
const FAR_BELOW = 400;
/** A climb that gains less than DULL_GAIN over DULL_STRETCH iterations walks along a ridge that has no end. */
const DULL_STRETCH = 8;
const DULL_GAIN = 1e-4;
/** A Fisher-transformed partial beyond this is on the circle to ten digits. */
const FARTHEST = 12;

/**
 * Climbs to a local maximum of ln L over the free coordinates, partial autocorrelations being searched as
 * u = artanh r (Fisher's transform, in which the likelihood is nearly quadratic with curvature near n).
 *
 * @param terrain space and likelihood
 * @param from coordinates of the start
 * @param held ±1 for coordinates held on a face, 0 elsewhere
 */
export function climb(terrain: Terrain, from: Float64Array, held: Int8Array, options: ClimbOptions): Landing {
  const free = freeCoordinates(held);
  const slope = climbSlope(terrain, held, options.fenced === true);
  const start = Float64Array.from(free, (i) => toSearch(terrain.space, i, from[i]!, START_MARGIN));
  let hopeless = false;
  let dull = false;
  const history: number[] = [];
  const end = minimise(slope.objective, start, {
    inverseHessian: firstInverse(terrain, free, slope.coordinates(start)) ?? 1 / terrain.readings,
    decrease: options.gain,
    maximumIterations: options.maximumIterations,
    longestStep: 1.5,
    abandon: (u, iterations, value) => {
      const late = iterations - EARLY + 1;
      hopeless = late > 0 && -value < (options.best ?? -Infinity) - FAR_BELOW / late ** 2;
      history.push(value);
      dull = history.length > DULL_STRETCH && history[iterations - 1 - DULL_STRETCH]! - value < DULL_GAIN;
      return hopeless || dull || (iterations >= PATIENCE && nearCircle(terrain, free, u));
    },
  });
  return {
    x: slope.coordinates(end.at),
    held,
    logLikelihood: -end.value,
    // On a ridge every point is as good as its neighbour; running to the circle is another matter.
    status: dull && !nearCircle(terrain, free, end.at) ? 'iterationLimit' : end.status,
    gradientNorm: end.gradientNorm,
    inverseHessian: end.inverseHessian,
    iterations: end.iterations,
    evaluations: end.evaluations,
    hopeless,
  };
}

function firstInverse({ space, readings, season }: Terrain, free: readonly number[], x: Float64Array) {
  if (!space.place(x)) return null;
  const slopes = free.map((i) => (space.isPartial(i) ? 1 - x[i]! * x[i]! : 1));
  return scoringInverse(space, free, slopes, readings, season);
}

/** Whether an AR partial is so near to ±1 that only a cancelling MA root can have drawn it there. */
function nearCircle({ space, readings }: Terrain, free: readonly number[], u: Float64Array): boolean {
  return free.some((i, k) => space.isAr(i) && 1 - Math.abs(Math.tanh(u[k]!)) < AR_CIRCLE / readings);
}

export function freeCoordinates(held: Int8Array): number[] {
  return Array.from({ length: held.length }, (_, i) => i).filter((i) => held[i] === 0);
}

/** −ln L and its gradient over the free search coordinates u, for `minimise`. */
export function climbSlope(terrain: Terrain, held: Int8Array, fenced = false) {
  const { space, likelihood, season } = terrain;
  const free = freeCoordinates(held);
  const partial = free.map((i) => space.isPartial(i));
  const x = Float64Array.from(held);
  const byCoefficient = new Float64Array(space.coefficients.all.length);
  const byCoordinate = new Float64Array(space.dimension);
  const settle = (u: Float64Array) => {
    for (let k = 0; k < free.length; k++) x[free[k]!] = partial[k] === true ? Math.tanh(u[k]!) : u[k]!;
  };
  return {
    objective: (u: Float64Array, gradient: Float64Array): number => {
      for (let k = 0; k < free.length; k++) if (partial[k] === true && Math.abs(u[k]!) > FARTHEST) return Infinity;
      settle(u);
      if (!space.place(x) || (fenced && !isAdmissible(space.coefficients, season))) return Infinity;
      const value = likelihood(space.coefficients, byCoefficient);
      if (!Number.isFinite(value)) return Infinity;
      space.pullBack(byCoefficient, byCoordinate);
      for (let k = 0; k < free.length; k++) {
        const i = free[k]!;
        gradient[k] = -byCoordinate[i]! * (partial[k] === true ? 1 - x[i]! * x[i]! : 1);
      }
      return -value;
    },
    coordinates: (u: Float64Array): Float64Array => {
      settle(u);
      return x.slice();
    },
  };
}

/** Search coordinate of coordinate i; partial autocorrelations nearer than `margin` to ±1 are drawn in so far. */
export function toSearch(space: SearchSpace, i: number, x: number, margin: number): number {
  return space.isPartial(i) ? Math.atanh(Math.max(margin - 1, Math.min(1 - margin, x))) : x;
}
