import type { Parameters } from '../contract/candidate.ts';
import type { DerivedQuantity } from '../contract/uncertainty.ts';
import { polynomialRoots } from '../numeric/polynomialRoots.ts';

type Coefficients = Pick<Parameters, 'ar' | 'ma' | 'seasonalAr' | 'seasonalMa'>;

interface Root {
  readonly modulus: number;
  /** Angle in [0, π]. */
  readonly angle: number;
}

/**
 * Quantities that depend on the coefficients alone, for one parameter point. `gain`: θ(1)Θ(1)/φ(1)Φ(1), the sum of the ψ weights, what a
 * lasting shift of the innovations does to the (differenced) record; `timeConstant`: readings in which the slowest AR root falls to 1/e;
 * moduli and periods: of the inverse root nearest to the circle of the regular AR and MA factor.
 *
 * @param at coefficients; @param season s, or 0
 * @returns NaN where a quantity does not exist (a period without a complex root); Infinity for the period of a positive root is not
 *   given, that is NaN too. `constant` is not here: it needs the level.
 */
export function pointQuantities(
  at: Coefficients,
  season: number,
): Record<Exclude<DerivedQuantity, 'constant'>, number> {
  const ar = slowest(at.ar, 1);
  const ma = slowest(at.ma, -1);
  const seasonal = slowest(at.seasonalAr, 1);
  const modulus = Math.max(ar?.modulus ?? 0, seasonal === null ? 0 : seasonal.modulus ** (1 / Math.max(1, season)));
  const hasAr = at.ar.length + at.seasonalAr.length > 0;
  return {
    gain: (onesOf(at.ma, 1) * onesOf(at.seasonalMa, 1)) / levelGain(at),
    timeConstant: hasAr ? (modulus > 0 ? -1 / Math.log(modulus) : 0) : NaN,
    arModulus: ar?.modulus ?? NaN,
    arPeriod: periodOf(ar, at.ar.length),
    maModulus: ma?.modulus ?? NaN,
    maPeriod: periodOf(ma, at.ma.length),
  };
}

/** φ(1)Φ(1): the constant of the difference equation is the mean times this. */
export function levelGain({ ar, seasonalAr }: Pick<Coefficients, 'ar' | 'seasonalAr'>): number {
  return onesOf(ar, -1) * onesOf(seasonalAr, -1);
}

function onesOf(coefficients: readonly number[], sign: 1 | -1): number {
  return coefficients.reduce((sum, value) => sum + sign * value, 1);
}

/** A single real root has no period worth a line; two readings is that of any negative one. */
function periodOf(root: Root | null, order: number): number {
  return root === null || order < 2 || root.angle < 1e-6 || root.angle > Math.PI - 1e-6
    ? NaN
    : (2 * Math.PI) / root.angle;
}

/** The inverse root of 1 − Σ sign·c_j Bʲ nearest to the circle; null without coefficients. */
function slowest(c: readonly number[], sign: 1 | -1): Root | null {
  if (c.length === 0) return null;
  if (c.length === 1) return { modulus: Math.abs(c[0]!), angle: sign * c[0]! < 0 ? Math.PI : 0 };
  if (c.length === 2) return slowestOfTwo(sign * c[0]!, sign * c[1]!);
  const ascending = new Float64Array(c.length + 1);
  c.forEach((value, j) => (ascending[c.length - 1 - j] = -sign * value));
  ascending[c.length] = 1;
  return polynomialRoots(ascending)
    .map(({ re, im }) => ({ modulus: Math.hypot(re, im), angle: Math.abs(Math.atan2(im, re)) }))
    .reduce((one, other) => (other.modulus > one.modulus ? other : one));
}

/** Roots of x² − a x − b. */
function slowestOfTwo(a: number, b: number): Root {
  const square = (a / 2) ** 2 + b;
  if (square < 0) return { modulus: Math.sqrt(-b), angle: Math.atan2(Math.sqrt(-square), a / 2) };
  const root = a / 2 + (a < 0 ? -1 : 1) * Math.sqrt(square);
  return { modulus: Math.abs(root), angle: root < 0 ? Math.PI : 0 };
}
