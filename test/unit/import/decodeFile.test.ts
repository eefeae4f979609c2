import { describe, expect, it } from 'vitest';
import { decodeFile, LARGEST_FILE } from '../../../src/import/decodeFile.ts';
import { FileHasher, hashFile, hashText } from '../../../src/import/hashFile.ts';

const utf8 = (text: string) => new TextEncoder().encode(text);
const decoded = async (bytes: Uint8Array<ArrayBuffer> | string) => {
  const result = await decodeFile(new Blob([bytes]));
  if (!result.ok) throw new Error(result.failure.code);
  return result.value;
};
const refused = async (...bytes: number[]) => {
  const result = await decodeFile(new Blob([Uint8Array.from(bytes)]));
  return result.ok ? null : result.failure;
};

describe('fingerprints', () => {
  it('are the first 128 bits of SHA-256 (FIPS 180-4, the examples of one and of two blocks)', () => {
    expect(hashText('abc')).toBe('ba7816bf8f01cfea414140de5dae2223');
    expect(hashText('abcdbcdecdefdefgefghfghighijhijkijkljklmklmnlmnomnopnopq')).toBe(
      '248d6a61d20638b8e5c026930c3e6039',
    );
  });

  it('are the same taken in pieces', () => {
    const hasher = new FileHasher();
    hasher.add(utf8('a'));
    hasher.add(utf8('bc'));
    expect(hasher.digest()).toBe(hashFile(utf8('abc')));
  });
});

describe('decodeFile', () => {
  it('reads UTF-8, with a mark or without, across the ends of its pieces', async () => {
    const text = `time,°C\n${'Größe 7 µS\n'.repeat(100_000)}`;
    const { text: back, encoding, hash } = await decoded(text);
    expect(back).toBe(text);
    expect(encoding).toBe('utf-8');
    expect(hash).toBe(hashText(text));
    expect((await decoded(`\ufeff${text}`)).text).toBe(text);
  });

  it('falls back to windows-1252 however late the byte that is no UTF-8 comes', async () => {
    // 0x80 is the euro sign in windows-1252 (WHATWG Encoding Standard, index windows-1252), and 0xB0 the degree sign.
    const bytes = Uint8Array.from([...utf8('x,y\n'.repeat(300_000)), 0x80, 0x20, 0xb0, 0x43]);
    const { text, encoding, hash } = await decoded(bytes);
    expect(text.endsWith('€ °C')).toBe(true);
    expect(text).toHaveLength(bytes.length);
    expect(encoding).toBe('windows-1252');
    expect(hash).toBe(hashFile(bytes));
  });

  it('reads UTF-16 of both orders, with a mark or without', async () => {
    const text = 'time,Größe\n1,2\n';
    const little = new Uint8Array(2 * text.length);
    for (let k = 0; k < text.length; k++) new DataView(little.buffer).setUint16(2 * k, text.charCodeAt(k), true);
    const big = little.map((_, k) => little[k ^ 1]!);
    expect(await decoded(little)).toMatchObject({ text, encoding: 'utf-16le' });
    expect(await decoded(big)).toMatchObject({ text, encoding: 'utf-16be' });
    expect(await decoded(Uint8Array.from([0xfe, 0xff, ...big]))).toMatchObject({ text, encoding: 'utf-16be' });
  });

  it('takes the encoding that the person has fixed', async () => {
    const result = await decodeFile(new Blob(['7 °C']), 'windows-1252');
    expect(result.ok && result.value.text).toBe('7 Â°C');
  });

  it('says what a file is that is no text', async () => {
    expect(await refused()).toEqual({ code: 'emptyFile' });
    expect(await refused(0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a)).toMatchObject({ kind: 'PNG picture' });
    expect(await refused(0x25, 0x50, 0x44, 0x46, 0x2d, 0x31)).toMatchObject({ kind: 'PDF document' });
    expect(await refused(...utf8('PK\u0003\u0004  notes.txt'))).toMatchObject({ kind: 'ZIP archive' });
    expect(await refused(0x41, 0x00, 0x01, 0x00, 0x07)).toEqual({ code: 'binaryFile', kind: 'data that are not text' });
    expect(await refused(...Array.from({ length: 99 }, (_, k) => (k * 7) % 32))).toMatchObject({ code: 'binaryFile' });
  });

  it('refuses a file that no string could hold', async () => {
    const huge = Object.assign(new Blob(['x']), {});
    Object.defineProperty(huge, 'size', { value: LARGEST_FILE + 1 });
    expect(await decodeFile(huge)).toEqual({
      ok: false,
      failure: { code: 'fileTooLarge', bytes: LARGEST_FILE + 1, limit: LARGEST_FILE },
    });
  });
});
