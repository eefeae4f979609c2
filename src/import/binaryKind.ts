/** Signatures at the beginning of files that are no text, after the formats' own specifications. */
const signatures: readonly (readonly [string, readonly number[], number?])[] = [
  ['JPEG picture', [0xff, 0xd8, 0xff]],
  ['PNG picture', [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]],
  ['GIF picture', [0x47, 0x49, 0x46, 0x38]],
  ['TIFF picture', [0x49, 0x49, 0x2a, 0x00]],
  ['TIFF picture', [0x4d, 0x4d, 0x00, 0x2a]],
  ['HEIC picture', [0x66, 0x74, 0x79, 0x70, 0x68, 0x65, 0x69], 4],
  ['AVIF picture', [0x66, 0x74, 0x79, 0x70, 0x61, 0x76, 0x69, 0x66], 4],
  ['video', [0x66, 0x74, 0x79, 0x70], 4],
  ['WebP picture', [0x57, 0x45, 0x42, 0x50], 8],
  ['PDF document', [0x25, 0x50, 0x44, 0x46, 0x2d]],
  ['gzip archive', [0x1f, 0x8b]],
  ['7z archive', [0x37, 0x7a, 0xbc, 0xaf, 0x27, 0x1c]],
  ['RAR archive', [0x52, 0x61, 0x72, 0x21, 0x1a, 0x07]],
  [
    'older spreadsheet or office document, or one locked by a password',
    [0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1],
  ],
  ['database', [0x53, 0x51, 0x4c, 0x69, 0x74, 0x65, 0x20]],
  ['Parquet table', [0x50, 0x41, 0x52, 0x31]],
  ['HDF5 file', [0x89, 0x48, 0x44, 0x46]],
];
export const workbookKind = 'spreadsheet workbook (.xlsx)';
const ZIP: readonly number[] = [0x50, 0x4b, 0x03, 0x04];

/** Share of control characters from which on bytes without a signature are no text. */
const CONTROL_SHARE = 0.02;
const isControl = (byte: number): boolean =>
  byte < 32 && byte !== 9 && byte !== 10 && byte !== 12 && byte !== 13 && byte !== 26 && byte !== 27;

const startsWith = (bytes: Uint8Array, mark: readonly number[], at = 0): boolean =>
  mark.every((value, i) => bytes[at + i] === value);

/** A ZIP is a spreadsheet where its first names are those of Office Open XML (ECMA-376) or OpenDocument (ISO 26300). */
function zipKind(bytes: Uint8Array): string {
  let names = '';
  for (const byte of bytes.subarray(0, 4096)) names += String.fromCharCode(byte);
  if (/xl\/|\[Content_Types\]/u.test(names)) return workbookKind;
  return names.includes('opendocument.spreadsheet') ? 'spreadsheet workbook (.ods)' : 'ZIP archive';
}

/**
 * What kind of file bytes are that are no text.
 *
 * Method: signatures of common formats; NUL bytes (in text of two bytes a character they are expected, and allowed);
 * more than 2 % of control characters.
 *
 * @param bytes the beginning of the file, some ten thousand bytes
 * @param wide whether the text has been found to be UTF-16
 * @returns a noun phrase for the kind, null for text
 */
export function binaryKind(bytes: Uint8Array, wide: boolean): string | null {
  if (startsWith(bytes, ZIP)) return zipKind(bytes);
  const known = signatures.find(([, mark, at]) => startsWith(bytes, mark, at));
  if (known !== undefined) return known[0];
  if (wide) return null;
  let [nul, control] = [0, 0];
  for (const byte of bytes) {
    if (byte === 0) nul++;
    else if (isControl(byte)) control++;
  }
  return nul > 0 || control > CONTROL_SHARE * bytes.length ? 'data that are not text' : null;
}
