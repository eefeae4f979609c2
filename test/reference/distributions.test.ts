import { describe, expect, test } from 'vitest';
import { chiSquareCdf } from '../../workers/distributions/chiSquareCdf.ts';
import { chiSquareQuantile } from '../../workers/distributions/chiSquareQuantile.ts';
import { chiSquareUpperTail } from '../../workers/distributions/chiSquareUpperTail.ts';
import { fisherFCdf } from '../../workers/distributions/fisherFCdf.ts';
import { fisherFQuantile } from '../../workers/distributions/fisherFQuantile.ts';
import { fisherFUpperTail } from '../../workers/distributions/fisherFUpperTail.ts';
import { normalCdf } from '../../workers/distributions/normalCdf.ts';
import { normalQuantile } from '../../workers/distributions/normalQuantile.ts';
import { normalUpperTail } from '../../workers/distributions/normalUpperTail.ts';
import { studentTCdf } from '../../workers/distributions/studentTCdf.ts';
import { studentTQuantile } from '../../workers/distributions/studentTQuantile.ts';
import { studentTUpperTail } from '../../workers/distributions/studentTUpperTail.ts';
import { weightedChiSquareUpperTail } from '../../workers/distributions/weightedChiSquareUpperTail.ts';
import reference from './distributions.json' with { type: 'json' };

/** 50-digit reference numbers by mpmath (generate/distributions.py). Relative tolerance 4e-12: rounding of exponents up to a few hundred. */
const close = (ours: number, exact: number) => {
  if (exact < 1e-300) expect(ours).toBeLessThan(1e-295);
  else expect(Math.abs(ours / exact - 1)).toBeLessThan(4e-12);
};

describe('tails against 50-digit arithmetic', () => {
  test.each(reference.normal as [number, number][])('normal %d', (x, upper) => {
    close(normalUpperTail(x), upper);
    close(normalCdf(-x), upper);
    if (upper > 1e-300 && x > -5) expect(-normalQuantile(upper)).toBeCloseTo(x, x === 1e-8 ? 7 : 9);
  });
  test.each(reference.chiSquare as [number, number, number, number][])('chi-square %d, %d', (x, df, lower, upper) => {
    close(chiSquareCdf(x, df), lower);
    close(chiSquareUpperTail(x, df), upper);
    if (lower > 1e-10 && lower < 0.999) expect(Math.abs(chiSquareQuantile(lower, df) / x - 1)).toBeLessThan(1e-9);
  });
  test.each(reference.studentT as [number, number, number][])('t %d, %d', (t, df, upper) => {
    close(studentTUpperTail(t, df), upper);
    close(studentTCdf(-t, df), upper);
    if (t > 0) expect(Math.abs(-studentTQuantile(upper, df) / t - 1)).toBeLessThan(1e-9);
  });
  test.each(reference.fisherF as [number, number, number, number, number][])(
    'F %d, %d, %d',
    (x, d1, d2, upper, lower) => {
      close(fisherFUpperTail(x, d1, d2), upper);
      close(fisherFCdf(x, d1, d2), lower);
      if (lower < 0.999) expect(Math.abs(fisherFQuantile(lower, d1, d2) / x - 1)).toBeLessThan(1e-9);
    },
  );
  test.each(reference.weighted as [number[], number, number][])('weighted chi-squares %j, %d', (weights, x, upper) => {
    expect(Math.abs(weightedChiSquareUpperTail(weights, x) - upper)).toBeLessThan(1e-8);
  });
});

test('outside the domain', () => {
  expect(chiSquareUpperTail(3, 0)).toBeNaN();
  expect(chiSquareUpperTail(-1, 2)).toBe(1);
  expect(chiSquareUpperTail(Infinity, 2)).toBe(0);
  expect(normalUpperTail(NaN)).toBeNaN();
  expect(normalQuantile(0)).toBe(-Infinity);
  expect(normalQuantile(1)).toBe(Infinity);
  expect(normalQuantile(1.2)).toBeNaN();
  expect(studentTUpperTail(Infinity, 3)).toBe(0);
  expect(fisherFUpperTail(-1, 2, 3)).toBe(1);
  expect(weightedChiSquareUpperTail([], 1)).toBeNaN();
  expect(weightedChiSquareUpperTail([1, -1], 1)).toBeNaN();
});
