import { cholesky } from '../../numeric/cholesky.ts';
import { choleskySolve } from '../../numeric/choleskySolve.ts';
import { asymptoticInformation } from '../asymptoticInformation.ts';
import type { SearchSpace } from './searchSpace.ts';

/** Terms of the impulse responses: enough for a first guess, and cheap. */
const TERMS = 200;
/** Part of the diagonal added: keeps a nearly singular information (roots about to cancel) from throwing the first step far. */
const RIDGE = 0.1;

/**
 * First guess of the inverse Hessian of −ln L in the search coordinates: the inverse of n times the asymptotic
 * information at the start (the scoring method's matrix), with a ridge.
 *
 * @param space its coefficients and Jacobian are those of the start (`place` has been called there)
 * @param free coordinates searched; @param slopes ∂coordinate/∂u of each
 * @returns free.length squared values, or null where the information is of no use
 */
export function scoringInverse(
  space: SearchSpace,
  free: readonly number[],
  slopes: readonly number[],
  readings: number,
  season: number,
): Float64Array | null {
  const rows = space.estimated();
  const k = rows.length;
  const f = free.length;
  const byCoefficient = asymptoticInformation(
    space.coefficients,
    Math.max(1, season),
    rows,
    Math.min(readings, TERMS + 2 * season),
  );
  // jacobian[j·f + m] = ∂c_j/∂u_m, one coordinate at a time through the pull-back of unit gradients.
  const jacobian = new Float64Array(k * f);
  const unit = new Float64Array(space.coefficients.all.length);
  const pulled = new Float64Array(space.dimension);
  rows.forEach((row, j) => {
    unit[row] = 1;
    space.pullBack(unit, pulled);
    unit[row] = 0;
    free.forEach((i, m) => (jacobian[j * f + m] = pulled[i]! * slopes[m]!));
  });
  const half = new Float64Array(k * f);
  for (let a = 0; a < k; a++) {
    for (let m = 0; m < f; m++) {
      let sum = 0;
      for (let b = 0; b < k; b++) sum += byCoefficient[a * k + b]! * jacobian[b * f + m]!;
      half[a * f + m] = sum;
    }
  }
  const matrix = new Float64Array(f * f);
  for (let one = 0; one < f; one++) {
    for (let other = 0; other < f; other++) {
      let sum = 0;
      for (let a = 0; a < k; a++) sum += jacobian[a * f + one]! * half[a * f + other]!;
      matrix[one * f + other] = readings * sum;
    }
    matrix[one * f + one] = matrix[one * f + one]! * (1 + RIDGE) + 1e-3 * readings;
  }
  if (!cholesky(matrix, f)) return null;
  const inverse = new Float64Array(f * f);
  const column = new Float64Array(f);
  for (let i = 0; i < f; i++) {
    column.fill(0);
    column[i] = 1;
    choleskySolve(matrix, f, column);
    for (let j = 0; j < f; j++) inverse[j * f + i] = column[j]!;
  }
  return inverse;
}
