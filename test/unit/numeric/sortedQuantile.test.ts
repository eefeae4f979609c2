import { expect, test } from 'vitest';
import { sortedQuantile } from '../../../workers/numeric/sortedQuantile.ts';

test('the example of NIST/SEMATECH e-Handbook 7.2.6.2: the 90th percentile of 12 gauge readings is 95.1981', () => {
  const readings = [
    95.1772, 95.1567, 95.1937, 95.1959, 95.1442, 95.061, 95.1591, 95.1195, 95.1065, 95.0925, 95.199, 95.1682,
  ].sort((a, b) => a - b);
  expect(sortedQuantile(readings, 0.9).toFixed(4)).toBe('95.1981');
});

test('a quantile at an order statistic is that, beyond the ends it is the end', () => {
  expect(sortedQuantile([1, 2, 3], 0.5)).toBe(2);
  expect(sortedQuantile([1, 2, 3], 0.25)).toBe(1);
  expect(sortedQuantile([1, 2, 4], 0.625)).toBe(3);
  expect(sortedQuantile([1, 2, 3], 0)).toBe(1);
  expect(sortedQuantile([1, 2, 3], 0.01)).toBe(1);
  expect(sortedQuantile([1, 2, 3], 1)).toBe(3);
  expect(sortedQuantile([5], 0.3)).toBe(5);
  expect(sortedQuantile([-Infinity, 0, Infinity], 0.5)).toBe(0);
});

test('outside the domain', () => {
  expect(sortedQuantile([], 0.5)).toBeNaN();
  expect(sortedQuantile([1, 2], -0.1)).toBeNaN();
  expect(sortedQuantile([1, 2], 1.1)).toBeNaN();
  expect(sortedQuantile([1, 2], NaN)).toBeNaN();
});
