/** Differences are multiples of a step when within this part of it: steps of a converter printed with few digits are uneven. */
const UNEVEN = 0.1;
/** Share of the differences that must be multiples. */
const SHARE = 0.98;
/** Beyond this many steps a difference says nothing about the step. */
const FAR = 200;
/** Readings looked at: enough to see any step. */
const MOST = 20_000;
const DECIMALS = 9;
const SAFE = 2 ** 52;

/**
 * The smallest step of a record's readings.
 *
 * Method: the smallest distance between different readings, if nearly all distances between neighbouring readings of the
 * sorted record are multiples of it; else the last decimal that is written in every reading, where there are at most nine.
 *
 * @param values gaps as NaN; the first 20 000 readings are looked at
 * @returns the step in the record's unit; 0 where none is seen
 * @example 1.5, 2.25, 2.5, 4: 0.25
 */
export function resolutionOf(values: Float64Array): number {
  const sorted = values
    .filter((value) => !Number.isNaN(value))
    .subarray(0, MOST)
    .sort();
  if (sorted.length < 3) return 0;
  const largest = Math.max(Math.abs(sorted[0]!), Math.abs(sorted.at(-1)!));
  const rounding = 16 * Number.EPSILON * largest;
  const steps: number[] = [];
  let smallest = Infinity;
  for (let i = 1; i < sorted.length; i++) {
    const step = sorted[i]! - sorted[i - 1]!;
    if (step <= rounding) continue;
    steps.push(step);
    if (step < smallest) smallest = step;
  }
  if (steps.length < 2) return steps[0] ?? 0;
  const near = steps.filter((step) => step < FAR * smallest);
  const whole = near.filter((step) => Math.abs(step / smallest - Math.round(step / smallest)) <= UNEVEN);
  // A tenth on either side would hold one difference in five by chance; four in five must be told apart from that.
  if (near.length >= 0.8 * steps.length && whole.length >= SHARE * near.length) return smallest;
  return lastDecimal(sorted, largest);
}

function lastDecimal(sorted: Float64Array, largest: number): number {
  for (let decimals = 0; decimals <= DECIMALS; decimals++) {
    const scale = 10 ** decimals;
    if (largest * scale > SAFE) return 0;
    const slack = 4 * Number.EPSILON * largest * scale + 1e-9;
    if (sorted.every((value) => Math.abs(value * scale - Math.round(value * scale)) <= slack)) return 1 / scale;
  }
  return 0;
}
