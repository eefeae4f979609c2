import type { Dialect } from '../../contract/dialect.ts';

/**
 * Columns that hold time in any form, and so no readings.
 *
 * @param dialect time column, clock column, columns of the parts of the stamp
 * @returns their numbers, counted from 0
 */
export function timeColumns(
  dialect: Pick<Dialect, 'timeColumn' | 'clockColumn' | 'stampColumns'>,
): ReadonlySet<number> {
  const { timeColumn, clockColumn, stampColumns } = dialect;
  return new Set([timeColumn, clockColumn, ...(stampColumns ?? [])].filter((column) => column !== null));
}
