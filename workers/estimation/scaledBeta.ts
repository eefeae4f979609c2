import type { Parameters } from '../contract/candidate.ts';
import type { PreparedRecord } from './prepareRecord.ts';

/**
 * Level and regression coefficients in the record's units as those of the centred and scaled columns.
 *
 * @param prepared the record's centre and scales; @param at parameters of the candidate it was prepared for
 * @returns one value a column, level first
 */
export function scaledBeta(prepared: PreparedRecord, at: Parameters): Float64Array {
  const level = prepared.columnNames[0];
  const hasLevel = level === 'mean' || level === 'drift';
  const own = hasLevel ? [at.mean, ...at.regression] : [...at.regression];
  const { columnCentres, columnScales, scale, centre } = prepared;
  let shift = 0;
  for (let i = hasLevel ? 1 : 0; i < own.length; i++) shift += own[i]! * columnCentres[i]!;
  if (level === 'mean') own[0] = own[0]! - centre + shift;
  return Float64Array.from(own, (beta, i) => (beta * columnScales[i]!) / scale);
}
