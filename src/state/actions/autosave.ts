import { openDB } from 'idb';
import type { Payload } from '../../sessionUrl/encodeSession.ts';
import { decodePayload } from '../../sessionUrl/decodeSession.ts';
import { envelopeOf } from '../envelopes.ts';
import { persistedFields } from '../persistedFields.ts';
import type { AppState } from '../appState.ts';
import type { Store } from '../store.ts';
import { activeRecord, note, withNotice } from '../updates.ts';

const database = 'lagwright';
const store = 'session';
const key = 'current';
const quiet = 800;
/** Records larger than this are not kept by the browser: the file is asked for again. */
const mostText = 60_000_000;

const open = () => openDB(database, 1, { upgrade: (db) => void db.createObjectStore(store) });

/** The session as the browser keeps it, or null where there is none or it cannot be read. */
export async function savedSession(): Promise<Payload | null> {
  try {
    const db = await open();
    const text: unknown = await db.get(store, key);
    db.close();
    if (typeof text !== 'string') return null;
    const decoded = decodePayload(text);
    return decoded.ok ? decoded.value : null;
  } catch {
    return null;
  }
}

/** What is written: null forgets. */
function savedText(state: AppState): string | null {
  const envelope = envelopeOf(state);
  if (envelope === null) return null;
  const source = activeRecord(state)?.source;
  const inline =
    source?.kind === 'loaded' && source.text.length < mostText
      ? { fileName: source.fileName, text: source.text }
      : null;
  return JSON.stringify({ envelope, inline });
}

/** Keeps the session in the browser's own store, a moment after the last change. A refusal becomes one notice. */
export function startAutosave(app: Store): void {
  let timer: ReturnType<typeof setTimeout> | undefined;
  let told = false;
  let last = app.get();
  const fields = (Object.keys(persistedFields) as (keyof AppState)[]).filter((field) => persistedFields[field].browser);
  const write = async () => {
    try {
      const text = savedText(app.get());
      const db = await open();
      if (text === null) await db.delete(store, key);
      else await db.put(store, text, key);
      db.close();
    } catch {
      if (told) return;
      told = true;
      const words = 'The browser refused to keep this session. Save it as a file or copy its link before you leave.';
      app.set((state) => withNotice(state, note(words)));
    }
  };
  app.subscribe(() => {
    const now = app.get();
    if (now.opening || fields.every((field) => now[field] === last[field])) return;
    last = now;
    clearTimeout(timer);
    timer = setTimeout(() => void write(), quiet);
  });
}
