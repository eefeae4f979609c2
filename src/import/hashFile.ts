import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex } from '@noble/hashes/utils.js';

/** Hexadecimal digits kept of a fingerprint: 128 bits. */
const DIGITS = 32;

/**
 * Fingerprint of a file: SHA-256 (FIPS 180-4) of its bytes, the first 128 bits in hexadecimal, taken piece by piece so that
 * a large file never holds the page.
 */
export class FileHasher {
  private readonly state = sha256.create();

  add(bytes: Uint8Array): void {
    this.state.update(bytes);
  }

  digest(): string {
    return bytesToHex(this.state.digest()).slice(0, DIGITS);
  }
}

/**
 * Fingerprint of bytes that are at hand, as `FileHasher` gives it.
 *
 * @param bytes the whole file
 * @returns 32 hexadecimal digits
 */
export function hashFile(bytes: Uint8Array): string {
  return bytesToHex(sha256(bytes)).slice(0, DIGITS);
}

/** Bytes hashed in one task: some milliseconds' work. */
const PIECE = 1 << 19;

/**
 * Fingerprint of a file or a long text, taken in pieces so that the page stays free.
 *
 * @param content a file, or a Blob of a text
 * @returns 32 hexadecimal digits
 */
export async function hashBlob(content: Blob): Promise<string> {
  const hasher = new FileHasher();
  for (let from = 0; from < content.size; from += PIECE)
    hasher.add(new Uint8Array(await content.slice(from, from + PIECE).arrayBuffer()));
  return hasher.digest();
}

/** Fingerprint of pasted text: that of its UTF-8 bytes. */
export const hashText = (text: string): string => hashFile(new TextEncoder().encode(text));
