import { expect, test } from 'vitest';
import { multiplyPolynomials } from '../../../workers/numeric/multiplyPolynomials.ts';

test('(1 + x)¹⁰ has the binomial coefficients', () => {
  let power: Float64Array = Float64Array.of(1);
  for (let i = 0; i < 10; i++) power = multiplyPolynomials(power, [1, 1]);
  expect([...power]).toEqual([1, 10, 45, 120, 210, 252, 210, 120, 45, 10, 1]);
});

test('the operator of a seasonal difference of a difference', () => {
  const seasonal = new Float64Array(13);
  seasonal[0] = 1;
  seasonal[12] = -1;
  const both = multiplyPolynomials([1, -1], seasonal);
  expect([...both]).toEqual([1, -1, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, -1, 1]);
});

test('nothing times anything is nothing; NaN passes on', () => {
  expect(multiplyPolynomials([], [1, 2])).toHaveLength(0);
  expect(multiplyPolynomials([1], [])).toHaveLength(0);
  expect([...multiplyPolynomials([0, NaN], [2])]).toEqual([0, NaN]);
});
