import { incompleteBeta } from './incompleteBeta.ts';

/**
 * P(T > t), accurate in the tail. Method: ½ I_x(df/2, ½) with x = df/(df + t²) (NIST DLMF 8.17; Abramowitz & Stegun 26.7.1).
 *
 * @param df > 0, not necessarily whole; NaN otherwise
 */
export function studentTUpperTail(t: number, df: number): number {
  if (!(df > 0) || Number.isNaN(t)) return NaN;
  const square = t * t;
  const x = square === Infinity ? 0 : df / (df + square);
  const { lower } = incompleteBeta(df / 2, 0.5, x, square === Infinity ? 1 : square / (df + square));
  return t >= 0 ? 0.5 * lower : 1 - 0.5 * lower;
}
