import type { Dialect, StampForm } from '../contract/dialect.ts';
import { readRows, type RowsRead } from './rows/readRows.ts';
import { timeColumns } from './rows/timeColumns.ts';
import { sniffDialect, type Found } from './sniff/sniffDialect.ts';
import { sniffStatus } from './sniff/sniffStatus.ts';
import { columnCells } from './sniff/sniffTime.ts';
import { exchangeDayMonth } from './stamps/exchangeDayMonth.ts';
import { distinctTimes, findGrid } from './grid/findGrid.ts';

/** A file read by the dialect that fits all of it. `openOrder`: day and month cannot be told apart by anything in it. */
export interface ThoroughRead {
  readonly found: Found;
  readonly read: RowsRead;
  readonly openOrder: 'no' | 'guessed' | 'open';
}

/** Share of texts beside numbers from which on they are looked at again as numbers of another convention. */
const ODD_SHARE = 0.02;
/** One order of day and month is the regular one where the other spreads the stamps over this many times as many places. */
const CLEARLY_WIDER = 3;

const exchanged = (form: StampForm): StampForm => (form === 'dayFirst' ? 'monthFirst' : 'dayFirst');

/** Whether one order makes the record regular and the other does not: `own`, `other`, or neither told. */
function regularOrder(times: Float64Array): 'own' | 'other' | 'open' {
  const [own, other] = [findGrid(times, true, null), findGrid(exchangeDayMonth(times), true, null)];
  if (own === null || other === null) return 'open';
  const spread = (found: NonNullable<typeof own>) => found.places / found.stamps + (10 * found.bad) / found.stamps;
  if (own.grid.kind !== other.grid.kind || own.grid.step !== other.grid.step) {
    // Stamps that are regular both ways, such as the first twelve days of January or the firsts of twelve months.
    if (spread(own) < 1.5 && spread(other) < 1.5) return 'open';
  }
  if (spread(other) > CLEARLY_WIDER * spread(own)) return 'own';
  return spread(own) > CLEARLY_WIDER * spread(other) ? 'other' : 'open';
}

/** Long lists of blocks, one tag after the other, show only their first tag in the head. */
function blocksOfTags(read: RowsRead, found: Found): number {
  const { times } = read;
  if (times === null || read.rows < 8) return -1;
  const timeLike = timeColumns(found.plan.dialect);
  const wordy = read.columns.flatMap((column, j) => {
    const words = column.fewWords().length;
    const apart = !timeLike.has(j) && column.numbers === 0;
    return apart && words >= 2 && words * 2 <= read.rows ? [j] : [];
  });
  if (wordy.length === 0) return -1;
  const distinct = distinctTimes(times).length;
  if (distinct > 0.75 * read.rows) return -1;
  return wordy.find((j) => distinct * read.columns[j]!.fewWords().length >= 0.8 * read.rows) ?? -1;
}

/**
 * Reads a file, and reads it again where its later rows contradict what its head suggested.
 *
 * Method: after the pass over all rows, cells that no number was found in are tried as witnesses of another decimal mark; a
 * text column whose words go with repeated stamps makes the layout long; a column that marks rows as bad leaves them out; the order of day and month is settled by
 * the days above twelve anywhere in the file, else by the order that makes the record regular, else it stays open.
 *
 * @param text whole text; @param settings what the person has fixed
 * @param progress called with the fraction done
 * @returns how it is written, its rows, and whether the order of day and month is a guess
 */
export function readThoroughly(
  text: string,
  settings: Partial<Dialect>,
  progress?: (fraction: number) => void,
): ThoroughRead {
  let found = sniffDialect(text, settings);
  let read = readRows(found.plan, progress);
  let fixed = settings;
  const again = (more: Partial<Dialect>, cells: readonly string[] = []) => {
    fixed = { ...fixed, ...more };
    found = sniffDialect(text, fixed, cells);
    read = readRows(found.plan, progress);
  };
  if (settings.decimal === undefined) {
    const odd = read.columns
      .filter(({ numbers, texts }) => texts > ODD_SHARE * numbers)
      .flatMap(({ oddTexts }) => oddTexts);
    const { decimal, thousands } = found.plan.dialect;
    const renewed = odd.length > 0 ? sniffDialect(text, settings, odd).plan.dialect : null;
    if (renewed !== null && (renewed.decimal !== decimal || renewed.thousands !== thousands))
      again({ decimal: renewed.decimal, thousands: renewed.thousands }, odd);
  }
  if (settings.layout === undefined && settings.tagColumn === undefined && read.tags === null) {
    const column = blocksOfTags(read, found);
    if (column >= 0) again({ layout: 'long', tagColumn: column });
  }
  if (settings.status === undefined) {
    const excluded = new Set([...timeColumns(found.plan.dialect), found.plan.dialect.tagColumn ?? -1]);
    const names = found.headings.map(({ name }) => name);
    const status = sniffStatus(read.columns, names, excluded);
    if (status !== null) again({ status });
  }
  const form = found.plan.dialect.stamp;
  if (
    found.plan.dialect.stampColumns !== null ||
    settings.stamp !== undefined ||
    (form !== 'dayFirst' && form !== 'monthFirst') ||
    read.times === null
  )
    return { found, read, openOrder: 'no' };
  const { own, other, open } = read.order;
  if (other > own) {
    again({ stamp: exchanged(form) });
    return { found, read, openOrder: 'no' };
  }
  if (own > 0 || open === 0) return { found, read, openOrder: 'no' };
  const regular = regularOrder(read.times);
  if (regular === 'other') again({ stamp: exchanged(form) });
  if (regular !== 'open') return { found, read, openOrder: 'guessed' };
  const first = columnCells(found.body, found.plan.dialect.timeColumn!)[0] ?? '';
  // Full stops stand between day, month and year in that order (DIN 1355, many national standards); still asked.
  return { found, read, openOrder: /^\d{1,2}\.\s?\d{1,2}\.\s?\d/u.test(first) ? 'guessed' : 'open' };
}
