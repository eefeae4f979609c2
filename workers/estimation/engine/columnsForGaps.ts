/** More values than this are not kept in columns, nor more columns. */
const MOST_VALUES = 3e6;
const MOST_COLUMNS = 60;

/** How the missing readings stand in for themselves beside an engine without gaps. */
export interface GapColumns {
  /** Columns of the readings missing among the first d + sD, on the level of the record: 1 at the place of the gap and 0 elsewhere. */
  readonly columns: readonly Float64Array[];
  /** Places of the other gaps in the differenced record, for `GapPulses`. */
  readonly places: Int32Array;
}

/**
 * The missing readings as unknowns with a flat prior, each a column that is 1 at the place of the gap.
 *
 * ∫ N(w; 0, σ²V) over the missing values is (2πσ²)^{k/2} |Z′V⁻¹Z|^{−1/2} times the density at the best values, so that integrating them out
 * gives exactly the likelihood of the readings there are (Ljung 1982, Scand. J. Stat. 9; Gómez, Maravall & Peña 1999, J. Econometrics 88, 341–363).
 * What stands in the gaps meanwhile does not matter. A gap among the first d + sD readings, whose differences lack their beginning, takes
 * a column of its own; all others are one pulse at different places.
 *
 * @param record gaps as NaN; @param starting d + sD; @param others further columns
 * @returns null where there are too many columns to keep
 */
export function columnsForGaps(record: Float64Array, starting: number, others: number): GapColumns | null {
  const n = record.length;
  const early: number[] = [];
  const places: number[] = [];
  for (let t = 0; t < n; t++) if (Number.isNaN(record[t]!)) (t < starting ? early : places).push(t);
  if (early.length > MOST_COLUMNS || (early.length > 0 && n * (early.length + others + 1) > MOST_VALUES)) return null;
  const columns = early.map((gap) => {
    const column = new Float64Array(n);
    column[gap] = 1;
    return column;
  });
  return { columns, places: Int32Array.from(places, (place) => place - starting) };
}

/** The record with the last reading standing in each gap: a placeholder that the columns cancel exactly. */
export function withoutGaps(record: Float64Array): Float64Array {
  const result = record.slice();
  for (let t = 1; t < result.length; t++) if (Number.isNaN(result[t]!)) result[t] = result[t - 1]!;
  return result;
}
