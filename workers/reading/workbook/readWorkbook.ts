import readSheets from 'read-excel-file/universal';
import type { WorkbookRequest, WorkbookText } from '../../contract/reading.ts';
import type { Result } from '../../contract/result.ts';
import { sheetText, type SheetCell } from './sheetText.ts';
import { unpackedBytes } from './unpackedBytes.ts';

/** Unpacked, a workbook of half a million rows and six columns takes about this many bytes. */
export const LARGEST_WORKBOOK = 192 * 1024 * 1024;
/** A sheet with fewer numbers is a cover or a note. */
const FEWEST_NUMBERS = 8;

interface Sheet {
  readonly sheet: string;
  readonly data: readonly (readonly SheetCell[])[];
}

function countNumbers({ data }: Sheet): number {
  let count = 0;
  for (const row of data) for (const cell of row) if (typeof cell === 'number') count++;
  return count;
}

/** Whether cells are numbers proper, so that the marks of numbers written as text need no guess. */
function numbersAreCells({ data }: Sheet, numbers: number): boolean {
  let texts = 0;
  for (const row of data)
    for (const cell of row) if (typeof cell === 'string' && /^[+-]?\d[\d.,]*$/u.test(cell)) texts++;
  return numbers > texts;
}

/**
 * One sheet of a workbook (Office Open XML, ECMA-376) as text for the reader of records.
 *
 * Method: the unpacked size is taken from the archive's directory and refused above the limit before anything is unpacked;
 * the sheet asked for is taken, else the first that holds at least eight numbers (or as many as any has), and where none holds numbers the first that is not empty. Cells hold what
 * the sheet shows last: results of formulas as they were saved.
 *
 * @param request the file, and the sheet by name or null
 * @returns the sheet as text, all sheets with their counts, and how the text is written; or `workbookTooLarge`,
 * `workbookDamaged`, `workbookEmpty`, `noSuchSheet`
 */
export async function readWorkbook({ bytes, sheet }: WorkbookRequest): Promise<Result<WorkbookText>> {
  const size = unpackedBytes(bytes);
  if (Number.isNaN(size))
    return { ok: false, failure: { code: 'workbookDamaged', reason: 'the list of its parts is missing or cut off' } };
  if (size > LARGEST_WORKBOOK)
    return { ok: false, failure: { code: 'workbookTooLarge', bytes: size, limit: LARGEST_WORKBOOK } };
  let found: readonly Sheet[];
  try {
    // The library's types call a date cell by its constructor; what it gives are dates.
    found = (await readSheets(bytes)) as unknown as readonly Sheet[];
  } catch (error) {
    const reason = error instanceof Error ? error.message : String(error);
    return { ok: false, failure: { code: 'workbookDamaged', reason } };
  }
  const sheets = found.map((one) => ({ name: one.sheet, rows: one.data.length, numbers: countNumbers(one) }));
  const names = sheets.map(({ name }) => name);
  const most = Math.max(0, ...sheets.map(({ numbers }) => numbers));
  const enough = Math.max(1, Math.min(most, FEWEST_NUMBERS));
  // Numbers may be written as texts; what is in the first sheet that is not empty is shown then.
  const first = sheets.findIndex(({ rows, numbers }) => (most > 0 ? numbers >= enough : rows > 0));
  const index = sheet === null ? first : names.indexOf(sheet);
  if (sheet !== null && index < 0) return { ok: false, failure: { code: 'noSuchSheet', sheet, sheets: names } };
  if (index < 0 || found[index]!.data.length === 0)
    return { ok: false, failure: { code: 'workbookEmpty', sheets: names } };
  const chosen = found[index]!;
  const marks = numbersAreCells(chosen, sheets[index]!.numbers) ? { decimal: '.' as const, thousands: null } : {};
  return {
    ok: true,
    value: {
      text: sheetText(chosen.data),
      sheet: chosen.sheet,
      sheets,
      settings: { delimiter: '\t', quote: '"', sheet: chosen.sheet, ...marks },
    },
  };
}
