import type { Candidate, FitRequest } from '../contract/candidate.ts';
import type { Failure } from '../contract/failures.ts';
import { coefficientCount } from './prepareRecord.ts';

/** Rounding of a reading, in units of the largest one, that differences of a noiseless record show. */
const ROUNDING = 2 ** -50;

/**
 * Reasons not to fit a record at all: a value that is not finite, or readings without noise (all equal, or on a straight
 * line or parabola), for which ln L has no maximum.
 *
 * @returns the failure, or null where there is none. Too few readings for the coefficients are refused elsewhere, once
 *   the readings used are known.
 */
export function refuseRecord(request: FitRequest, candidate: Candidate): Failure | null {
  const { values } = request;
  const from = request.window?.from ?? 0;
  const to = request.window?.to ?? values.length;
  if (!(Number.isInteger(from) && Number.isInteger(to) && from >= 0 && to <= values.length && from < to)) {
    return { code: 'badCandidate', field: 'window', reason: 'window' };
  }
  let largest = 0;
  let low = Infinity;
  let high = -Infinity;
  let observed = 0;
  for (let t = 0; t < values.length; t++) {
    const value = values[t]!;
    if (value === Infinity || value === -Infinity) return { code: 'notFinite', what: 'values', index: t };
    if (t < from || t >= to || Number.isNaN(value)) continue;
    observed++;
    low = Math.min(low, value);
    high = Math.max(high, value);
    largest = Math.max(largest, Math.abs(value));
  }
  for (const [name, column] of Object.entries(request.columns ?? {})) {
    const index = column.findIndex((value) => value === Infinity || value === -Infinity);
    if (index >= 0) return { code: 'notFinite', what: name, index };
  }
  // The level and σ² count too; a harmonic counts once, its second column being found out later.
  const coefficients =
    coefficientCount(candidate) + (candidate.level === 'none' ? 0 : 1) + candidate.regressors.length + 1;
  if (observed < 2) return { code: 'tooFewReadings', readings: observed, needed: coefficients + 2, coefficients };
  if (low === high) return { code: 'noVariation', value: low, afterDifferencing: false };
  return noiseless(values.subarray(from, to), largest);
}

/** A record on a straight line (first differences constant) or a parabola (second differences constant) to rounding. */
function noiseless(values: Float64Array, largest: number): Failure | null {
  let current = values.slice();
  for (let order = 1; order <= 2; order++) {
    const next = new Float64Array(current.length - 1);
    for (let t = 0; t < next.length; t++) next[t] = current[t + 1]! - current[t]!;
    current = next;
    let low = Infinity;
    let high = -Infinity;
    let count = 0;
    for (const value of current) {
      if (Number.isNaN(value)) continue;
      count++;
      low = Math.min(low, value);
      high = Math.max(high, value);
    }
    const resolution = ROUNDING * 2 ** order * largest;
    if (count > order + 1 && high - low <= resolution) {
      return { code: 'deterministic', spread: high - low, resolution };
    }
  }
  return null;
}
