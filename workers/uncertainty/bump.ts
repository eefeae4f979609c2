import { cholesky } from '../numeric/cholesky.ts';
import { logGamma } from '../distributions/logGamma.ts';

/** A multivariate Student t law with 4 degrees of freedom: where it is and how wide, by the Cholesky factor of its scale matrix. */
export interface Bump {
  readonly at: Float64Array;
  /** Lower triangular, row-major. */
  readonly factor: Float64Array;
  /** ln density at its centre. */
  readonly peak: number;
}

/** Heavy enough for the tails of a likelihood near the edges of its region. */
const DEGREES = 4;

/** A bump of a given scale matrix; null where that is not positive definite. */
export function bumpOf(at: Float64Array, scale: Float64Array): Bump | null {
  const k = at.length;
  const factor = scale.slice();
  if (!cholesky(factor, k)) return null;
  for (let i = 0; i < k; i++) for (let j = i + 1; j < k; j++) factor[i * k + j] = 0;
  let logDeterminant = 0;
  for (let i = 0; i < k; i++) logDeterminant += Math.log(factor[i * k + i]!);
  if (!Number.isFinite(logDeterminant)) return null;
  const constant = logGamma((DEGREES + k) / 2) - logGamma(DEGREES / 2) - (k / 2) * Math.log(DEGREES * Math.PI);
  return { at: at.slice(), factor, peak: constant - logDeterminant };
}

/** ln density of a bump. */
export function bumpLogDensity({ at, factor, peak }: Bump, x: Float64Array): number {
  const k = at.length;
  let squares = 0;
  const solved = new Float64Array(k);
  for (let i = 0; i < k; i++) {
    let sum = x[i]! - at[i]!;
    for (let j = 0; j < i; j++) sum -= factor[i * k + j]! * solved[j]!;
    solved[i] = sum / factor[i * k + i]!;
    squares += solved[i]! ** 2;
  }
  return peak - ((DEGREES + k) / 2) * Math.log1p(squares / DEGREES);
}

/**
 * A draw from a bump: k standard normals over the root of a chi-square with 4 degrees of freedom, which is −2 ln of two uniforms.
 *
 * @param normals k standard normal values
 * @param one @param other uniform on (0, 1)
 */
export function bumpDraw({ at, factor }: Bump, normals: ArrayLike<number>, one: number, other: number): Float64Array {
  const k = at.length;
  const stretch = Math.sqrt(DEGREES / (-2 * Math.log(one * other)));
  return at.map((centre, i) => {
    let sum = 0;
    for (let j = 0; j <= i; j++) sum += factor[i * k + j]! * normals[j]!;
    return centre + stretch * sum;
  });
}
