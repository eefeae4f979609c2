import type { Dialect } from '../../contract/dialect.ts';
import type { Failure } from '../../contract/failures.ts';
import type { JoinedFiles, JoinedPart, JoinRequest } from '../../contract/reading.ts';
import type { Result } from '../../contract/result.ts';
import { sniffDialect, type Found } from '../sniff/sniffDialect.ts';
import { joinStampParts } from '../stamps/joinStampParts.ts';
import { StampReader } from '../stamps/stampReader.ts';
import { plainLines } from './plainLines.ts';
import { rewriteRows } from './rewriteRows.ts';

interface Piece {
  readonly fileName: string;
  readonly text: string;
  readonly found: Found;
  /** Earliest stamp of its first rows; its number among the files where there is no time. */
  readonly start: number;
}

function startOf(found: Found, form: Dialect['stamp'], index: number): number {
  const { timeColumn, clockColumn, stampColumns, decimal } = found.plan.dialect;
  if (timeColumn === null) return index;
  const reader = new StampReader(form ?? 'number', decimal);
  const stamps = found.body.map(({ cells }) => {
    const day = stampColumns === null ? (cells[timeColumn] ?? '').trim() : joinStampParts(cells, stampColumns);
    return reader.read(clockColumn === null ? day : `${day} ${cells[clockColumn] ?? ''}`);
  });
  return stamps.reduce((least, stamp) => (stamp < least ? stamp : least), Infinity);
}

const orders = new Set<Dialect['stamp']>(['dayFirst', 'monthFirst']);
const namesOf = ({ headings, plan }: Found): string =>
  plan.dialect.header ? headings.map(({ name }) => name).join(', ') : `${plan.columns} columns without names`;

/** Why a file cannot stand behind the first; null where it can. */
function difference(first: Piece, other: Piece): Failure | null {
  const [a, b] = [first.found.plan.dialect, other.found.plan.dialect];
  const differ = (what: 'columns' | 'decimal' | 'stamp' | 'time', expected: string, found: string): Failure => {
    return { code: 'filesDiffer', fileName: other.fileName, firstName: first.fileName, what, expected, found };
  };
  if (columnMap(first.found, other.found) === null)
    return differ('columns', namesOf(first.found), namesOf(other.found));
  if ((a.timeColumn === null) !== (b.timeColumn === null))
    return differ('time', a.timeColumn === null ? 'no' : 'yes', b.timeColumn === null ? 'no' : 'yes');
  const openOrder = orders.has(a.stamp) && orders.has(b.stamp);
  if (a.stamp !== b.stamp && !openOrder) return differ('stamp', a.stamp ?? 'number', b.stamp ?? 'number');
  const guessed = other.found.questions.some(({ about }) => about === 'decimal');
  return a.decimal !== b.decimal && !guessed ? differ('decimal', a.decimal, b.decimal) : null;
}

/** For each column of the first file the column of the other with the same name; null where they do not correspond. */
function columnMap(first: Found, other: Found): readonly number[] | null {
  if (first.plan.columns !== other.plan.columns) return null;
  const same = first.headings.map((_, j) => j);
  if (!first.plan.dialect.header || !other.plan.dialect.header) return same;
  const names = other.headings.map(({ name }) => name);
  if (first.headings.every(({ name }, j) => name === names[j])) return same;
  const map = first.headings.map(({ name }) => names.indexOf(name));
  return map.includes(-1) || new Set(map).size < map.length ? null : map;
}

/** First character of the first data row. */
function bodyStart({ text, found }: Piece): number {
  let at = 0;
  for (let line = found.body[0]?.line ?? 1; line > 1; line--) at = text.indexOf('\n', at) + 1;
  return at;
}

const ended = (text: string): string => (text === '' || text.endsWith('\n') ? text : `${text}\n`);
const lineCount = (text: string): number => {
  let count = 0;
  for (let at = text.indexOf('\n'); at >= 0; at = text.indexOf('\n', at + 1)) count++;
  return count;
};

/**
 * Several files of one kind as one text, in the order of time.
 *
 * Method: each file's head is looked at by itself; the earliest goes first with all it has, of the others the data rows follow.
 * Columns in another order are brought into that of the first by their names, and another delimiter is exchanged. Rows are
 * neither dropped nor sorted here: what overlaps is reported when the text is read.
 *
 * @param request at least one file, and settings of the person (lines before the table are found in each file)
 * @returns the text and where each file begins in it; or `filesDiffer`, which names both files and what is different
 */
export function joinFiles({ files, settings }: JoinRequest): Result<JoinedFiles> {
  const own = Object.fromEntries(Object.entries(settings).filter(([field]) => field !== 'preambleLines'));
  const plain = files.map(({ fileName, text }) => ({ fileName, text: plainLines(text) }));
  const looked = plain.map(({ fileName, text }) => ({ fileName, text, found: sniffDialect(text, own) }));
  const form = looked[0]?.found.plan.dialect.stamp ?? null;
  const pieces: Piece[] = looked.map((piece, index) => ({ ...piece, start: startOf(piece.found, form, index) }));
  pieces.sort((a, b) => a.start - b.start);
  const [first, ...others] = pieces;
  if (first === undefined) return { ok: false, failure: { code: 'emptyFile' } };
  let text = ended(first.text);
  const parts: JoinedPart[] = [{ fileName: first.fileName, line: 1, ownLine: 1 }];
  for (const piece of others) {
    const failure = difference(first, piece);
    if (failure !== null) return { ok: false, failure };
    const map = columnMap(first.found, piece.found)!;
    const [a, b] = [first.found.plan.dialect, piece.found.plan.dialect];
    const from = bodyStart(piece);
    const asIs = map.every((column, j) => column === j) && a.delimiter === b.delimiter && a.quote === b.quote;
    const rows = asIs ? ended(piece.text.slice(from)) : rewriteRows(piece.text, from, b, a, map);
    parts.push({ fileName: piece.fileName, line: lineCount(text) + 1, ownLine: piece.found.body[0]?.line ?? 1 });
    text += rows;
  }
  return { ok: true, value: { text, parts } };
}
