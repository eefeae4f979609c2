import type { Dialect } from '../../contract/dialect.ts';
import { parseNumber } from './parseNumber.ts';

/** What a cell of a numeric column holds. `belowLimit`: `<0.05`, a value below a detection limit, kept as a gap. */
export type CellKind = 'number' | 'gap' | 'text' | 'belowLimit';

const belowLimit = /^[<≤]\s*[\d.,]+(?:[eE][+-]?\d+)?$/u;

/**
 * Reader of value cells in one dialect.
 *
 * Gap words are compared without case and outer blanks; one that is itself a number (−999) also matches other
 * spellings of the same number. A suffix that a whole column carries (`7.31 pH`) is taken off first.
 *
 * @param dialect decimal and thousands marks, gap words
 * @returns an object whose `read(cell, suffix)` answers the kind and leaves the number in `value` (NaN for a gap or text)
 */
export function cellReader(dialect: Pick<Dialect, 'decimal' | 'thousands' | 'gapWords'>): CellReader {
  return new CellReader(dialect);
}

export class CellReader {
  value = NaN;
  private readonly decimal: '.' | ',';
  private readonly thousands: Dialect['thousands'];
  private readonly words: ReadonlySet<string>;
  private readonly numbers: ReadonlySet<number>;

  constructor(dialect: Pick<Dialect, 'decimal' | 'thousands' | 'gapWords'>) {
    this.decimal = dialect.decimal;
    this.thousands = dialect.thousands;
    const words = dialect.gapWords.map((word) => word.trim().toLowerCase());
    this.words = new Set(words);
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
        return belowLimit.test(bare) ? 'belowLimit' : 'text';
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
