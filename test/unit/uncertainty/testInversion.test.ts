import { describe, expect, it } from 'vitest';
import { testInversion, testValue } from '../../../workers/uncertainty/testInversion.ts';
import { heldSpace } from '../../../workers/uncertainty/heldSpace.ts';
import { heldMaximum } from '../../../workers/uncertainty/heldMaximum.ts';
import { prepareLikelihood } from '../../../workers/estimation/prepareLikelihood.ts';
import { fitted } from '../../helpers/fitted.ts';
import { publishedSeries } from '../../helpers/publishedSeries.ts';

const noLags = { ar: [], ma: [], seasonalAr: [], seasonalMa: [] };

describe('coordinates with a coefficient held', () => {
  it('finds its way back', () => {
    const space = heldSpace({ p: 2, q: 1, P: 0, Q: 1 }, noLags, { factor: 'ar', lag: 1, value: 0.5 });
    expect(space.dimension).toBe(3);
    const at = { ar: [0.5, 0.2], ma: [-0.4], seasonalAr: [], seasonalMa: [0.3] };
    const found = space.place(space.locate(at)!)!;
    expect(found.ar[0]).toBe(0.5);
    expect(found.ar[1]).toBeCloseTo(0.2, 12);
    expect(found.ma[0]).toBeCloseTo(-0.4, 12);
    expect(found.seasonalMa[0]).toBeCloseTo(0.3, 12);
  });

  it('has nothing where the held value leaves no stationary model', () => {
    const space = heldSpace({ p: 1, q: 0, P: 0, Q: 0 }, noLags, { factor: 'ar', lag: 1, value: 1.2 });
    expect(space.locate({ ar: [0.3], ma: [], seasonalAr: [], seasonalMa: [] })).toBeNull();
  });
});

describe('maxima under a hypothesis', () => {
  const values = publishedSeries('lakeHuron');
  const fit = fitted(values, { p: 1 }, 'mean');
  const prepared = prepareLikelihood({ values, candidate: fit.candidate });
  if (!prepared.ok) throw new Error(prepared.failure.code);
  const likelihood = prepared.value;

  it('is the fit where nothing is held', () => {
    // ln L of Lake Huron AR(1): −106.597974697 (34-digit computation).
    const free = heldMaximum(likelihood, fit.candidate, { kind: 'free' }, [{ ...fit.parameters, ar: [0.2] }]);
    expect(free.logLikelihood).toBeCloseTo(-106.597974697, 6);
  });

  it('is the likelihood of the record less the mean where the mean is held', () => {
    const shifted = values.map((value) => value - 578.2);
    const without = fitted(shifted, { p: 1 }, 'none');
    const held = heldMaximum(likelihood, fit.candidate, { kind: 'column', column: 0, value: 578.2 }, [fit.parameters]);
    // The climb ends where it expects to gain less than 1e−5.
    expect(Math.abs(held.logLikelihood - without.logLikelihood)).toBeLessThan(1e-4);
    expect(held.coefficients!.ar[0]).toBeCloseTo(without.parameters.ar[0]!, 3);
  });

  it('is the profile where a coefficient is held', () => {
    const hypothesis = { kind: 'coefficient', factor: 'ar', lag: 1, value: 0.7 } as const;
    const held = heldMaximum(likelihood, fit.candidate, hypothesis, [fit.parameters]);
    const at = { ...fit.parameters, ar: [0.7] };
    expect(held.logLikelihood).toBeCloseTo(likelihood.concentrated(at).logLikelihood, 10);
  });
});

describe('intervals by inverting the simulated test', () => {
  it('is Student’s interval for the mean of white noise', () => {
    // LR = n ln(1 + t²/(n − 1)): the simulated law must lead back to t(0.975; 9) = 2.262157 (tables).
    const values = Float64Array.of(3.1, 2.7, 3.6, 2.9, 3.3, 3.8, 2.5, 3.0, 3.4, 2.8);
    const fit = fitted(values, {}, 'mean');
    const found = testInversion({ fit, values, about: 'mean', coverage: 0.95, seed: 5, replicates: 1999 });
    if (!found.ok) throw new Error(found.failure.code);
    const mean = values.reduce((a, b) => a + b, 0) / 10;
    const error = Math.sqrt(values.reduce((sum, x) => sum + (x - mean) ** 2, 0) / 90);
    // The 95 % point of 2000 ratios carries a standard error of about 4 %, its root 2 %.
    expect(Math.abs((found.value.upper - mean) / error / 2.262157 - 1)).toBeLessThan(0.06);
    expect(Math.abs((mean - found.value.lower) / error / 2.262157 - 1)).toBeLessThan(0.06);
  });

  it('gives p-values that fall from 1 at the estimate, and the same again for the same seed', () => {
    const values = publishedSeries('luteinisingHormone');
    const fit = fitted(values, { p: 1 }, 'mean');
    const test = (value: number) => {
      const found = testValue({ fit, values, about: 'φ1', seed: 2, replicates: 99 }, value);
      if (!found.ok) throw new Error(found.failure.code);
      return found.value;
    };
    expect(test(fit.parameters.ar[0]!).p).toBeGreaterThan(0.9);
    const [near, far] = [test(0.45), test(0.05)];
    expect(near.p).toBeGreaterThan(far.p);
    expect(far.p).toBeLessThan(0.03);
    expect(test(0.45)).toEqual(near);
  });

  it('reports progress and refuses parameters the fit does not have', () => {
    const values = publishedSeries('colour');
    const fit = fitted(values, { p: 1 }, 'mean');
    const seen: number[] = [];
    const found = testInversion({ fit, values, about: 'φ1', coverage: 0.9, seed: 1, replicates: 39 }, (d) =>
      seen.push(d),
    );
    expect(found.ok).toBe(true);
    expect(seen.at(-1)).toBe(1);
    expect(seen.every((value, i) => i === 0 || value >= seen[i - 1]!)).toBe(true);
    expect(testInversion({ fit, values, about: 'Θ9', coverage: 0.9, seed: 1 })).toMatchObject({
      ok: false,
      failure: { code: 'noSuchParameter', name: 'Θ9' },
    });
  });
});
