import type { Dialect } from '../../workers/contract/dialect.ts';

/** Share of NUL bytes in every second place from which on text is UTF-16 without a mark: ASCII is half of it. */
const WIDE_SHARE = 0.4;

/**
 * Encoding that the first bytes of a file speak for.
 *
 * Method: byte order marks (Unicode 16.0, § 23.8); without one, NUL bytes in the even or the odd places, as ASCII characters
 * in UTF-16 have them. Anything else is taken for UTF-8 until a byte contradicts it.
 *
 * @param bytes the beginning of the file
 * @returns the encoding, and whether its mark was there
 */
export function findEncoding(bytes: Uint8Array): { readonly encoding: Dialect['encoding']; readonly marked: boolean } {
  if (bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf) return { encoding: 'utf-8', marked: true };
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return { encoding: 'utf-16le', marked: true };
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return { encoding: 'utf-16be', marked: true };
  const pairs = Math.floor(bytes.length / 2);
  let [even, odd] = [0, 0];
  for (let i = 0; i < pairs; i++) {
    if (bytes[2 * i] === 0) even++;
    if (bytes[2 * i + 1] === 0) odd++;
  }
  if (pairs > 4 && odd > WIDE_SHARE * pairs && even === 0) return { encoding: 'utf-16le', marked: false };
  if (pairs > 4 && even > WIDE_SHARE * pairs && odd === 0) return { encoding: 'utf-16be', marked: false };
  return { encoding: 'utf-8', marked: false };
}
