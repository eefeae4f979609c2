import { expect, test } from 'vitest';
import {
  counted,
  formatFixed,
  formatNumber,
  formatPValue,
  formatWithUncertainty,
} from '../../../src/format/numbers.ts';

test.each([
  [-0.83756, 4, '−0.8376'],
  [24, 4, '24'],
  [994, 9, '994'],
  [123456.789, 4, '123\u2009457'],
  [1.5e-9, 2, '1.5·10⁻⁹'],
  [2.5e12, 2, '2.5·10¹²'],
  [0, 3, '0'],
  [NaN, 3, '–'],
  [-Infinity, 3, '−∞'],
])('formatNumber(%d, %d) is %s', (value, digits, text) => {
  expect(formatNumber(value, digits)).toBe(text);
});

/** Two significant digits of the uncertainty, the value rounded to the same place: JCGM 100:2008, 7.2.6, whose example is 10.057 62 ohm with 27 milliohm. */
test.each([
  [10.05762, 0.027, '10.058', '0.027'],
  [0.837556601, 0.05386067, '0.838', '0.054'],
  [1234567, 4321, '1\u2009234\u2009600', '4300'],
  [56.1505, 4.6434, '56.2', '4.6'],
  [0.9996, 0.0996, '1.00', '0.10'],
])('%d ± %d is %s ± %s', (value, uncertainty, shown, shownUncertainty) => {
  expect(formatWithUncertainty(value, uncertainty)).toEqual({ value: shown, uncertainty: shownUncertainty });
});

test('without an uncertainty the value keeps five digits', () => {
  expect(formatWithUncertainty(0.1234567, null)).toEqual({ value: '0.12346', uncertainty: '–' });
});

test('p-values, fixed decimals, counts', () => {
  expect(formatPValue(0.00012)).toBe('< 0.001');
  expect(formatPValue(0.0456)).toBe('0.046');
  expect(formatPValue(NaN)).toBe('–');
  expect(formatFixed(-106.5979, 2)).toBe('−106.60');
  expect(formatFixed(null, 2)).toBe('–');
  expect(counted(1, 'gap')).toBe('1 gap');
  expect(counted(12000, 'reading')).toBe('12\u2009000 readings');
});
