import type { Coefficients } from './searchSpace.ts';
import { polynomialRoots } from '../../numeric/polynomialRoots.ts';

/** An AR and an MA root of one model (inverse roots, so inside the unit disc), nearest pair first. */
export interface RootPair {
  readonly arModulus: number;
  readonly maModulus: number;
  readonly distance: number;
}

interface Inverse {
  readonly re: number;
  readonly im: number;
}

/** A pair within this of each other and of the circle is a cancelled sinusoid, not a model. */
const PAIR_DISTANCE = 0.01;
/** An AR root nearer to the circle than this is on it. */
const ON_CIRCLE = 1e-6;

/**
 * Whether a point belongs to the set that fits are ranked over: no AR root on the unit circle, and no AR–MA pair of
 * roots within 0.01 of each other and of the circle. MA roots on the circle are legal.
 */
export function isAdmissible(coefficients: Coefficients, season: number): boolean {
  if (largestArModulus(coefficients, season) > 1 - ON_CIRCLE) return false;
  const spurious = nearestPair(coefficients, season, 1 - PAIR_DISTANCE);
  return spurious === null || spurious.distance > PAIR_DISTANCE;
}

/** Modulus of the AR root nearest to the unit circle, of φ(B)Φ(Bˢ) in B; 0 without an AR part. */
export function largestArModulus({ ar, seasonalAr }: Pick<Coefficients, 'ar' | 'seasonalAr'>, season: number): number {
  const regular = inverseRoots(ar, 1).map(modulus);
  const seasonal = inverseRoots(seasonalAr, 1).map((root) => modulus(root) ** (1 / season));
  return Math.max(0, ...regular, ...seasonal);
}

/** Modulus of the MA root nearest to the unit circle, of θ(B)Θ(Bˢ) in B; 0 without an MA part. */
export function largestMaModulus({ ma, seasonalMa }: Pick<Coefficients, 'ma' | 'seasonalMa'>, season: number): number {
  const regular = inverseRoots(ma, -1).map(modulus);
  const seasonal = inverseRoots(seasonalMa, -1).map((root) => modulus(root) ** (1 / season));
  return Math.max(0, ...regular, ...seasonal);
}

/**
 * The nearest AR–MA pair of inverse roots among those with both moduli at least `from`; null where there is none.
 * Roots of a seasonal factor are compared with those of a regular one through the nearest of their s-th roots.
 */
export function nearestPair(coefficients: Coefficients, season: number, from: number): RootPair | null {
  const ar = inverseRoots(coefficients.ar, 1);
  const ma = inverseRoots(coefficients.ma, -1);
  const seasonalAr = inverseRoots(coefficients.seasonalAr, 1);
  const seasonalMa = inverseRoots(coefficients.seasonalMa, -1);
  let best: RootPair | null = null;
  const meet = (one: Inverse, other: Inverse) => {
    const pair = { arModulus: modulus(one), maModulus: modulus(other), distance: distance(one, other) };
    if (pair.arModulus < from || pair.maModulus < from) return;
    if (best === null || pair.distance < best.distance) best = pair;
  };
  for (const one of ar) for (const other of ma) meet(one, other);
  for (const one of ar) for (const other of seasonalMa) meet(one, nearestSeasonal(other, season, one));
  for (const other of ma) for (const one of seasonalAr) meet(nearestSeasonal(one, season, other), other);
  for (const one of seasonalAr) {
    for (const other of seasonalMa) {
      // All s-th roots of both turn by the same angles: the principal ones with the smaller angle between them decide.
      const first = nearestSeasonal(one, season, { re: 1, im: 0 });
      meet(first, nearestSeasonal(other, season, first));
    }
  }
  return best;
}

/** Inverse roots of 1 − Σ sign·c_j Bʲ: the roots of x^m − Σ sign·c_j x^{m−j}; those at 0 are left out. */
export function inverseRoots(coefficients: ArrayLike<number>, sign: 1 | -1): Inverse[] {
  let m = coefficients.length;
  while (m > 0 && coefficients[m - 1] === 0) m--;
  if (m === 0) return [];
  const ascending = new Float64Array(m + 1);
  for (let j = 1; j <= m; j++) ascending[m - j] = -sign * coefficients[j - 1]!;
  ascending[m] = 1;
  return polynomialRoots(ascending);
}

function nearestSeasonal(root: Inverse, season: number, to: Inverse): Inverse {
  const size = modulus(root) ** (1 / season);
  const angle = Math.atan2(root.im, root.re) / season;
  const turn = (2 * Math.PI) / season;
  const best = angle + turn * Math.round((Math.atan2(to.im, to.re) - angle) / turn);
  return { re: size * Math.cos(best), im: size * Math.sin(best) };
}

function modulus({ re, im }: Inverse): number {
  return Math.hypot(re, im);
}

function distance(one: Inverse, other: Inverse): number {
  return Math.hypot(one.re - other.re, one.im - other.im);
}
