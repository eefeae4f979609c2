import type { Candidate, Level, Order } from '../contract/candidate.ts';
import type { SweepPlan, SweepRange } from '../contract/selection.ts';

/** A range of more candidates than this is walked, not gone through. */
const MOST = 400;

/**
 * The candidates of a range, shared out to workers.
 *
 * A part holds whole families (same differencing, season orders and level), since within a family one fit starts and bounds another.
 *
 * @param range see SweepRange; @param like lends transform, estimator and regressors to every candidate
 * @param workers parts wanted
 * @returns mode `walk` with places to start from where the range is large
 */
export function planSweep(range: SweepRange, like: Candidate, workers: number): SweepPlan {
  const families = familiesOf(range, like);
  const size = families.reduce((sum, family) => sum + family.length, 0);
  const walk = size > MOST;
  const lists = walk ? families.map((family) => startsOf(family)) : families;
  const parts: Candidate[][] = Array.from({ length: Math.max(1, Math.min(workers, lists.length)) }, () => []);
  // The longest first, each to the part that has least.
  for (const list of [...lists].sort((one, other) => other.length - one.length)) {
    const least = parts.reduce((one, other) => (other.length < one.length ? other : one));
    least.push(...list);
  }
  return { mode: walk ? 'walk' : 'all', size, parts };
}

function familiesOf(range: SweepRange, like: Candidate): Candidate[][] {
  const { d, D, s, levels } = range;
  const seasonal = s > 0;
  const families: Candidate[][] = [];
  for (const regular of d)
    for (const season of seasonal ? D : [0])
      for (const level of levels) {
        if (!allows(regular + season, level)) continue;
        for (const P of seasonal ? span(range.P) : [0])
          for (const Q of seasonal ? span(range.Q) : [0]) {
            const family: Candidate[] = [];
            for (const p of span(range.p))
              for (const q of span(range.q)) {
                const used = P + season + Q > 0;
                const order: Order = { p, d: regular, q, P, D: season, Q, s: used ? s : 0 };
                family.push({ ...like, order, level, zeroLags: { ar: [], ma: [], seasonalAr: [], seasonalMa: [] } });
              }
            families.push(family);
          }
      }
  return families;
}

/** Whether a level goes with so many differences. */
export function allows(differences: number, level: Level): boolean {
  return level === 'none' || (level === 'mean') === (differences === 0);
}

function span([least, most]: readonly [number, number]): number[] {
  return Array.from({ length: Math.max(0, most - least + 1) }, (_, i) => least + i);
}

/** The smallest candidate of a family and one in the middle. */
function startsOf(family: readonly Candidate[]): Candidate[] {
  const bySize = [...family].sort((one, other) => sizeOf(one) - sizeOf(other));
  const middle = bySize.find(({ order }) => order.p >= 1 && order.q >= 1);
  return middle === undefined || middle === bySize[0] ? bySize.slice(0, 1) : [bySize[0]!, middle];
}

/** Coefficients of a candidate beside its level. */
export function sizeOf({ order }: Candidate): number {
  return order.p + order.q + order.P + order.Q;
}
