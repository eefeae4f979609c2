const MINUS = '\u2212';
const THIN = '\u2009';

/** Replaces the hyphen by a minus sign and groups five and more digits in thousands by thin spaces (ISO 80000-1). */
function typeset(text: string): string {
  const [whole = '', fraction] = text.replace('-', MINUS).split('.');
  const digits = whole.replace(MINUS, '');
  const grouped = digits.length > 4 ? whole.replace(/\B(?=(\d{3})+(?!\d))/g, THIN) : whole;
  return fraction === undefined ? grouped : `${grouped}.${fraction}`;
}

function scientific(value: number, digits: number): string {
  const [mantissa = '', exponent = '0'] = value.toExponential(Math.max(0, digits - 1)).split('e');
  return `${typeset(mantissa)}·10${superscript(Number(exponent))}`;
}

const SUPERS = '⁰¹²³⁴⁵⁶⁷⁸⁹';
const SUBS = '₀₁₂₃₄₅₆₇₈₉';

export function superscript(value: number): string {
  return (value < 0 ? '⁻' : '') + String(Math.abs(value)).replace(/\d/g, (digit) => SUPERS[Number(digit)]!);
}

export function subscript(value: number): string {
  return String(value).replace(/\d/g, (digit) => SUBS[Number(digit)]!);
}

/**
 * A number to so many significant digits, in a person's notation; powers of ten only where the plain form would mislead.
 *
 * @example formatNumber(-0.83756, 4) is "−0.8376"; a whole number has no decimals; NaN is "–"
 */
export function formatNumber(value: number | null, digits = 5): string {
  if (value === null || Number.isNaN(value)) return '–';
  if (!Number.isFinite(value)) return value > 0 ? '∞' : `${MINUS}∞`;
  if (value === 0) return '0';
  const size = Math.floor(Math.log10(Math.abs(value)));
  if (size < -5 || size > 8) return scientific(value, digits);
  if (Number.isInteger(value)) return typeset(String(value));
  const decimals = Math.max(0, digits - 1 - size);
  return typeset(value.toFixed(Math.min(decimals, 20)));
}

/** A reading as it was read: all its digits, none added. */
export function formatReading(value: number): string {
  return Number.isNaN(value) ? 'gap' : typeset(String(Number(value.toPrecision(15))));
}

/** A number with a fixed count of decimals, for columns that line up on the point. */
export function formatFixed(value: number | null, decimals: number): string {
  if (value === null || Number.isNaN(value)) return '–';
  if (!Number.isFinite(value)) return value > 0 ? '∞' : `${MINUS}∞`;
  return typeset(value.toFixed(decimals));
}

/**
 * A value rounded to its uncertainty, which is given to two significant digits (JCGM 100, 7.2.6).
 *
 * @example formatWithUncertainty(0.837556, 0.05386) is { value: "0.838", uncertainty: "0.054" }
 */
export function formatWithUncertainty(
  value: number,
  uncertainty: number | null,
): { readonly value: string; readonly uncertainty: string } {
  if (uncertainty === null || !(uncertainty > 0) || !Number.isFinite(uncertainty))
    return { value: formatNumber(value, 5), uncertainty: '–' };
  const size = Math.floor(Math.log10(Number(uncertainty.toPrecision(2))));
  if (size < -6 || size > 8) return { value: scientific(value, 4), uncertainty: scientific(uncertainty, 2) };
  const decimals = Math.max(0, 1 - size);
  const step = size > 1 ? 10 ** (size - 1) : 1;
  const rounded = (x: number) => typeset((size > 1 ? Math.round(x / step) * step : x).toFixed(decimals));
  return { value: rounded(value), uncertainty: rounded(uncertainty) };
}

/** A p-value: three decimals, "< 0.001" below. */
export function formatPValue(p: number | null): string {
  if (p === null || Number.isNaN(p)) return '–';
  return p < 0.001 ? '< 0.001' : p.toFixed(3);
}

/** A whole number with thin spaces, and a word that agrees with it. */
export function counted(count: number, one: string, many = `${one}s`): string {
  return `${typeset(String(count))} ${count === 1 ? one : many}`;
}
