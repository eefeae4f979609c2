/** Differences looked at; a longer record is sampled evenly. */
const MOST = 50_000;

/**
 * Median of the differences between neighbours (the upper one of an even number).
 *
 * @param times ascending, at least two; of more than 50 000 an even sample of neighbours is used
 * @returns the median, in the unit of the stamps
 */
export function medianDifference(times: Float64Array): number {
  const all = times.length - 1;
  const stride = Math.ceil(all / MOST);
  const differences = new Float64Array(Math.ceil(all / stride));
  for (let i = 0; i < differences.length; i++) differences[i] = times[i * stride + 1]! - times[i * stride]!;
  return differences.sort()[Math.floor(differences.length / 2)]!;
}
