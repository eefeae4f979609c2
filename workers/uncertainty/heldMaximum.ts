import type { Candidate } from '../contract/candidate.ts';
import type { PreparedLikelihood } from '../estimation/prepareLikelihood.ts';
import { cholesky } from '../numeric/cholesky.ts';
import { choleskySolve } from '../numeric/choleskySolve.ts';
import { minimise } from '../numeric/minimise.ts';
import { heldSpace, type Coefficients, type Held } from './heldSpace.ts';

/** What is held: nothing, a coefficient, or one of level and regression (by its column) at a value. */
export type Hypothesis =
  | { readonly kind: 'free' }
  | ({ readonly kind: 'coefficient' } & Held)
  | { readonly kind: 'column'; readonly column: number; readonly value: number };

export interface HeldMaximum {
  readonly logLikelihood: number;
  /** Null where no point of the region satisfies the hypothesis. */
  readonly coefficients: Coefficients | null;
}

/** Step of the central differences, in radians or units of a coefficient. */
const STEP = 1e-4;
/** Gain in ln L still predicted at which a climb ends: far below what a likelihood ratio is read to. */
const GAIN = 1e-5;

/**
 * The highest ln L under a hypothesis, climbing from given coefficients.
 *
 * Method: BFGS over the free coordinates of `heldSpace`, gradient by central differences. A held level or regression coefficient
 * costs no search: holding β_j at v multiplies the residual sum of squares by 1 + t²/n, with t its distance from the estimate in standard
 * errors for known coefficients.
 *
 * @param starts coefficients to climb from; the best end counts
 */
export function heldMaximum(
  likelihood: PreparedLikelihood,
  candidate: Candidate,
  hypothesis: Hypothesis,
  starts: readonly Coefficients[],
): HeldMaximum {
  const { order, zeroLags } = candidate;
  const space = heldSpace(order, zeroLags, hypothesis.kind === 'coefficient' ? hypothesis : null);
  const n = likelihood.readingsUsed;
  const height = (x: Float64Array): number => {
    const at = space.place(x);
    if (at === null) return -Infinity;
    const found = likelihood.concentrated(at);
    if (hypothesis.kind !== 'column') return found.logLikelihood;
    const square = columnDistance(found.beta, found.betaInformation, hypothesis);
    return found.logLikelihood - (n / 2) * Math.log1p(square / n);
  };
  const objective = (x: Float64Array, gradient: Float64Array): number => {
    const value = height(x);
    if (!Number.isFinite(value)) return Infinity;
    const near = x.slice();
    for (let i = 0; i < x.length; i++) {
      near[i] = x[i]! + STEP;
      const ahead = height(near);
      near[i] = x[i]! - STEP;
      const behind = height(near);
      near[i] = x[i]!;
      // Beside the edge only one side exists.
      gradient[i] = Number.isFinite(ahead)
        ? Number.isFinite(behind)
          ? (behind - ahead) / (2 * STEP)
          : (value - ahead) / STEP
        : (behind - value) / STEP;
    }
    return -value;
  };
  let best: HeldMaximum = { logLikelihood: -Infinity, coefficients: null };
  for (const start of starts) {
    const from = space.locate(start);
    if (from === null) continue;
    const end = minimise(objective, from, {
      inverseHessian: 1 / n,
      decrease: GAIN,
      maximumIterations: 80,
      longestStep: 0.5,
    });
    if (-end.value > best.logLikelihood) best = { logLikelihood: -end.value, coefficients: space.place(end.at) };
  }
  return best;
}

/** (β_j − v)² over the variance of β̂_j for known coefficients. */
function columnDistance(
  beta: Float64Array,
  information: Float64Array,
  { column, value }: { readonly column: number; readonly value: number },
): number {
  const k = beta.length;
  const factor = information.slice();
  if (!cholesky(factor, k)) return Infinity;
  const variance = new Float64Array(k);
  variance[column] = 1;
  choleskySolve(factor, k, variance);
  return (beta[column]! - value) ** 2 / variance[column];
}
