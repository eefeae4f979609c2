import { encodeSession, longLink, type Payload } from '../../sessionUrl/encodeSession.ts';
import { decodePayload, decodeSession, hashOf } from '../../sessionUrl/decodeSession.ts';
import type { Result } from '../../../workers/contract/result.ts';
import type { Arrivals } from './arrivals.ts';
import { envelopeOf, recordsOf } from '../envelopes.ts';
import type { History } from './history.ts';
import type { Jobs } from './jobs.ts';
import type { Store } from '../store.ts';
import { activeRecord, note, trouble, withNotice } from '../updates.ts';
import type { Platform } from './platform.ts';

export interface Links {
  readonly sessionLink: (inline: boolean) => Promise<{ readonly url: string; readonly tooLong: boolean }>;
  readonly copySessionLink: (inline: boolean) => Promise<void>;
  readonly saveSessionFile: () => Promise<void>;
  /** Opens the text behind `#`; true where the page now shows it. */
  readonly openHash: (hash: string) => Promise<boolean>;
  /** Opens pasted or dropped text that is a session link or file; false where it is neither. */
  readonly openSessionText: (text: string) => Promise<boolean>;
}

export function createLinks(store: Store, platform: Platform, arrivals: Arrivals, jobs: Jobs, history: History): Links {
  const payload = (inline: boolean): Payload | null => {
    const state = store.get();
    const envelope = envelopeOf(state);
    if (envelope === null) return null;
    const source = activeRecord(state)?.source;
    const readings = inline && source?.kind === 'loaded' ? { fileName: source.fileName, text: source.text } : null;
    return { envelope, inline: readings };
  };

  const show = async (decoded: Result<Payload>): Promise<boolean> => {
    if (!decoded.ok) {
      store.set((state) => withNotice(state, trouble(decoded.failure)));
      return false;
    }
    const { envelope, inline } = decoded.value;
    jobs.cancel();
    if (!store.get().opening) history.remember();
    store.set((state) => ({
      ...state,
      records: recordsOf(envelope),
      active: envelope.active,
      view: envelope.view,
      arrival: null,
      prediction: null,
    }));
    const fileHash = activeRecord(store.get())?.fileHash ?? '';
    const example = inline === null ? await platform.exampleByHash(fileHash) : null;
    const readings = inline ?? example;
    if (readings !== null) await arrivals.openRecordText(readings.text, readings.fileName, 'look', example !== null);
    return true;
  };

  const sessionLink: Links['sessionLink'] = async (inline) => {
    const carried = payload(inline);
    if (carried === null) return { url: platform.pageAddress(), tooLong: false };
    const url = `${platform.pageAddress()}#${await encodeSession(carried)}`;
    return { url, tooLong: url.length > longLink };
  };

  return {
    sessionLink,
    copySessionLink: async (inline) => {
      const { url, tooLong } = await sessionLink(inline);
      const copied = await platform.copy(url);
      const length = `${url.length.toLocaleString('en')} characters`;
      const words = !copied
        ? `The browser did not allow copying. The link: ${url}`
        : tooLong
          ? `Session link copied, but with ${length} many mail programs would cut it: better save the session as a file.`
          : `Session link copied (${length}).`;
      store.set((state) => withNotice(state, note(words)));
    },
    saveSessionFile: () => {
      const carried = payload(true);
      if (carried !== null)
        platform.download('session.lagwright.json', new Blob([JSON.stringify(carried)], { type: 'application/json' }));
      return Promise.resolve();
    },
    openHash: async (hash) => show(await decodeSession(hash)),
    openSessionText: async (text) => {
      const hash = hashOf(text);
      if (hash !== null) {
        await show(await decodeSession(hash));
        return true;
      }
      if (!/^\s*\{\s*"envelope"/.test(text)) return false;
      await show(decodePayload(text));
      return true;
    },
  };
}
