import type { Candidate } from '../contract/candidate.ts';
import type { Fit } from '../contract/fit.ts';
import type { SweepReport, SweepRequest } from '../contract/selection.ts';
import { fitCandidate } from '../estimation/fitCandidate.ts';
import { isNested } from '../estimation/neighbourStarts.ts';
import { centredSumOfSquares } from '../numeric/centredSumOfSquares.ts';
import { mean } from '../numeric/mean.ts';
import { allows, sizeOf } from './planSweep.ts';

/** A candidate whose AIC cannot come within this of the best of its differencing is passed over. */
const HOPELESS = 12;
/** A candidate two coefficients beyond the best is passed over where everything one coefficient smaller is this far above it. */
const TIRED = 8;
/** A record farther from 0 than this many of its standard deviations is not modelled without a level: only a unit root could stand in for it. */
const FAR_FROM_ZERO = 10;
/** A larger fit this far below one nested in it is made again from there. */
const SHORTFALL = 1e-6;

/**
 * Fits the candidates of a sweep, each started from those nested in it.
 *
 * Method, `all`: of each family the largest candidate and the largest pure AR and MA first, whose ln L bound every one nested in them; then the rest,
 * smallest first. A candidate is passed over that would not come within 12 of the best AIC even at its bound, or that has two coefficients more than the best and
 * whose every neighbour with one fewer is 8 above it: one coefficient more would have to gain 5 in ln L. `walk`: from each start to the neighbour (one order more or
 * fewer, or another level) with the lowest AIC, until none is lower.
 *
 * A record that lies far from 0 is not fitted without a level unless it is differenced.
 *
 * @param request record, candidates and mode; @param report called after every fit with what is new
 */
export function sweepFits(request: SweepRequest, report: (news: SweepReport) => void): void {
  const done: Fit[] = [];
  const far = isFarFromZero(request.values.subarray(request.window?.from ?? 0, request.window?.to));
  const fit = (candidate: Candidate): Fit | null => {
    if (far && needsLevel(candidate)) {
      report({ fits: [], failed: 0, passedOver: 1 });
      return null;
    }
    const { values, window, columns, seed, seriesHash } = request;
    const made = fitCandidate({
      values,
      candidate,
      seed,
      effort: 'first',
      neighbours: done,
      ...(window === undefined ? {} : { window }),
      ...(columns === undefined ? {} : { columns }),
      ...(seriesHash === undefined ? {} : { seriesHash }),
    });
    if (!made.ok) {
      report({ fits: [], failed: 1, passedOver: 0 });
      return null;
    }
    done.push(made.value);
    report({ fits: [made.value], failed: 0, passedOver: 0 });
    return made.value;
  };
  if (request.mode === 'walk') walk(request, fit);
  else goThrough(request.candidates, done, fit, report);
}

/** Without differencing, level, transform or input that could carry the mean of the record. */
function needsLevel({ order, level, transform, regressors }: Candidate): boolean {
  return level === 'none' && order.d + order.D === 0 && transform.kind === 'none' && regressors.length === 0;
}

function isFarFromZero(values: Float64Array): boolean {
  const observed = values.filter((value) => !Number.isNaN(value));
  const centre = mean(observed);
  const spread = Math.sqrt(centredSumOfSquares(observed) / Math.max(1, observed.length - 1));
  return Math.abs(centre) > FAR_FROM_ZERO * spread;
}

function goThrough(
  candidates: readonly Candidate[],
  done: Fit[],
  fit: (candidate: Candidate) => Fit | null,
  report: (news: SweepReport) => void,
): void {
  const families = new Map<string, Candidate[]>();
  for (const candidate of candidates) {
    const key = familyKey(candidate);
    families.set(key, [...(families.get(key) ?? []), candidate]);
  }
  for (const family of families.values()) {
    const bySize = [...family].sort((one, other) => sizeOf(one) - sizeOf(other));
    const largest = bySize.at(-1)!;
    // The largest pure AR and pure MA bound the smaller ones, which one of the two usually shows to be hopeless.
    const pure = (name: 'p' | 'q') => bySize.filter(({ order }) => order[name === 'p' ? 'q' : 'p'] === 0).at(-1);
    const first = new Set([largest, pure('p') ?? largest, pure('q') ?? largest]);
    const firstFits = [...first].map((candidate) => fit(candidate));
    const top = firstFits[0] ?? null;
    for (const candidate of bySize) {
      if (first.has(candidate)) continue;
      if (isHopeless(candidate, done)) {
        report({ fits: [], failed: 0, passedOver: 1 });
        continue;
      }
      fit(candidate);
    }
    // The largest was made without the help of those nested in it.
    const better =
      top !== null &&
      done.some(
        (other) =>
          other !== top &&
          other.logLikelihood > top.logLikelihood + SHORTFALL &&
          isNested(other.candidate, top.candidate),
      );
    if (better) {
      done.splice(done.indexOf(top), 1);
      fit(largest);
    }
  }
}

function isHopeless(candidate: Candidate, done: readonly Fit[]): boolean {
  const best = bestOf(candidate, done);
  if (best === null) return false;
  const bound = boundOf(candidate, done);
  if (bound !== null && bound > best.criteria.aic + HOPELESS) return true;
  if (sizeOf(candidate) < sizeOf(best.candidate) + 2) return false;
  const parents = done.filter(
    ({ candidate: other }) => sizeOf(other) === sizeOf(candidate) - 1 && isNested(other, candidate),
  );
  return parents.length > 0 && parents.every(({ criteria }) => criteria.aic > best.criteria.aic + TIRED);
}

/** The lowest AIC that a candidate could have, from fits of candidates it is nested in; null without one. */
function boundOf(candidate: Candidate, done: readonly Fit[]): number | null {
  let highest = Infinity;
  let parameters = 0;
  for (const other of done) {
    if (!isNested(candidate, other.candidate) || other.logLikelihood >= highest) continue;
    highest = other.logLikelihood;
    const spared = sizeOf(other.candidate) - sizeOf(candidate) + Number(other.candidate.level !== candidate.level);
    parameters = other.parameterCount - spared;
  }
  return highest === Infinity ? null : -2 * highest + 2 * parameters;
}

/** The fit with the lowest AIC so far among those with the same differencing. */
function bestOf({ order }: Candidate, done: readonly Fit[]): Fit | null {
  let best: Fit | null = null;
  for (const fit of done) {
    const { order: other } = fit.candidate;
    const same = other.d === order.d && other.D === order.D && (order.D === 0 || other.s === order.s);
    if (same && (best === null || fit.criteria.aic < best.criteria.aic)) best = fit;
  }
  return best;
}

function familyKey({ order, level }: Candidate): string {
  return [order.d, order.D, order.P, order.Q, order.s, level].join();
}

function walk(request: SweepRequest, fit: (candidate: Candidate) => Fit | null): void {
  const seen = new Map<string, Fit | null>();
  const visit = (candidate: Candidate): Fit | null => {
    const key = `${JSON.stringify(candidate.order)}${candidate.level}`;
    if (!seen.has(key)) seen.set(key, fit(candidate));
    return seen.get(key)!;
  };
  for (const start of request.candidates) {
    let here = visit(start);
    while (here !== null) {
      const from: Fit = here;
      const near: Fit[] = neighboursOf(from.candidate, request).flatMap((candidate) => visit(candidate) ?? []);
      const best = near.reduce((one, other) => (other.criteria.aic < one.criteria.aic ? other : one), from);
      if (best === from) break;
      here = best;
    }
  }
}

/** One order more or fewer, p and q together, or another level, within the range. */
function neighboursOf(candidate: Candidate, { range }: SweepRequest): Candidate[] {
  const { order, level } = candidate;
  const steps = [
    { p: 1 },
    { p: -1 },
    { q: 1 },
    { q: -1 },
    { p: 1, q: 1 },
    { p: -1, q: -1 },
    { p: 1, q: -1 },
    { p: -1, q: 1 },
    ...(range.s > 0 ? [{ P: 1 }, { P: -1 }, { Q: 1 }, { Q: -1 }] : []),
  ] as const;
  const moved = steps.flatMap((step): Candidate[] => {
    const next = { ...order };
    for (const [name, by] of Object.entries(step) as ['p' | 'q' | 'P' | 'Q', number][]) {
      next[name] += by;
      if (next[name] < range[name][0] || next[name] > range[name][1]) return [];
    }
    const seasonal = next.P + next.D + next.Q > 0;
    return [{ ...candidate, order: { ...next, s: seasonal ? range.s : 0 } }];
  });
  const levels = range.levels.filter((other) => other !== level && allows(order.d + order.D, other));
  return [...moved, ...levels.map((other) => ({ ...candidate, level: other }))];
}
