import type { Dialect } from '../../../workers/contract/dialect.ts';
import type { JoinedPart, JoinRequest, WorkbookText } from '../../../workers/contract/reading.ts';
import type { Result } from '../../../workers/contract/result.ts';
import { decodeFile } from '../../import/decodeFile.ts';
import { hashBlob } from '../../import/hashFile.ts';
import { isWorkbook } from '../../import/isWorkbook.ts';
import type { CoreClient } from '../../workerClient/clients.ts';

/** Files as one text. */
export interface Loaded {
  readonly text: string;
  readonly fileHash: string;
  readonly settings: Partial<Dialect>;
  readonly pieces: JoinRequest['files'];
  readonly parts: readonly JoinedPart[];
  readonly sheets: WorkbookText['sheets'];
}

interface OneLoaded {
  readonly text: string;
  readonly hash: string;
  readonly settings: Partial<Dialect>;
  readonly sheets: WorkbookText['sheets'];
}

class Stopped extends Error {}

async function loadOne(
  client: CoreClient,
  file: File,
  settings: Partial<Dialect>,
  progress: (fraction: number) => void,
): Promise<Result<OneLoaded>> {
  if (!(await isWorkbook(file))) {
    const decoded = await decodeFile(file, settings.encoding, progress);
    if (!decoded.ok) return decoded;
    const { text, hash, encoding } = decoded.value;
    return { ok: true, value: { text, hash, settings: { ...settings, encoding }, sheets: [] } };
  }
  const hash = await hashBlob(file);
  progress(0.5);
  const taken = await client.workbook({ bytes: await file.arrayBuffer(), sheet: settings.sheet ?? null });
  if (!taken.ok) return taken;
  const { text, sheets } = taken.value;
  return { ok: true, value: { text, hash, sheets, settings: { ...settings, ...taken.value.settings } } };
}

/** Texts put together in the order of time, with the fingerprint of the whole. */
export async function joinPieces(
  client: CoreClient,
  pieces: JoinRequest['files'],
  settings: Partial<Dialect>,
): Promise<Result<Pick<Loaded, 'text' | 'parts' | 'fileHash'>>> {
  const joined = await client.join({ files: pieces, settings });
  if (!joined.ok) return joined;
  const { text, parts } = joined.value;
  return { ok: true, value: { text, parts, fileHash: await hashBlob(new Blob([text])) } };
}

/**
 * The text of one or several files: decoded, or taken from the sheet of a workbook, and put together.
 *
 * @param files at least one; @param settings of the person, encoding and sheet among them
 * @param proceed called with the fraction done; answers false to stop
 * @returns the text with what was settled on the way; the first failure; `cancelled` where it was stopped
 */
export async function loadFiles(
  client: CoreClient,
  files: readonly File[],
  settings: Partial<Dialect>,
  proceed: (fraction: number) => boolean,
): Promise<Result<Loaded>> {
  const loaded: OneLoaded[] = [];
  const { length } = files;
  try {
    for (const [index, file] of files.entries()) {
      const one = await loadOne(client, file, settings, (fraction) => {
        if (!proceed((index + fraction) / length)) throw new Stopped();
      });
      if (!one.ok) return one;
      loaded.push(one.value);
    }
  } catch (error) {
    if (error instanceof Stopped) return { ok: false, failure: { code: 'cancelled' } };
    const message = error instanceof Error ? error.message : String(error);
    return { ok: false, failure: { code: 'fileUnreadable', reason: message } };
  }
  const [first] = loaded;
  if (first === undefined) return { ok: false, failure: { code: 'emptyFile' } };
  if (length === 1) {
    const { text, hash, sheets } = first;
    return { ok: true, value: { text, fileHash: hash, settings: first.settings, pieces: [], parts: [], sheets } };
  }
  const pieces = loaded.map(({ text }, index) => ({ fileName: files[index]!.name, text }));
  // Marks of numbers, delimiters and sheets are each file's own; the encoding only tells how the first was decoded.
  const joined = await joinPieces(client, pieces, settings);
  if (!joined.ok) return joined;
  const encoding = first.settings.encoding ?? 'utf-8';
  return { ok: true, value: { ...joined.value, settings: { ...settings, encoding }, pieces, sheets: [] } };
}
