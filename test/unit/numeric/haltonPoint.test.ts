import { describe, expect, it } from 'vitest';
import { haltonPoint } from '../../../workers/numeric/haltonPoint.ts';

describe('Halton points', () => {
  it('are radical inverses', () => {
    // Halton 1960: base 2: 1/2, 1/4, 3/4, 1/8, 5/8; base 3: 1/3, 2/3, 1/9, 4/9, 7/9.
    const expected = [
      [1 / 2, 1 / 3],
      [1 / 4, 2 / 3],
      [3 / 4, 1 / 9],
      [1 / 8, 4 / 9],
      [5 / 8, 7 / 9],
    ];
    const point = new Float64Array(2);
    expected.forEach((values, i) => {
      haltonPoint(i + 1, [0, 0], point);
      values.forEach((value, j) => expect(point[j]).toBeCloseTo(value, 15));
    });
  });

  it('wrap when shifted, and have a dozen coordinates', () => {
    const point = new Float64Array(1);
    haltonPoint(3, [0.5], point);
    expect(point[0]).toBeCloseTo(0.25, 15);
    expect(() => haltonPoint(1, new Float64Array(13), new Float64Array(13))).toThrow('12');
  });

  it('integrate a smooth function far better than random points', () => {
    // ∫ x y over the unit square is 1/4; 1000 random points have a standard error of 0.007.
    const point = new Float64Array(2);
    let sum = 0;
    for (let i = 1; i <= 1000; i++) {
      haltonPoint(i, [0.3, 0.6], point);
      sum += point[0]! * point[1]!;
    }
    expect(Math.abs(sum / 1000 - 0.25)).toBeLessThan(0.0015);
  });
});
