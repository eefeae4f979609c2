import { describe, expect, it } from 'vitest';
import type { Candidate, Level, Order } from '../../../workers/contract/candidate.ts';
import type { Failure } from '../../../workers/contract/failures.ts';
import type { Fit, WarningCode } from '../../../workers/contract/fit.ts';
import { fitCandidate } from '../../../workers/estimation/fitCandidate.ts';
import { candidateOf } from '../../../workers/model/candidateOf.ts';
import { createRandom } from '../../../workers/numeric/random.ts';
import { publishedSeries } from '../../helpers/publishedSeries.ts';

const ORDER: Order = { p: 0, d: 0, q: 0, P: 0, D: 0, Q: 0, s: 0 };
type Rest = Partial<Omit<Candidate, 'order'>>;

const attempt = (
  values: Float64Array,
  order: Partial<Order>,
  rest: Rest = {},
  columns?: Record<string, Float64Array>,
) =>
  fitCandidate({
    values,
    candidate: candidateOf({ order: { ...ORDER, ...order }, ...rest }),
    seed: 7,
    ...(columns === undefined ? {} : { columns }),
  });
function fitted(values: Float64Array, order: Partial<Order>, level: Level = 'mean', rest: Rest = {}): Fit {
  const result = attempt(values, order, { level, ...rest });
  if (!result.ok) throw new Error(JSON.stringify(result.failure));
  return result.value;
}
function refused(values: Float64Array, order: Partial<Order>, rest: Rest = {}): Failure {
  const result = attempt(values, order, { level: 'mean', ...rest });
  if (result.ok) throw new Error('A fit was not refused.');
  return result.failure;
}
const warned = (fit: Fit, code: WarningCode) => fit.warnings.find((warning) => warning.code === code);

/** An ARMA record by its recursion after a run-in, for cases that need no published data. */
function simulated(n: number, seed: number, ar: readonly number[] = [], ma: readonly number[] = []): Float64Array {
  const random = createRandom(seed);
  const runIn = 500;
  const shocks = Float64Array.from({ length: n + runIn }, () => random.normal());
  const z = new Float64Array(n + runIn);
  for (let t = 0; t < z.length; t++) {
    let value = shocks[t]!;
    ma.forEach((theta, i) => (value += theta * (shocks[t - 1 - i] ?? 0)));
    ar.forEach((phi, i) => (value += phi * (z[t - 1 - i] ?? 0)));
    z[t] = value;
  }
  return z.slice(runIn);
}

/**
 * Maxima on published data: values of an independent dense likelihood from 8 to 25 starts with a polished end, the
 * gradient below 1e-5 and the Hessian positive definite at each.
 */
describe('several maxima', () => {
  const expectMaxima = (fit: Fit, expected: readonly { logLikelihood: number; boundary: boolean }[]) => {
    for (const { logLikelihood, boundary } of expected) {
      const met = fit.outcome.maxima.find((one) => Math.abs(one.logLikelihood - logLikelihood) < 1e-4);
      expect(met, `maximum ${logLikelihood}`).toMatchObject({ boundary, admissible: true });
    }
    expect(fit.outcome.maxima.length).toBeGreaterThanOrEqual(expected.length);
    expect(fit.outcome.maxima.every((one) => one.reached >= 1)).toBe(true);
    const heights = fit.outcome.maxima.map((one) => one.logLikelihood);
    expect(heights).toEqual([...heights].sort((one, other) => other - one));
  };

  it('overshorts MA(1) with mean: inside and on the circle, 0.004 apart', () => {
    const fit = fitted(publishedSeries('overshorts'), { q: 1 });
    expect(fit.outcome.maxima).toHaveLength(2);
    const [inside, edge] = fit.outcome.maxima;
    expect(inside!.parameters.ma[0]).toBeCloseTo(-0.847272, 6);
    expect(inside!.logLikelihood).toBeCloseTo(-298.422122, 6);
    expect(edge!.parameters.ma[0]).toBe(-1);
    expect(edge!.logLikelihood).toBeCloseTo(-298.426166, 6);
    expect(edge!.parameters.mean).toBeCloseTo(-5.02504, 5);
    expect(warned(fit, 'severalMaxima')?.numbers).toMatchObject({ count: 2 });
    expect(warned(fit, 'severalMaxima')!.numbers['gap']).toBeCloseTo(0.004044, 5);
  });

  it('Lake Huron ARMA(2,2): the highest has an MA root on the circle', () => {
    const fit = fitted(publishedSeries('lakeHuron'), { p: 2, q: 2 });
    expectMaxima(fit, [
      { logLikelihood: -102.7941, boundary: true },
      { logLikelihood: -103.0095, boundary: false },
      { logLikelihood: -103.2053, boundary: false },
    ]);
    [-0.1861, 0.7009].forEach((value, i) => expect(fit.parameters.ar[i]).toBeCloseTo(value, 4));
    [1.2779, 0.2779].forEach((value, i) => expect(fit.parameters.ma[i]).toBeCloseTo(value, 4));
    expect(fit.outcome.status).toBe('boundary');
    expect(fit.standardErrors).toBeNull();
    expect(warned(fit, 'maOnCircle')).toBeDefined();
    expect(warned(fit, 'covarianceUnavailable')?.numbers).toMatchObject({ onCircle: 1 });
  });

  it('Lake Huron ARMA(3,1)', () => {
    expectMaxima(fitted(publishedSeries('lakeHuron'), { p: 3, q: 1 }), [
      { logLikelihood: -102.7164, boundary: false },
      { logLikelihood: -102.9024, boundary: true },
      { logLikelihood: -103.4971, boundary: true },
    ]);
  });

  it('Series F ARMA(2,1)', () => {
    expectMaxima(fitted(publishedSeries('seriesF'), { p: 2, q: 1 }), [
      { logLikelihood: -264.8268, boundary: false },
      { logLikelihood: -265.8434, boundary: true },
    ]);
  });

  it('does not depend on the seed of its random starts', () => {
    const lake = publishedSeries('lakeHuron');
    const candidate = candidateOf({ order: { ...ORDER, p: 2, q: 2 }, level: 'mean' });
    for (const seed of [1, 2, 3, 4, 5]) {
      const result = fitCandidate({ values: lake, candidate, seed });
      expect(result.ok && result.value.logLikelihood).toBeCloseTo(-102.7941, 4);
    }
  });

  it('a larger model is never lower than one nested in it, from order (0,0) to (3,2) on Lake Huron', () => {
    const lake = publishedSeries('lakeHuron');
    const heights = Array.from({ length: 4 }, (_, p) =>
      Array.from({ length: 3 }, (_, q) => fitted(lake, { p, q }).logLikelihood),
    );
    for (let p = 0; p < 4; p++) {
      for (let q = 0; q < 3; q++) {
        if (p > 0) expect(heights[p]![q]).toBeGreaterThanOrEqual(heights[p - 1]![q]! - 1e-9);
        if (q > 0) expect(heights[p]![q]).toBeGreaterThanOrEqual(heights[p]![q - 1]! - 1e-9);
      }
    }
  });
});

describe('roots and factors', () => {
  it('white noise fitted by ARMA(1,1): hardly ever without a warning', () => {
    const telling = ['commonFactor', 'flatLikelihood', 'severalMaxima', 'maOnCircle', 'covarianceUnavailable'];
    const silent = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10].filter((seed) => {
      const noise = simulated(100, seed);
      const fit = fitted(noise, { p: 1, q: 1 });
      expect(fit.logLikelihood).toBeGreaterThanOrEqual(fitted(noise, {}).logLikelihood - 1e-9);
      return !fit.warnings.some(({ code }) => telling.includes(code));
    });
    expect(silent.length).toBeLessThanOrEqual(2);
  });

  it('both polynomials one too many: no standard errors that mean anything are shown without a warning', () => {
    const fit = fitted(simulated(400, 11, [0.6], [0.4]), { p: 2, q: 2 });
    const said = fit.warnings.map(({ code }) => code);
    expect(said.some((code) => ['commonFactor', 'flatLikelihood', 'covarianceUnavailable'].includes(code))).toBe(true);
  });

  it('the colour record’s spurious sinusoid on the circle is not ranked', () => {
    // Unrestricted maximum: φ (1.855, −1), θ (−1.852, 1), ln L −102.567 (independent dense likelihood).
    const fit = fitted(publishedSeries('colour'), { p: 2, q: 2 });
    expect(fit.logLikelihood).toBeLessThan(-103);
    const excluded = fit.outcome.maxima.find(({ admissible }) => !admissible)!;
    expect(excluded.logLikelihood).toBeGreaterThan(-102.7);
    expect(excluded.parameters.ar[0]).toBeCloseTo(1.855, 2);
    expect(warned(fit, 'spuriousPair')?.numbers).toMatchObject({ excluded: 1 });
  });

  it('differenced white noise ends on the circle, said to be over-differenced, without standard errors', () => {
    const fit = fitted(simulated(200, 5), { d: 1, q: 1 }, 'none');
    expect(fit.parameters.ma[0]).toBeLessThan(-0.97);
    const { numbers } = warned(fit, 'overDifferenced')!;
    // In theory −½, and twice the variance; within the sampling error of 200 readings.
    expect(Math.abs(numbers['lagOne']! + 0.5)).toBeLessThan(0.12);
    expect(Math.abs(numbers['after']! / numbers['before']! - 2)).toBeLessThan(0.3);
  });

  it.each([
    ['none', 0.6574],
    ['mean', 0.9549],
  ] as const)('a unit MA root piles up on the circle as often as theory says, level %s', (level, probability) => {
    // P(θ̂ = −1 | θ = −1) in the limit: Sargan & Bhargava 1983, Econometrica 51, 799–820; Anderson & Takemura 1986, J. Time
    // Series Anal. 7, 155–171. In samples of 50 it is within 0.02 of that (simulation).
    const replicates = 150;
    let piled = 0;
    for (let seed = 1; seed <= replicates; seed++) {
      const fit = fitted(simulated(50, 1000 + seed, [], [-1]), { q: 1 }, level);
      if (fit.parameters.ma[0] === -1) {
        piled++;
        expect(fit.standardErrors).toBeNull();
      }
    }
    const error = Math.sqrt((probability * (1 - probability)) / replicates);
    expect(Math.abs(piled / replicates - probability)).toBeLessThan(3 * error + 0.02);
  });

  it('a fixed seasonal pattern: the seasonal MA root goes to the circle', () => {
    const noise = simulated(240, 9);
    const fit = fitted(
      noise.map((value, t) => value + 10 * Math.sin((2 * Math.PI * t) / 12)),
      { D: 1, Q: 1, s: 12 },
      'none',
    );
    expect(fit.parameters.seasonalMa[0]).toBeLessThan(-0.97);
    expect(warned(fit, 'overDifferenced')).toBeDefined();
  });

  it('random walks fitted without differencing: stationary answers that mostly warn of the unit root', () => {
    const silent = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10].filter((seed) => {
      let level = 0;
      const fit = fitted(
        simulated(150, seed).map((step) => (level += step)),
        { p: 1 },
      );
      expect(fit.parameters.ar[0]).toBeLessThan(1);
      return warned(fit, 'nearUnitAr') === undefined;
    });
    // n(1 − φ̂) has a long tail: beyond 11 in one walk of ten (Fuller 1976, table 8.5.1, estimated mean).
    expect(silent.length).toBeLessThanOrEqual(5);
  });

  it('the mirror image θ → 1/θ: an estimate is always invertible', () => {
    // A record made with θ = −2 has the autocovariances of one made with θ = −½ and four times the variance.
    const fit = fitted(simulated(2000, 21, [], [-2]), { q: 1 });
    expect(fit.parameters.ma[0]).toBeGreaterThan(-0.6);
    expect(fit.parameters.ma[0]).toBeLessThan(-0.4);
    expect(fit.parameters.innovationVariance).toBeGreaterThan(3.5);
  });
});

describe('size and scale', () => {
  it('too few readings for the coefficients: refused with the numbers', () => {
    expect(refused(simulated(5, 1), { p: 2, q: 2 })).toMatchObject({ code: 'tooFewReadings', readings: 5 });
    expect(refused(simulated(14, 1), { q: 1, D: 1, s: 12 }, { level: 'none' })).toMatchObject({
      code: 'tooFewReadings',
    });
  });

  it('a constant record: no variation', () => {
    expect(refused(new Float64Array(50).fill(7.3), { p: 1 })).toEqual({
      code: 'noVariation',
      value: 7.3,
      afterDifferencing: false,
    });
  });

  it('a ramp, a totaliser, a parabola: a deterministic line, whatever the differencing', () => {
    const ramp = Float64Array.from({ length: 60 }, (_, t) => 0.1 * t + 3);
    expect(refused(ramp, { p: 1 }).code).toBe('deterministic');
    expect(refused(ramp, { p: 1, d: 1 }, { level: 'none' }).code).toBe('deterministic');
    expect(
      refused(
        ramp.map((value) => value * value),
        { p: 1, d: 1 },
        { level: 'none' },
      ).code,
    ).toBe('deterministic');
  });

  it('a repeated pattern: nothing is left after the seasonal difference', () => {
    const pattern = Float64Array.from({ length: 60 }, (_, t) => [3, 1, 4, 1, 5][t % 5]!);
    expect(refused(pattern, { q: 1, D: 1, s: 5 }, { level: 'none' })).toMatchObject({
      code: 'noVariation',
      afterDifferencing: true,
    });
  });

  it('a record that a regressor explains without rest: deterministic', () => {
    const wave = Float64Array.from({ length: 96 }, (_, t) => Math.cos((2 * Math.PI * t) / 24));
    expect(refused(wave, { p: 1 }, { regressors: [{ kind: 'harmonic', period: 24, k: 1 }] }).code).toBe(
      'deterministic',
    );
  });

  it('constant but for one blip: the variance is one reading’s', () => {
    const blip = new Float64Array(100).fill(5);
    blip[40] = 9;
    expect(warned(fitted(blip, { p: 1 }), 'nearlyDeterministic')?.numbers).toMatchObject({ points: 2, share: 1 });
  });

  it('an offset of 10⁹ costs no digits that the record had; they are said to be lost when it had not', () => {
    // Readings on a grid of 2⁻²⁰ are exact at both offsets, so that the two records hold the same information.
    const record = simulated(300, 8, [0.7]).map((value) => Math.round(value * 2 ** 20) / 2 ** 20);
    const plain = fitted(record, { p: 1 });
    const shifted = fitted(
      record.map((value) => value + 2 ** 30),
      { p: 1 },
    );
    expect(Math.abs(shifted.parameters.ar[0]! - plain.parameters.ar[0]!)).toBeLessThan(1e-9);
    expect(Math.abs(shifted.logLikelihood - plain.logLikelihood)).toBeLessThan(1e-7);
    expect(warned(shifted, 'digitsLost')?.numbers['digits']).toBe(8);
    expect(warned(plain, 'digitsLost')).toBeUndefined();
  });

  it.each([1e-12, 1e6, 1e15])('units of %d change ln L by −N ln a and nothing else', (unit) => {
    // Lake Huron in units of a millionth: ln L falls by 1353.920034805.
    const lake = publishedSeries('lakeHuron');
    const plain = fitted(lake, { p: 1, q: 1 });
    const scaled = fitted(
      lake.map((value) => value * unit),
      { p: 1, q: 1 },
    );
    expect(scaled.logLikelihood).toBeCloseTo(plain.logLikelihood - 98 * Math.log(unit), 7);
    if (unit === 1e6) expect(plain.logLikelihood - scaled.logLikelihood).toBeCloseTo(1353.920034805, 6);
    expect(Math.abs(scaled.parameters.ar[0]! - plain.parameters.ar[0]!)).toBeLessThan(1e-9);
    expect(scaled.standardErrors![0]! / plain.standardErrors![0]!).toBeCloseTo(1, 6);
    expect(scaled.standardErrors![2]! / plain.standardErrors![2]! / unit).toBeCloseTo(1, 6);
  });

  it('a high order does not break down', () => {
    const fit = fitted(simulated(150, 17, [0.5]), { p: 25 });
    expect(fit.parameters.ar).toHaveLength(25);
    expect(fit.logLikelihood).toBeGreaterThan(fitted(simulated(150, 17, [0.5]), { p: 1 }).logLikelihood);
    expect(warned(fit, 'fewReadings')).toBeDefined();
  });

  it('coarse steps are said: LSB of two standard deviations', () => {
    const coarse = simulated(500, 31, [0.7]).map((value) => 3 * Math.round(value / 3));
    expect(warned(fitted(coarse, { p: 1 }), 'quantised')?.numbers['step']).toBeCloseTo(3, 9);
  });

  it('an infinite reading is refused with its place', () => {
    const record = simulated(50, 2);
    record[17] = Infinity;
    expect(refused(record, { p: 1 })).toEqual({ code: 'notFinite', what: 'values', index: 17 });
  });
});

describe('regressors and transforms', () => {
  const record = simulated(120, 13, [0.5]);

  it('a mean with differencing is refused, and a drift without', () => {
    expect(refused(record, { p: 1, d: 1 }, { level: 'mean' })).toMatchObject({ reason: 'meanWithDifferencing' });
    expect(refused(record, { p: 1 }, { level: 'drift' })).toMatchObject({ reason: 'driftWithoutDifferencing' });
  });

  it('a step in a gap at the end, or collinear columns: named and refused', () => {
    const gap = record.map((value, t) => (t >= 100 ? NaN : value));
    expect(refused(gap, { p: 1 }, { regressors: [{ kind: 'step', at: 110 }] })).toMatchObject({
      code: 'columnNotEstimable',
      column: 'β1',
    });
    const twice = [{ kind: 'step', at: 60 } as const, { kind: 'step', at: 60 } as const];
    expect(refused(record, { p: 1 }, { regressors: twice })).toMatchObject({
      code: 'columnNotEstimable',
      column: 'β2',
      reason: 'collinear',
    });
  });

  it('a ramp over the whole record under a drift: collinear after differencing', () => {
    expect(refused(record, { p: 1, d: 1 }, { level: 'drift', regressors: [{ kind: 'ramp', at: 0 }] })).toMatchObject({
      code: 'columnNotEstimable',
      column: 'β1',
    });
  });

  it('a logarithm of a reading that is not positive: refused with its place, nothing added silently', () => {
    const positive = record.map((value) => Math.exp(value));
    positive[33] = 0;
    positive[50] = -1;
    expect(refused(positive, { p: 1 }, { transform: { kind: 'log' } })).toEqual({
      code: 'transformDomain',
      transform: 'log',
      index: 33,
      value: 0,
      count: 2,
    });
  });

  it('a conditional fit of a record with gaps is refused with their number', () => {
    const gap = record.map((value, t) => (t === 40 || t === 41 ? NaN : value));
    expect(refused(gap, { p: 1 }, { estimator: 'conditional' })).toEqual({ code: 'conditionalWithGaps', gaps: 2 });
    expect(refused(gap, { p: 1 }, { estimator: 'burg' })).toMatchObject({ code: 'estimatorNeedsNoGaps', gaps: 2 });
    expect(refused(record, { p: 1, q: 1 }, { estimator: 'burg' }).code).toBe('estimatorNeedsPureAr');
  });
});
