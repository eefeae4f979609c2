import type { Finding } from '../contract/forensics.ts';
import type { Span } from '../contract/series.ts';
import { normalUpperTail } from '../distributions/normalUpperTail.ts';
import { gapRunsOf } from './gapRunsOf.ts';
import { runsWhere } from './runsWhere.ts';
import { whitenRecord } from './whitenRecord.ts';

/** Runs as long as these come about by chance in one clean record of so many. */
const CHANCE = 5e-4;
/** Law with more mass in the middle than the normal: its probability of staying is raised to this power. */
const PEAKED = 0.85;
const SHORTEST = 4;

/**
 * Stretches in which the reading did not change.
 *
 * Method: runs of one value longer than chance allows. Whatever the memory of a Gaussian record, the next reading is normal about
 * its expectation with the innovation's standard deviation σ, so that it falls into one given step r of the readings with probability
 * at most λ = P(|Z| ≤ r/2σ); n λ^(L−1) bounds the expected number of runs of L. σ is that of the record with the runs of at least
 * four taken out, less the variance of rounding r²/12. Without rounding four equal readings never come about.
 *
 * @param values gaps as NaN; @param resolution smallest step, 0 for none
 * @returns a finding or null; `numbers`: longest, least (length from which a run is no chance), readings. The first reading of each
 *   run is kept: it was measured.
 */
export function findFrozen(values: Float64Array, resolution: number): Finding | null {
  const same = (t: number) => t > 0 && values[t] === values[t - 1];
  const repeats = runsWhere(values.length, same, SHORTEST - 1);
  if (repeats.length === 0) return null;
  const least = Math.max(SHORTEST, shortestFrozen(values, resolution, repeats));
  const frozen = repeats.filter(({ from, to }) => to - from >= least - 1);
  if (frozen.length === 0) return null;
  const lengths = frozen.map(({ from, to }) => to - from + 1);
  return {
    code: 'frozen',
    count: frozen.length,
    places: frozen,
    numbers: {
      longest: lengths.reduce((a, b) => Math.max(a, b), 0),
      least,
      readings: frozen.reduce((sum, { from, to }) => sum + to - from, 0),
    },
    effect: 'memoryInvented',
    offered: [{ kind: 'gaps', runs: gapRunsOf(frozen) }],
  };
}

/** Length of a run from which on it is no chance; Infinity where that cannot be known. */
function shortestFrozen(values: Float64Array, resolution: number, repeats: readonly Span[]): number {
  if (!(resolution > 0)) return SHORTEST;
  const moving = values.slice();
  const longest = repeats.reduce((one, other) => (other.to - other.from > one.to - one.from ? other : one));
  moving.fill(NaN, longest.from, longest.to);
  const whitened = whitenRecord(moving);
  const spread = whitened === null ? NaN : spreadOf(whitened.innovations);
  if (!(spread > 0)) return Infinity;
  let gain = 1;
  for (const a of whitened!.coefficients) gain += a * a;
  // Rounding noise passes the autoregression with this gain; at least a fifth of the variance is the process's own.
  const sigma = Math.sqrt(Math.max(spread ** 2 - (gain * resolution ** 2) / 12, 0.2 * spread ** 2));
  const stay = (1 - 2 * normalUpperTail(resolution / (2 * sigma))) ** PEAKED;
  return 1 + Math.ceil(Math.log(CHANCE / values.length) / Math.log(stay));
}

function spreadOf(innovations: Float64Array): number {
  let [sum, count] = [0, 0];
  for (const e of innovations) {
    if (Number.isNaN(e)) continue;
    sum += e * e;
    count++;
  }
  return Math.sqrt(sum / count);
}
