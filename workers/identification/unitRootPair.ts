import type { UnitRootOutcome, UnitRootPair } from '../contract/shape.ts';
import { augmentedDickeyFuller } from './augmentedDickeyFuller.ts';
import { averagedRecord } from './averagedRecord.ts';
import { kpss } from './kpss.ts';

/** A longer record is averaged first. */
const MOST_READINGS = 20_000;

/**
 * Both unit-root tests, whose null hypotheses are each other's alternatives, and what they say together at 5 %.
 *
 * Method: `augmentedDickeyFuller` and `kpss` side by side, as Kwiatkowski et al. 1992 (J. Econometrics 54, §1) propose. A record of more than
 * 20 000 readings is averaged over blocks first: sums of blocks have a unit root where the readings have one (Tiao 1972, Biometrika 59, 525–531).
 *
 * @param values gaps as NaN; @param trend deterministic part
 * @returns readings averaged into one (1: none) and the outcome: `stationary` where only the unit root is rejected, `unitRoot` where only stationarity is, `neither` (both rejected: neither
 *   description holds, as with a level shift or long memory), `open` (none rejected: too little to tell); null where a test cannot be made
 */
export function unitRootPair(
  values: Float64Array,
  trend: 'constant' | 'trend',
): (UnitRootPair & { readonly averaged: number }) | null {
  const averaged = Math.max(1, Math.ceil(values.length / MOST_READINGS));
  const readings = averagedRecord(values, averaged);
  const dickeyFuller = augmentedDickeyFuller(readings, trend);
  const against = kpss(readings, trend);
  if (dickeyFuller === null || against === null) return null;
  const outcome: UnitRootOutcome = dickeyFuller.rejects
    ? against.rejects
      ? 'neither'
      : 'stationary'
    : against.rejects
      ? 'unitRoot'
      : 'open';
  return { dickeyFuller, kpss: against, outcome, averaged };
}
