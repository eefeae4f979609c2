import type { Dialect } from '../../contract/dialect.ts';

/** Decimal and thousands marks; `sure` is false where the cells leave it open. */
export interface Marks {
  readonly decimal: '.' | ',';
  readonly thousands: Dialect['thousands'];
  readonly sure: boolean;
}

const shape =
  /^[<≤]?\s*[+\u2212-]?(\d[\d.,'\u2019\s]*)(?:[eEdD][+\u2212-]?\d+)?[\u2212-]?(?:\s?[°%\p{L}][\p{L}\d°/³²%·]{0,7})?$/u;
const spaced = /\d[\u00a0\u2009\u202f ]\d{3}(?!\d)/u;
const apostrophes = /\d['\u2019]\d{3}(?!\d)/u;
/** Share of whole numbers below a thousand beside `1.234` that speaks for groups: a fixed format would write 812.000. */
const WHOLE_SHARE = 0.1;

/** What one cell says about a mark: `decimal` or `group` for certain, `either` for one mark before exactly three digits. */
function witness(digits: string, mark: '.' | ','): 'decimal' | 'group' | 'either' | null {
  const other = mark === '.' ? ',' : '.';
  const parts = digits.split(mark);
  if (parts.length === 1) return null;
  if (parts.length > 2) return 'group';
  const [whole, fraction] = [parts[0]!, parts[1]!];
  if (digits.includes(other)) return whole.includes(other) ? 'decimal' : 'group';
  return fraction.length !== 3 || whole.length > 3 || (whole.startsWith('0') && whole.length === 1)
    ? 'decimal'
    : 'either';
}

/**
 * Decimal and thousands marks of the numbers in a file.
 *
 * Method: each cell is a witness. `7,3` and `0,731` say that the comma is the decimal mark, `1,234,567` and `1,234.5` that
 * it separates groups; `1,234` says neither. Where all are of the last kind, a good share of whole numbers below a
 * thousand speaks for groups, and the answer is marked as unsure.
 *
 * @param cells cells of the numeric columns, time columns left out
 * @param settled decimal mark that the person has fixed; then only the thousands mark is found
 * @returns the marks; a point and no groups where no cell has a mark
 */
export function sniffDecimal(cells: readonly string[], settled?: '.' | ','): Marks {
  const count = { point: { decimal: 0, group: 0, either: 0 }, comma: { decimal: 0, group: 0, either: 0 } };
  let [plain, small, space, apostrophe] = [0, 0, 0, 0];
  for (const cell of cells) {
    const digits = shape.exec(cell.trim())?.[1]?.trim();
    if (digits === undefined) continue;
    if (spaced.test(digits)) space++;
    if (apostrophes.test(digits)) apostrophe++;
    const bare = digits.replace(/[\s'\u2019]/gu, '');
    const point = witness(bare, '.');
    const comma = witness(bare, ',');
    if (point !== null) count.point[point]++;
    if (comma !== null) count.comma[comma]++;
    if (point === null && comma === null) {
      plain++;
      if (bare.length <= 3) small++;
    }
  }
  const blanks = space > 0 ? ' ' : apostrophe > 0 ? "'" : null;
  if (settled !== undefined) {
    const [mark, other] = settled === '.' ? ([',', count.comma] as const) : (['.', count.point] as const);
    return { decimal: settled, thousands: other.group + other.either > 0 ? mark : blanks, sure: true };
  }
  const forPoint = count.point.decimal + count.comma.group;
  const forComma = count.comma.decimal + count.point.group;
  if (forPoint + forComma > 0) {
    return forPoint >= forComma
      ? { decimal: '.', thousands: count.comma.group + count.comma.either > 0 ? ',' : blanks, sure: true }
      : { decimal: ',', thousands: count.point.group + count.point.either > 0 ? '.' : blanks, sure: true };
  }
  const wholeNumbers = plain === small && plain > 0;
  const looksGrouped = (either: number) => wholeNumbers && plain > WHOLE_SHARE * (plain + either);
  if (count.comma.either > 0)
    return looksGrouped(count.comma.either)
      ? { decimal: '.', thousands: ',', sure: false }
      : { decimal: ',', thousands: blanks, sure: false };
  if (count.point.either > 0 && looksGrouped(count.point.either)) return { decimal: ',', thousands: '.', sure: false };
  return { decimal: '.', thousands: blanks, sure: true };
}
