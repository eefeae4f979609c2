import type { Objective } from './minimise.ts';

export interface LineSearchState {
  readonly at: Float64Array;
  readonly value: number;
  /** Directional derivative at the start, below 0. */
  readonly slope: number;
  readonly direction: Float64Array;
  /** First step tried, as a multiple of `direction`. */
  readonly step: number;
  /** Work space; holds the accepted point and its gradient on return. */
  readonly trial: { readonly at: Float64Array; readonly gradient: Float64Array };
}

export interface LineSearchEnd {
  readonly accepted: boolean;
  readonly step: number;
  readonly value: number;
  readonly evaluations: number;
}

/** Sufficient decrease and curvature constants of the Wolfe conditions, as usual for quasi-Newton methods. */
const SUFFICIENT = 1e-4;
const CURVATURE = 0.9;
/** Below this many units of rounding of the objective, decrease is judged by slopes alone. */
const ROUNDING = 16 * 2 ** -52;
const MAXIMUM_EVALUATIONS = 30;

/**
 * Finds a step that satisfies the strong Wolfe conditions along a descent direction.
 *
 * Method: bracketing by extrapolation, then safeguarded cubic interpolation (Nocedal & Wright 2006, algorithms 3.5 and
 * 3.6). Where the decrease is lost in rounding the approximate Wolfe conditions of Hager & Zhang 2005
 * (doi:10.1137/030601880, (4.1)) decide. Points where the objective is not finite shorten the bracket.
 *
 * @param objective value and gradient
 * @param state the point, its value and slope, the direction and the first step
 * @returns the step and value; `accepted` false where no step reduced the objective
 */
export function lineSearch(objective: Objective, state: LineSearchState): LineSearchEnd {
  const { at, value, slope, direction, trial } = state;
  const noise = ROUNDING * Math.abs(value);
  let low: Point = { step: 0, value, slope };
  let high: Point | null = null;
  let step = state.step;
  let evaluations = 0;

  const evaluate = (length: number): Point => {
    for (let i = 0; i < at.length; i++) trial.at[i] = at[i]! + length * direction[i]!;
    const newValue = objective(trial.at, trial.gradient);
    let newSlope = 0;
    for (let i = 0; i < at.length; i++) newSlope += trial.gradient[i]! * direction[i]!;
    evaluations++;
    const finite = Number.isFinite(newValue) && Number.isFinite(newSlope);
    return finite ? { step: length, value: newValue, slope: newSlope } : { step: length, value: Infinity, slope: NaN };
  };

  while (evaluations < MAXIMUM_EVALUATIONS) {
    const point = evaluate(step);
    const lostInRounding = point.value <= value + noise && point.slope <= (2 * SUFFICIENT - 1) * slope;
    const decreased = lostInRounding || point.value <= value + SUFFICIENT * step * slope;
    if (!decreased || (low.step > 0 && point.value > low.value + noise)) high = point;
    else if (Math.abs(point.slope) <= -CURVATURE * slope) {
      return { accepted: true, step, value: point.value, evaluations };
    } else {
      if (point.slope * (high === null ? 1 : high.step - low.step) >= 0) high = low;
      low = point;
    }
    step = high === null ? 3 * step : interpolate(low, high);
    if (high !== null && Math.abs(high.step - low.step) <= 1e-12 * Math.max(low.step, high.step)) break;
  }
  // No point met both conditions: the best one that at least reduces the objective will do.
  if (low.step > 0 && low.value < value) {
    evaluate(low.step);
    return { accepted: true, step: low.step, value: low.value, evaluations };
  }
  return { accepted: false, step: 0, value, evaluations };
}

interface Point {
  readonly step: number;
  readonly value: number;
  readonly slope: number;
}

/** Minimiser of the cubic through two points with slopes, kept inside the middle 80 % of the bracket. */
function interpolate(low: Point, high: Point): number {
  const width = high.step - low.step;
  if (!Number.isFinite(high.value)) return low.step + 0.25 * width;
  const d1 = low.slope + high.slope - (3 * (low.value - high.value)) / -width;
  const radicand = d1 * d1 - low.slope * high.slope;
  let fraction = 0.5;
  if (radicand >= 0) {
    const d2 = Math.sign(width) * Math.sqrt(radicand);
    fraction = 1 - (high.slope + d2 - d1) / (high.slope - low.slope + 2 * d2);
  }
  if (!(fraction > 0.1)) fraction = 0.1;
  if (fraction > 0.9) fraction = 0.9;
  return low.step + fraction * width;
}
