import type { Square } from '../contract/result.ts';

/** Answer of a linear least-squares problem with k columns. */
export interface LeastSquares {
  /** One a column; 0 for a dependent one. */
  readonly coefficients: Float64Array;
  readonly residualSumOfSquares: number;
  readonly rank: number;
  /** Columns, counted from 0, that are combinations of the ones before them; they were left out. */
  readonly dependent: readonly number[];
  /** (XᵀX)⁻¹ of the columns used; NaN in the rows and columns of dependent ones. */
  readonly inverse: Square;
}

/**
 * Linear least squares min |y − Xb|².
 *
 * Method: Householder triangularisation in the order of the columns (Golub & Van Loan, Matrix Computations, 4th ed., §5.2–5.3). A column of which
 * less than `tolerance` of its length is left after the ones before it is dependent: the columns keep their order, so that it
 * is always the later one that is named.
 *
 * @param columns k arrays of m numbers each; @param right y, m numbers
 * @param tolerance relative; max(m, k)·4ε when left out: what rounding alone leaves of a dependent column
 * @returns NaN coefficients where an input is NaN
 * @throws RangeError where a column's length differs from that of y
 * @example columns (1,1,1), (0,1,2) and y = (1,3,5): coefficients 1 and 2, residual 0
 */
export function leastSquares(
  columns: readonly ArrayLike<number>[],
  right: ArrayLike<number>,
  tolerance = Math.max(right.length, columns.length) * 4 * Number.EPSILON,
): LeastSquares {
  const m = right.length;
  const k = columns.length;
  const wrong = columns.findIndex((column) => column.length !== m);
  if (wrong >= 0) throw new RangeError(`Column ${wrong} has ${columns[wrong]!.length} values where ${m} are needed.`);
  const work = columns.map((column) => Float64Array.from(column));
  const y = Float64Array.from(right);
  const used: number[] = [];
  const dependent: number[] = [];
  for (let j = 0; j < k; j++) {
    const column = work[j]!;
    const row = used.length;
    const whole = norm(column, 0);
    const rest = row < m ? norm(column, row) : 0;
    if (rest <= tolerance * whole) {
      dependent.push(j);
      continue;
    }
    const pivot = column[row]! > 0 ? -rest : rest;
    const reflector = column.subarray(row).map((value) => value / rest);
    const square = 2 * (1 + Math.abs(reflector[0]!));
    reflector[0]! -= Math.sign(pivot);
    for (let other = j + 1; other < k; other++) reflect(work[other]!, reflector, square, row);
    reflect(y, reflector, square, row);
    column.fill(0, row);
    column[row] = pivot;
    used.push(j);
  }
  const rank = used.length;
  const triangle = (i: number, j: number) => work[used[j]!]![i]!;
  const coefficients = new Float64Array(k);
  for (let i = rank - 1; i >= 0; i--) {
    let sum = y[i]!;
    for (let j = i + 1; j < rank; j++) sum -= triangle(i, j) * coefficients[used[j]!]!;
    coefficients[used[i]!] = sum / triangle(i, i);
  }
  return {
    coefficients,
    residualSumOfSquares: norm(y, rank) ** 2,
    rank,
    dependent,
    inverse: crossInverse(triangle, used, k),
  };
}

/** (I − 2vvᵀ/vᵀv) x from row on, `square` being vᵀv. */
function reflect(x: Float64Array, v: Float64Array, square: number, row: number): void {
  let dot = 0;
  for (let i = 0; i < v.length; i++) dot += v[i]! * x[row + i]!;
  const factor = (2 * dot) / square;
  for (let i = 0; i < v.length; i++) x[row + i]! -= factor * v[i]!;
}

/** Euclidean length from an index on, scaled so that no square overflows. */
function norm(x: Float64Array, from: number): number {
  let most = 0;
  for (let i = from; i < x.length; i++) most = Math.max(most, Math.abs(x[i]!));
  if (!(most > 0)) return most;
  let sum = 0;
  for (let i = from; i < x.length; i++) sum += (x[i]! / most) ** 2;
  return most * Math.sqrt(sum);
}

/** R⁻¹R⁻ᵀ spread over the places of the columns used. */
function crossInverse(triangle: (i: number, j: number) => number, used: readonly number[], k: number): Square {
  const rank = used.length;
  const inverse = new Float64Array(rank * rank);
  for (let j = 0; j < rank; j++) {
    for (let i = j; i >= 0; i--) {
      let sum = i === j ? 1 : 0;
      for (let l = i + 1; l <= j; l++) sum -= triangle(i, l) * inverse[l * rank + j]!;
      inverse[i * rank + j] = sum / triangle(i, i);
    }
  }
  const values = new Float64Array(k * k).fill(NaN);
  for (let i = 0; i < rank; i++) {
    for (let j = 0; j < rank; j++) {
      let sum = 0;
      for (let l = Math.max(i, j); l < rank; l++) sum += inverse[i * rank + l]! * inverse[j * rank + l]!;
      values[used[i]! * k + used[j]!] = sum;
    }
  }
  return { n: k, values };
}
