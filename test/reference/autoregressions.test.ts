import { describe, expect, it } from 'vitest';
import type { Candidate } from '../../workers/contract/candidate.ts';
import { closedFormEstimate } from '../../workers/estimation/closedFormEstimate.ts';
import { candidateOf } from '../../workers/model/candidateOf.ts';
import { publishedSeries } from '../helpers/publishedSeries.ts';

const differences = (values: Float64Array) => values.slice(1).map((value, i) => value - values[i]!);
const estimate = (
  record: Float64Array,
  p: number,
  estimator: Candidate['estimator'],
  level: Candidate['level'] = 'mean',
) => {
  const order = { p, d: 0, q: 0, P: 0, D: 0, Q: 0, s: 0 };
  const found = closedFormEstimate(record, candidateOf({ order, level, estimator }));
  if (found === null) throw new Error('The equations are singular.');
  return found;
};
const dowJones = differences(publishedSeries('dowJones'));
const lakeHuron = publishedSeries('lakeHuron');

/** Brockwell & Davis, Introduction to Time Series and Forecasting, examples 5.1.1, 5.1.3 and 5.1.4, as printed. */
describe('Dow Jones index, differenced', () => {
  it('has Yule–Walker AR(1) 0.4219, σ² 0.1479', () => {
    const { ar, innovationVariance, mean } = estimate(dowJones, 1, 'yuleWalker');
    expect(mean).toBeCloseTo(0.1336, 4);
    expect(ar[0]).toBeCloseTo(0.4219, 4);
    expect(innovationVariance).toBeCloseTo(0.1479, 4);
  });

  it('has Yule–Walker AR(2) 0.3739, 0.1138, σ² 0.1460', () => {
    const { ar, innovationVariance } = estimate(dowJones, 2, 'yuleWalker');
    expect(ar[0]).toBeCloseTo(0.3739, 4);
    expect(ar[1]).toBeCloseTo(0.1138, 4);
    expect(innovationVariance).toBeCloseTo(0.146, 4);
  });

  it('has Burg AR(1) 0.4371, σ² 0.1423', () => {
    const { ar, innovationVariance } = estimate(dowJones, 1, 'burg');
    expect(ar[0]).toBeCloseTo(0.4371, 4);
    expect(innovationVariance).toBeCloseTo(0.1423, 4);
  });
});

describe('Lake Huron', () => {
  it('has Burg AR(2) 1.0449, −0.2456, σ² 0.4706', () => {
    const { ar, innovationVariance } = estimate(lakeHuron, 2, 'burg');
    expect(ar[0]).toBeCloseTo(1.0449, 4);
    expect(ar[1]).toBeCloseTo(-0.2456, 4);
    expect(innovationVariance).toBeCloseTo(0.4706, 4);
  });

  it('has Yule–Walker AR(2) 1.0538, −0.2668, σ² 0.4920', () => {
    const { ar, innovationVariance } = estimate(lakeHuron, 2, 'yuleWalker');
    expect(ar[0]).toBeCloseTo(1.0538, 4);
    expect(ar[1]).toBeCloseTo(-0.2668, 4);
    expect(innovationVariance).toBeCloseTo(0.492, 4);
  });
});

describe('Series F', () => {
  it('has the Yule–Walker AR(2) of the e-Handbook, 6.4.4.9', () => {
    // Printed: −0.3198 (0.1202), 0.1797 (0.1202), mean 51.1286. Its standard errors divide by n − 3 instead of n.
    const { ar, mean, covariance } = estimate(publishedSeries('seriesF'), 2, 'yuleWalker');
    expect(ar[0]).toBeCloseTo(-0.3198, 4);
    expect(ar[1]).toBeCloseTo(0.1797, 4);
    expect(mean).toBeCloseTo(51.1286, 4);
    expect(Math.sqrt((covariance![0]! * 70) / 67)).toBeCloseTo(0.1202, 4);
    expect(Math.sqrt((covariance![4]! * 70) / 67)).toBeCloseTo(0.1202, 4);
  });
});

describe('sunspots 1770–1869', () => {
  it('has Yule–Walker AR(2) 1.318, −0.634, σ² 289.2', () => {
    // Brockwell & Davis, Time Series: Theory and Methods, example 8.1.1 (Series E of Box & Jenkins).
    const { ar, innovationVariance } = estimate(publishedSeries('seriesE'), 2, 'yuleWalker');
    expect(ar[0]).toBeCloseTo(1.318, 3);
    expect(ar[1]).toBeCloseTo(-0.634, 3);
    expect(innovationVariance).toBeCloseTo(289.2, 1);
  });
});

describe('least squares', () => {
  it('is the straight line through the pairs of neighbours for AR(1)', () => {
    // Simple regression by its textbook formulas: slope Sxy/Sxx, its standard error √(s²/Sxx) with n − 2 degrees.
    const x = lakeHuron.slice(0, -1);
    const y = lakeHuron.slice(1);
    const average = (values: Float64Array) => values.reduce((sum, value) => sum + value, 0) / values.length;
    const [mx, my] = [average(x), average(y)];
    let [sxx, sxy, syy] = [0, 0, 0];
    x.forEach((value, i) => {
      sxx += (value - mx) ** 2;
      sxy += (value - mx) * (y[i]! - my);
      syy += (y[i]! - my) ** 2;
    });
    const slope = sxy / sxx;
    const residual = syy - slope * sxy;
    const { ar, mean, innovationVariance, covariance } = estimate(lakeHuron, 1, 'leastSquares');
    expect(ar[0]).toBeCloseTo(slope, 9);
    expect(mean).toBeCloseTo((my - slope * mx) / (1 - slope), 7);
    expect(innovationVariance).toBeCloseTo(residual / 97, 9);
    expect(covariance![0]).toBeCloseTo(residual / 95 / sxx, 9);
  });

  it('does not change slope or relative errors with the units', () => {
    const one = estimate(lakeHuron, 2, 'leastSquares');
    const other = estimate(
      lakeHuron.map((value) => 1e9 + 1e-3 * value),
      2,
      'leastSquares',
    );
    // The record itself keeps seven digits of its spread at this offset.
    one.ar.forEach((value, i) => expect(other.ar[i]).toBeCloseTo(value, 3));
    expect((other.mean - 1e9) / 1e-3).toBeCloseTo(one.mean, 3);
  });
});
