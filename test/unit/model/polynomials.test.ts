import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { coefficientsToPartial } from '../../../workers/model/coefficientsToPartial.ts';
import { differencingPolynomial } from '../../../workers/model/differencingPolynomial.ts';
import { equationOf } from '../../../workers/model/equationOf.ts';
import { candidateOf } from '../../../workers/model/candidateOf.ts';
import { expandPolynomials } from '../../../workers/model/expandPolynomials.ts';
import { partialToCoefficients } from '../../../workers/model/partialToCoefficients.ts';
import { psiWeights } from '../../../workers/model/psiWeights.ts';
import { rootPoints } from '../../../workers/model/rootPoints.ts';

const coefficientsOf = (partial: number[]) => {
  const result = new Float64Array(partial.length);
  partialToCoefficients(partial, result);
  return result;
};

describe('partial autocorrelations', () => {
  test('(.5, −.3, .2) is φ = (.71, −.43, .20) (Barndorff-Nielsen & Schou 1973)', () => {
    const phi = coefficientsOf([0.5, -0.3, 0.2]);
    [0.71, -0.43, 0.2].forEach((value, i) => expect(phi[i]).toBeCloseTo(value, 14));
    const partial = new Float64Array(3);
    expect(coefficientsToPartial(phi, partial)).toBe(true);
    [0.5, -0.3, 0.2].forEach((value, i) => expect(partial[i]).toBeCloseTo(value, 14));
  });

  test('AR(2) is stationary exactly in its triangle: φ2 < 1 − |φ1|, φ2 > −1 (Box & Jenkins, ch. 3)', () => {
    const partial = new Float64Array(2);
    fc.assert(
      fc.property(
        fc.double({ min: -2.5, max: 2.5, noNaN: true }),
        fc.double({ min: -1.5, max: 1.5, noNaN: true }),
        (one, two) => {
          fc.pre(Math.abs(two - (1 - Math.abs(one))) > 1e-9 && Math.abs(two + 1) > 1e-9);
          expect(coefficientsToPartial([one, two], partial)).toBe(two < 1 - Math.abs(one) && two > -1);
        },
      ),
    );
  });

  test('every set of partials inside the cube gives roots inside the circle, and comes back', () => {
    const inside = fc.array(fc.double({ min: -0.95, max: 0.95, noNaN: true }), { minLength: 1, maxLength: 6 });
    fc.assert(
      fc.property(inside, (partial) => {
        const phi = coefficientsOf(partial);
        const back = new Float64Array(partial.length);
        expect(coefficientsToPartial(phi, back)).toBe(true);
        partial.forEach((value, i) => expect(back[i]).toBeCloseTo(value, 6));
        const at = {
          ar: [...phi],
          ma: [],
          seasonalAr: [],
          seasonalMa: [],
          mean: 0,
          regression: [],
          innovationVariance: 1,
        };
        for (const root of rootPoints(at, { s: 0 })) expect(root.modulus).toBeLessThan(1 + 1e-9);
      }),
    );
  });
});

describe('polynomials', () => {
  test('(1 − .5B)(1 − .4B⁴) and (1 + .3B)(1 − .6B⁴), by hand', () => {
    const { ar, ma } = expandPolynomials({ ar: [0.5], ma: [0.3], seasonalAr: [0.4], seasonalMa: [-0.6] }, 4);
    [0.5, 0, 0, 0.4, -0.2].forEach((value, i) => expect(ar[i]).toBeCloseTo(value, 15));
    [0.3, 0, 0, -0.6, -0.18].forEach((value, i) => expect(ma[i]).toBeCloseTo(value, 15));
  });

  test('differencing: (1 − B)²(1 − B³), by hand', () => {
    expect([...differencingPolynomial({ d: 2, D: 1, s: 3 })]).toEqual([1, -2, 1, -1, 2, -1]);
    expect([...differencingPolynomial({ d: 0, D: 0, s: 0 })]).toEqual([1]);
  });

  test('ψ weights of AR(.5, .3) with MA(.4), by hand', () => {
    const psi = psiWeights(Float64Array.of(0.5, 0.3), Float64Array.of(0.4), 8);
    [1, 0.9, 0.75, 0.645, 0.5475, 0.46725, 0.397875, 0.3391125].forEach((value, i) =>
      expect(psi[i]).toBeCloseTo(value, 14),
    );
  });

  test('the constant is the mean times φ(1)Φ(1), not the mean', () => {
    const candidate = candidateOf({ order: { p: 1, d: 0, q: 0, P: 1, D: 0, Q: 0, s: 4 }, level: 'mean' });
    const equation = equationOf(candidate, {
      ar: [0.5],
      ma: [],
      seasonalAr: [0.2],
      seasonalMa: [],
      mean: 10,
      regression: [],
      innovationVariance: 1,
    });
    expect(equation.constant).toBeCloseTo(4, 14);
    expect(equation.mean).toBe(10);
  });
});

describe('roots', () => {
  const none = { ar: [], ma: [], seasonalAr: [], seasonalMa: [], mean: 0, regression: [], innovationVariance: 1 };

  test('φ = (1.2, −.72): modulus √.72, an angle of 45°, period 8', () => {
    const [root, ...others] = rootPoints({ ...none, ar: [1.2, -0.72] }, { s: 0 });
    expect(others).toHaveLength(0);
    expect(root!.modulus).toBeCloseTo(Math.sqrt(0.72), 12);
    expect(root!.period).toBeCloseTo(8, 10);
    expect(root!.timeConstant).toBeCloseTo(-1 / Math.log(Math.sqrt(0.72)), 10);
  });

  test('a seasonal root stands at every frequency of its season', () => {
    const roots = rootPoints({ ...none, seasonalAr: [0.81] }, { s: 4 });
    expect(roots.map((root) => root.period).sort((a, b) => a - b)).toEqual([2, 4, Infinity]);
    for (const root of roots) expect(root.modulus).toBeCloseTo(0.81 ** 0.25, 12);
  });

  test('an alternating root has period 2, an MA root on the circle lasts for ever', () => {
    const roots = rootPoints({ ...none, ar: [-0.5], ma: [-1] }, { s: 0 });
    expect(roots.map(({ polynomial, period }) => [polynomial, period])).toEqual([
      ['ar', 2],
      ['ma', Infinity],
    ]);
    expect(roots[1]!.timeConstant).toBe(Infinity);
  });
});
