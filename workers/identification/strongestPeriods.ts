import type { Axis } from '../contract/series.ts';
import type { NamedPeriod, ShapeSpectrum } from '../contract/shape.ts';
import { brentMinimise } from '../numeric/brentMinimise.ts';
import { calendarPeriods } from './calendarPeriods.ts';
import { fisherG } from './fisherG.ts';
import { periodogram } from './periodogram.ts';
import { spectralBackground, type SpectralBackground } from './spectralBackground.ts';

const MOST_PERIODS = 6;
/** Probability below which a peak is named. */
const NAMED = 0.01;
/** Cycles a record must hold before a period is named. */
const FEWEST_CYCLES = 3;
const DRAWN = 1200;

/**
 * Periodogram with the periods that stand out of it.
 *
 * Method: each ordinate over what its surroundings would give (`spectralBackground`); without a period an ordinate is exponential in large samples
 * (Brockwell & Davis, Time Series: Theory and Methods, 2nd ed., §10.3), and its ratio to a background known as well as a mean of ν ordinates exceeds
 * x with probability u = (1 + x/ν)^{−ν}, the tail of F with 2 and 2ν degrees of freedom; the largest of m does with 1 − (1 − u)^m. Peaks are taken one by one, the least likely first; an ordinate within two Fourier spacings of a larger one belongs to it. The
 * frequency is refined at the maximum of the periodogram between its neighbours. A calendar period, or one of its first six harmonics, gives its
 * name where it lies within half a Fourier spacing. Fisher's g of the largest ordinate is against independent readings, with no memory.
 *
 * @param values length n, gaps as NaN (entered as the mean); @param axis interval of the readings, for the names
 * @param step readings from one value to the next: more than 1 where a long record was averaged first
 * @returns empty arrays for fewer than 16 readings or no variation
 */
export function strongestPeriods(values: Float64Array, axis: Axis, step = 1): ShapeSpectrum {
  const n = values.length;
  const { frequencies, ordinates } = periodogram(values);
  const m = frequencies.length;
  const total = ordinates.reduce((sum, value) => sum + value, 0);
  const inside = n % 2 === 0 ? m - 1 : m;
  const none = { frequencies: new Float64Array(0), ordinates: new Float64Array(0), background: new Float64Array(0) };
  if (n < 16 || !(total > 0))
    return { ...none, periods: [], averaged: step, fisher: { statistic: NaN, pValue: NaN, ordinates: 0 } };
  const known = spectralBackground(ordinates);
  const background = known.expected;
  let largest = 0;
  let sum = 0;
  for (let i = 0; i < inside; i++) {
    sum += ordinates[i]!;
    if (ordinates[i]! > largest) largest = ordinates[i]!;
  }
  const periods = peaks(ordinates, known).map((at): NamedPeriod => {
    const contrast = ordinates[at]! / background[at]!;
    const frequency = refined(values, frequencies[at]!);
    const period = step / frequency;
    return {
      frequency: frequency / step,
      period,
      calendar: named(axis, period, n * step),
      share: [at - 1, at, at + 1].reduce((part, i) => part + (ordinates[i] ?? 0), 0) / total,
      contrast,
      pValue: -Math.expm1(m * Math.log1p(-chance(contrast, known.ordinates[at]!))),
    };
  });
  const statistic = largest / sum;
  return {
    ...drawn(frequencies, ordinates, background, step),
    periods,
    averaged: step,
    fisher: { statistic, pValue: fisherG(statistic, inside), ordinates: inside },
  };
}

/** P(ratio > x) for an exponential over a background known as well as a mean of ν. */
function chance(x: number, ordinates: number): number {
  return Math.exp(-ordinates * Math.log1p(x / ordinates));
}

/** Places of the peaks, least likely first. */
function peaks(ordinates: Float64Array, known: SpectralBackground): number[] {
  const m = ordinates.length;
  const limit = -Math.expm1(Math.log1p(-NAMED) / m);
  const standing: { at: number; p: number }[] = [];
  for (let at = FEWEST_CYCLES - 1; at < m; at++) {
    const p = chance(ordinates[at]! / known.expected[at]!, known.ordinates[at]!);
    if (p < limit) standing.push({ at, p });
  }
  standing.sort((a, b) => a.p - b.p);
  const kept: number[] = [];
  for (const { at } of standing) {
    if (kept.length >= MOST_PERIODS) break;
    if (kept.every((other) => Math.abs(other - at) > 2)) kept.push(at);
  }
  return kept;
}

/** Frequency of the maximum of |Σ x_t exp(−2πift)| within one Fourier spacing. */
function refined(values: Float64Array, frequency: number): number {
  const n = values.length;
  let total = 0;
  let count = 0;
  for (const value of values) {
    if (Number.isNaN(value)) continue;
    total += value;
    count++;
  }
  const middle = total / count;
  const negative = (f: number) => {
    // One rotation a reading: the angle itself is taken up anew every 1 024 readings, so that rounding does not add up.
    const turn = { re: Math.cos(2 * Math.PI * f), im: Math.sin(2 * Math.PI * f) };
    let [re, im, c, s] = [0, 0, 1, 0];
    for (let t = 0; t < n; t++) {
      if (t % 1024 === 0) [c, s] = [Math.cos(2 * Math.PI * f * t), Math.sin(2 * Math.PI * f * t)];
      const value = values[t]!;
      if (!Number.isNaN(value)) {
        re += (value - middle) * c;
        im += (value - middle) * s;
      }
      [c, s] = [c * turn.re - s * turn.im, s * turn.re + c * turn.im];
    }
    return -(re * re + im * im);
  };
  const top = Math.min(0.5, frequency + 1 / n);
  if (frequency >= 0.5) return 0.5;
  return brentMinimise(negative, frequency - 1 / n, top, 1e-3 / n).x;
}

function named(axis: Axis, period: number, places: number): NamedPeriod['calendar'] {
  for (let harmonic = 1; harmonic <= 6; harmonic++) {
    for (const { name, readings } of calendarPeriods(axis)) {
      // A fundamental of less than three cycles cannot be told from its neighbours.
      if (places < FEWEST_CYCLES * readings) continue;
      if (Math.abs(1 / period - harmonic / readings) < 0.5 / places) return { name, readings, harmonic };
    }
  }
  return null;
}

/** At most `DRAWN` points, each the largest ordinate of its stretch, stretches of equal length in log frequency where they hold many. */
function drawn(frequencies: Float64Array, ordinates: Float64Array, background: Float64Array, step: number) {
  const m = frequencies.length;
  const kept: number[] = [];
  if (m <= DRAWN) for (let i = 0; i < m; i++) kept.push(i);
  else {
    const ratio = m ** (1 / DRAWN);
    for (let from = 0; from < m;) {
      const to = Math.max(from + 1, Math.min(m, Math.ceil((from + 1) * ratio) - 1));
      let best = from;
      for (let i = from; i < to; i++) if (ordinates[i]! > ordinates[best]!) best = i;
      kept.push(best);
      from = to;
    }
  }
  return {
    frequencies: Float64Array.from(kept, (i) => frequencies[i]! / step),
    ordinates: Float64Array.from(kept, (i) => ordinates[i]!),
    background: Float64Array.from(kept, (i) => background[i]!),
  };
}
