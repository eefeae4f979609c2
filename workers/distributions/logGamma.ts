import { stirlingRemainder } from './stirlingRemainder.ts';

/** 1 − γ, γ being Euler's constant. */
const FIRST = 0.42278433509846713;
/** (−1)ᵏ (ζ(k) − 1)/k, k = 2…28, to 17 digits. */
const ZETA = [
  0.3224670334241132, -0.0673523010531981, 0.020580808427784546, -0.007385551028673986, 0.0028905103307415234,
  -0.001192753911703261, 0.0005096695247430425, -0.00022315475845357939, 9.945751278180853e-5, -4.492623673813314e-5,
  2.050721277567069e-5, -9.439488275268397e-6, 4.374866789907488e-6, -2.039215753801366e-6, 9.55141213040742e-7,
  -4.492469198764566e-7, 2.1207184805554665e-7, -1.0043224823968099e-7, 4.7698101693639804e-8, -2.2711094608943164e-8,
  1.0838659214896955e-8, -5.183475041970047e-9, 2.4836745438024785e-9, -1.1921401405860912e-9, 5.731367241678862e-10,
  -2.7595228851242334e-10, 1.330476437424449e-10,
] as const;
const HALF_LOG_TWO_PI = 0.9189385332046728;

/**
 * ln Γ(x).
 *
 * Method: for x ≤ 2.5 the series of ln Γ(2 + u) in ζ(k) − 1 (NIST DLMF 5.7.3) and Γ(x + 1) = xΓ(x), so that the zeros at 1 and 2 keep their
 * relative accuracy; above, Stirling's formula with its remainder (5.11.1).
 *
 * @param x > 0
 * @returns relative error below 1e−14; NaN for x ≤ 0 or NaN, Infinity for Infinity
 * @example logGamma(5) = ln 24
 */
export function logGamma(x: number): number {
  if (!(x > 0)) return NaN;
  if (x === Infinity) return Infinity;
  if (x > 2.5) return (x - 0.5) * Math.log(x) - x + HALF_LOG_TWO_PI + stirlingRemainder(x);
  if (x >= 1.5) return fromTwo(x - 2);
  if (x >= 0.5) return fromTwo(x - 1) - Math.log1p(x - 1);
  return fromTwo(x) - Math.log1p(x) - Math.log(x);
}

/** ln Γ(2 + u), |u| ≤ ½. */
function fromTwo(u: number): number {
  let sum = 0;
  for (let k = ZETA.length - 1; k >= 0; k--) sum = sum * u + ZETA[k]!;
  return u * (FIRST + u * sum);
}
