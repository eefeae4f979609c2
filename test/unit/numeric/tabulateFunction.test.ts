import { expect, it } from 'vitest';
import { tabulateFunction } from '../../../workers/numeric/tabulateFunction.ts';

it('follows a cubic exactly, a sine to the fourth power of the step, and stops at its ends', () => {
  const cubic = tabulateFunction((x) => x ** 3 - 2 * x + 1, -2, 3, 10);
  for (const x of [-2, -1.9, 0, 0.37, 2.2, 2.99, 3]) expect(cubic(x)).toBeCloseTo(x ** 3 - 2 * x + 1, 12);
  const sine = tabulateFunction(Math.sin, 0, Math.PI, 100);
  for (let x = 0; x < Math.PI; x += 0.01) expect(Math.abs(sine(x) - Math.sin(x))).toBeLessThan(3e-8);
  expect(cubic(-5)).toBe(cubic(-2));
  expect(cubic(7)).toBe(cubic(3));
  expect(cubic(NaN)).toBeNaN();
});
