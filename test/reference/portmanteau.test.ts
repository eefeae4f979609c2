import { describe, expect, it } from 'vitest';
import type { Candidate, Level, Order } from '../../workers/contract/candidate.ts';
import { diagnoseFit } from '../../workers/diagnostics/diagnoseFit.ts';
import { innovationsOf } from '../../workers/diagnostics/innovationsOf.ts';
import { portmanteau } from '../../workers/diagnostics/portmanteau.ts';
import { autocorrelation } from '../../workers/identification/autocorrelation.ts';
import { partialAutocorrelation } from '../../workers/identification/partialAutocorrelation.ts';
import { fitted } from '../helpers/fitted.ts';
import { publishedSeries, type PublishedName } from '../helpers/publishedSeries.ts';

/**
 * Statistics of the exact innovations of published series at their exact maximum likelihood, computed independently (dense covariance,
 * 34-digit estimates; SOURCES.md). `raw`: innovations as they stand; `standardised`: each over its own standard deviation. Box & Jenkins,
 * Time Series Analysis, chapter 8, print 28.4 and 31.9 for Series A, 38.8 for B, 26.8 and 20.0 for E, 14.7 for F, from least-squares
 * residuals: nearby, not equal.
 */
interface Case {
  readonly name: string;
  readonly series: PublishedName;
  readonly order: Partial<Order>;
  readonly level: Level;
  readonly transform?: Candidate['transform'];
  readonly lag: number;
  readonly raw?: { ljungBox: number; boxPierce?: number; monti?: number };
  readonly standardised?: { ljungBox: number; boxPierce?: number; monti?: number };
}

const airline = { d: 1, q: 1, D: 1, Q: 1, s: 12 };
const CASES: readonly Case[] = [
  {
    name: 'Series F AR(2), 15 lags',
    series: 'seriesF',
    order: { p: 2 },
    level: 'mean',
    lag: 15,
    raw: { ljungBox: 7.144, boxPierce: 5.965, monti: 7.234 },
  },
  {
    name: 'Series F AR(2), 25 lags',
    series: 'seriesF',
    order: { p: 2 },
    level: 'mean',
    lag: 25,
    raw: { ljungBox: 14.524, boxPierce: 11.192, monti: 20.138 },
    standardised: { ljungBox: 14.55 },
  },
  {
    name: 'Series A (1,0,1), 25 lags',
    series: 'seriesA',
    order: { p: 1, q: 1 },
    level: 'mean',
    lag: 25,
    raw: { ljungBox: 27.916, boxPierce: 25.964, monti: 26.91 },
    standardised: { ljungBox: 27.91 },
  },
  {
    name: 'Series A (0,1,1), 25 lags',
    series: 'seriesA',
    order: { d: 1, q: 1 },
    level: 'none',
    lag: 25,
    raw: { ljungBox: 32.47 },
    standardised: { ljungBox: 32.13 },
  },
  {
    name: 'Series B (0,1,1), 25 lags',
    series: 'seriesB',
    order: { d: 1, q: 1 },
    level: 'none',
    lag: 25,
    raw: { ljungBox: 39.36 },
    standardised: { ljungBox: 39.36 },
  },
  {
    name: 'Series E AR(2), 25 lags',
    series: 'seriesE',
    order: { p: 2 },
    level: 'mean',
    lag: 25,
    raw: { ljungBox: 22.4 },
    standardised: { ljungBox: 24.89 },
  },
  {
    name: 'Series E AR(3), 25 lags',
    series: 'seriesE',
    order: { p: 3 },
    level: 'mean',
    lag: 25,
    raw: { ljungBox: 15.22 },
    standardised: { ljungBox: 17.7 },
  },
  {
    name: 'log airline (0,1,1)(0,1,1)₁₂, 24 lags',
    series: 'airline',
    order: airline,
    level: 'none',
    transform: { kind: 'log' },
    lag: 24,
    standardised: { ljungBox: 23.862, boxPierce: 20.792, monti: 25.173 },
  },
];

/** Half a unit in the last place printed. */
const printed = (found: number, value: number) => {
  const decimals = (value.toString().split('.')[1] ?? '').length;
  const step = 10 ** -Math.max(decimals, 2);
  expect(Math.abs(found - value)).toBeLessThanOrEqual(0.51 * step);
};

describe('portmanteau statistics of published series', () => {
  it.each(CASES)('$name', ({ series, order, level, transform, lag, raw, standardised }) => {
    const values = publishedSeries(series);
    const fit = fitted(values, order, level, transform ? { transform } : {});
    const made = innovationsOf(fit, values);
    if (!made.ok) throw new Error(made.failure.code);
    for (const [kind, wanted] of [
      ['values', raw],
      ['standardised', standardised],
    ] as const) {
      if (wanted === undefined) continue;
      const x = made.value[kind].filter((value) => !Number.isNaN(value));
      const { correlations, pairs } = autocorrelation(x, lag, 'zero');
      const size = { length: x.length, observed: x.length, pairs };
      const at = (method: 'ljungBox' | 'monti', values: Float64Array) =>
        portmanteau({ method, correlations: values, size, coefficients: 0 }).statistics[lag - 1]!;
      printed(at('ljungBox', correlations), wanted.ljungBox);
      if (wanted.boxPierce !== undefined) {
        printed(x.length * correlations.reduce((sum, r) => sum + r * r, 0), wanted.boxPierce);
      }
      if (wanted.monti !== undefined) printed(at('monti', partialAutocorrelation(correlations)), wanted.monti);
    }
  });

  it('p-values with 23 degrees of freedom, Series A (1,0,1): Ljung–Box .2190, Monti .2598', () => {
    const values = publishedSeries('seriesA');
    const made = innovationsOf(fitted(values, { p: 1, q: 1 }, 'mean'), values);
    if (!made.ok) throw new Error(made.failure.code);
    const { correlations, pairs } = autocorrelation(made.value.values, 25, 'zero');
    const size = { length: 197, observed: 197, pairs };
    const p = (method: 'ljungBox' | 'monti', values: Float64Array) =>
      portmanteau({ method, correlations: values, size, coefficients: 2 }).pValues[24]!;
    expect(p('ljungBox', correlations)).toBeCloseTo(0.219, 4);
    expect(p('monti', partialAutocorrelation(correlations))).toBeCloseTo(0.2598, 4);
  });

  it('the evidence on the airline model is the standardised one: 23.862, p .3545 with 22 degrees of freedom', () => {
    const values = publishedSeries('airline');
    const fit = fitted(values, airline, 'none', { transform: { kind: 'log' } });
    const made = diagnoseFit({ fit, values, coverage: 0.95 });
    if (!made.ok) throw new Error(made.failure.code);
    const { portmanteau: found } = made.value;
    printed(found.statistics[23]!, 23.862);
    expect(found.degreesOfFreedom[23]).toBe(22);
    expect(found.pValues[23]).toBeCloseTo(0.3545, 4);
    expect(Array.from(found.pValues.slice(0, 3), (p) => Number.isNaN(p))).toEqual([true, true, false]);
  });
});
