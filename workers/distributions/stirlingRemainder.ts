/** B_2k / (2k(2k−1)), k = 1…8. */
const SERIES = [1 / 12, -1 / 360, 1 / 1260, -1 / 1680, 1 / 1188, -691 / 360360, 1 / 156, -3617 / 122400] as const;
const LARGE = 16;

/**
 * What Stirling's formula leaves of ln Γ: δ(z) = ln Γ(z) − (z − ½) ln z + z − ½ ln 2π.
 *
 * Method: the asymptotic series for z ≥ 16 (NIST DLMF 5.11.1), below it δ(z) = δ(z + 1) + (z + ½) ln(1 + 1/z) − 1. Ratios of gamma functions
 * built from it keep their digits where differences of ln Γ cancel.
 *
 * @param z > 0
 * @returns absolute error below 3e−15; 0 for Infinity, NaN outside the domain
 */
export function stirlingRemainder(z: number): number {
  if (!(z > 0)) return NaN;
  let sum = 0;
  let w = z;
  // ln(1 + 1/w) is written so that 1/w cannot overflow.
  for (; w < LARGE; w++) sum += (w + 0.5) * (w < 1 ? Math.log1p(w) - Math.log(w) : Math.log1p(1 / w)) - 1;
  const inverse = 1 / w;
  const square = inverse * inverse;
  let series = 0;
  for (let k = SERIES.length - 1; k >= 0; k--) series = series * square + SERIES[k]!;
  return sum + series * inverse;
}
