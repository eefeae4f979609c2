import type { Finding } from '../contract/forensics.ts';
import { gapRunsOf } from './gapRunsOf.ts';
import { medianOf } from './medianOf.ts';
import { robustScale } from './robustScale.ts';
import { runsWhere } from './runsWhere.ts';

/** Codes for "no reading" in common use (common practice of exporters): nines, ends of the ranges of whole numbers. */
const CODES = [99, 999, 9999, 99999, 999999, 9999999, 32767, 32768, 65535, 2147483647, 2147483648, 1e30, 1e35];
/** Decimals that codes come with, such as −999.25 and 9999.9. */
const TAILS = [0, 0.25, 0.9, 0.99];
/** Robust deviations from the median beyond which a known code is no reading. */
const CODE_FAR = 8;
/** The same for any other value that comes back at least so often. */
const VALUE_FAR = 10;
const TIMES = 3;
/** More different far values than this are a tail, not a code. */
const MOST_VALUES = 3;

/**
 * Values that stand for "no reading".
 *
 * Method: a known code (nines and the ends of whole-number ranges, either sign) more than 8 robust deviations from the median,
 * or any other value that repeats exactly at least 3 times more than 10 away, with nothing between it and the bulk within a
 * third of its distance.
 *
 * @param values gaps as NaN
 * @returns one finding for all of them, or null; `numbers`: value (the commonest), kinds (different values)
 */
export function findSentinels(values: Float64Array): Finding | null {
  const centre = medianOf(values);
  const scale = robustScale(values);
  if (!(scale > 0)) return null;
  const far = new Map<number, number>();
  for (const value of values) {
    if (Math.abs(value - centre) > CODE_FAR * scale) far.set(value, (far.get(value) ?? 0) + 1);
  }
  const codes = [...far].filter(([value, times]) => {
    if (isCode(value)) return true;
    return times >= TIMES && Math.abs(value - centre) > VALUE_FAR * scale && far.size <= MOST_VALUES;
  });
  if (codes.length === 0 || codes.length > MOST_VALUES) return null;
  const taken = new Set(codes.map(([value]) => value));
  const places = runsWhere(values.length, (t) => taken.has(values[t]!));
  const count = codes.reduce((sum, [, times]) => sum + times, 0);
  const [value] = codes.reduce((one, other) => (other[1] > one[1] ? other : one));
  return {
    code: 'sentinel',
    count,
    places,
    numbers: { value, kinds: codes.length },
    effect: 'meaningless',
    offered: [{ kind: 'gaps', runs: gapRunsOf(places) }],
  };
}

function isCode(value: number): boolean {
  const size = Math.abs(value);
  return CODES.some((code) => TAILS.some((tail) => Math.abs(size - code - tail) < 1e-9 * code));
}
