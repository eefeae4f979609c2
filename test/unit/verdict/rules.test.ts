import { describe, expect, it } from 'vitest';
import type { Portmanteau } from '../../../workers/contract/diagnostics.ts';
import type { Fit } from '../../../workers/contract/fit.ts';
import { createRandom } from '../../../workers/numeric/random.ts';
import { extremeInnovations } from '../../../workers/verdict/extremeInnovations.ts';
import { judgeFit } from '../../../workers/verdict/judgeFit.ts';
import { jointWhiteness } from '../../../workers/verdict/jointWhiteness.ts';
import { needlessCoefficients } from '../../../workers/verdict/needlessCoefficients.ts';
import { fitted } from '../../helpers/fitted.ts';
import { publishedSeries } from '../../helpers/publishedSeries.ts';

const judged = (fit: Fit, values: Float64Array) => {
  const result = judgeFit({ fit, values, coverage: 0.95 });
  if (!result.ok) throw new Error(result.failure.code);
  return result.value.verdict;
};
const reasons = (fit: Fit, values: Float64Array) =>
  judged(fit, values).items.map(({ reason, about }) => [reason, ...(about ?? [])].join(' '));

describe('joint reading of the portmanteau', () => {
  const withP = (pValues: number[]): Portmanteau => ({
    method: 'ljungBox',
    lags: Int32Array.from(pValues, (_, i) => i + 1),
    statistics: new Float64Array(pValues.length),
    degreesOfFreedom: new Int32Array(pValues.length),
    pValues: Float64Array.from(pValues),
    law: 'chiSquare',
  });

  it('is the least of K p_(i)/i over the stated lags (Simes 1986, equation 1)', () => {
    const p = new Array<number>(24).fill(1);
    // One coefficient: lags 4, 11 and 24.
    p[3] = 0.04;
    p[10] = 0.03;
    p[23] = 0.5;
    const joint = jointWhiteness(withP(p), 1, 0)!;
    expect(joint.lags).toEqual([4, 11, 24]);
    // 3·.03/1 = .09, 3·.04/2 = .06, 3·.5/3 = .5.
    expect(joint.p).toBeCloseTo(0.06, 14);
    expect(joint.lag).toBe(4);
  });

  it('looks at one season and two, and only at lags above the number of coefficients', () => {
    const joint = jointWhiteness(withP(new Array<number>(30).fill(0.5)), 2, 12)!;
    expect(joint.lags).toEqual([5, 12, 24]);
    expect(jointWhiteness(withP([NaN, NaN]), 2, 0)).toBeNull();
    expect(jointWhiteness(withP([]), 0, 0)).toBeNull();
  });
});

describe('innovations larger than independent normals give', () => {
  it('by hand: one of ten at three times the others', () => {
    const values = Float64Array.of(1, -1, 1, -1, 1, 3, -1, 1, -1, NaN, 1);
    const found = extremeInnovations(values, 0.01)!;
    // τ² = 9/(18/10) = 5 of at most 10; t = √5·√(9/5) = 3 with 9 degrees of freedom, two-sided .014956 (t tables: .015).
    expect(found.index).toBe(5);
    expect(found.largest).toBe(3);
    expect(found.p).toBeCloseTo(1 - (1 - 0.0149561) ** 10, 5);
    expect(found.count).toBe(0);
  });

  it('has its stated rate on simulated normals: 1 % of records of 50', () => {
    const random = createRandom(11);
    const replicates = 8000;
    let exceeded = 0;
    for (let i = 0; i < replicates; i++) {
      const record = Float64Array.from({ length: 50 }, () => random.normal());
      if (extremeInnovations(record, 0.01)!.count > 0) exceeded++;
    }
    // Four standard errors of a rate of .01 from 8 000: ± .0045.
    expect(Math.abs(exceeded / replicates - 0.01)).toBeLessThan(0.0045);
  });

  it('says nothing of fewer than three, or of none that vary', () => {
    expect(extremeInnovations(Float64Array.of(1, 2), 0.01)).toBeNull();
    expect(extremeInnovations(new Float64Array(5), 0.01)).toBeNull();
  });
});

describe('coefficients that could be left out', () => {
  it('luteinising hormone AR(3): φ₃ = −.2198 (.1421), not φ₂ below it (Venables & Ripley 2002, chapter 14)', () => {
    const values = publishedSeries('luteinisingHormone');
    const found = needlessCoefficients(fitted(values, { p: 3 }, 'mean'), 0.05);
    expect(found.map(({ name }) => name)).toEqual(['φ3']);
    expect(found[0]!.estimate / found[0]!.standardError).toBeCloseTo(-0.219796359886 / 0.1420786, 5);
  });

  it('judges the mean, names coefficients past a lag held at zero, and keeps silent without standard errors', () => {
    const values = publishedSeries('lakeHuron').map((value) => value - 579.05);
    const fit = fitted(values, { p: 2 }, 'mean', { zeroLags: { ar: [1], ma: [], seasonalAr: [], seasonalMa: [] } });
    expect(fit.names).toEqual(['φ2', 'mean']);
    expect(needlessCoefficients(fit, 0.05).map(({ name }) => name)).toEqual(['mean']);
    expect(needlessCoefficients({ ...fit, standardErrors: null }, 0.05)).toEqual([]);
  });
});

describe('verdict', () => {
  it('log airline: (0,1,1)(0,1,1)₁₂ is sound, (0,1,1) is unsound for the memory it leaves', () => {
    const values = publishedSeries('airline');
    const log = { transform: { kind: 'log' } } as const;
    const full = fitted(values, { d: 1, q: 1, D: 1, Q: 1, s: 12 }, 'none', log);
    expect(judged(full, values)).toMatchObject({ standing: 'sound', items: [{ reason: 'white', weight: 'supports' }] });
    const plain = judged(fitted(values, { d: 1, q: 1 }, 'none', log), values);
    expect(plain.standing).toBe('unsound');
    expect(plain.items[0]).toMatchObject({ reason: 'notWhite', weight: 'unsound', panel: 'lags' });
  });

  it('Lake Huron without memory is unsound, and nothing is concluded about its mean', () => {
    const values = publishedSeries('lakeHuron').map((value) => value - 579.05);
    expect(reasons(fitted(values, {}, 'mean'), values)).toEqual(['notWhite']);
    expect(reasons(fitted(values, { p: 2 }, 'mean'), values)).toEqual(['needlessCoefficient mean', 'white']);
  });

  it('overshorts MA(1) with mean: two maxima leave a doubt', () => {
    const values = publishedSeries('overshorts');
    const verdict = judged(fitted(values, { q: 1 }, 'mean'), values);
    expect(verdict.standing).toBe('doubtful');
    expect(verdict.items[0]).toMatchObject({ reason: 'warning', weight: 'doubtful', about: ['severalMaxima'] });
  });

  it('Series B (0,1,1): the fall by 38 from 399 to 361 is one large innovation, by its index', () => {
    const values = publishedSeries('seriesB');
    const { items } = judged(fitted(values, { d: 1, q: 1 }, 'none'), values);
    const large = items.find(({ reason }) => reason === 'largeInnovations')!;
    const fall = values.findIndex((value, t) => t > 0 && value === 361 && values[t - 1] === 399);
    expect(large).toMatchObject({ weight: 'doubtful', panel: 'innovations', numbers: { count: 1, index: fall } });
    // 38 over the standard deviation √52.2 of Box & Jenkins' fit.
    expect(large.numbers.largest).toBeCloseTo(-38 / Math.sqrt(52.2), 1);
  });

  it('with too few readings for any p-value says so first', () => {
    const values = Float64Array.of(3, 1, 4, 1, 5, 9);
    const [first] = judged(fitted(values, { p: 1 }, 'mean'), values).items;
    expect(first).toMatchObject({ reason: 'fewReadings', weight: 'doubtful', numbers: { readings: 6, lags: 1 } });
  });

  it('puts what makes a fit unsound before doubts, and what supports it last', () => {
    const values = publishedSeries('airline');
    const fit = fitted(values, { d: 1, q: 1 }, 'none');
    const warned: Fit = {
      ...fit,
      warnings: [
        { code: 'quantised', numbers: {} },
        { code: 'notConverged', numbers: {} },
      ],
    };
    const weights = judged(warned, values).items.map(({ weight }) => weight);
    expect(weights.slice(0, 3)).toEqual(['unsound', 'unsound', 'doubtful']);
    const setAside: Fit = { ...fit, warnings: [{ code: 'spuriousPair', numbers: { excluded: 1, gain: 2 } }] };
    expect(reasons(setAside, values).some((one) => one.includes('spuriousPair'))).toBe(false);
  });
});
