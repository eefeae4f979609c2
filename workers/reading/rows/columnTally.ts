import type { CellKind, CellReader } from '../cells/cellReader.ts';
import { GrowingFloats, GrowingInts } from './growable.ts';

/** Distinct texts remembered of a column; with more it is free text. */
const WORDS_KEPT = 200;
/** Distinct cells counted of a column, numbers among them; a status column has no more. */
const CELLS_KEPT = 24;
/** Letters of a text remembered. */
const LETTERS_KEPT = 60;
/** Places of odd cells remembered, to show. */
const PLACES_KEPT = 8;

/** One column as the rows go by: its numbers, and what else stood in it. */
export class ColumnTally {
  readonly values = new GrowingFloats();
  numbers = 0;
  gaps = 0;
  texts = 0;
  belowLimit = 0;
  /** Rows and texts of the first cells that were neither numbers nor gaps; rows of the first gaps and limits. */
  readonly oddRows: number[] = [];
  readonly oddTexts: string[] = [];
  readonly gapRows: number[] = [];
  readonly limitRows: number[] = [];
  readonly limitTexts: string[] = [];
  readonly words = new Map<string, number>();
  /** Rows with a value below a detection limit. */
  readonly limits = new GrowingInts();
  private readonly cells = new Map<string, number>();
  private many = false;
  private readonly suffix: string;

  constructor(suffix: string) {
    this.suffix = suffix;
  }

  /** Takes a cell of row `row`; undefined: the row is too short to have it. */
  take(cell: string | undefined, row: number, reader: CellReader): void {
    if (!this.many && cell !== undefined) this.count(cell);
    const kind: CellKind = cell === undefined ? 'gap' : reader.read(cell, this.suffix);
    if (kind === 'number') {
      this.numbers++;
      this.values.push(reader.value);
      return;
    }
    this.values.push(NaN);
    if (kind === 'gap') {
      this.gaps++;
      if (this.gapRows.length < PLACES_KEPT) this.gapRows.push(row);
      return;
    }
    const bare = cell!.trim().slice(0, LETTERS_KEPT);
    if (kind === 'belowLimit') {
      this.belowLimit++;
      this.limits.push(row);
      if (this.limitRows.length < PLACES_KEPT) this.limitRows.push(row);
      if (this.limitTexts.length < PLACES_KEPT && !this.limitTexts.includes(bare)) this.limitTexts.push(bare);
      return;
    }
    this.texts++;
    if (this.oddRows.length < PLACES_KEPT) this.oddRows.push(row);
    if (this.oddTexts.length < PLACES_KEPT && !this.oddTexts.includes(bare)) this.oddTexts.push(bare);
    if (this.words.size <= WORDS_KEPT) this.words.set(bare, (this.words.get(bare) ?? 0) + 1);
  }

  private count(cell: string): void {
    const before = this.cells.get(cell);
    if (before !== undefined) this.cells.set(cell, before + 1);
    else if (this.cells.size === CELLS_KEPT) this.many = true;
    else this.cells.set(cell, 1);
  }

  /** Every distinct cell without outer blanks, with its count, where they are few; null where they are many. */
  distinctCells(): ReadonlyMap<string, number> | null {
    if (this.many) return null;
    const bare = new Map<string, number>();
    for (const [cell, count] of this.cells) {
      const text = cell.trim().slice(0, LETTERS_KEPT);
      bare.set(text, (bare.get(text) ?? 0) + count);
    }
    return bare;
  }

  /** Few distinct texts, such as a status or a tag column has; free text gives none. */
  fewWords(): readonly string[] {
    return this.words.size > 0 && this.words.size <= WORDS_KEPT ? [...this.words.keys()] : [];
  }
}
