import type { Regressor } from '../contract/candidate.ts';
import type { Axis } from '../contract/series.ts';
import type { AdviceReason, NamedPeriod, ShapeSpectrum, Sureness } from '../contract/shape.ts';
import { autocorrelation } from './autocorrelation.ts';
import { calendarPeriods } from './calendarPeriods.ts';

/** A season of the model longer than this costs more than it tells: harmonics describe it instead. */
const MOST_SEASON = 60;
/** Seasons a record must hold. */
const FEWEST_SEASONS = 4;
/** Seasonal differencing lowers the variance where the autocorrelation at the season is above one half. */
const PERSISTS = 0.5;
/** Autocorrelation at a calendar season that is worth a coefficient even where no line stands out. */
const WORTH = 0.2;

export interface SeasonAdvice {
  readonly s: number;
  readonly D: number;
  /** Autocorrelation of the first differences at the season; NaN without one. */
  readonly correlation: number;
  readonly regressors: readonly Regressor[];
  readonly sureness: Sureness;
  readonly reasons: readonly AdviceReason[];
}

/**
 * Which season, and whether to difference it.
 *
 * Method: a season is a period named in the periodogram, or the least whole number of readings of which all the named ones are harmonics, or a
 * calendar period at which the first differences are correlated. It is differenced where that correlation exceeds ½, which is where the
 * seasonal difference has the smaller variance: var ∇ₛx = 2 c₀ (1 − r_s) (Box & Jenkins, Time Series Analysis, §9.1.3). A season of more
 * than 60 readings, or of no whole number of them, is advised as harmonics. Common practice, thresholds our own.
 *
 * @param values gaps as NaN; @param axis of the record; @param spectrum of these values without differencing
 * @returns s = 0 where there is none
 */
export function adviseSeason(values: Float64Array, axis: Axis, spectrum: ShapeSpectrum): SeasonAdvice {
  const n = values.length;
  const none = { s: 0, D: 0, correlation: NaN, regressors: [] };
  const differences = values.map((value, t) => (t === 0 ? NaN : value - values[t - 1]!)).subarray(1);
  const strongest = spectrum.periods[0];
  const period = strongest === undefined ? null : fundamental(spectrum.periods, n);
  if (strongest !== undefined && period !== null) {
    const owner = spectrum.periods.find((one) => (one.calendar?.readings ?? one.period) === period) ?? strongest;
    const stands: AdviceReason = {
      about: 's',
      code: 'periodStands',
      numbers: { period, share: strongest.share, pValue: strongest.pValue, calendar: owner.calendar === null ? 0 : 1 },
    };
    const whole = Math.round(period);
    if (period > MOST_SEASON || whole !== period) {
      return {
        ...none,
        regressors: harmonics(spectrum.periods, period, n),
        sureness: 'likely',
        reasons: [
          stands,
          whole === period
            ? { about: 's', code: 'seasonTooLong', numbers: { period, most: MOST_SEASON } }
            : { about: 's', code: 'seasonNotWhole', numbers: { period } },
        ],
      };
    }
    if (whole >= 2 && n >= FEWEST_SEASONS * whole) {
      const r = correlationsAt(differences, whole)[whole - 1]!;
      // A line in the periodogram that the season's own correlation does not bear out is not one to difference.
      return { ...judged(whole, r), reasons: [stands, ...judged(whole, r).reasons] };
    }
  }
  for (const { readings } of [...calendarPeriods(axis)].reverse()) {
    const s = Math.round(readings);
    if (Math.abs(s - readings) > 1e-6 || s < 3 || s > MOST_SEASON || n < FEWEST_SEASONS * s) continue;
    const found = correlationsAt(differences, s + 1);
    const r = found[s - 1]!;
    const beside = Math.max(s > 2 ? found[s - 2]! : -1, found[s]!);
    if (!(r > WORTH && r > 3 / Math.sqrt(n) && r > beside + 0.1)) continue;
    const advice = judged(s, r);
    return {
      ...advice,
      sureness: 'likely',
      reasons: [{ about: 's', code: 'lagSeason', numbers: { s, r } }, ...advice.reasons],
    };
  }
  return { ...none, sureness: 'clear', reasons: [{ about: 's', code: 'noSeason', numbers: {} }] };
}

function judged(s: number, r: number): SeasonAdvice {
  const D = r > PERSISTS ? 1 : 0;
  const sureness = r > 0.7 || r < 0.3 ? 'clear' : 'likely';
  const reasons: AdviceReason[] = [{ about: 'D', code: D === 1 ? 'seasonPersists' : 'seasonFixed', numbers: { s, r } }];
  return { s, D, correlation: r, regressors: [], sureness, reasons };
}

function correlationsAt(differences: Float64Array, lags: number): Float64Array {
  return autocorrelation(differences, lags).correlations;
}

/** The period of which the named ones are harmonics: the shortest that accounts for nearly all that the best one does. */
function fundamental(periods: readonly NamedPeriod[], n: number): number | null {
  const tried = periods.flatMap(({ period, calendar }) =>
    calendar === null
      ? [1, 2, 3, 4].map((k) => nearWhole(k * period, k, n))
      : [calendar.readings, calendar.readings / calendar.harmonic],
  );
  const accounted = (base: number): number =>
    periods.reduce((sum, { frequency, share }) => {
      const multiple = Math.round(frequency * base);
      return sum + (multiple >= 1 && Math.abs(frequency - multiple / base) < 0.5 / n ? share : 0);
    }, 0);
  const possible = tried.filter((base) => base >= 2 - 1e-9 && base <= n / 3);
  if (possible.length === 0) return null;
  const most = Math.max(...possible.map(accounted));
  return Math.min(...possible.filter((base) => accounted(base) >= 0.9 * most));
}

/** A period that cannot be told from a whole number of readings is that number. */
function nearWhole(base: number, harmonic: number, n: number): number {
  const whole = Math.round(base);
  return whole >= 2 && Math.abs(harmonic / base - harmonic / whole) < 0.5 / n ? whole : base;
}

/** Harmonics of the period that stand out, at most four. */
function harmonics(periods: readonly NamedPeriod[], period: number, n: number): Regressor[] {
  const found = new Set<number>();
  for (const { frequency } of periods) {
    const k = Math.round(frequency * period);
    if (k >= 1 && 2 * k <= period && Math.abs(frequency - k / period) < 0.5 / n) found.add(k);
  }
  return [...found]
    .sort((a, b) => a - b)
    .slice(0, 4)
    .map((k) => ({ kind: 'harmonic', period, k }));
}
