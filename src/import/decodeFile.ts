import type { Dialect } from '../../workers/contract/dialect.ts';
import type { Result } from '../../workers/contract/result.ts';
import { binaryKind } from './binaryKind.ts';
import { findEncoding } from './findEncoding.ts';
import { FileHasher } from './hashFile.ts';

/** A file as text. `hash` is the fingerprint of its bytes. */
export interface DecodedFile {
  readonly text: string;
  readonly encoding: Dialect['encoding'];
  readonly hash: string;
}

/** Half of what a JavaScript string can hold in the engines in use. */
export const LARGEST_FILE = 256 * 1024 * 1024;
const LOOKED_AT = 1 << 14;
/** Bytes decoded and hashed in one task: about five milliseconds' work. */
const PIECE = 1 << 19;

/** Decodes piece by piece; null where the bytes are not of the encoding. */
async function decode(
  file: Blob,
  encoding: Dialect['encoding'],
  strict: boolean,
  each: (bytes: Uint8Array, done: number) => void,
): Promise<string | null> {
  const decoder = new TextDecoder(encoding, { fatal: strict });
  const parts: string[] = [];
  try {
    for (let from = 0; from < file.size; from += PIECE) {
      const bytes = new Uint8Array(await file.slice(from, from + PIECE).arrayBuffer());
      each(bytes, (from + bytes.length) / file.size);
      parts.push(decoder.decode(bytes, { stream: true }));
    }
    parts.push(decoder.decode());
  } catch (error) {
    if (error instanceof TypeError) return null;
    throw error;
  }
  return parts.join('');
}

/**
 * The text of a file, with its encoding and fingerprint.
 *
 * Method: the encoding is found from byte order marks and NUL bytes; bytes that are not valid UTF-8 are read as
 * windows-1252 (WHATWG Encoding Standard), which older exporters write. Files that are no text are named by their
 * signature. Bytes are decoded and hashed in pieces, each a task of its own.
 *
 * @param file a dropped or picked file
 * @param wanted encoding the person has fixed; then it is used whatever the bytes say
 * @param progress called with the fraction done after each piece; what it throws ends the work
 * @returns the text, or `emptyFile`, `binaryFile`, `fileTooLarge`
 */
export async function decodeFile(
  file: Blob,
  wanted?: Dialect['encoding'],
  progress?: (fraction: number) => void,
): Promise<Result<DecodedFile>> {
  if (file.size === 0) return { ok: false, failure: { code: 'emptyFile' } };
  if (file.size > LARGEST_FILE)
    return { ok: false, failure: { code: 'fileTooLarge', bytes: file.size, limit: LARGEST_FILE } };
  const start = new Uint8Array(await file.slice(0, LOOKED_AT).arrayBuffer());
  const guess = findEncoding(start);
  const encoding = wanted ?? guess.encoding;
  const kind = binaryKind(start, encoding.startsWith('utf-16'));
  if (kind !== null) return { ok: false, failure: { code: 'binaryFile', kind } };
  const hasher = new FileHasher();
  let hashed = 0;
  const hash = (bytes: Uint8Array, done: number) => {
    hasher.add(bytes);
    hashed += bytes.length;
    progress?.(done);
  };
  const text = await decode(file, encoding, wanted === undefined && encoding === 'utf-8', hash);
  if (text !== null) return { ok: true, value: { text, encoding, hash: hasher.digest() } };
  // What was hashed before the offending piece, and that piece, stay; the rest follows.
  let seen = 0;
  const older = await decode(file, 'windows-1252', false, (bytes, done) => {
    seen += bytes.length;
    if (seen > hashed) hash(bytes, done);
  });
  return { ok: true, value: { text: older ?? '', encoding: 'windows-1252', hash: hasher.digest() } };
}
