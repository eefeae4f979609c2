import { expect, test } from 'vitest';
import { solveLinear, symmetricEigen } from '../../../workers/numeric/matrix.ts';

test('A·V = V·D for a symmetric matrix, eigenvalues ascending (1, 3 for [2 1; 1 2])', () => {
  const values = Float64Array.of(2, 1, 1, 2);
  const { values: d, vectors: v } = symmetricEigen({ n: 2, values });
  expect(d[0]).toBeCloseTo(1, 14);
  expect(d[1]).toBeCloseTo(3, 14);
  for (let i = 0; i < 2; i++)
    for (let j = 0; j < 2; j++)
      expect(values[i * 2]! * v[j]! + values[i * 2 + 1]! * v[2 + j]!).toBeCloseTo(v[i * 2 + j]! * d[j]!, 14);
});

test('a general system; null for a singular one', () => {
  expect([...solveLinear({ n: 2, values: Float64Array.of(0, 2, 3, 1) }, Float64Array.of(4, 5))!]).toEqual([1, 2]);
  expect(solveLinear({ n: 2, values: Float64Array.of(1, 2, 2, 4) }, Float64Array.of(1, 1))).toBeNull();
});
