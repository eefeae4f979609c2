import { coefficientsToPartial } from '../../model/coefficientsToPartial.ts';
import type { Factors } from '../../model/expandPolynomials.ts';

/** Step of the differences, as a part of the distance over which the likelihood bends. */
const STEP = 3e-5;

/**
 * Gradient of ln L by central differences, for the engines that do not differentiate their recursion.
 *
 * The step shrinks with the distance of the factor from the edge of its region, near which the likelihood bends on that
 * scale (for an MA factor not below 1/n, the width of the pile-up at the circle). Where one side is outside, the other is used alone.
 *
 * @param factors where; @param height ln L (−Infinity outside); @param here its value there; @param n readings
 * @param gradient receives ∂/∂φ, ∂/∂θ, ∂/∂Φ, ∂/∂Θ
 */
export function numericGradient(
  factors: Factors,
  height: (near: Factors) => number,
  here: number,
  n: number,
  gradient: Float64Array,
): void {
  let at = 0;
  for (const name of ['ar', 'ma', 'seasonalAr', 'seasonalMa'] as const) {
    const own = Float64Array.from(factors[name]);
    const step = factorStep(own, name === 'ma' || name === 'seasonalMa', n);
    for (let i = 0; i < own.length; i++, at++) {
      const centre = own[i]!;
      const value = (shift: number) => {
        own[i] = centre + shift;
        return height({ ...factors, [name]: own });
      };
      const above = value(step);
      const below = value(-step);
      own[i] = centre;
      const up = Number.isFinite(above);
      const down = Number.isFinite(below);
      gradient[at] = ((up ? above : here) - (down ? below : here)) / (step * ((up ? 1 : 0) + (down ? 1 : 0) || 1));
    }
  }
}

/** Step for the coefficients of one factor. */
export function factorStep(coefficients: Float64Array, ma: boolean, n: number): number {
  const partial = new Float64Array(coefficients.length);
  const polynomial = ma ? coefficients.map((value) => -value) : coefficients;
  const inside = coefficientsToPartial(polynomial, partial);
  let room = inside ? 1 : 0;
  if (inside) for (const r of partial) room = Math.min(room, 1 - Math.abs(r));
  return STEP * Math.max(room, ma ? 1 / n : 1e-8);
}
