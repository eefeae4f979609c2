import { differenceRecord } from '../series/differenceRecord.ts';
import type { PreparedRecord } from './prepareRecord.ts';

/**
 * The record as the ARMA part sees it, for starting values: transformed, less level and regression, differenced, in
 * units of the prepared record's scale.
 *
 * @param beta level (where there is one), then regression coefficients, in the record's own (transformed) units
 * @returns values of length (record) − d − sD, gaps as NaN
 */
export function adjustedRecord(prepared: PreparedRecord, beta: ArrayLike<number>): Float64Array {
  const { record, columns, columnNames, columnCentres, columnScales, centre, scale, differencing } = prepared;
  const rest = record.slice();
  columns.forEach((column, i) => {
    let own = beta[i]!;
    if (columnNames[i] === 'mean') {
      own -= centre;
      for (let j = 1; j < columns.length; j++) own += beta[j]! * columnCentres[j]!;
    }
    const factor = (own * columnScales[i]!) / scale;
    for (let t = 0; t < rest.length; t++) rest[t]! -= factor * column[t]!;
  });
  return differencing.length > 1 ? differenceRecord(rest, differencing) : rest;
}
