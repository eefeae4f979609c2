import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { inversePartialMap, partialMap } from '../../../../workers/estimation/search/partialMap.ts';

const mapped = (partials: number[]) => {
  const p = partials.length;
  const coefficients = new Float64Array(p);
  const jacobian = new Float64Array(p * p);
  partialMap(Float64Array.from(partials), coefficients, jacobian);
  return { coefficients, jacobian };
};
const partial = fc.double({ min: -0.99, max: 0.99, noNaN: true });

describe('partialMap', () => {
  it('maps (.5, −.3, .2) to (.71, −.43, .20)', () => {
    // Worked by hand from the recursion of Barndorff-Nielsen & Schou 1973.
    const { coefficients } = mapped([0.5, -0.3, 0.2]);
    [0.71, -0.43, 0.2].forEach((value, i) => expect(coefficients[i]).toBeCloseTo(value, 15));
  });

  it('puts a root at +1 where the first partial is 1, whatever the others', () => {
    fc.assert(
      fc.property(fc.array(partial, { minLength: 1, maxLength: 5 }), (rest) => {
        const { coefficients } = mapped([1, ...rest]);
        expect(coefficients.reduce((sum, value) => sum - value, 1)).toBeCloseTo(0, 12);
      }),
    );
  });

  it('has the derivatives of its own differences', () => {
    fc.assert(
      fc.property(fc.array(partial, { minLength: 1, maxLength: 6 }), (partials) => {
        const p = partials.length;
        const { jacobian } = mapped(partials);
        for (let m = 0; m < p; m++) {
          // The map is of first degree in each partial alone, so a central difference is exact to rounding.
          const at = (shift: number) => mapped(partials.map((r, i) => (i === m ? r + shift : r))).coefficients;
          const [ahead, behind] = [at(0.25), at(-0.25)];
          for (let j = 0; j < p; j++) expect(jacobian[j * p + m]).toBeCloseTo((ahead[j]! - behind[j]!) / 0.5, 11);
        }
      }),
    );
  });

  it('is undone by its inverse', () => {
    fc.assert(
      fc.property(fc.array(partial, { minLength: 1, maxLength: 6 }), (partials) => {
        const back = new Float64Array(partials.length);
        expect(inversePartialMap(mapped(partials).coefficients, back)).toBe(true);
        // Each step back divides by 1 − r², at worst 0.02, so some digits may go.
        partials.forEach((r, i) => expect(back[i]).toBeCloseTo(r, 3));
      }),
    );
  });

  it('refuses a polynomial with a root inside the circle', () => {
    expect(inversePartialMap([1.2], new Float64Array(1))).toBe(false);
    expect(inversePartialMap([0.6, 0.6], new Float64Array(2))).toBe(false);
    expect(inversePartialMap([NaN], new Float64Array(1))).toBe(false);
  });
});
