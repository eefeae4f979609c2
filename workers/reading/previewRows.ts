import type { PreviewRow } from '../contract/reading.ts';
import { findRows } from './rows/findRows.ts';
import { rowShape, type RawRow, type RowPlan, type RowsRead } from './rows/readRows.ts';
import type { Taken } from './takeRecord.ts';

const MOST_WORST = 12;
const OF_A_KIND = 3;

type Trouble = PreviewRow['trouble'];

function firstLeftOut({ leftOut, rows }: RowsRead): number[] {
  const found: number[] = [];
  for (let row = 0; leftOut !== null && row < rows && found.length < OF_A_KIND; row++)
    if (leftOut[row] === 1) found.push(row);
  return found;
}

/**
 * The first rows of a file and the worst, as they stand in it and as they were read.
 *
 * @param plan how the rows were read; @param read the rows; @param taken what became of them
 * @param valueColumn column of the record; null where there is none yet
 * @returns up to twelve of each; of every kind of trouble the first three
 */
export function previewRows(
  plan: RowPlan,
  read: RowsRead,
  taken: Taken | null,
  valueColumn: number | null,
): { first: PreviewRow[]; worst: PreviewRow[] } {
  const times = taken?.times ?? read.times;
  const column = valueColumn === null ? null : read.columns[valueColumn]!;
  const ragged: number[] = [];
  for (let row = 0; row < read.rows && ragged.length < OF_A_KIND; row++)
    if (read.shapes[row] !== rowShape.whole) ragged.push(row);
  const groups: [Trouble, readonly number[]][] = [
    ['badStamp', read.badStamps.map(({ row }) => row)],
    ['ragged', ragged],
    ['badValue', column?.oddRows ?? []],
    ['belowLimit', column?.limitRows ?? []],
    ['leftOut', firstLeftOut(read)],
    ['offGrid', taken?.offGrid ?? []],
    ['duplicate', taken?.duplicates ?? []],
    ['reversed', taken?.reversed ?? []],
  ];
  const troubles = new Map<number, Trouble>();
  for (const [trouble, rows] of groups.toReversed()) for (const row of rows) troubles.set(row, trouble);
  const describe = ({ row, line, cells }: RawRow): PreviewRow => ({
    line,
    cells: [...cells],
    time: times?.[row] ?? (times === null ? row + 1 : NaN),
    value: read.leftOut?.[row] === 1 ? NaN : (column?.values.view()[row] ?? NaN),
    trouble:
      read.leftOut?.[row] === 1
        ? 'leftOut'
        : (troubles.get(row) ?? (read.shapes[row] === rowShape.whole ? 'none' : 'ragged')),
  });
  const wanted = groups.flatMap(([, rows]) => rows.slice(0, OF_A_KIND)).slice(0, MOST_WORST);
  const first = read.first.filter(({ row }) => row < read.rows).map(describe);
  return { first, worst: findRows(plan, read, wanted).map(describe) };
}
