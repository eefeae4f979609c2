import { defaultGapWords } from '../cells/gapWords.ts';
import { parseNumber } from '../cells/parseNumber.ts';
import { StampReader } from '../stamps/stampReader.ts';

/** What a cell looks like before anything is known about its column. */
export type CellClass = 'empty' | 'gap' | 'number' | 'stamp' | 'text';

const gapWords = new Set(defaultGapWords);
const grouped = /^[+\u2212-]?\d{1,3}(?:[.,'\u2019\u00a0\u2009\u202f ]\d{3})+(?:[.,]\d+)?$/u;
const withUnit = /^[+\u2212-]?\d[\d.,]*\s?[°%‰µμ\p{L}][\p{L}\d°/³²%·]{0,7}$/u;
const limit = /^[<>≤≥]\s*\d/u;

/**
 * Class of a cell by its looks: numbers in any decimal convention (with a unit behind, or a detection limit before), stamps
 * in any order of the fields.
 *
 * @param cell the cell as it stands
 * @returns its class; `text` for everything else
 */
export function cellClass(cell: string): CellClass {
  const text = cell.trim();
  if (text === '') return 'empty';
  if (gapWords.has(text.toLowerCase())) return 'gap';
  if (text.length > 60) return 'text';
  if (!Number.isNaN(parseNumber(text, '.', null)) || !Number.isNaN(parseNumber(text, ',', null))) return 'number';
  if (grouped.test(text)) return 'number';
  if (isStamp(text)) return 'stamp';
  return withUnit.test(text) || limit.test(text) ? 'number' : 'text';
}

function isStamp(text: string): boolean {
  if (!/\d/u.test(text)) return false;
  for (const form of ['yearFirst', 'dayFirst', 'monthFirst'] as const)
    if (!Number.isNaN(new StampReader(form, '.').read(text))) return true;
  return false;
}
