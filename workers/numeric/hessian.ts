export interface HessianEstimate {
  /** Symmetrised, k×k row-major. */
  readonly values: Float64Array;
  /** Largest estimated error of an element, relative to √(h_ii h_jj). Infinity where a diagonal element is 0. */
  readonly error: number;
  readonly evaluations: number;
}

/** Levels of halving in the extrapolation table: errors of order h², h⁴, h⁶ are removed. */
const LEVELS = 4;
/** Estimated error, relative to the column, at which further halving is not worth an evaluation; the true one is smaller. */
const ENOUGH = 1e-6;

/**
 * Hessian of a function (more generally the Jacobian of a vector field that is a gradient) from its gradients by
 * central differences with Richardson extrapolation; the step is halved until the estimated error stops falling.
 *
 * Method: Ridders 1982, Advances in Engineering Software 4(2) 75–76 (doi:10.1016/S0141-1195(82)80057-0): each column
 * of the table removes one more even power of the step, the entry with the smallest difference from its neighbours is
 * kept. The two triangles are found independently, and half their difference counts as error too.
 *
 * @param gradientOf writes the k components of the gradient at a point; not finite outside the domain
 * @param at k values
 * @param steps k largest steps, > 0; at ± step must be inside the domain
 * @returns the symmetrised matrix with its error; NaN elements where the gradient was not finite
 */
export function hessian(
  gradientOf: (at: Float64Array, gradient: Float64Array) => void,
  at: Float64Array,
  steps: ArrayLike<number>,
): HessianEstimate {
  const k = at.length;
  const values = new Float64Array(k * k);
  const errors = new Float64Array(k * k);
  const point = at.slice();
  const forward = new Float64Array(k);
  const backward = new Float64Array(k);
  let evaluations = 0;
  for (let column = 0; column < k; column++) {
    const table: Float64Array[][] = [];
    let bestWorst = Infinity;
    for (let level = 0; level < LEVELS; level++) {
      const step = steps[column]! / 2 ** level;
      const ahead = at[column]! + step;
      const behind = at[column]! - step;
      point[column] = ahead;
      gradientOf(point, forward);
      point[column] = behind;
      gradientOf(point, backward);
      point[column] = at[column]!;
      evaluations += 2;
      const row = [Float64Array.from(forward, (value, i) => (value - backward[i]!) / (ahead - behind))];
      for (let order = 1; order <= level; order++) {
        const factor = 4 ** order;
        const coarse = table[level - 1]![order - 1]!;
        row.push(row[order - 1]!.map((fine, i) => (factor * fine - coarse[i]!) / (factor - 1)));
      }
      table.push(row);
      const worst = keepBest(table, level, column, values, errors);
      if (worst <= ENOUGH || worst > 2 * bestWorst) break;
      bestWorst = Math.min(bestWorst, worst);
    }
  }
  return { values, error: symmetrise(values, errors, k), evaluations };
}

/** Stores the extrapolated column if it beats the one kept; returns its error relative to its largest element. */
function keepBest(
  table: readonly Float64Array[][],
  level: number,
  column: number,
  values: Float64Array,
  errors: Float64Array,
): number {
  const k = table[0]![0]!.length;
  if (level === 0) {
    table[0]![0]!.forEach((value, i) => {
      values[i * k + column] = value;
      errors[i * k + column] = Infinity;
    });
    return Infinity;
  }
  let worst = 0;
  let size = 0;
  for (let i = 0; i < k; i++) {
    let best = errors[i * k + column]!;
    for (let order = 1; order <= level; order++) {
      const entry = table[level]![order]![i]!;
      const error = Math.max(
        Math.abs(entry - table[level]![order - 1]![i]!),
        Math.abs(entry - table[level - 1]![order - 1]![i]!),
      );
      if (error < best) {
        best = error;
        values[i * k + column] = entry;
      }
    }
    errors[i * k + column] = best;
    worst = Math.max(worst, best);
    size = Math.max(size, Math.abs(values[i * k + column]!));
  }
  return worst / size;
}

function symmetrise(values: Float64Array, errors: Float64Array, k: number): number {
  let worst = 0;
  const diagonal = Float64Array.from({ length: k }, (_, i) => Math.sqrt(Math.abs(values[i * k + i]!)));
  for (let i = 0; i < k; i++) {
    for (let j = 0; j <= i; j++) {
      const one = values[i * k + j]!;
      const other = values[j * k + i]!;
      const mean = (one + other) / 2;
      const error = Math.max(errors[i * k + j]!, errors[j * k + i]!, Math.abs(one - other) / 2);
      const relative = error / (diagonal[i]! * diagonal[j]!);
      worst = Math.max(worst, Number.isNaN(relative) ? Infinity : relative);
      values[i * k + j] = mean;
      values[j * k + i] = mean;
    }
  }
  return worst;
}
