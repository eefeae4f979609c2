import { describe, expect, it } from 'vitest';
import { hessian } from '../../../workers/numeric/hessian.ts';

describe('hessian', () => {
  it('of exp(x)·sin(y) agrees with the closed form to its own error estimate', () => {
    const [x, y] = [0.3, 1.1];
    const estimate = hessian(
      (at, gradient) => {
        gradient[0] = Math.exp(at[0]!) * Math.sin(at[1]!);
        gradient[1] = Math.exp(at[0]!) * Math.cos(at[1]!);
      },
      Float64Array.of(x, y),
      [0.1, 0.1],
    );
    const e = Math.exp(x);
    const exact = [e * Math.sin(y), e * Math.cos(y), e * Math.cos(y), -e * Math.sin(y)];
    exact.forEach((value, i) => expect(Math.abs(estimate.values[i]! - value)).toBeLessThan(1e-10));
    expect(estimate.error).toBeLessThan(1e-6);
    expect(estimate.error).toBeGreaterThan(0);
  });

  it('is exact for a quadratic', () => {
    const estimate = hessian(
      (at, gradient) => {
        gradient[0] = 4 * at[0]! + at[1]!;
        gradient[1] = at[0]! + 3 * at[1]!;
      },
      Float64Array.of(0.5, 2),
      [0.25, 0.25],
    );
    expect([...estimate.values]).toEqual([4, 1, 1, 3]);
    expect(estimate.error).toBe(0);
  });

  it('reports a field that is no gradient as error', () => {
    const turning = hessian(
      (at, gradient) => {
        gradient[0] = at[0]! - at[1]!;
        gradient[1] = at[0]! + at[1]!;
      },
      Float64Array.of(0, 0),
      [0.5, 0.5],
    );
    expect(turning.error).toBeCloseTo(1, 10);
  });

  it('is not a number where the gradient is none', () => {
    const estimate = hessian((_, gradient) => gradient.fill(NaN), Float64Array.of(0), [1]);
    expect(estimate.values[0]).toBeNaN();
    expect(estimate.error).toBe(Infinity);
  });

  it('of no arguments is empty', () => {
    expect(hessian(() => undefined, new Float64Array(0), []).values).toHaveLength(0);
  });
});
