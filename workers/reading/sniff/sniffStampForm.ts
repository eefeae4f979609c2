import type { StampForm } from '../../contract/dialect.ts';
import { parseNumber } from '../cells/parseNumber.ts';
import { StampReader } from '../stamps/stampReader.ts';

/** How the stamps of one column are written. */
export interface FormFound {
  readonly form: StampForm;
  /** Whether the stamps have a date, and a time of day. */
  readonly date: boolean;
  readonly clock: boolean;
  /** Other forms that read the sample as well and are as regular. */
  readonly rivals: readonly StampForm[];
}

/**
 * Share of a column's cells that must read as stamps. Words and numbers hardly ever do, so that a column with two fifths is
 * one of stamps with many that are wrong, which is to be said and not passed over.
 */
const ENOUGH = 0.4;
const calendarForms = ['iso', 'yearFirst', 'dayFirst', 'monthFirst'] as const;
const digitsAndMarks = /^[\d.,]+$/u;
const allTwoDigits = /^\d{2}([-/.])\d{2}\1\d{2}(?!\d)/u;
const monthBeforeDay = /^\p{L}{3,10}\.?[-/ ]*\d{1,2}(?:st|nd|rd|th)?(?:,|[-/ ])/u;
const yearName = /^(?:year|jahr|ann[ée]e|an|año|anno|ano|jaar)$/iu;

interface Trial {
  readonly form: StampForm;
  readonly read: number;
  readonly dates: number;
  readonly clocks: number;
  readonly regularity: number;
}

/** Share of the commonest difference among those between neighbours; 0 for an unordered column. */
function regularityOf(times: readonly number[]): number {
  const counts = new Map<number, number>();
  let down = 0;
  for (let i = 1; i < times.length; i++) {
    const difference = times[i]! - times[i - 1]!;
    if (difference < 0) down++;
    const key = Math.round(Math.abs(difference) * 1e3);
    counts.set(key, (counts.get(key) ?? 0) + 1);
  }
  const n = times.length - 1;
  if (n < 1) return 1;
  return Math.max(...counts.values(), 0) / n - (0.5 * Math.min(down, n - down)) / n;
}

function tryForm(form: StampForm, cells: readonly string[]): Trial {
  const reader = new StampReader(form, '.');
  const times: number[] = [];
  let [dates, clocks] = [0, 0];
  for (const cell of cells) {
    const time = reader.read(cell);
    if (Number.isNaN(time)) continue;
    times.push(time);
    if (reader.hasDate) dates++;
    if (reader.hasClock) clocks++;
  }
  return { form, read: times.length, dates, clocks, regularity: regularityOf(times) };
}

const monotone = (values: readonly number[]): boolean => values.every((value, i) => i === 0 || value >= values[i - 1]!);

/** Seconds or milliseconds since 1970 between 1973 and 2096, in order. */
function epochForm(cells: readonly string[]): FormFound | null {
  const values = cells.map((cell) => parseNumber(cell, '.', null));
  if (values.length < 2 || values.some((value) => Number.isNaN(value)) || !monotone(values)) return null;
  const [low, high] = [values[0]!, values.at(-1)!];
  if (low === high) return null;
  const within = (unit: number) => low >= 1e8 * unit && high < 4e9 * unit;
  if (within(1)) return { form: 'epochSeconds', date: true, clock: true, rivals: [] };
  return within(1000) ? { form: 'epochMilliseconds', date: true, clock: true, rivals: [] } : null;
}

/** Dates written as bare digits (20240501, 2024) need more than looks: order, and for years the column's name. */
function plainDigits(cells: readonly string[], name: string): boolean {
  const width = cells[0]!.length;
  if (!cells.every((cell) => cell.length === width)) return false;
  if (!monotone(cells.map(Number)) && !monotone(cells.map((cell) => -Number(cell)))) return false;
  if (width === 4) return yearName.test(name.trim());
  return width === 6 || width === 7 || width === 8 || width === 12 || width === 14;
}

/**
 * Form of a column of stamps.
 *
 * Method: the four calendar forms are tried in turn and the first that reads most cells is taken. Where all three fields
 * have two digits, the more regular of the readings wins and equals are named as rivals. Whole numbers in the range
 * of epoch seconds or milliseconds count as such where they ascend.
 *
 * @param cells filled cells of the column, outer blanks taken off; @param name its heading
 * @returns the form, or null where the column holds no stamps
 */
export function sniffStampForm(cells: readonly string[], name: string): FormFound | null {
  if (cells.length === 0) return null;
  const bare = cells.filter((cell) => digitsAndMarks.test(cell)).length;
  if (bare > cells.length / 2) {
    const dotted = cells.every((cell) => /^\d{1,4}\.\d{1,2}\.\d{1,4}\.?$/u.test(cell));
    if (!dotted && !plainDigits(cells, name)) return epochForm(cells);
  }
  const trials = calendarForms.map((form) => tryForm(form, cells));
  const most = Math.max(...trials.map(({ read }) => read));
  if (most < ENOUGH * cells.length) return null;
  let able = trials.filter(({ read }) => read >= most);
  const short = cells.every((cell) => allTwoDigits.test(cell));
  if (short) {
    const best = Math.max(...able.map(({ regularity }) => regularity));
    able = able.filter(({ regularity }) => regularity >= best - 0.02);
    // The year stands last far more often than first.
    able.sort((a, b) => Number(a.form === 'yearFirst') - Number(b.form === 'yearFirst'));
  }
  const written = monthBeforeDay.test(cells[0]!) ? able.find(({ form }) => form === 'monthFirst') : undefined;
  const found = written ?? able[0]!;
  const rivals = short ? able.filter((trial) => trial !== found).map(({ form }) => form) : [];
  return { form: found.form, date: found.dates * 2 > found.read, clock: found.clocks * 2 > found.read, rivals };
}
