import { describe, expect, it } from 'vitest';
import { minimise, type Objective } from '../../../workers/numeric/minimise.ts';

const options = { inverseHessian: 1, decrease: 1e-16, maximumIterations: 500, longestStep: 10 };

/** Test functions of Moré, Garbow & Hillstrom 1981, ACM TOMS 7, 17–41 (doi:10.1145/355934.355936), with their minima. */
const rosenbrock: Objective = (at, gradient) => {
  const [x, y] = [at[0]!, at[1]!];
  gradient[0] = -400 * x * (y - x * x) - 2 * (1 - x);
  gradient[1] = 200 * (y - x * x);
  return 100 * (y - x * x) ** 2 + (1 - x) ** 2;
};
const powellSingular: Objective = (at, gradient) => {
  const [a, b, c, d] = [at[0]!, at[1]!, at[2]!, at[3]!];
  gradient[0] = 2 * (a + 10 * b) + 40 * (a - d) ** 3;
  gradient[1] = 20 * (a + 10 * b) + 4 * (b - 2 * c) ** 3;
  gradient[2] = 10 * (c - d) - 8 * (b - 2 * c) ** 3;
  gradient[3] = -10 * (c - d) - 40 * (a - d) ** 3;
  return (a + 10 * b) ** 2 + 5 * (c - d) ** 2 + (b - 2 * c) ** 4 + 10 * (a - d) ** 4;
};
const beale: Objective = (at, gradient) => {
  const [x, y] = [at[0]!, at[1]!];
  let sum = 0;
  gradient.fill(0);
  [1.5, 2.25, 2.625].forEach((target, i) => {
    const residual = target - x * (1 - y ** (i + 1));
    sum += residual * residual;
    gradient[0]! += -2 * residual * (1 - y ** (i + 1));
    gradient[1]! += 2 * residual * x * (i + 1) * y ** i;
  });
  return sum;
};

describe('minimise', () => {
  it('finds the minimum of the Rosenbrock function from its standard start', () => {
    const end = minimise(rosenbrock, Float64Array.of(-1.2, 1), options);
    expect(end.status).toBe('converged');
    expect(Math.abs(end.at[0]! - 1)).toBeLessThan(1e-7);
    expect(Math.abs(end.at[1]! - 1)).toBeLessThan(1e-7);
    expect(end.iterations).toBeLessThan(60);
  });

  it('finds the minimum of Beale’s function', () => {
    const end = minimise(beale, Float64Array.of(1, 1), options);
    expect(end.at[0]).toBeCloseTo(3, 7);
    expect(end.at[1]).toBeCloseTo(0.5, 7);
  });

  it('goes down a singular valley', () => {
    const end = minimise(powellSingular, Float64Array.of(3, -1, 0, 1), options);
    expect(end.value).toBeLessThan(1e-10);
  });

  it('turns back at the edge of the domain', () => {
    // −ln x + x, defined for x > 0 only; minimum at 1.
    const barrier: Objective = (at, gradient) => {
      gradient[0] = 1 - 1 / at[0]!;
      return at[0]! > 0 ? at[0]! - Math.log(at[0]!) : Infinity;
    };
    const end = minimise(barrier, Float64Array.of(8), { ...options, inverseHessian: 100, longestStep: 1000 });
    expect(end.status).toBe('converged');
    expect(end.at[0]).toBeCloseTo(1, 7);
  });

  it('says so when the start is outside', () => {
    const nowhere: Objective = () => NaN;
    expect(minimise(nowhere, Float64Array.of(0), options).status).toBe('startOutside');
  });

  it('is done at once without arguments', () => {
    const end = minimise(() => 7, new Float64Array(0), options);
    expect(end).toMatchObject({ status: 'converged', value: 7, iterations: 0, gradientNorm: 0 });
  });

  it('stalls where the gradient lies', () => {
    const wrong: Objective = (at, gradient) => {
      gradient[0] = -1;
      return at[0]! ** 2;
    };
    expect(minimise(wrong, Float64Array.of(0), options).status).toBe('stalled');
  });

  it('keeps the curvature it learnt: the inverse Hessian of a quadratic', () => {
    // f = ½x′Ax with A = [[4,1],[1,3]]; A⁻¹ = [[3,−1],[−1,4]]/11.
    const quadratic: Objective = (at, gradient) => {
      gradient[0] = 4 * at[0]! + at[1]!;
      gradient[1] = at[0]! + 3 * at[1]!;
      return (at[0]! * gradient[0] + at[1]! * gradient[1]) / 2;
    };
    const end = minimise(quadratic, Float64Array.of(5, -7), { ...options, decrease: 1e-28 });
    expect(end.value).toBeLessThan(1e-20);
    const expected = [3 / 11, -1 / 11, -1 / 11, 4 / 11];
    end.inverseHessian.forEach((value, i) => expect(value).toBeCloseTo(expected[i]!, 2));
  });
});
