/**
 * Sum with a running correction for the digits each addition loses.
 *
 * Method: Neumaier's variant of Kahan summation (Neumaier 1974, Z. Angew. Math. Mech. 54, 39–51), in which the larger of sum and term keeps
 * its digits. Error bound 2ε |Σx| + O(nε²) Σ|x|.
 *
 * @param values any numbers, any length
 * @returns 0 for no values; NaN where one is NaN or infinities of both signs meet; ±Infinity otherwise where one is infinite
 * @example (1, 1e100, 1, −1e100) gives 2
 */
export function compensatedSum(values: ArrayLike<number>): number {
  let sum = 0;
  let lost = 0;
  for (let i = 0; i < values.length; i++) {
    const value = values[i]!;
    const next = sum + value;
    lost += Math.abs(sum) >= Math.abs(value) ? sum - next + value : value - next + sum;
    sum = next;
  }
  // An infinite sum leaves NaN in the correction: the sum alone is then the answer.
  return Number.isFinite(sum) ? sum + lost : sum;
}
