import type { ColumnProfile } from '../../contract/reading.ts';
import type { Heading } from '../sniff/headingName.ts';
import { statusName } from '../sniff/sniffStatus.ts';
import type { ColumnTally } from './columnTally.ts';
import type { RowPlan, RowsRead } from './readRows.ts';
import { timeColumns } from './timeColumns.ts';

/** A column with as many numbers as other texts, or more, is numeric. */
const NUMERIC_SHARE = 0.5;

/** Whether a column holds readings: numbers, and not more texts than numbers. */
export const isNumeric = (column: ColumnTally): boolean =>
  column.numbers > 0 && column.numbers >= NUMERIC_SHARE * (column.numbers + column.texts);

/** Names made different by a count behind, so that columns can be told apart. */
function distinctNames(headings: readonly Heading[]): string[] {
  const seen = new Map<string, number>();
  const taken = new Set(headings.map(({ name }) => name));
  return headings.map(({ name }) => {
    let count = (seen.get(name) ?? 0) + 1;
    seen.set(name, count);
    if (count === 1) return name;
    while (taken.has(`${name} (${count})`)) count++;
    taken.add(`${name} (${count})`);
    return `${name} (${count})`;
  });
}

function roleOf(column: ColumnTally, index: number, name: string, dialect: RowPlan['dialect']): ColumnProfile['role'] {
  if (index === dialect.clockColumn) return 'clock';
  if (timeColumns(dialect).has(index)) return 'time';
  if (index === dialect.tagColumn) return 'tag';
  if (index === dialect.status?.column) return 'status';
  if (column.numbers + column.texts + column.belowLimit === 0) return 'empty';
  const few = column.fewWords().length > 0 && column.fewWords().length <= 20;
  if (statusName.test(name) && (few || column.numbers > 0)) return 'status';
  return isNumeric(column) ? 'value' : 'text';
}

/**
 * What each column of a file holds.
 *
 * @param read rows as columns; @param plan how they were read; @param headings names and units
 * @returns one profile a column, counts over all rows; the unit that every number carries stands in for a missing heading
 */
export function profileColumns(read: RowsRead, plan: RowPlan, headings: readonly Heading[]): ColumnProfile[] {
  const times = timeColumns(plan.dialect);
  const names = distinctNames(headings);
  return read.columns.map((column, index) => {
    const { unit } = headings[index]!;
    const isTime = times.has(index);
    const cells = isTime ? null : column.distinctCells();
    const words = index === plan.dialect.tagColumn ? read.tagNames : column.fewWords();
    return {
      index,
      name: names[index]!,
      unit: unit === '' ? plan.suffixes[index]! : unit,
      numbers: isTime ? read.rows - read.badStampCount : column.numbers,
      gaps: column.gaps,
      texts: isTime ? read.badStampCount : column.texts + column.belowLimit,
      role: roleOf(column, index, names[index]!, plan.dialect),
      ...(words.length > 0 ? { words } : {}),
      ...(cells !== null && cells.size > 1 ? { cells: [...cells].map(([text, count]) => ({ text, count })) } : {}),
    };
  });
}
