import type { Dialect } from '../../contract/dialect.ts';

/** More significant digits than these may not fit a double's integer range, and take the slow path. */
const EXACT_DIGITS = 15;
/** 10^k is exact in a double up to here, so that one division or product is correctly rounded (Clinger 1990). */
const EXACT_POWER = 22;

const powers = Array.from({ length: EXACT_POWER + 1 }, (_, k) => Number(`1e${k}`));

/** Blanks that exporters put around or inside numbers: ASCII, no-break, thin, narrow no-break, byte order mark. */
export const isBlank = (code: number): boolean =>
  code === 32 || (code >= 9 && code <= 13) || code === 0xa0 || code === 0x2009 || code === 0x202f || code === 0xfeff;

const isMinus = (code: number): boolean => code === 0x2d || code === 0x2212;

function isThousands(code: number, mark: Dialect['thousands']): boolean {
  if (mark === ' ') return isBlank(code);
  if (mark === "'") return code === 0x27 || code === 0x2019;
  return mark !== null && code === mark.charCodeAt(0);
}

/**
 * The number written in a cell.
 *
 * Method: one scan over the characters; up to 15 significant digits and a power of ten up to 22 the value is one exact
 * integer divided by or multiplied with an exact power, hence correctly rounded (W. D. Clinger, How to read floating
 * point numbers accurately, PLDI 1990, doi:10.1145/93542.93557); beyond that, the language's own reader.
 * Accepted besides plain decimals: blanks around, + and − (also U+2212, also behind the digits), exponents with E or D,
 * thousands marks that stand before groups of exactly three digits.
 *
 * @param text the cell
 * @param decimal decimal mark
 * @param thousands thousands mark; a blank stands for every kind of blank, an apostrophe also for U+2019
 * @returns the number; NaN where the text is anything else, is empty, or overflows
 */
export function parseNumber(text: string, decimal: '.' | ',', thousands: Dialect['thousands']): number {
  let at = 0;
  let end = text.length;
  while (at < end && isBlank(text.charCodeAt(at))) at++;
  while (end > at && isBlank(text.charCodeAt(end - 1))) end--;
  if (at === end) return NaN;
  const first = at;
  let negative = false;
  const sign = text.charCodeAt(at);
  if (isMinus(sign) || sign === 0x2b) {
    negative = sign !== 0x2b;
    at++;
  } else if (isMinus(text.charCodeAt(end - 1))) {
    negative = true;
    end--;
  }
  const decimalCode = decimal.charCodeAt(0);
  let mantissa = 0;
  let significant = 0;
  let digits = 0;
  let scale = 0;
  let group = -1;
  let run = 0;
  let afterMark = false;
  for (; at < end; at++) {
    const code = text.charCodeAt(at);
    if (code >= 48 && code <= 57) {
      digits++;
      if (significant > 0 || code !== 48) significant++;
      if (significant <= EXACT_DIGITS) mantissa = mantissa * 10 + (code - 48);
      if (afterMark) scale--;
      else run++;
    } else if (code === decimalCode && !afterMark) {
      if (group >= 0 && run !== 3) return NaN;
      group = -1;
      afterMark = true;
    } else if (!afterMark && isThousands(code, thousands)) {
      if (group >= 0 ? run !== 3 : run < 1 || run > 3) return NaN;
      group = run;
      run = 0;
    } else break;
  }
  if (digits === 0 || (group >= 0 && run !== 3)) return NaN;
  let exponent = 0;
  if (at < end) {
    exponent = parseExponent(text, at, end);
    if (Number.isNaN(exponent)) return NaN;
  }
  const power = scale + exponent;
  if (significant <= EXACT_DIGITS && power >= -EXACT_POWER && power <= EXACT_POWER) {
    const size = power < 0 ? mantissa / powers[-power]! : mantissa * powers[power]!;
    return negative ? -size : size;
  }
  const size = slowly(text.slice(first, at), decimalCode, exponent);
  return Number.isFinite(size) ? (negative ? -size : size) : NaN;
}

/** `E+03`, `e5`, `D-2` from `at` to the end; NaN where it is anything else. */
function parseExponent(text: string, at: number, end: number): number {
  const mark = text.charCodeAt(at) | 0x20;
  if (mark !== 0x65 && mark !== 0x64) return NaN;
  at++;
  const sign = text.charCodeAt(at);
  const negative = isMinus(sign);
  if (negative || sign === 0x2b) at++;
  if (at >= end || end - at > 4) return NaN;
  let value = 0;
  for (; at < end; at++) {
    const code = text.charCodeAt(at);
    if (code < 48 || code > 57) return NaN;
    value = value * 10 + (code - 48);
  }
  return negative ? -value : value;
}

function slowly(body: string, decimalCode: number, exponent: number): number {
  let plain = '';
  for (let i = 0; i < body.length; i++) {
    const code = body.charCodeAt(i);
    if (code >= 48 && code <= 57) plain += body[i]!;
    else if (code === decimalCode) plain += '.';
  }
  return Number(`${plain}e${exponent}`);
}
