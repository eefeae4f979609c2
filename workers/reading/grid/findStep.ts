import { medianDifference } from './medianDifference.ts';

/** A regular axis that most stamps lie on. `bad`: stamps off it, or sharing a place with another. */
export interface StepFound {
  readonly step: number;
  /** A point of the grid. */
  readonly phase: number;
  readonly bad: number;
  readonly places: number;
  /** Mean distance from the grid, as a fraction of the step. */
  readonly distance: number;
}

/** Largest distance from a grid point, as a fraction of the step, that still counts as on it. */
export const DEFAULT_TOLERANCE = 0.25;
/** A grid of mostly gaps costs as much as this share of stamps off it. */
const GAP_COST = 0.2;
/** A mean distance of the whole step would cost this much. */
const DISTANCE_COST = 0.1;
/** An interval that no clock has must fit by this much better than one that a clock has. */
const ODD_COST = 0.002;
/** Mean distances below this fraction of the step are rounding. */
export const EXACT = 1e-7;
const MOST_DIFFERENCES = 200_000;
/** Differences closer than this fraction of the median are the same (rounding of decimals). */
const SAME = 1e-6;
/** A regression step this near to a clock's interval is that interval. */
const NICE = 0.005;

const niceSeconds = [1, 2, 3, 4, 5, 6, 10, 12, 15, 20, 30]
  .flatMap((n) => [n, n * 60])
  .concat(
    [1, 2, 3, 4, 6, 8, 12, 24, 48, 72, 168, 336].map((n) => n * 3600),
    [0.001, 0.002, 0.005, 0.01, 0.02, 0.05, 0.1, 0.2, 0.25, 0.5],
  );

const tidy = (value: number): number => Number(value.toPrecision(12));

/** The commonest differences between neighbours, commonest first. */
function commonDifferences(times: Float64Array, median: number): number[] {
  const unit = median * SAME;
  const counts = new Map<number, number>();
  const stride = Math.max(1, Math.floor(times.length / MOST_DIFFERENCES));
  for (let i = 1; i < times.length; i += stride) {
    const key = Math.round((times[i]! - times[i - 1]!) / unit);
    counts.set(key, (counts.get(key) ?? 0) + 1);
  }
  return [...counts]
    .sort((a, b) => b[1] - a[1] || b[0] - a[0])
    .slice(0, 5)
    .map(([key]) => Number((key * unit).toPrecision(6)));
}

/** Slope of the stamps on their count of steps: the mean interval where stamps jitter. */
function regressionStep(times: Float64Array, step: number): number {
  const n = times.length;
  let [k, sumK, sumT] = [0, 0, 0];
  const origin = times[0]!;
  for (let i = 1; i < n; i++) {
    k += Math.max(1, Math.round((times[i]! - times[i - 1]!) / step));
    sumK += k;
    sumT += times[i]! - origin;
  }
  let [sxy, sxx] = [0, 0];
  k = 0;
  for (let i = 0; i < n; i++) {
    if (i > 0) k += Math.max(1, Math.round((times[i]! - times[i - 1]!) / step));
    sxy += (k - sumK / n) * (times[i]! - origin - sumT / n);
    sxx += (k - sumK / n) ** 2;
  }
  return sxx > 0 ? sxy / sxx : step;
}

const BINS = 1000;

/** Where the grid lies between the stamps: the commonest remainder, or the circular mean where they are spread. */
function phaseOf(times: Float64Array, step: number, calendar: boolean): number {
  const origin = times[0]!;
  const bins = new Int32Array(BINS);
  const firstOf = new Int32Array(BINS).fill(-1);
  const restOf = (time: number): number => {
    const turns = (time - origin) / step;
    return turns - Math.floor(turns);
  };
  for (let i = 0; i < times.length; i++) {
    const bin = Math.floor((restOf(times[i]!) + 0.5 / BINS) * BINS) % BINS;
    bins[bin]!++;
    if (firstOf[bin]! < 0) firstOf[bin] = i;
  }
  const mode = bins.indexOf(Math.max(...bins));
  if (bins[mode]! * 2 >= times.length) return times[firstOf[mode]!]!;
  let [cosines, sines] = [0, 0];
  for (let i = 0; i < times.length; i++) {
    const angle = 2 * Math.PI * restOf(times[i]!);
    cosines += Math.cos(angle);
    sines += Math.sin(angle);
  }
  const phase = origin + (Math.atan2(sines, cosines) / (2 * Math.PI)) * step;
  if (!calendar) return phase;
  for (const unit of [step, 86400, 3600, 60, 1]) {
    const round = Math.round(phase / unit) * unit;
    if (unit <= step && Math.abs(phase - round) <= 0.05 * step) return round;
  }
  return phase;
}

function judge(times: Float64Array, step: number, calendar: boolean): StepFound {
  const phase = phaseOf(times, step, calendar);
  let bad = 0;
  let distance = 0;
  let last = -Infinity;
  for (let i = 0; i < times.length; i++) {
    const turns = (times[i]! - phase) / step;
    const place = Math.round(turns);
    const off = Math.abs(turns - place);
    distance += off;
    if (off > DEFAULT_TOLERANCE || place === last) bad++;
    last = place;
  }
  const places = Math.round((times.at(-1)! - times[0]!) / step) + 1;
  return { step, phase, bad, places, distance: distance / times.length };
}

/**
 * The sampling interval of a record and where its grid lies.
 *
 * Method: the commonest differences between neighbouring stamps, the median difference, and for stamps that jitter the
 * slope of stamp on count (rounded to a clock's interval where within 0.5 %) are tried; the step is taken that leaves the
 * fewest stamps off the grid or in a place already taken; gaps cost a fifth as much, distance from the grid a tenth.
 *
 * @param times ascending, distinct, at least two
 * @param calendar whether the stamps are seconds of a clock
 * @param fixed step the person has settled; then only the place of the grid is found
 * @returns step, a grid point, stamps that do not fit, and places from first to last
 */
export function findStep(times: Float64Array, calendar: boolean, fixed?: number): StepFound {
  if (fixed !== undefined) return judge(times, fixed, calendar);
  const median = medianDifference(times);
  const candidates = new Set(commonDifferences(times, median));
  for (const start of [median, ...[...candidates].slice(0, 1)]) {
    const slope = regressionStep(times, start);
    candidates.add(tidy(slope));
    if (calendar) {
      const nice = niceSeconds.find((seconds) => Math.abs(slope / seconds - 1) < NICE);
      if (nice !== undefined) candidates.add(nice);
    }
  }
  let best: StepFound | null = null;
  let least = Infinity;
  for (const step of candidates) {
    if (!(step > 0)) continue;
    const found = judge(times, step, calendar);
    const exact = found.distance < Math.max(EXACT, (4 * Number.EPSILON * Math.abs(times[0]!)) / step);
    const odd = calendar && !exact && !niceSeconds.includes(step) ? ODD_COST : 0;
    const gaps = GAP_COST * Math.max(0, 1 - times.length / found.places);
    const cost = found.bad / times.length + gaps + DISTANCE_COST * (exact ? 0 : found.distance) + odd;
    if (cost === 0) return found;
    if (cost < least - 1e-12 || (Math.abs(cost - least) <= 1e-12 && step > best!.step)) [best, least] = [found, cost];
  }
  return best!;
}
