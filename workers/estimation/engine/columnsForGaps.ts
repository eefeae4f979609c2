/** Rough costs in nanoseconds, measured: a step of the fast engine and of its gradient for one column, and a product of two columns. */
const STEP = 12;
const PROBE = 20;
const PRODUCT = 0.75;
/** A step of the filter with a state of length m: this much, and so much for each place and each pair of places. */
const FILTER_STEP = 60;
const PLACE = 25;
const PAIR = 0.7;
/** Evaluations of the filter that a value and its numeric gradient take. */
const GRADIENT = 7;
/** More values than this are not kept in columns. */
const MOST_VALUES = 3e6;

/**
 * Columns that stand for the missing readings where that is cheaper than filtering: 1 at the place of the gap and 0 elsewhere, each with a
 * flat prior, on the level of the record.
 *
 * ∫ N(w; 0, σ²V) over the missing values is (2πσ²)^{k/2} |Z′V⁻¹Z|^{−1/2} times the density at the best values, so that integrating them out
 * gives exactly the likelihood of the readings there are (Ljung 1982, Scand. J. Stat. 9; Gómez, Maravall & Peña 1999, J. Econometrics 88, 341–363).
 * What stands in the gaps meanwhile does not matter.
 *
 * @param record gaps as NaN; @param p, q degrees of the polynomials; @param starting d + sD; @param others further columns
 * @returns the columns, none for a record without gaps; null where the filter is cheaper
 */
export function columnsForGaps(
  record: Float64Array,
  p: number,
  q: number,
  starting: number,
  others: number,
): Float64Array[] | null {
  const n = record.length;
  const gaps: number[] = [];
  for (let t = 0; t < n; t++) if (Number.isNaN(record[t]!)) gaps.push(t);
  if (gaps.length === 0) return [];
  const count = gaps.length + others + 1;
  if (n * count > MOST_VALUES) return null;
  const fast = n * (count * STEP + count * count * PRODUCT + gaps.length * PROBE) + count ** 3 / 3;
  const size = Math.max(p + starting, q, 1);
  const filter = GRADIENT * n * (FILTER_STEP + PLACE * size + PAIR * size * size + others * (PLACE + size));
  if (fast > filter) return null;
  return gaps.map((gap) => {
    const column = new Float64Array(n);
    column[gap] = 1;
    return column;
  });
}

/** The record with the last reading standing in each gap: a placeholder that the columns cancel exactly. */
export function withoutGaps(record: Float64Array): Float64Array {
  const result = record.slice();
  for (let t = 1; t < result.length; t++) if (Number.isNaN(result[t]!)) result[t] = result[t - 1]!;
  return result;
}
