import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex } from '@noble/hashes/utils.js';

/**
 * Fingerprint of a record's readings.
 *
 * Method: SHA-256 (FIPS 180-4) of the values as little-endian IEEE 754 doubles, every NaN (gap) as the one canonical NaN,
 * −0 as 0; the first 128 bits in hexadecimal.
 *
 * @param values any length, gaps as NaN
 * @returns 32 hexadecimal digits
 */
export function hashValues(values: Float64Array): string {
  const bytes = new Uint8Array(values.length * 8);
  const view = new DataView(bytes.buffer);
  for (let i = 0; i < values.length; i++) view.setFloat64(i * 8, values[i]! + 0, true);
  for (let i = 0; i < values.length; i++)
    if (Number.isNaN(values[i]!)) view.setBigUint64(i * 8, 0x7ff8000000000000n, true);
  return bytesToHex(sha256(bytes)).slice(0, 32);
}
