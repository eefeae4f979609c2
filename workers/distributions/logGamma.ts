/** B_2k / (2k(2k−1)), k = 1…8. */
const STIRLING = [1 / 12, -1 / 360, 1 / 1260, -1 / 1680, 1 / 1188, -691 / 360360, 1 / 156, -3617 / 122400] as const;
const LARGE = 16;

/**
 * ln Γ(x).
 *
 * Method: Stirling's series for x ≥ 16 (NIST DLMF 5.11.1), the recurrence Γ(x+1) = xΓ(x) below. Relative error below 1e−14 away from the zeros at 1
 * and 2, absolute error below 1e−14 near them.
 *
 * @param x > 0
 * @returns NaN for x ≤ 0 or NaN; Infinity for Infinity
 */
export function logGamma(x: number): number {
  if (!(x > 0)) return NaN;
  if (x === Infinity) return Infinity;
  let shift = 1;
  let z = x;
  while (z < LARGE) shift *= z++;
  const inverse = 1 / z;
  const square = inverse * inverse;
  let series = 0;
  for (let k = STIRLING.length - 1; k >= 0; k--) series = series * square + STIRLING[k]!;
  return (z - 0.5) * Math.log(z) - z + 0.9189385332046728 + series * inverse - Math.log(shift);
}
