/** Rough costs in nanoseconds of a step of the fast engine, a product of two columns there, and an entry of the filter's covariance. */
const STEP = 8;
const PRODUCT = 0.5;
const ENTRY = 10;
/** A step of the filter costs this at least. */
const FILTER_STEP = 150;
/** Evaluations of the filter that its numeric gradient takes, beside one and a half of the fast engine. */
const GRADIENT = 4;

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
  const fast = 1.5 * n * (count * STEP + 0.5 * count * count * PRODUCT) + count ** 3 / 3;
  const size = Math.max(p, q, 1) + starting;
  const columns = starting + others + 1;
  const filter = GRADIENT * n * (FILTER_STEP + ENTRY * (2 * size * size + columns * size + 0.5 * columns * columns));
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
