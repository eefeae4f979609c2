import type { Order, Parameters } from '../contract/candidate.ts';
import type { RootPoint } from '../contract/diagnostics.ts';
import { polynomialRoots } from '../numeric/polynomialRoots.ts';

/**
 * Inverse roots of the AR and MA polynomials by modulus and period, factor by factor; a seasonal factor's root appears once a season
 * frequency. One entry stands for a complex pair.
 *
 * Method: roots of xᵖ − φ_1 x^{p−1} − …, whose moduli are below 1 for a stationary (invertible) model; period 2π/|angle|.
 *
 * @returns AR first, the slowest decaying first within each polynomial; period Infinity for a positive real root
 * @example φ = (1.2, −.72): one pair, modulus √.72, period 2π/45°= 8
 */
export function rootPoints(parameters: Parameters, { s }: Pick<Order, 's'>): RootPoint[] {
  const points = [
    ...pointsOf('ar', parameters.ar, 1, -1),
    ...pointsOf('ar', parameters.seasonalAr, s, -1),
    ...pointsOf('ma', parameters.ma, 1, 1),
    ...pointsOf('ma', parameters.seasonalMa, s, 1),
  ];
  return points.sort((a, b) =>
    a.polynomial === b.polynomial ? b.modulus - a.modulus : a.polynomial === 'ar' ? -1 : 1,
  );
}

function pointsOf(polynomial: 'ar' | 'ma', coefficients: readonly number[], season: number, sign: 1 | -1): RootPoint[] {
  const p = coefficients.length;
  if (p === 0) return [];
  const ascending = new Float64Array(p + 1);
  ascending[p] = 1;
  for (let i = 1; i <= p; i++) ascending[p - i] = sign * coefficients[i - 1]!;
  const points: RootPoint[] = [];
  for (const { re, im } of polynomialRoots(ascending)) {
    const size = Math.hypot(re, im) ** (1 / season);
    if (size === 0) continue;
    const angle = Math.atan2(im, re);
    for (let k = 0; k < season; k++) {
      const turn = (angle + 2 * Math.PI * k) / season;
      const folded = Math.atan2(Math.sin(turn), Math.cos(turn));
      if (folded < -1e-9) continue;
      const period = folded < 1e-9 ? Infinity : (2 * Math.PI) / folded;
      points.push({ polynomial, modulus: size, period, timeConstant: size < 1 ? -1 / Math.log(size) : Infinity });
    }
  }
  return points;
}
