import { cholesky } from '../numeric/cholesky.ts';
import { choleskySolve } from '../numeric/choleskySolve.ts';
import { hessian } from '../numeric/hessian.ts';
import { asymptoticInformation } from './asymptoticInformation.ts';
import type { Coefficients, SearchSpace } from './search/searchSpace.ts';

/** What the covariance needs of a likelihood: its gradient, and the level and regression coefficients it implies. */
export interface CurvatureSource {
  /** ln L with level, regression and σ² profiled out; writes its gradient for all coefficients. */
  readonly gradientAt: (coefficients: Coefficients, gradient: Float64Array) => number;
  /** Estimates of level and regression at the coefficients that `gradientAt` was called with last. */
  readonly betaAt: (coefficients: Coefficients) => Float64Array;
  /** X′V⁻¹X/σ² at the estimates, row-major: the information on level and regression for known coefficients. */
  readonly betaInformation: Float64Array;
  readonly readings: number;
  readonly season: number;
}

export type CovarianceEnd =
  | {
      readonly ok: true;
      readonly values: Float64Array;
      readonly size: number;
      readonly error: number;
      readonly ratio: number;
    }
  | {
      readonly ok: false;
      readonly reason: 'indefinite' | 'inexact' | 'flat';
      readonly error: number;
      readonly smallest: number;
    };

/**
 * First step of the differences, in asymptotic standard errors: the gradient bends by its square (some 1e-5), which one
 * extrapolation removes, and its own rounding, near 1e-11, is nothing beside its change over such a step.
 */
const STEP = 0.005;
/** Largest relative error of the Hessian for which standard errors are given. */
const EXACT_ENOUGH = 1e-3;
/** A direction of the scaled Hessian flatter than this is no information: its standard error would be noise. */
const FLAT = 1e-7;

/**
 * Covariance of the estimates from the observed information: the negative inverse Hessian of the exact ln L in the
 * natural parameters φ, θ, Φ, Θ, level, β, with σ² profiled out.
 *
 * Method: block inversion. With C the inverse of −∇² of the profile over the coefficients ψ and J = ∂β̂/∂ψ, the
 * covariance is [C, CJ′; JC, (X′V⁻¹X/σ²)⁻¹ + JCJ′], which is that of the joint Hessian. ∇² comes from gradients by
 * extrapolated central differences; the first step is a small part of each asymptotic standard error, shortened until
 * both ends are stationary and invertible. J comes from the same evaluations.
 *
 * @param source see CurvatureSource
 * @param space its `coefficients` hold the estimates on entry and on return
 * @param rows indices into `coefficients.all` of the coefficients estimated
 * @returns the covariance, with the error of the Hessian and the largest ratio (≥ 1) between its standard errors and the
 *   asymptotic ones; or why there is none
 */
export function covarianceFromHessian(
  source: CurvatureSource,
  space: SearchSpace,
  rows: readonly number[],
): CovarianceEnd {
  const { all } = space.coefficients;
  const centre = all.slice();
  const k = rows.length;
  const s = Math.round(Math.sqrt(source.betaInformation.length));
  const asymptotic = asymptoticInformation(space.coefficients, source.season, rows, source.readings);
  const scales = rows.map((_, i) => 1 / Math.sqrt(source.readings * asymptotic[i * k + i]!));
  const steps = rows.map((row, i) => insideStep(space, centre, row, STEP * scales[i]!));
  const full = new Float64Array(all.length);
  const place = (at: Float64Array) => {
    all.set(centre);
    rows.forEach((row, i) => (all[row] = at[i]!));
  };
  const here = Float64Array.from(rows, (row) => centre[row]!);
  const probes: Probe[] = [];
  const curvature = hessian(
    (at, gradient) => {
      place(at);
      source.gradientAt(space.coefficients, full);
      rows.forEach((row, i) => (gradient[i] = -full[row]!));
      const column = here.findIndex((value, i) => value !== at[i]!);
      if (s > 0)
        probes.push({ column, shift: at[column]! - here[column]!, beta: source.betaAt(space.coefficients).slice() });
    },
    here,
    steps,
  );
  const jacobian = betaJacobian(probes, k, s);
  all.set(centre);

  // Scaled to a unit diagonal so that "flat" does not depend on the units of a coefficient.
  const root = Array.from({ length: k }, (_, i) => Math.sqrt(Math.max(0, curvature.values[i * k + i]!)));
  if (root.some((value) => !(value > 0)))
    return { ok: false, reason: 'indefinite', error: curvature.error, smallest: 0 };
  const correlation = curvature.values.map((value, at) => value / (root[Math.floor(at / k)]! * root[at % k]!));
  const factor = correlation.slice();
  if (!cholesky(factor, k)) return { ok: false, reason: 'indefinite', error: curvature.error, smallest: 0 };
  const smallest = Array.from({ length: k }, (_, i) => factor[i * k + i]! ** 2).reduce((a, b) => Math.min(a, b), 1);
  if (smallest < FLAT) return { ok: false, reason: 'flat', error: curvature.error, smallest };
  if (curvature.error > EXACT_ENOUGH * smallest) {
    return { ok: false, reason: 'inexact', error: curvature.error, smallest };
  }
  const inner = inverseOf(factor, k).map((value, at) => value / (root[Math.floor(at / k)]! * root[at % k]!));
  const values = joinBlocks(inner, k, jacobian, source.betaInformation, s);
  if (values === null) return { ok: false, reason: 'indefinite', error: curvature.error, smallest };
  return {
    ok: true,
    values,
    size: k + s,
    error: curvature.error,
    ratio: disagreement(inner, asymptotic, source.readings, k),
  };
}

/** A step, at most `wanted`, whose both ends are inside the stationary and invertible set. */
function insideStep(space: SearchSpace, centre: Float64Array, row: number, wanted: number): number {
  const { all } = space.coefficients;
  let step = wanted;
  for (let attempt = 0; attempt < 40; attempt++) {
    const inside = [-1, 1].every((side) => {
      all.set(centre);
      all[row]! += side * step;
      return space.isInside();
    });
    if (inside) break;
    step /= 2;
  }
  all.set(centre);
  return step;
}

/** What level and regression were estimated as with one coefficient shifted. */
interface Probe {
  readonly column: number;
  readonly shift: number;
  readonly beta: Float64Array;
}

/** ∂β̂/∂ψ, s×k row-major, by central differences over the two smallest steps taken of each coefficient, extrapolated once. */
function betaJacobian(probes: readonly Probe[], k: number, s: number): Float64Array {
  const jacobian = new Float64Array(s * k);
  for (let i = 0; i < k; i++) {
    // They come in pairs, ahead and behind, each step half of the one before.
    const own = probes.filter(({ column }) => column === i).slice(-4);
    const slope = (r: number, at: number) => {
      const ahead = own[at]!;
      const behind = own[at + 1]!;
      return (ahead.beta[r]! - behind.beta[r]!) / (ahead.shift - behind.shift);
    };
    for (let r = 0; r < s; r++)
      jacobian[r * k + i] = own.length < 4 ? slope(r, 0) : (4 * slope(r, 2) - slope(r, 0)) / 3;
  }
  return jacobian;
}

function joinBlocks(
  inner: Float64Array,
  k: number,
  jacobian: Float64Array,
  information: Float64Array,
  s: number,
): Float64Array | null {
  const size = k + s;
  const joint = new Float64Array(size * size);
  for (let i = 0; i < k; i++) for (let j = 0; j < k; j++) joint[i * size + j] = inner[i * k + j]!;
  if (s === 0) return joint;
  const factor = information.slice();
  if (!cholesky(factor, s)) return null;
  const known = inverseOf(factor, s);
  for (let r = 0; r < s; r++) {
    for (let j = 0; j < k; j++) {
      let cross = 0;
      for (let i = 0; i < k; i++) cross += jacobian[r * k + i]! * inner[i * k + j]!;
      joint[(k + r) * size + j] = cross;
      joint[j * size + k + r] = cross;
    }
  }
  for (let r = 0; r < s; r++) {
    for (let c = 0; c < s; c++) {
      let sum = known[r * s + c]!;
      for (let j = 0; j < k; j++) sum += joint[(k + r) * size + j]! * jacobian[c * k + j]!;
      joint[(k + r) * size + k + c] = sum;
    }
  }
  return joint;
}

/** Inverse from a Cholesky factor. */
function inverseOf(factor: Float64Array, k: number): Float64Array {
  const inverse = new Float64Array(k * k);
  for (let i = 0; i < k; i++) {
    const column = new Float64Array(k);
    column[i] = 1;
    choleskySolve(factor, k, column);
    for (let j = 0; j < k; j++) inverse[j * k + i] = column[j]!;
  }
  return inverse;
}

/** Largest ratio, either way, between observed and asymptotic standard errors. */
function disagreement(inner: Float64Array, asymptotic: Float64Array, readings: number, k: number): number {
  const factor = asymptotic.slice();
  if (k === 0 || !cholesky(factor, k)) return 1;
  const expected = inverseOf(factor, k);
  let worst = 1;
  for (let i = 0; i < k; i++) {
    const ratio = Math.sqrt((inner[i * k + i]! * readings) / expected[i * k + i]!);
    worst = Math.max(worst, ratio, 1 / ratio);
  }
  return worst;
}
