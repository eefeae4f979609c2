import type { Candidate, Level, Order } from '../../workers/contract/candidate.ts';
import type { Axis } from '../../workers/contract/series.ts';

const DAY = 86_400;

/** A complete candidate for the page; the core checks it again. */
export function plainCandidate(order: Partial<Order>, level: Level): Candidate {
  return {
    order: { p: 0, d: 0, q: 0, P: 0, D: 0, Q: 0, s: 0, ...order },
    level,
    transform: { kind: 'none' },
    estimator: 'exact',
    zeroLags: { ar: [], ma: [], seasonalAr: [], seasonalMa: [] },
    regressors: [],
  };
}

/** The season in readings that the sampling interval suggests (a day, a week, a year), or 0. */
export function plausibleSeason(axis: Axis, readings: number): number {
  const season =
    axis.kind === 'months' ? 12 / axis.step : axis.kind === 'seconds' ? (axis.step === DAY ? 7 : DAY / axis.step) : 0;
  return Number.isInteger(season) && season >= 2 && season <= 24 && readings >= 4 * season ? season : 0;
}

/** What is fitted first on a new record: one short memory, one mixed, and one that wanders or has a season. */
export function startingCandidates(axis: Axis, readings: number): Candidate[] {
  const s = plausibleSeason(axis, readings);
  return [
    plainCandidate({ p: 1 }, 'mean'),
    plainCandidate({ p: 1, q: 1 }, 'mean'),
    s === 0 ? plainCandidate({ d: 1, q: 1 }, 'none') : plainCandidate({ p: 1, D: 1, Q: 1, s }, 'none'),
  ];
}

/** One text for one set of settings; equal candidates have equal keys. */
export function candidateKey(candidate: Candidate): string {
  return JSON.stringify(candidate);
}
