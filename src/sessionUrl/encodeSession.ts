import type { Envelope } from '../../workers/contract/envelope.ts';
import { deflate, toBase64Url } from './bytes.ts';

/** What a link carries. */
export interface Payload {
  readonly envelope: Envelope;
  readonly inline: { readonly fileName: string; readonly text: string } | null;
}

/** Mark of the hash; the number is that of the packing, not of the session. */
export const hashMark = 's1.';
/** Links longer than this are cut by mail programs: offer a file instead. */
export const longLink = 8000;

/** A session as the text behind `#`. */
export async function encodeSession(payload: Payload): Promise<string> {
  return hashMark + toBase64Url(await deflate(JSON.stringify(payload)));
}
