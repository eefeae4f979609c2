import { binaryKind, workbookKind } from './binaryKind.ts';

const LOOKED_AT = 1 << 12;

/**
 * Whether a file is a workbook that can be read (Office Open XML).
 *
 * @param file a dropped or picked file
 * @returns true by its first bytes, whatever it is called
 */
export async function isWorkbook(file: Blob): Promise<boolean> {
  const start = new Uint8Array(await file.slice(0, LOOKED_AT).arrayBuffer());
  return binaryKind(start, false) === workbookKind;
}
