import { describe, expect, it } from 'vitest';
import type { Candidate, FitRequest, Order } from '../../../workers/contract/candidate.ts';
import type { Fit } from '../../../workers/contract/fit.ts';
import { exactLogLikelihood } from '../../../workers/estimation/exactLikelihood.ts';
import { fitCandidate } from '../../../workers/estimation/fitCandidate.ts';
import { isNested, neighbourStarts } from '../../../workers/estimation/neighbourStarts.ts';
import { candidateOf } from '../../../workers/model/candidateOf.ts';
import { publishedSeries } from '../../helpers/publishedSeries.ts';

const ORDER: Order = { p: 0, d: 0, q: 0, P: 0, D: 0, Q: 0, s: 0 };
type Part = Partial<Omit<Candidate, 'order'>> & { order: Partial<Order> };
const candidate = (part: Part) => candidateOf({ ...part, order: { ...ORDER, ...part.order } });
function fitted(values: Float64Array, part: Part, rest: Partial<FitRequest> = {}): Fit {
  const result = fitCandidate({ values, candidate: candidate(part), seed: 1, ...rest });
  if (!result.ok) throw new Error(JSON.stringify(result.failure));
  return result.value;
}
const lake = publishedSeries('lakeHuron');
const airline = publishedSeries('airline');

describe('a fit', () => {
  it('says what it is: exact ln L at its parameters, names, count of parameters, seed, fingerprint', () => {
    const fit = fitted(lake, { order: { p: 1, q: 1 }, level: 'mean' }, { seed: 42 });
    expect(fit.names).toEqual(['φ1', 'θ1', 'mean']);
    expect(fit.parameterCount).toBe(4);
    expect(fit.readingsUsed).toBe(98);
    expect(fit.seed).toBe(42);
    expect(fit.seriesHash).toMatch(/^[0-9a-f]{32}$/);
    expect(fit.window).toEqual({ from: 0, to: 98 });
    expect(fit.logLikelihood).toBeCloseTo(exactLogLikelihood(lake, fit.candidate, fit.parameters), 9);
    expect(fit.covariance!.n).toBe(3);
    fit.standardErrors!.forEach((error, i) => expect(error ** 2).toBeCloseTo(fit.covariance!.values[i * 4]!, 12));
    expect(fit.outcome.status).toBe('converged');
    expect(fit.outcome.maxima[0]!.logLikelihood).toBe(fit.logLikelihood);
  });

  it('is the same twice, and at a maximum: no coefficient can be moved for the better', () => {
    const part: Part = { order: { p: 2, q: 1 }, level: 'mean' };
    const fit = fitted(lake, part);
    expect(fitted(lake, part)).toEqual(fit);
    for (const name of ['ar', 'ma'] as const) {
      fit.parameters[name].forEach((_, i) => {
        for (const step of [1e-4, -1e-4]) {
          const moved = fit.parameters[name].map((value, j) => (j === i ? value + step : value));
          const at = { ...fit.parameters, [name]: moved };
          expect(exactLogLikelihood(lake, fit.candidate, at)).toBeLessThan(fit.logLikelihood);
        }
      });
    }
  });

  it('of a window is the fit of that part', () => {
    const part: Part = { order: { p: 1 }, level: 'mean' };
    const whole = fitted(lake, part, { window: { from: 20, to: 80 } });
    const cut = fitted(lake.slice(20, 80), part);
    expect(whole.parameters).toEqual(cut.parameters);
    expect(whole.readingsUsed).toBe(60);
    const outside = fitCandidate({ values: lake, candidate: candidate(part), seed: 1, window: { from: 50, to: 120 } });
    expect(outside).toMatchObject({ ok: false, failure: { code: 'badCandidate', field: 'window' } });
  });

  it('without memory is the mean and the variance with divisor n', () => {
    const fit = fitted(lake, { order: {}, level: 'mean' });
    const mean = lake.reduce((sum, value) => sum + value, 0) / 98;
    const variance = lake.reduce((sum, value) => sum + (value - mean) ** 2, 0) / 98;
    expect(fit.parameters.mean).toBeCloseTo(mean, 10);
    expect(fit.parameters.innovationVariance).toBeCloseTo(variance, 10);
    expect(fit.standardErrors![0]).toBeCloseTo(Math.sqrt(variance / 98), 10);
    expect(fit.logLikelihood).toBeCloseTo(-49 * (Math.log(2 * Math.PI * variance) + 1), 9);
  });
});

describe('lags held at zero', () => {
  it('stay zero, count as none, and cost ln L', () => {
    const zeroLags = { ar: [1], ma: [], seasonalAr: [], seasonalMa: [] };
    const subset = fitted(lake, { order: { p: 2 }, level: 'mean', zeroLags });
    const full = fitted(lake, { order: { p: 2 }, level: 'mean' });
    expect(subset.parameters.ar[0]).toBe(0);
    expect(subset.names).toEqual(['φ2', 'mean']);
    expect(subset.parameterCount).toBe(3);
    expect(subset.logLikelihood).toBeLessThan(full.logLikelihood);
    expect(subset.standardErrors).toHaveLength(2);
  });

  it('make the same model as a seasonal factor where it has only that', () => {
    // 1 + Θ B¹² as a regular MA(12) with eleven lags at zero, on ∇∇₁₂ ln y.
    const logs = airline.map(Math.log);
    const seasonal = fitted(logs, { order: { d: 1, D: 1, Q: 1, s: 12 } });
    const zeros = Array.from({ length: 11 }, (_, i) => i + 1);
    const zeroLags = { ar: [], ma: zeros, seasonalAr: [], seasonalMa: [] };
    const subset = fitted(logs, { order: { q: 12, d: 1, D: 1, s: 12 }, zeroLags });
    expect(subset.parameters.ma[11]).toBeCloseTo(seasonal.parameters.seasonalMa[0]!, 6);
    expect(subset.logLikelihood).toBeCloseTo(seasonal.logLikelihood, 8);
  });
});

describe('other estimators', () => {
  it('conditional AR is least squares on the lagged readings', () => {
    // Given the first p readings the conditional sum of squares is that of the regression.
    const conditional = fitted(lake, { order: { p: 2 }, level: 'mean', estimator: 'conditional' });
    const regression = fitted(lake, { order: { p: 2 }, level: 'mean', estimator: 'leastSquares' });
    conditional.parameters.ar.forEach((value, i) => expect(value).toBeCloseTo(regression.parameters.ar[i]!, 6));
    expect(conditional.parameters.mean).toBeCloseTo(regression.parameters.mean, 5);
    expect(conditional.parameters.innovationVariance).toBeCloseTo(regression.parameters.innovationVariance, 7);
    // Regression divides by the degrees of freedom (96 − 3), the information by the readings.
    const ratio = conditional.standardErrors![0]! / regression.standardErrors![0]!;
    expect(ratio).toBeCloseTo(Math.sqrt(93 / 96), 3);
    expect(regression.outcome.status).toBe('closedForm');
  });

  it('conditional MA comes near the exact one, never above its ln L', () => {
    const nile = publishedSeries('nile');
    const conditional = fitted(nile, { order: { d: 1, q: 1 }, estimator: 'conditional' });
    const exact = fitted(nile, { order: { d: 1, q: 1 } });
    expect(Math.abs(conditional.parameters.ma[0]! - exact.parameters.ma[0]!)).toBeLessThan(0.05);
    expect(conditional.logLikelihood).toBeLessThanOrEqual(exact.logLikelihood);
    expect(conditional.logLikelihood).toBeCloseTo(
      exactLogLikelihood(nile, conditional.candidate, conditional.parameters),
      8,
    );
  });

  it('take differencing and drift', () => {
    const walk = fitted(lake, { order: { p: 1, d: 1 }, level: 'drift', estimator: 'yuleWalker' });
    expect(walk.parameters.mean).toBeCloseTo((lake[97]! - lake[0]!) / 97, 9);
    expect(walk.names).toEqual(['φ1', 'drift']);
  });
});

describe('an estimated power', () => {
  it('is at the top of its profile, counts as a parameter, and ln L carries the Jacobian', () => {
    // Log airline passengers is the textbook transform; the likelihood must not prefer the raw readings.
    const part: Part = { order: { d: 1, q: 1, D: 1, Q: 1, s: 12 } };
    const free = fitted(airline, { ...part, transform: { kind: 'boxCox', lambda: 'estimate' } }, { effort: 'first' });
    const lambda = free.parameters.lambda!;
    expect(Math.abs(lambda)).toBeLessThan(0.3);
    expect(free.parameterCount).toBe(4);
    const at = (value: number) =>
      fitted(airline, { ...part, transform: { kind: 'boxCox', lambda: value } }, { effort: 'first' }).logLikelihood;
    expect(at(lambda)).toBeCloseTo(free.logLikelihood, 6);
    expect(at(lambda + 0.05)).toBeLessThan(free.logLikelihood);
    expect(at(lambda - 0.05)).toBeLessThan(free.logLikelihood);
    // ln L(y) = ln L(ln y) − Σ ln y over the readings used, an identity.
    const log = fitted(airline, { ...part, transform: { kind: 'log' } });
    const jacobian = airline.slice(13).reduce((sum, value) => sum + Math.log(value), 0);
    expect(log.logLikelihood).toBeCloseTo(244.696486833 - jacobian, 7);
    expect(at(0)).toBeCloseTo(log.logLikelihood, 7);
  });
});

describe('neighbouring fits', () => {
  const small = fitted(lake, { order: { p: 1 }, level: 'mean' });
  const middle = fitted(lake, { order: { p: 1, q: 1 }, level: 'mean' });

  it('are nested where every model of the one is one of the other', () => {
    const of = (order: Partial<Order>, rest: Omit<Part, 'order'> = {}) => candidate({ order, level: 'mean', ...rest });
    expect(isNested(of({ p: 1 }), of({ p: 2, q: 1 }))).toBe(true);
    expect(isNested(of({ p: 2 }), of({ p: 1, q: 1 }))).toBe(false);
    expect(isNested(of({ p: 1 }, { level: 'none' }), of({ p: 1 }))).toBe(true);
    expect(isNested(of({ p: 1 }), of({ p: 1 }, { level: 'none' }))).toBe(false);
    expect(isNested(of({ p: 1 }), of({ p: 2, d: 1 }, { level: 'none' }))).toBe(false);
    expect(isNested(of({ p: 1 }), of({ p: 2 }, { transform: { kind: 'log' } }))).toBe(false);
    const zeroLags = { ar: [1], ma: [], seasonalAr: [], seasonalMa: [] };
    expect(isNested(of({ p: 1 }), of({ p: 2 }, { zeroLags }))).toBe(false);
    expect(isNested(of({ p: 2 }, { zeroLags }), of({ p: 2 }))).toBe(true);
    const step = { kind: 'step', at: 5 } as const;
    expect(isNested(of({ p: 1 }), of({ p: 1 }, { regressors: [step] }))).toBe(true);
    expect(isNested(of({ p: 1 }, { regressors: [step] }), of({ p: 1 }))).toBe(false);
    expect(isNested(of({ p: 1 }), of({ p: 1, P: 1, s: 4 }))).toBe(true);
  });

  it('are embedded with zeros, the highest first, and the search ends no lower', () => {
    const larger = candidate({ order: { p: 3, q: 2 }, level: 'mean' });
    const starts = neighbourStarts(larger, [small, middle]);
    expect(starts).toHaveLength(2);
    expect(starts[0]!.ar).toEqual([middle.parameters.ar[0], 0, 0]);
    expect(starts[0]!.ma).toEqual([middle.parameters.ma[0], 0]);
    const result = fitCandidate({ values: lake, candidate: larger, seed: 1, starts, effort: 'first' });
    expect(result.ok && result.value.logLikelihood).toBeGreaterThanOrEqual(middle.logLikelihood - 1e-9);
  });
});
