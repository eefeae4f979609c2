import type { ColumnProfile } from '../../contract/reading.ts';
import type { RowsRead } from './readRows.ts';

/** The column taken as the record, and the others that could be. */
export interface ValueChosen {
  readonly column: number | null;
  readonly others: readonly number[];
}

/** Columns with far fewer numbers than the fullest are not what the file is about. */
const FULL_SHARE = 0.3;

function isConstantOrCounter(values: Float64Array): boolean {
  let [first, before] = [NaN, NaN];
  let [constant, counter] = [true, true];
  for (const value of values) {
    if (Number.isNaN(value)) continue;
    if (Number.isNaN(first)) first = value;
    else {
      if (value !== first) constant = false;
      if (value !== before + 1) counter = false;
    }
    before = value;
    if (!constant && !counter) return false;
  }
  return true;
}

/**
 * The column that is most likely the record.
 *
 * Method: the first numeric column from the left that is neither constant nor a plain counter and has at least 30 % as many
 * numbers as the fullest; where there is none of that kind, the first numeric one.
 *
 * @param read rows as columns; @param profiles what each column holds
 * @returns the column, null where no column holds numbers, and the other candidates
 */
export function chooseValueColumn(read: RowsRead, profiles: readonly ColumnProfile[]): ValueChosen {
  const numeric = profiles.filter(({ role }) => role === 'value');
  const fullest = Math.max(0, ...numeric.map(({ numbers }) => numbers));
  const full = numeric.filter(({ numbers }) => numbers >= FULL_SHARE * fullest);
  const lively = full.filter(
    ({ index }) => !isConstantOrCounter(read.columns[index]!.values.view().subarray(0, read.rows)),
  );
  const [chosen, ...others] = (lively.length > 0 ? lively : full).map(({ index }) => index);
  return { column: chosen ?? null, others };
}
