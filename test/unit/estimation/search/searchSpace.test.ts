import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { SearchSpace } from '../../../../workers/estimation/search/searchSpace.ts';
import { candidateOf } from '../../../../workers/model/candidateOf.ts';

const ORDER = { p: 2, d: 0, q: 2, P: 1, D: 0, Q: 1, s: 12 };
const none = candidateOf({ order: ORDER }).zeroLags;
const inside = fc.array(fc.double({ min: -0.95, max: 0.95, noNaN: true }), { minLength: 6, maxLength: 6 });

describe('SearchSpace', () => {
  it('places and locates: there and back', () => {
    fc.assert(
      fc.property(inside, (x) => {
        const space = new SearchSpace(ORDER, none);
        expect(space.place(x)).toBe(true);
        expect(space.isInside()).toBe(true);
        const { ar, ma, seasonalAr, seasonalMa } = space.coefficients;
        const back = space.locate({
          ar: [...ar],
          ma: [...ma],
          seasonalAr: [...seasonalAr],
          seasonalMa: [...seasonalMa],
        });
        back.forEach((value, i) => expect(value).toBeCloseTo(x[i]!, 8));
      }),
    );
  });

  it('pulls a gradient back as the chain rule has it', () => {
    fc.assert(
      fc.property(inside, (x) => {
        const space = new SearchSpace(ORDER, none);
        // f = Σ w_i c_i is linear in the coefficients, and those are of first degree in each partial.
        const weights = Float64Array.of(1, -2, 3, 0.5, -1, 2);
        const height = (at: readonly number[]) => {
          space.place(at);
          return space.coefficients.all.reduce((sum, value, i) => sum + value * weights[i]!, 0);
        };
        const differences = x.map((_, i) => {
          const moved = (step: number) => height(x.map((value, j) => (j === i ? value + step : value)));
          return (moved(0.02) - moved(-0.02)) / 0.04;
        });
        space.place(x);
        const gradient = new Float64Array(6);
        space.pullBack(weights, gradient);
        differences.forEach((value, i) => expect(gradient[i]).toBeCloseTo(value, 9));
      }),
    );
  });

  it('takes MA roots on the circle and refuses AR ones', () => {
    const space = new SearchSpace(ORDER, none);
    expect(space.place([0.1, 0.1, 1, 0.3, 0, 0])).toBe(true);
    expect(space.coefficients.ma.reduce((sum, value) => sum + value, 1)).toBeCloseTo(0, 14);
    expect(space.place([1, 0.1, 0.1, 0.3, 0, 0])).toBe(false);
    expect(space.place([0.1, 0.1, 0.1, 1.01, 0, 0])).toBe(false);
    expect(space.place([NaN, 0.1, 0.1, 0.3, 0, 0])).toBe(false);
  });

  it('draws a model from outside in, keeping the direction of its roots', () => {
    const space = new SearchSpace({ ...ORDER, p: 1, q: 1, P: 0, Q: 0, s: 0 }, none);
    const x = space.locate({ ar: [1.4], ma: [-3], seasonalAr: [], seasonalMa: [] });
    space.place(x);
    expect(space.coefficients.ar[0]).toBeGreaterThan(0.9);
    expect(space.coefficients.ma[0]).toBeLessThan(-0.9);
    expect(space.isInside()).toBe(true);
  });

  it('has a face for each way MA roots reach the circle', () => {
    const space = new SearchSpace(ORDER, none);
    expect(space.faces()).toEqual([
      { coordinate: 2, value: 1 },
      { coordinate: 2, value: -1 },
      { coordinate: 3, value: -1 },
      { coordinate: 5, value: 1 },
      { coordinate: 5, value: -1 },
    ]);
    expect([0, 1, 2, 3, 4, 5].map((i) => space.mayReachCircle(i))).toEqual([false, false, true, true, false, true]);
  });

  it('searches coefficients themselves where lags are held at zero', () => {
    const zeroLags = { ...none, ar: [1] };
    const space = new SearchSpace({ ...ORDER, q: 0, P: 0, Q: 0, s: 0 }, zeroLags);
    expect(space.dimension).toBe(1);
    expect(space.place([0.7])).toBe(true);
    expect([...space.coefficients.ar]).toEqual([0, 0.7]);
    expect(space.place([1.2])).toBe(false);
    expect(space.estimated()).toEqual([1]);
    expect(() => space.isPartial(1)).toThrow(RangeError);
  });
});
