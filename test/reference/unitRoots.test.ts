import { describe, expect, it } from 'vitest';
import { augmentedDickeyFuller } from '../../workers/identification/augmentedDickeyFuller.ts';
import { dickeyFullerCritical } from '../../workers/identification/dickeyFullerCritical.ts';
import { kpss } from '../../workers/identification/kpss.ts';
import { kpssUpperTail } from '../../workers/identification/kpssUpperTail.ts';
import { publishedSeries, type PublishedName } from '../helpers/publishedSeries.ts';
import cases from './unitRoots.json' with { type: 'json' };

/* Statistics and tails from generate/unitRoots.py (numpy.linalg.qr; Smirnov's integrals and Anderson and Darling's series in mpmath). */

/** The normal equations lose about the square of what a triangular factor loses; series with a strong trend lose most. */
const STATISTIC = 1e-9;
/** The tails are computed to 1e−11 relative; the terms of the law left out cost up to 1e−7. */
const TAIL = 2e-7;

type Trend = 'constant' | 'trend';
const record = (name: string, gaps: readonly number[]) => {
  const values = publishedSeries(name as PublishedName);
  for (const t of gaps) values[t] = NaN;
  return values;
};

describe('unit-root tests against least squares done elsewhere', () => {
  it.each(cases.dickeyFuller)('Dickey–Fuller $series $trend, $lags lags, gaps $gaps', (one) => {
    const test = augmentedDickeyFuller(record(one.series, one.gaps), one.trend as Trend, one.lags)!;
    expect(test.readings).toBe(one.rows);
    expect(Math.abs(test.statistic / one.statistic - 1)).toBeLessThan(STATISTIC);
  });

  it.each(cases.kpss)('KPSS $series $trend, $lags lags, gaps $gaps', (one) => {
    const test = kpss(record(one.series, one.gaps), one.trend as Trend, one.lags)!;
    expect(Math.abs(test.statistic / one.statistic - 1)).toBeLessThan(STATISTIC);
  });

  it('the Nile at Aswan is not stationary about one level: η rejects at 5 %, as a well-known shift of 1899 says (Cobb 1978)', () => {
    const test = kpss(publishedSeries('nile'), 'constant', 4)!;
    expect(test.rejects).toBe(true);
    expect(test.pValue).toBeLessThan(0.01);
  });
});

describe('laws of the unit-root tests', () => {
  it.each(cases.tails)('KPSS tail $trend at $x', ({ trend, x, p }) => {
    expect(Math.abs(kpssUpperTail(x, trend as Trend) / p - 1)).toBeLessThan(TAIL);
  });

  it('the critical values in use are the quantiles of the exact laws', () => {
    const values = Float64Array.from({ length: 40 }, (_, t) => Math.sin(t * t));
    for (const trend of ['constant', 'trend'] as const)
      kpss(values, trend)!.critical.forEach((value, i) => {
        expect(Math.abs(value / cases[trend][i]! - 1)).toBeLessThan(1e-5);
        expect(kpssUpperTail(value, trend)).toBeCloseTo([0.01, 0.05, 0.1][i]!, 5);
      });
  });

  it('the table of 1992 agrees to its simulation error (Kwiatkowski et al. 1992, table 1)', () => {
    const table = { constant: [0.739, 0.463, 0.347], trend: [0.216, 0.146, 0.119] };
    for (const trend of ['constant', 'trend'] as const)
      table[trend].forEach((value, i) => expect(Math.abs(value / cases[trend][i]! - 1)).toBeLessThan(0.015));
  });

  it.each([
    [25, -2.9865, -3.0],
    [50, -2.9214, -2.93],
    [100, -2.8909, -2.89],
    [250, -2.8732, -2.88],
    [Infinity, -2.8615, -2.86],
  ])(
    'Dickey–Fuller, constant, 5 %%, T = %s: MacKinnon 2010 to 4 decimals, Fuller 1976 table 8.5.2 to 0.015',
    (rows, surface, fuller) => {
      const value = dickeyFullerCritical('constant', rows)[1];
      expect(value).toBeCloseTo(surface, 4);
      expect(Math.abs(value - fuller)).toBeLessThan(0.015);
    },
  );

  it('Dickey–Fuller, trend, limits: Fuller 1976, table 8.5.2: −3.96, −3.41, −3.12', () => {
    const values = dickeyFullerCritical('trend', Infinity);
    [-3.96, -3.41, -3.12].forEach((value, i) => expect(Math.abs(values[i]! - value)).toBeLessThan(0.011));
  });
});
