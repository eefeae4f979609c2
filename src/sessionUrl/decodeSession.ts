import * as v from 'valibot';
import type { Failure } from '../../workers/contract/failures.ts';
import type { Result } from '../../workers/contract/result.ts';
import { fromBase64Url, inflate } from './bytes.ts';
import { hashMark, type Payload } from './encodeSession.ts';
import { currentVersion, migrate } from './migrate.ts';
import { payloadSchema } from './schema.ts';

/** Chromium keeps two million characters of a hash and then ends the tab. */
const mostCharacters = 1_500_000;

const fail = (failure: Failure): { ok: false; failure: Failure } => ({ ok: false, failure });

/** The hash of a pasted link from any origin, or the text itself where it is a bare hash; null where it is neither. */
export function hashOf(link: string): string | null {
  const trimmed = link.trim();
  const at = trimmed.indexOf('#');
  const hash = at >= 0 ? trimmed.slice(at + 1) : trimmed;
  return hash.startsWith(hashMark) && !/\s/.test(hash) ? hash : null;
}

/**
 * A session from the text behind `#`. Never throws.
 *
 * @param hash with or without the `#`
 * @returns a complete payload; or linkForeign (not one of ours), linkTooLarge, linkDamaged, linkNewer
 */
export async function decodeSession(hash: string): Promise<Result<Payload>> {
  const body = hash.startsWith('#') ? hash.slice(1) : hash;
  if (!body.startsWith(hashMark)) return fail({ code: 'linkForeign' });
  if (body.length > mostCharacters)
    return fail({ code: 'linkTooLarge', characters: body.length, limit: mostCharacters });
  const bytes = fromBase64Url(body.slice(hashMark.length));
  const text = bytes === null ? null : await inflate(bytes);
  if (text === null) return fail({ code: 'linkDamaged', where: 'packing' });
  return decodePayload(text);
}

/** The same from a session file, which holds the payload as JSON. */
export function decodePayload(text: string): Result<Payload> {
  let parsed: unknown;
  try {
    parsed = JSON.parse(text);
  } catch {
    return fail({ code: 'linkDamaged', where: 'text' });
  }
  if (!isObject(parsed) || !isObject(parsed['envelope'])) return fail({ code: 'linkDamaged', where: 'envelope' });
  const version = parsed['envelope']['version'];
  if (typeof version === 'number' && version > currentVersion)
    return fail({ code: 'linkNewer', version, known: currentVersion });
  const envelope = migrate(parsed['envelope']);
  const checked = v.safeParse(payloadSchema, { ...parsed, envelope });
  if (checked.success) return { ok: true, value: checked.output };
  return fail({ code: 'linkDamaged', where: v.getDotPath(checked.issues[0]) ?? 'envelope' });
}

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}
