const SMALL = 0.5;

/**
 * ln r − (r − 1), which falls away as −(r − 1)²/2 near r = 1.
 *
 * Method: with d = r − 1 and t = d/(2 + d), ln r = 2(t + t³/3 + t⁵/5 + …) (Abramowitz & Stegun 4.1.27) and 2t − d = −dt exactly, so that nothing
 * cancels; the logarithm itself beyond |d| = ½.
 *
 * @param ratio r ≥ 0; @param excess r − 1 where the caller knows it better than by subtraction
 * @returns ≤ 0; relative error of a few units in the last place; −Infinity at 0 and Infinity, NaN below 0
 */
export function logMinusLinear(ratio: number, excess = ratio - 1): number {
  if (!(Math.abs(excess) <= SMALL)) return ratio === Infinity ? -Infinity : Math.log(ratio) - excess;
  const t = excess / (2 + excess);
  const square = t * t;
  let power = square;
  let sum = 1 / 3;
  for (let k = 5; power > 1e-18; k += 2, power *= square) sum += power / k;
  return t * (2 * square * sum - excess);
}
