import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CellReader } from '../../../workers/reading/cells/cellReader.ts';
import { parseNumber } from '../../../workers/reading/cells/parseNumber.ts';
import { sniffDecimal } from '../../../workers/reading/sniff/sniffDecimal.ts';

describe('parseNumber', () => {
  it('reads every double as the language does (ECMA-262, StringToNumber, correctly rounded)', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (signed) => {
        const value = signed + 0;
        expect(parseNumber(String(value), '.', null)).toBe(value);
        expect(parseNumber(value.toExponential(), '.', null)).toBe(value);
        expect(parseNumber(String(value).replace('.', ','), ',', null)).toBe(value);
      }),
      { numRuns: 2000 },
    );
  });

  it('reads decimals of every length as the language does', () => {
    const decimal = fc.tuple(fc.bigInt({ min: 0n, max: 10n ** 24n }), fc.nat(24));
    fc.assert(
      fc.property(decimal, ([digits, places]) => {
        const text = digits.toString().padStart(places + 1, '0');
        const point = text.length - places;
        const written = `${text.slice(0, point)}.${text.slice(point)}`;
        expect(parseNumber(written, '.', null)).toBe(Number(written));
      }),
      { numRuns: 2000 },
    );
  });

  it.each([
    ['1,234.5', '.', ',', 1234.5],
    ['1.234.567,25', ',', '.', 1234567.25],
    ['1\u00a0234,5', ',', ' ', 1234.5],
    ['1\u202f234\u202f567', ',', ' ', 1234567],
    ['1’234.5', '.', "'", 1234.5],
    ['-12,5', ',', null, -12.5],
    ['12.5-', '.', null, -12.5],
    ['\u22120.5', '.', null, -0.5],
    ['+7', '.', null, 7],
    [' \t7.25\u00a0', '.', null, 7.25],
    ['.5', '.', null, 0.5],
    ['5.', '.', null, 5],
    ['1.5E+03', '.', null, 1500],
    ['0.123D-2', '.', null, 0.00123],
    ['1e-320', '.', null, 1e-320],
  ] as const)('%j with decimal %j and thousands %j', (text, decimal, thousands, value) => {
    expect(parseNumber(text, decimal, thousands)).toBe(value);
  });

  it.each([
    ['', '.', null],
    ['   ', '.', null],
    ['-', '.', null],
    ['.', '.', null],
    ['e5', '.', null],
    ['1e', '.', null],
    ['1e999', '.', null],
    ['1 2', '.', null],
    ['1,5', '.', null],
    ['1.5.2', '.', null],
    ['12,34', '.', ','],
    ['1,2345', '.', ','],
    ['1234,567', '.', ','],
    [',123', '.', ','],
    ['0x1f', '.', null],
    ['Infinity', '.', null],
    ['--5', '.', null],
    ['7 °C', '.', null],
  ] as const)('%j with decimal %j and thousands %j is no number', (text, decimal, thousands) => {
    expect(parseNumber(text, decimal, thousands)).toBeNaN();
  });
});

describe('CellReader', () => {
  const reader = new CellReader({ decimal: '.', thousands: null, gapWords: ['n/a', '-999'] });

  it('tells numbers, gaps, limits and texts apart', () => {
    const kinds = ['7.31', 'N/A', '  ', '-999.0', '<0.05', 'Bad', '7.31 pH'].map((cell) => reader.read(cell, ' pH'));
    expect(kinds).toEqual(['number', 'gap', 'gap', 'gap', 'belowLimit', 'text', 'number']);
    expect(reader.value).toBe(7.31);
  });

  it('leaves no number behind a gap', () => {
    reader.read('5', '');
    reader.read('n/a', '');
    expect(reader.value).toBeNaN();
  });
});

describe('sniffDecimal', () => {
  it.each([
    [['7.3', '7.25'], '.', null, true],
    [['7,3', '0,731'], ',', null, true],
    [['1,234.5', '12.0'], '.', ',', true],
    [['1.234,5', '12,0'], ',', '.', true],
    [['1.234.567', '12'], ',', '.', true],
    [['1 234,5'], ',', ' ', true],
    [["1'234.5"], '.', "'", true],
    [['7.312', '7.288', '7.300'], '.', null, true],
    [['7,312', '7,288', '7,300'], ',', null, false],
    [['1,250', '980', '1,312', '874'], '.', ',', false],
    [['1.250', '980', '1.312', '874'], ',', '.', false],
    [['12', '15'], '.', null, true],
    [[], '.', null, true],
  ] as const)('%j', (cells, decimal, thousands, sure) => {
    expect(sniffDecimal(cells)).toEqual({ decimal, thousands, sure });
  });

  it('finds the thousands mark that goes with a decimal mark the person has fixed', () => {
    expect(sniffDecimal(['1.250', '12'], ',')).toEqual({ decimal: ',', thousands: '.', sure: true });
    expect(sniffDecimal(['1,250', '12'], '.')).toEqual({ decimal: '.', thousands: ',', sure: true });
    expect(sniffDecimal(['7.25', '12'], '.')).toEqual({ decimal: '.', thousands: null, sure: true });
  });
});
