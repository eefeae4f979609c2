import { describe, expect, it } from 'vitest';
import { fisherG } from '../../../workers/identification/fisherG.ts';

describe("Fisher's g", () => {
  it('for two ordinates is uniform on ½…1: 2(1 − x)', () => {
    for (const x of [0.5001, 0.6, 0.75, 0.999]) expect(fisherG(x, 2)).toBeCloseTo(2 * (1 - x), 13);
  });

  it('for three ordinates: 3(1 − x)² − 3(1 − 2x)² below ½, 3(1 − x)² above', () => {
    expect(fisherG(0.4, 3)).toBeCloseTo(3 * 0.36 - 3 * 0.04, 13);
    expect(fisherG(0.7, 3)).toBeCloseTo(3 * 0.09, 13);
  });

  // Fisher 1929, Proc. R. Soc. A 125, table I, and the tables after it (Brockwell & Davis, Time Series: Theory and Methods, §10.2), from
  // memory: 5 % points of g.
  it.each([
    [5, 0.68377],
    [10, 0.44495],
    [20, 0.2704],
    [50, 0.13135],
  ])('5 %% point for m = %i', (m, g) => {
    expect(fisherG(g, m)).toBeCloseTo(0.05, 3);
  });

  it('goes over to its extreme-value limit without a step, and never leaves 0…1', () => {
    for (const m of [30, 300, 30_000]) {
      let before = 1;
      for (let x = 1 / m; x < Math.min(1, 40 / m); x *= 1.01) {
        const p = fisherG(x, m);
        expect(p).toBeGreaterThanOrEqual(0);
        expect(p).toBeLessThanOrEqual(before + 0.02);
        before = p;
      }
    }
  });

  it('outside its domain', () => {
    expect(fisherG(0.01, 50)).toBe(1);
    expect(fisherG(1, 5)).toBe(0);
    expect(fisherG(NaN, 5)).toBeNaN();
    expect(fisherG(0.5, 0)).toBeNaN();
  });
});
