import type { Dialect } from '../../contract/dialect.ts';
import type { ColumnTally } from '../rows/columnTally.ts';

/** Headings of columns that say how far a reading can be trusted. */
export const statusName =
  /^(?:status|state|quality|qual|qc|flag|flags|valid|validity|good|ok|q|güte|qualit[ée]|estado|stato)\b/iu;

/** Words that say a reading is good, or is not, in the languages of the month names. Any other word is left to the person. */
const good =
  /^(?:good|ok|okay|valid|normal|in order|gut|gültig|bon|bonne|valide|bueno|válido|valido|goed|geldig|g|goodnonspecific)$/iu;
const bad =
  /^(?:bad|not ok|nok|invalid|fail|failed|failure|fault|error|err|uncertain|suspect|questionable|no data|not connected|offline|out of service|oos|comm fail|comm failure|timeout|sensor failure|device failure|schlecht|ungültig|fehler|störung|gestört|mauvais|invalide|malo|inválido|slecht|ongeldig|bad[ ,:._-].*)$/iu;

/** True says good only under a heading that says so: a flag may stand for either. */
const validityName = /^(?:valid|good|ok|gültig|valide|válido|valido|geldig)\b/iu;
const truthWord = /^(?:true|false)$/iu;

/** OPC Data Access 3.00, § 6.8: quality as a byte, the two bits of value 192 set for good, 64 for uncertain, none for bad. */
function isPoorByte(words: readonly string[]): ((word: string) => boolean) | null {
  const bytes = words.filter((word) => word !== '').map(Number);
  const allBytes = bytes.every((byte) => Number.isInteger(byte) && byte >= 0 && byte <= 255);
  if (!allBytes || !bytes.some((byte) => byte >= 192) || !bytes.some((byte) => byte < 192)) return null;
  return (word) => word !== '' && Number(word) < 192;
}

/**
 * The status column whose words leave no doubt which rows are bad.
 *
 * Method: a column headed as a status, or with no other words than known ones, that has both good and bad ones among its
 * few distinct cells; or quality bytes of OPC. Words that are neither are kept.
 *
 * @param columns as read; @param names headings; @param excluded columns that are time or tag
 * @returns the column with the cells to keep; null where nothing is certain, which leaves every row in
 */
export function sniffStatus(
  columns: readonly ColumnTally[],
  names: readonly string[],
  excluded: ReadonlySet<number>,
): Dialect['status'] {
  for (const [index, column] of columns.entries()) {
    const words = [...(column.distinctCells()?.keys() ?? [])];
    if (excluded.has(index) || words.length < 2) continue;
    const name = names[index] ?? '';
    const headed = statusName.test(name);
    const truth = words.length === 2 && words.every((word) => truthWord.test(word));
    if (truth && validityName.test(name)) return { column: index, keep: words.filter((word) => /^true$/iu.test(word)) };
    const [bads, goods] = [words.filter((word) => bad.test(word)), words.filter((word) => good.test(word))];
    const known = bads.length + goods.length === words.filter((word) => word !== '').length;
    if (bads.length > 0 && goods.length > 0 && (headed || known))
      return { column: index, keep: words.filter((word) => !bad.test(word)) };
    const poor = headed ? isPoorByte(words) : null;
    if (poor !== null) return { column: index, keep: words.filter((word) => !poor(word)) };
  }
  return null;
}
