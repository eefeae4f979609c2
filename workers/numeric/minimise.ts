import { lineSearch } from './lineSearch.ts';

/** A function to be made small: writes its gradient and returns its value; anything not finite means "outside". */
export type Objective = (at: Float64Array, gradient: Float64Array) => number;

export interface MinimiseOptions {
  /** First guess of the inverse Hessian, k×k row-major; a positive number stands for that multiple of the identity. */
  readonly inverseHessian: Float64Array | number;
  /** Stop when the decrease still predicted, ½ g′B⁻¹g, is below this. In the objective's units. */
  readonly decrease: number;
  readonly maximumIterations: number;
  /** Longest step allowed in any one coordinate. */
  readonly longestStep: number;
  /** Asked after every iteration: true ends the search as `abandoned`. */
  readonly abandon?: (at: Float64Array, iterations: number, value: number) => boolean;
}

export interface Minimum {
  readonly at: Float64Array;
  readonly value: number;
  readonly gradient: Float64Array;
  /** Largest absolute component of the gradient. */
  readonly gradientNorm: number;
  readonly inverseHessian: Float64Array;
  readonly iterations: number;
  readonly evaluations: number;
  /** `stalled`: no step reduced the objective although one was predicted to. `startOutside`: not finite at the start. */
  readonly status: 'converged' | 'stalled' | 'iterationLimit' | 'startOutside' | 'abandoned';
}

/**
 * Minimises a smooth function by the BFGS quasi-Newton method with a strong Wolfe line search.
 *
 * Method: Nocedal & Wright, Numerical Optimization, 2nd ed. 2006, algorithm 6.1 with the update (6.17); the line search
 * is theirs of section 3.5. The inverse Hessian is carried, so a step costs O(k²) beside the evaluation.
 *
 * @param objective value and gradient; k arguments; may return ±Infinity or NaN outside its domain, where the line
 *   search turns back
 * @param start k values inside the domain; not changed
 * @param options see MinimiseOptions
 * @returns the lowest point met, with how the search ended. With k = 0 it is the start, converged.
 */
export function minimise(objective: Objective, start: Float64Array, options: MinimiseOptions): Minimum {
  const k = start.length;
  const at = start.slice();
  const gradient = new Float64Array(k);
  const inverse = startingInverse(options.inverseHessian, k);
  let value = objective(at, gradient);
  let evaluations = 1;
  let iterations = 0;
  let status: Minimum['status'] = Number.isFinite(value) ? 'iterationLimit' : 'startOutside';
  let fresh = true;
  const direction = new Float64Array(k);
  const trial = { at: new Float64Array(k), gradient: new Float64Array(k) };
  const gradientChange = new Float64Array(k);
  const product = new Float64Array(k);

  while (status === 'iterationLimit' && iterations < options.maximumIterations) {
    let slope = descend(inverse, gradient, direction);
    if (!(slope < 0)) {
      // Rounding has spoilt the inverse Hessian: start again from steepest descent.
      inverse.set(startingInverse(options.inverseHessian, k));
      slope = descend(inverse, gradient, direction);
    }
    if (-slope / 2 <= options.decrease || !(slope < 0)) {
      status = 'converged';
      break;
    }
    const step = Math.min(1, options.longestStep / largest(direction));
    const found = lineSearch(objective, { at, value, slope, direction, step, trial });
    evaluations += found.evaluations;
    if (!found.accepted) {
      if (fresh) {
        status = 'stalled';
        break;
      }
      inverse.set(startingInverse(options.inverseHessian, k));
      fresh = true;
      continue;
    }
    iterations++;
    for (let i = 0; i < k; i++) gradientChange[i] = trial.gradient[i]! - gradient[i]!;
    at.set(trial.at);
    gradient.set(trial.gradient);
    value = found.value;
    updateInverse(inverse, direction, found.step, gradientChange, product);
    fresh = false;
    if (options.abandon?.(at, iterations, value) === true) status = 'abandoned';
  }
  return {
    at,
    value,
    gradient,
    gradientNorm: largest(gradient),
    inverseHessian: inverse,
    iterations,
    evaluations,
    status,
  };
}

function startingInverse(given: Float64Array | number, k: number): Float64Array {
  if (typeof given !== 'number') return given.slice();
  const inverse = new Float64Array(k * k);
  for (let i = 0; i < k; i++) inverse[i * k + i] = given;
  return inverse;
}

/** direction = −B⁻¹g; returns the slope g′direction. */
function descend(inverse: Float64Array, gradient: Float64Array, direction: Float64Array): number {
  const k = gradient.length;
  let slope = 0;
  for (let i = 0; i < k; i++) {
    let sum = 0;
    for (let j = 0; j < k; j++) sum -= inverse[i * k + j]! * gradient[j]!;
    direction[i] = sum;
    slope += sum * gradient[i]!;
  }
  return slope;
}

function largest(values: Float64Array): number {
  let most = 0;
  for (const value of values) most = Math.max(most, Math.abs(value));
  return most;
}

/** Equation (6.17) of Nocedal & Wright, with the step s = step·direction; skipped where s′y is not safely positive. */
function updateInverse(
  inverse: Float64Array,
  direction: Float64Array,
  step: number,
  change: Float64Array,
  product: Float64Array,
): void {
  const k = direction.length;
  let curvature = 0;
  let lengthStep = 0;
  let lengthChange = 0;
  for (let i = 0; i < k; i++) {
    const s = step * direction[i]!;
    curvature += s * change[i]!;
    lengthStep += s * s;
    lengthChange += change[i]! * change[i]!;
  }
  if (!(curvature > 1e-10 * Math.sqrt(lengthStep * lengthChange))) return;
  let quadratic = 0;
  for (let i = 0; i < k; i++) {
    let sum = 0;
    for (let j = 0; j < k; j++) sum += inverse[i * k + j]! * change[j]!;
    product[i] = sum;
    quadratic += sum * change[i]!;
  }
  const outer = (1 + quadratic / curvature) / curvature;
  for (let i = 0; i < k; i++) {
    const si = step * direction[i]!;
    for (let j = 0; j < k; j++) {
      const sj = step * direction[j]!;
      inverse[i * k + j]! += outer * si * sj - (product[i]! * sj + si * product[j]!) / curvature;
    }
  }
}
