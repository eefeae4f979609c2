import type { Finding } from '../contract/forensics.ts';
import { normalQuantile } from '../distributions/normalQuantile.ts';
import { innovationsBy, whitenRecord, type Whitened } from './whitenRecord.ts';

const CHANCE = 1e-3;
/** No limit is below this: the autoregression is estimated on a record from which the step has been taken. */
const LEAST = 6;
/** Rounds of finding the place, removing the step and whitening again. */
const ROUNDS = 3;
const MOST_STEPS = 5;
/** In records longer than this a step worth a line shows at once, even through an autoregression that it has inflated. */
const LONG = 20_000;
const HOPELESS = 5;
/** A step this near to an end cannot be told from a few odd readings. */
const EDGE = 5;

interface Step {
  readonly at: number;
  readonly size: number;
  readonly statistic: number;
}

/** What was found, and the record without the steps. */
export interface Steps {
  readonly finding: Finding | null;
  readonly level: Float64Array;
  readonly whitened: Whitened;
}

/**
 * Steps of the level.
 *
 * Method: generalised least squares of a step at every place, with a mean, on the whitened record (level shift of Chen & Liu 1993, J. Am.
 * Stat. Assoc. 88, 284–297). A step inflates the autoregression that whitens it, so that the place of the largest statistic, its
 * removal and the whitening are repeated three times, and the size is judged with the autoregression of the record without it. The limit
 * is normal with Bonferroni's bound over n, at least 6. Found steps are removed and the next is sought, up to five.
 *
 * @param values gaps as NaN; @param whitened of `values`
 * @returns `finding` null for none; its places are the first reading of each new level, largest step first in `numbers`: size, statistic,
 *   limit, inDeviations (size over the standard deviation of the record without steps)
 */
export function findSteps(values: Float64Array, whitened: Whitened): Steps {
  const limit = Math.max(LEAST, -normalQuantile(CHANCE / (2 * values.length)));
  let level = values;
  let now = whitened;
  const found: Step[] = [];
  while (found.length < MOST_STEPS) {
    const next = oneStep(level, now);
    if (next === null || next.step.statistic < limit) break;
    found.push(next.step);
    level = without(level, next.step);
    now = next.whitened;
  }
  if (found.length === 0) return { finding: null, level, whitened: now };
  const [largest] = [...found].sort((a, b) => b.statistic - a.statistic);
  const places = found.map(({ at }) => ({ from: at, to: at + 1 })).sort((a, b) => a.from - b.from);
  const { size, statistic } = largest!;
  const numbers = { size, statistic, limit, inDeviations: Math.abs(size) / deviationOf(level), at: largest!.at };
  const finding: Finding = {
    code: 'levelStep',
    count: found.length,
    places,
    numbers,
    effect: 'memoryInvented',
    offered: [],
  };
  return { finding, level, whitened: now };
}

function oneStep(values: Float64Array, first: Whitened): { step: Step; whitened: Whitened } | null {
  let step = largestStep(first);
  if (values.length > LONG && (step === null || step.statistic < HOPELESS)) return null;
  let whitened = first;
  for (let round = 0; round < ROUNDS && step !== null; round++) {
    const calmer = whitenRecord(without(values, step));
    if (calmer === null) return null;
    const { coefficients, mean, scale } = calmer;
    const innovations = innovationsBy(values, coefficients, mean);
    const next = largestStep({ ...calmer, innovations, scale });
    whitened = calmer;
    const settled = next?.at === step.at;
    step = next;
    if (settled && round > 0) break;
  }
  return step === null ? null : { step, whitened };
}

function without(values: Float64Array, { at, size }: Step): Float64Array {
  return values.map((value, t) => (t >= at ? value - size : value));
}

/** The step of the largest statistic, mean estimated beside it; O(n p). */
function largestStep({ innovations: e, coefficients: a, scale }: Whitened): Step | null {
  const n = e.length;
  const p = a.length;
  const c = new Float64Array(p);
  let sum = 1;
  for (let k = 0; k < p; k++) {
    c[k] = sum;
    sum -= a[k]!;
  }
  const end = sum;
  let [total, count] = [0, 0];
  for (const one of e) {
    if (Number.isNaN(one)) continue;
    total += one;
    count++;
  }
  let [later, places] = [0, 0];
  let best: Step | null = null;
  for (let at = n - 1; at > p + EDGE; at--) {
    if (!Number.isNaN(e[at]!)) {
      later += e[at]!;
      places++;
    }
    if (places < EDGE || count - places < EDGE) continue;
    let se = end * later;
    let ss = end * end * places;
    let sm = end * places;
    for (let k = 0; k < p && at + k < n; k++) {
      if (Number.isNaN(e[at + k]!)) continue;
      se += (c[k]! - end) * e[at + k]!;
      ss += c[k]! ** 2 - end * end;
      sm += c[k]! - end;
    }
    // The mean's column is constant in the whitened record, whatever its size.
    const own = ss - (sm * sm) / count;
    if (!(own > 1e-9)) continue;
    const size = (se - (sm * total) / count) / own;
    const statistic = (Math.abs(size) * Math.sqrt(own)) / scale;
    if (best === null || statistic > best.statistic) best = { at, size, statistic };
  }
  return best;
}

function deviationOf(values: Float64Array): number {
  let [sum, squares, count] = [0, 0, 0];
  for (const value of values) if (!Number.isNaN(value)) [sum, count] = [sum + value, count + 1];
  for (const value of values) if (!Number.isNaN(value)) squares += (value - sum / count) ** 2;
  return Math.sqrt(squares / count);
}
