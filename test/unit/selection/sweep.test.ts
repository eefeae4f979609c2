import { describe, expect, it } from 'vitest';
import type { Fit } from '../../../workers/contract/fit.ts';
import type { SweepRange, SweepReport } from '../../../workers/contract/selection.ts';
import { candidateOf } from '../../../workers/model/candidateOf.ts';
import { simulateRecord } from '../../../workers/model/simulateRecord.ts';
import { createRandom } from '../../../workers/numeric/random.ts';
import { planSweep } from '../../../workers/selection/planSweep.ts';
import { rankSweep } from '../../../workers/selection/rankSweep.ts';
import { sweepFits } from '../../../workers/selection/sweepFits.ts';
import { isNested } from '../../../workers/estimation/neighbourStarts.ts';

const like = candidateOf({ order: { p: 0, d: 0, q: 0, P: 0, D: 0, Q: 0, s: 0 } });
const plain: SweepRange = {
  p: [0, 3],
  q: [0, 3],
  P: [0, 0],
  Q: [0, 0],
  d: [0],
  D: [0],
  s: 0,
  levels: ['none', 'mean'],
};

function record(ar: number[], ma: number[], n: number, seed: number): Float64Array {
  const at = { ar, ma, seasonalAr: [], seasonalMa: [], mean: 0, regression: [], innovationVariance: 1 };
  const order = { p: ar.length, d: 0, q: ma.length, P: 0, D: 0, Q: 0, s: 0 };
  return simulateRecord({ order, at, length: n, random: createRandom(seed) });
}

function sweep(values: Float64Array, range: SweepRange, mode: 'all' | 'walk' = 'all') {
  const plan = planSweep(range, like, 1);
  const news: SweepReport[] = [];
  sweepFits({ values, candidates: plan.parts[0]!, mode, range, seed: 1 }, (each) => news.push(each));
  const fits = news.flatMap((each) => each.fits);
  const count = (what: 'failed' | 'passedOver') => news.reduce((sum, each) => sum + each[what], 0);
  return { plan, fits, failed: count('failed'), passedOver: count('passedOver') };
}

const nameOf = ({ candidate: { order, level } }: Fit) => `${order.p}${order.d}${order.q}${level}`;

describe('the plan of a sweep', () => {
  it('holds every candidate once, levels only where they go with the differencing', () => {
    const range: SweepRange = {
      ...plain,
      d: [0, 1],
      D: [0, 1],
      P: [0, 1],
      Q: [0, 1],
      s: 12,
      levels: ['none', 'mean', 'drift'],
    };
    const { parts, size, mode } = planSweep(range, like, 3);
    const all = parts.flat();
    // 16 (p,q) × 4 (P,Q) × [d = D = 0: none, mean; three other differencings: none, drift].
    expect(size).toBe(16 * 4 * 8);
    expect(mode).toBe('walk');
    for (const { order, level } of all) {
      const differences = order.d + order.D;
      expect(level === 'mean' ? differences === 0 : level === 'drift' ? differences > 0 : true).toBe(true);
      expect(order.s).toBe(order.P + order.D + order.Q > 0 ? 12 : 0);
    }
    expect(new Set(all.map((each) => JSON.stringify(each))).size).toBe(all.length);
  });

  it('goes through a small range whole, shared out without loss', () => {
    const { parts, size, mode } = planSweep(plain, like, 2);
    expect([size, mode, parts.length]).toEqual([32, 'all', 2]);
    expect(parts.flat()).toHaveLength(32);
  });
});

describe('a sweep', () => {
  const values = record([0.7], [0.4], 500, 11);
  const found = sweep(values, plain);

  it('accounts for every candidate, and passes over many of a large range', () => {
    // A largest candidate made again is reported twice; the last one counts.
    const names = new Set(found.fits.map(nameOf));
    expect(names.size + found.failed + found.passedOver).toBe(32);
    // In a long record no short moving average comes near: (0,0) … (0,3) are bounded by (0,4).
    const wide = sweep(record([0.7], [0.4], 2000, 11), { ...plain, p: [0, 4], q: [0, 4], levels: ['none'] });
    expect(new Set(wide.fits.map(nameOf)).size + wide.failed + wide.passedOver).toBe(25);
    expect(wide.passedOver).toBeGreaterThanOrEqual(4);
  });

  it('passes over nothing that belongs among the best', () => {
    const whole = planSweep(plain, like, 1).parts[0]!.map((candidate) => {
      const news: SweepReport[] = [];
      sweepFits({ values, candidates: [candidate], mode: 'all', range: plain, seed: 1 }, (each) => news.push(each));
      return news.flatMap(({ fits }) => fits)[0]!;
    });
    const least = Math.min(...whole.map(({ criteria }) => criteria.aic));
    const good = whole.filter(({ criteria }) => criteria.aic < least + 4).map(nameOf);
    const names = found.fits.map(nameOf);
    for (const name of good) expect(names).toContain(name);
  });

  it('never leaves a larger candidate below one nested in it', () => {
    const last = new Map(found.fits.map((fit) => [nameOf(fit), fit]));
    for (const larger of last.values())
      for (const smaller of last.values())
        if (isNested(smaller.candidate, larger.candidate))
          expect(larger.logLikelihood).toBeGreaterThan(smaller.logLikelihood - 1e-4);
  });

  it('ranks the true orders among the best and folds cancelling pairs', () => {
    const last = [...new Map(found.fits.map((fit) => [nameOf(fit), fit])).values()];
    const ranking = rankSweep(last);
    const best = ranking.groups[0]!.members.slice(0, 4).map(({ index }) => nameOf(last[index]!));
    expect(best).toContain('101none');
    for (const { index, into } of ranking.folded) {
      expect(isNested(last[into]!.candidate, last[index]!.candidate)).toBe(true);
      expect(last[index]!.logLikelihood - last[into]!.logLikelihood).toBeLessThan(1);
    }
    const listed = ranking.groups.flatMap(({ members }) => members.map(({ index }) => index));
    expect(listed.length + ranking.folded.length).toBe(last.length);
  });

  it('does not fit a record far from zero without a level, except differenced', () => {
    const shifted = values.map((value) => value + 100);
    const range: SweepRange = { ...plain, p: [0, 1], q: [0, 1], d: [0, 1] };
    const { fits, passedOver, failed } = sweep(shifted, range);
    expect(fits.some(({ candidate }) => candidate.level === 'none' && candidate.order.d === 0)).toBe(false);
    expect(fits.some(({ candidate }) => candidate.level === 'none' && candidate.order.d === 1)).toBe(true);
    expect(new Set(fits.map(nameOf)).size + passedOver + failed).toBe(12);
  });

  it('walks to the same best as going through', () => {
    const walked = sweep(values, plain, 'walk');
    const least = (fits: readonly Fit[]) => Math.min(...fits.map(({ criteria }) => criteria.aic));
    expect(least(walked.fits)).toBeCloseTo(least(found.fits), 2);
    expect(walked.fits.length).toBeLessThanOrEqual(32);
  });
});
