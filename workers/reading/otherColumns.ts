import { fillGrid } from './grid/fillGrid.ts';
import type { GridFound } from './grid/findGrid.ts';
import { placeOnGrid, type Placement } from './grid/placeOnGrid.ts';
import { columnValues, gather, rowsOfTag } from './selectRows.ts';
import type { TakeRequest } from './takeRecord.ts';

/**
 * The other numeric columns of a file, or in the long layout the other tags, on the grid of the record.
 *
 * @param request rows, profiles, chosen column and tag; @param found grid of the record; @param placement its rows on it
 * @param times stamps by row of the file; null where there is no time
 * @returns values by column name or tag, each as long as the record, NaN where there are none
 */
export function otherColumns(
  request: TakeRequest,
  found: GridFound,
  placement: Placement,
  times: Float64Array | null,
): Record<string, Float64Array> {
  const { read, profiles, valueColumn, tag } = request;
  const { rule } = found.grid;
  if (read.tags === null) {
    const others = profiles.filter(({ index, role }) => index !== valueColumn && role === 'value');
    return Object.fromEntries(
      others.map(({ index, name }) => [name, fillGrid(columnValues(read, index), placement, rule)]),
    );
  }
  // Without times, readings of different tags cannot be told to belong together.
  if (times === null) return {};
  const values = columnValues(read, valueColumn);
  return Object.fromEntries(
    read.tagNames.flatMap((name, index) => {
      const rows = rowsOfTag(read, index)!;
      const own = gather(values, rows);
      if (index === tag || own.every((value) => Number.isNaN(value))) return [];
      return [[name, fillGrid(own, placeOnGrid(gather(times, rows), own, found, request.plan.dialect.repeats), rule)]];
    }),
  );
}
