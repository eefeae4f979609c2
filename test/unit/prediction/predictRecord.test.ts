import { describe, expect, it } from 'vitest';
import type { Fit } from '../../../workers/contract/fit.ts';
import type { PredictRequest } from '../../../workers/contract/prediction.ts';
import { predictReadings } from '../../../workers/prediction/predictReadings.ts';
import { predictRecord } from '../../../workers/prediction/predictRecord.ts';
import { oracleAutocovariances } from '../../helpers/denseOracle.ts';
import { heldFit } from '../../helpers/heldFit.ts';

const failureOf = (request: PredictRequest) => {
  const result = predictRecord(request);
  return result.ok ? null : result.failure;
};
const plain = (fit: Fit, values: Float64Array, more: Partial<PredictRequest> = {}): PredictRequest => ({
  fit,
  values,
  horizon: 3,
  coverage: 0.95,
  ...more,
});

/** Normal regression of the horizon on the observed readings, from the dense covariance. */
function conditional(values: Float64Array, gamma: (lag: number) => number, mean: number, horizon: number) {
  const seen = Array.from(values.keys()).filter((t) => !Number.isNaN(values[t]!));
  return Array.from({ length: horizon }, (_, h) => {
    const at = values.length + h;
    const right = seen.map((t) => gamma(at - t));
    const rows = seen.map((t, i) => [...seen.map((u) => gamma(Math.abs(t - u))), right[i]!]);
    const weights = solve(rows);
    const expected = seen.reduce((sum, t, i) => sum + weights[i]! * (values[t]! - mean), mean);
    const variance = gamma(0) - right.reduce((sum, value, i) => sum + value * weights[i]!, 0);
    return { expected, deviation: Math.sqrt(variance) };
  });
}

function solve(rows: number[][]): number[] {
  const n = rows.length;
  for (let k = 0; k < n; k++) {
    for (let i = k + 1; i < n; i++) {
      const ratio = rows[i]![k]! / rows[k]![k]!;
      for (let j = k; j <= n; j++) rows[i]![j]! -= ratio * rows[k]![j]!;
    }
  }
  const x = new Array<number>(n).fill(0);
  for (let k = n - 1; k >= 0; k--) {
    let sum = rows[k]![n]!;
    for (let j = k + 1; j < n; j++) sum -= rows[k]![j]! * x[j]!;
    x[k] = sum / rows[k]![k]!;
  }
  return x;
}

describe('predictions', () => {
  it('with gaps, one of them at the end: the normal regression from the dense covariance', () => {
    const values = Float64Array.of(1.2, NaN, 0.4, -0.9, NaN, NaN, 2.1, 1.4, 0.3, NaN);
    const fit = heldFit(10, { p: 2, q: 1 }, 'mean', { ar: [0.6, -0.3], ma: [0.5], mean: 0.7, innovationVariance: 2 });
    const gamma = oracleAutocovariances([0.6, -0.3], [0.5], 16).map((value) => 2 * value);
    const dense = conditional(values, (lag) => gamma[lag]!, 0.7, 5);
    const { expected, standardError } = predictReadings(fit, values, 5);
    dense.forEach((one, h) => {
      expect(expected[h]).toBeCloseTo(one.expected, 11);
      expect(standardError[h]).toBeCloseTo(one.deviation, 11);
    });
  });

  it('of white noise with mean 5 and variance 4 are 5 ± 1.959964·2 at every horizon', () => {
    const fit = heldFit(4, {}, 'mean', { mean: 5, innovationVariance: 4 });
    const found = predictReadings(fit, Float64Array.of(1, 9, 3, 7), 2);
    expect(Array.from(found.expected)).toEqual([5, 5]);
    expect(found.upper[1]).toBeCloseTo(5 + 1.959963984540054 * 2, 12);
    expect(found.lower[0]).toBeCloseTo(5 - 1.959963984540054 * 2, 12);
    expect(Array.from(found.median)).toEqual([5, 5]);
  });

  it('of a random walk with drift climb by the drift; the variance grows by one innovation a step', () => {
    const fit = heldFit(5, { d: 1 }, 'drift', { mean: 0.25, innovationVariance: 0.09 });
    const { expected, standardError } = predictReadings(fit, Float64Array.of(10, 11, NaN, 12, 14), 4);
    expected.forEach((value, h) => expect(value).toBeCloseTo(14 + 0.25 * (h + 1), 10));
    standardError.forEach((value, h) => expect(value).toBeCloseTo(0.3 * Math.sqrt(h + 1), 10));
  });

  it('carry a seasonal pattern forward and cannot know a phase that was never observed', () => {
    // Season of 3 whose last phase is always a gap.
    const values = Float64Array.of(1, 5, NaN, 2, 6, NaN, 3, 7, NaN);
    const { expected, standardError } = predictReadings(heldFit(9, { D: 1, s: 3 }, 'none', {}), values, 6);
    expect(expected[0]).toBeCloseTo(3, 10);
    expect(expected[1]).toBeCloseTo(7, 10);
    expect(expected[2]).toBeNaN();
    expect(standardError[2]).toBeNaN();
    expect(standardError[3]).toBeCloseTo(Math.SQRT2, 10);
  });

  it('go on with an event, and with a covariate as far as its values are known', () => {
    const values = Float64Array.of(0, 0, 0, 3, 3);
    const step = heldFit(5, {}, 'none', { regression: [3] }, { regressors: [{ kind: 'step', at: 3 }] });
    expect(Array.from(predictReadings(step, values, 2).expected)).toEqual([3, 3]);
    const fit = heldFit(5, {}, 'none', { regression: [2] }, { regressors: [{ kind: 'column', id: 'feed', lag: 1 }] });
    const feed = Float64Array.of(0, 0, 1.5, 1.5, 4, 5, 6);
    expect(Array.from(predictReadings(fit, values, 3, { columns: { feed } }).expected)).toEqual([8, 10, 12]);
    expect(failureOf(plain(fit, values))).toEqual({ code: 'columnMissing', column: 'feed' });
    expect(failureOf(plain(fit, values, { columns: { feed }, horizon: 4 }))).toEqual({
      code: 'columnLength',
      column: 'feed',
      length: 7,
      needed: 8,
    });
    const holed = { feed: feed.with(5, NaN) };
    expect(failureOf(plain(fit, values, { columns: holed }))).toEqual({ code: 'columnGap', column: 'feed', index: 5 });
  });

  it('on a Box–Cox scale are transformed back as quantiles', () => {
    const values = Float64Array.of(4, 9, 16, 25);
    const parameters = { mean: 6, innovationVariance: 1 };
    const fit = heldFit(4, {}, 'mean', parameters, { transform: { kind: 'boxCox', lambda: 0.5 } });
    const { median, upper, lower } = predictReadings(fit, values, 1);
    // (2√y − 2 = x): y = (1 + x/2)².
    expect(median[0]).toBeCloseTo(16, 12);
    expect(upper[0]).toBeCloseTo((1 + (6 + 1.959963984540054) / 2) ** 2, 10);
    expect(lower[0]).toBeCloseTo((1 + (6 - 1.959963984540054) / 2) ** 2, 10);
    const estimated = heldFit(
      4,
      {},
      'mean',
      { ...parameters, lambda: 0.5 },
      {
        transform: { kind: 'boxCox', lambda: 'estimate' },
      },
    );
    expect(predictReadings(estimated, values, 1).median[0]).toBeCloseTo(16, 12);
  });

  it('start at the origin asked for and use no later reading', () => {
    const fit = heldFit(6, { p: 1 }, 'none', { ar: [0.5] });
    const values = Float64Array.of(1, 2, 4, 8, 16, 32);
    expect(Array.from(predictReadings(fit, values, 2, { origin: 3 }).expected)).toEqual([2, 1]);
    expect(Array.from(predictReadings(fit, values, 2).expected)).toEqual([16, 8]);
  });

  it('refuse settings that make no sense, naming them', () => {
    const fit = heldFit(3, {}, 'none', {});
    const values = Float64Array.of(1, 2, 3);
    const field = (more: Partial<PredictRequest>) => {
      const failure = failureOf(plain(fit, values, more));
      return failure?.code === 'badCandidate' ? failure.field : failure?.code;
    };
    expect(field({ horizon: 0 })).toBe('horizon');
    expect(field({ horizon: 1.5 })).toBe('horizon');
    expect(field({ horizon: 1e9 })).toBe('horizon');
    expect(field({ coverage: 0 })).toBe('coverage');
    expect(field({ coverage: 1 })).toBe('coverage');
    expect(field({ coverage: NaN })).toBe('coverage');
    expect(field({ origin: 4 })).toBe('origin');
    expect(field({ origin: 0 })).toBe('origin');
    expect(() => predictReadings(fit, values, -1)).toThrow(/cannot be predicted.*horizon/);
  });

  it('of a logarithmic model name the reading that has no logarithm', () => {
    const fit = heldFit(3, {}, 'none', {}, { transform: { kind: 'log' } });
    expect(failureOf(plain(fit, Float64Array.of(1, -2, 3)))).toMatchObject({ code: 'transformDomain', index: 1 });
  });
});
