import type { Dialect } from '../../contract/dialect.ts';
import { parseNumber } from './parseNumber.ts';

/** What a cell of a numeric column holds. `belowLimit`: `<0.05`, a value below a detection limit, kept as a gap. */
export type CellKind = 'number' | 'gap' | 'text' | 'belowLimit';

/** What of a dialect concerns its cells; no words for limits where they are left out. */
export type CellDialect = Pick<Dialect, 'decimal' | 'thousands' | 'gapWords'> & Partial<Pick<Dialect, 'limitWords'>>;

const belowLimit = /^[<≤]\s*[\d.,]+(?:[eE][+-]?\d+)?$/u;

/**
 * Reader of value cells in one dialect.
 *
 * Gap words are compared without case and outer blanks; one that is itself a number (−999) also matches other
 * spellings of the same number. Words for a detection limit are compared in the same way. A suffix that a whole column carries (`7.31 pH`) is taken off first.
 *
 * @param dialect decimal and thousands marks, gap words
 * @returns an object whose `read(cell, suffix)` answers the kind and leaves the number in `value` (NaN for a gap or text)
 */
export function cellReader(dialect: CellDialect): CellReader {
  return new CellReader(dialect);
}

export class CellReader {
  value = NaN;
  private readonly decimal: '.' | ',';
  private readonly thousands: Dialect['thousands'];
  private readonly words: ReadonlySet<string>;
  private readonly numbers: ReadonlySet<number>;
  private readonly limits: ReadonlySet<string>;

  constructor(dialect: CellDialect) {
    this.decimal = dialect.decimal;
    this.thousands = dialect.thousands;
    const words = dialect.gapWords.map((word) => word.trim().toLowerCase());
    this.words = new Set(words);
    this.limits = new Set(dialect.limitWords?.map((word) => word.trim().toLowerCase()));
    const numbers = words.map((word) => parseNumber(word, dialect.decimal, dialect.thousands));
    this.numbers = new Set(numbers.filter((value) => !Number.isNaN(value)));
  }

  read(cell: string, suffix: string): CellKind {
    let value = parseNumber(cell, this.decimal, this.thousands);
    if (Number.isNaN(value)) {
      const bare = cell.trim();
      if (bare === '' || this.words.has(bare.toLowerCase())) {
        this.value = NaN;
        return 'gap';
      }
      if (suffix !== '' && bare.endsWith(suffix))
        value = parseNumber(bare.slice(0, -suffix.length), this.decimal, this.thousands);
      if (Number.isNaN(value)) {
        this.value = NaN;
        return belowLimit.test(bare) || this.limits.has(bare.toLowerCase()) ? 'belowLimit' : 'text';
      }
    }
    if (this.numbers.size > 0 && this.numbers.has(value)) {
      this.value = NaN;
      return 'gap';
    }
    this.value = value;
    return 'number';
  }
}
