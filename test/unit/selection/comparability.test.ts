import { describe, expect, it } from 'vitest';
import type { Candidate } from '../../../workers/contract/candidate.ts';
import type { Criteria } from '../../../workers/contract/fit.ts';
import { comparabilityKey } from '../../../workers/selection/comparabilityKey.ts';
import { comparisonGroups } from '../../../workers/selection/comparisonGroups.ts';
import { criteriaDifferences } from '../../../workers/selection/criteriaDifferences.ts';
import { fitted } from '../../helpers/fitted.ts';
import { heldFit } from '../../helpers/heldFit.ts';
import { publishedSeries } from '../../helpers/publishedSeries.ts';

const key = (...given: Parameters<typeof heldFit>) => comparabilityKey(heldFit(...given)).key;

describe('comparability', () => {
  const base = key(100, { p: 1 }, 'mean', {});
  const conditional: Partial<Candidate> = { estimator: 'conditional' };

  it('is shared across orders, levels, transforms, regressors, and a season without a seasonal difference', () => {
    expect(key(100, { p: 3, q: 2 }, 'none', {})).toBe(base);
    expect(key(100, { P: 1, s: 12 }, 'mean', {})).toBe(base);
    expect(key(100, { p: 1 }, 'mean', {}, { transform: { kind: 'log' } })).toBe(base);
    expect(key(100, { p: 1 }, 'mean', {}, { regressors: [{ kind: 'step', at: 4 }] })).toBe(base);
  });

  it('is lost by differencing, season of the difference, readings, likelihood kind and searched events', () => {
    const others = [
      key(100, { p: 1, d: 1 }, 'none', {}),
      key(100, { p: 1, D: 1, s: 12 }, 'none', {}),
      key(100, { p: 1, D: 1, s: 7 }, 'none', {}),
      key(99, { p: 1 }, 'mean', {}),
      key(100, { p: 1 }, 'mean', {}, conditional),
      comparabilityKey({ ...heldFit(100, { p: 1 }, 'mean', {}), seriesHash: 'other' }).key,
      comparabilityKey({ ...heldFit(100, { p: 1 }, 'mean', {}), window: { from: 1, to: 101 } }).key,
      comparabilityKey(heldFit(100, { p: 1 }, 'mean', {}), ['step at 4']).key,
    ];
    expect(new Set([base, ...others]).size).toBe(others.length + 1);
  });

  it('does not depend on the order in which events were found', () => {
    const fit = heldFit(100, { p: 1 }, 'mean', {});
    expect(comparabilityKey(fit, ['a', 'b']).key).toBe(comparabilityKey(fit, ['b', 'a']).key);
  });
});

describe('differences and weights', () => {
  const criteria = (aic: number, aicc: number | null = aic): Criteria => ({ aic, aicc, bic: aic + 5, hq: aic + 2 });

  it('AIC 100, 102, 110: weights in the ratio 1 : e⁻¹ : e⁻⁵ (Burnham & Anderson 2002, §2.9)', () => {
    const { entries, weightBy } = criteriaDifferences([criteria(102), criteria(100), criteria(110)]);
    const total = 1 + Math.exp(-1) + Math.exp(-5);
    expect(weightBy).toBe('aicc');
    expect(entries.map(({ differences }) => differences.aic)).toEqual([2, 0, 10]);
    expect(entries[0]!.weight).toBeCloseTo(Math.exp(-1) / total, 14);
    expect(entries[2]!.weight).toBeCloseTo(Math.exp(-5) / total, 14);
  });

  it('falls back to AIC where AICc is undefined for one', () => {
    const { entries, weightBy } = criteriaDifferences([criteria(100, null), criteria(101, 103)]);
    expect(weightBy).toBe('aic');
    expect(entries[0]!.differences.aicc).toBeNull();
    expect(entries[1]!.differences.aicc).toBe(0);
  });

  it('Lake Huron: ARMA(1,1) 0, AR(2) .776, AR(1) 4.531 by AICc; differenced and conditional fits stand apart', () => {
    // AICc from exact maximum likelihood in 34-digit arithmetic: 214.9206288, 215.6965526, 219.4512685.
    const values = publishedSeries('lakeHuron');
    const fits = [
      fitted(values, { d: 1 }, 'none'),
      fitted(values, { p: 1 }, 'mean'),
      fitted(values, { p: 2 }, 'mean'),
      fitted(values, { p: 1, q: 1 }, 'mean'),
      fitted(values, { p: 1 }, 'mean', { estimator: 'conditional' }),
    ];
    const groups = comparisonGroups(fits);
    expect(groups.map(({ members }) => members.map(({ index }) => index))).toEqual([[3, 2, 1], [0], [4]]);
    expect(groups.map(({ differsIn }) => differsIn)).toEqual([[], ['differencing'], ['likelihood']]);
    const differences = groups[0]!.members.map((member) => member.differences.aicc!);
    expect(differences[0]).toBe(0);
    expect(differences[1]).toBeCloseTo(215.6965526 - 214.9206288, 6);
    expect(differences[2]).toBeCloseTo(219.4512685 - 214.9206288, 6);
    expect(groups[0]!.members.reduce((sum, { weight }) => sum + weight, 0)).toBeCloseTo(1, 14);
  });

  it('no fits make no groups', () => {
    expect(comparisonGroups([])).toEqual([]);
  });
});
