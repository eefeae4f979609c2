import type { Dialect } from '../../../workers/contract/dialect.ts';
import type { Failure } from '../../../workers/contract/failures.ts';
import type { ReadAnswer, ReadRecord } from '../../../workers/contract/reading.ts';
import { hashText } from '../../import/hashFile.ts';
import type { CoreClient } from '../../workerClient/clients.ts';
import type { Arrival, RecordState } from '../appState.ts';
import { filledRecord, replacedRecord } from './arrivedRecord.ts';
import type { History } from './history.ts';
import type { Jobs } from './jobs.ts';
import { joinPieces, loadFiles, type Loaded } from './loadFiles.ts';
import type { Store } from '../store.ts';
import { activeRecord, note, trouble, withNotice } from '../updates.ts';

export interface Arrivals {
  readonly openFiles: (files: readonly File[]) => Promise<void>;
  /** Text of a record, pasted or fetched. */
  readonly openRecordText: (text: string, name: string, take?: 'take' | 'look', example?: boolean) => Promise<void>;
  readonly changeDialect: (settings: Partial<Dialect>) => Promise<void>;
  readonly acceptArrival: () => void;
  readonly stopReading: () => void;
  readonly dismissArrival: () => void;
  readonly forgetRecord: () => void;
}

/** Share of the work of a large file that decoding it takes; splitting it into rows is the rest. */
const DECODING = 0.3;

/** A session file begins with a brace, and a link is short: a long table is not searched for one. */
const looksLikeSession = (text: string): boolean => /^\s*\{/u.test(text.slice(0, 100)) || text.length < 2_000_000;

export function createArrivals(
  store: Store,
  client: CoreClient,
  jobs: Jobs,
  history: History,
  /** Opens text that is a session and not a record. */
  openSessionText: (text: string) => Promise<boolean>,
): Arrivals {
  /** Number of the newest reading; late answers of older ones are dropped. */
  let newest = 0;
  /** The arrival as it was last read to the end: where stopping goes back to. */
  let settled: Arrival | null = null;

  const show = (arrival: Arrival | null) => store.set((state) => ({ ...state, arrival }));
  const progressOf = (own: number) => (fraction: number) =>
    store.set((state) =>
      own === newest && state.arrival !== null ? { ...state, arrival: { ...state.arrival, fraction } } : state,
    );

  /** Goes back to what was read last and says why. */
  const giveUp = (failure: Failure, name: string) => {
    show(settled);
    if (failure.code !== 'cancelled') store.set((state) => withNotice(state, trouble(failure, name)));
  };

  const read = async (arrival: Arrival, from = 0): Promise<ReadAnswer | null> => {
    newest += 1;
    const own = newest;
    const { text, fileName, settings, parts } = arrival;
    show({ ...arrival, reading: true, fraction: from });
    const progress = progressOf(own);
    const answer = await client.read({ text, fileName, settings, parts }, (part) => progress(from + (1 - from) * part));
    if (own !== newest) return null;
    settled = { ...arrival, answer, reading: false, fraction: 1 };
    show(settled);
    return answer;
  };

  /** Decodes, unpacks and joins; null where it failed, was stopped, or something newer has begun. */
  const load = async (arrival: Arrival): Promise<Loaded | null> => {
    newest += 1;
    const own = newest;
    show({ ...arrival, reading: true, fraction: 0 });
    const progress = progressOf(own);
    const loaded = await loadFiles(client, arrival.files, arrival.settings, (part) => {
      progress(DECODING * part);
      return own === newest;
    });
    if (own !== newest) return null;
    if (loaded.ok) return loaded.value;
    giveUp(loaded.failure, arrival.fileName);
    return null;
  };

  const wanted = (): RecordState | null => {
    const record = activeRecord(store.get());
    return record?.source.kind === 'wanted' ? record : null;
  };

  /** A file for a session that came by link is read the link's way. */
  const start = (fileName: string, fileHash: string, text: string, files: readonly File[] = []): Arrival => {
    const settings = wanted()?.dialect ?? {};
    const empty = { answer: null, reading: true, fraction: 0, pieces: [], parts: [], sheets: [] };
    return { fileName, fileHash, text, settings, files, ...empty };
  };

  /** The record as the wanted one knew it, its repairs replayed; null where it is another one. */
  const asWanted = async (raw: ReadRecord): Promise<ReadRecord | null> => {
    const waiting = wanted();
    if (waiting === null) return null;
    if (waiting.repairs.length === 0) return waiting.seriesHash === raw.series.hash ? raw : null;
    const replayed = await client.repair(raw.series, waiting.repairs, raw.columns);
    return replayed.ok && replayed.value.series.hash === waiting.seriesHash ? { ...raw, ...replayed.value } : null;
  };

  /** `known`: the record as the wanted one knew it, or null where it is another one. */
  const take = (arrival: Arrival, raw: ReadRecord, known: ReadRecord | null, example: boolean) => {
    const waiting = wanted();
    const same = waiting !== null && known?.series.hash === waiting.seriesHash;
    // What the page opens with is where undo ends.
    if (waiting === null && !store.get().opening) history.remember();
    newest += 1;
    settled = null;
    store.set((state) => ({
      ...(same
        ? filledRecord(state, waiting, arrival, raw, known, example)
        : replacedRecord(state, arrival, raw, example)),
      arrival: null,
      prediction: null,
    }));
    if (waiting !== null && !same) {
      const sameFile = waiting.fileHash === arrival.fileHash;
      store.set((state) =>
        withNotice(state, trouble({ code: 'recordMismatch', fileName: arrival.fileName, sameFile })),
      );
      const lost = waiting.repairs.length;
      const words = `The ${lost === 1 ? 'repair' : `${lost} repairs`} of the session were made to another record and are left out.`;
      if (lost > 0) store.set((state) => withNotice(state, note(words)));
    }
    jobs.fitWaiting();
  };

  const dismissArrival = () => {
    newest += 1;
    settled = null;
    client.abortReading();
    show(null);
  };

  /** Loads the files of an arrival again and reads them. */
  const reload = async (arrival: Arrival) => {
    const loaded = await load(arrival);
    if (loaded !== null) await read({ ...arrival, ...loaded }, DECODING);
  };

  return {
    openFiles: async (files) => {
      const [first] = files;
      if (first === undefined) return;
      const name = files.length === 1 ? first.name : `${first.name} and ${files.length - 1} more`;
      const matches = wanted();
      settled = store.get().arrival?.reading === true ? settled : store.get().arrival;
      const arrival = start(name, '', '', files);
      const loaded = await load(arrival);
      if (loaded === null) return;
      const mayBeSession = files.length === 1 && loaded.sheets.length === 0 && looksLikeSession(loaded.text);
      if (mayBeSession && (await openSessionText(loaded.text))) return;
      const settings = matches === null ? loaded.settings : { ...loaded.settings, ...arrival.settings };
      const answer = await read({ ...arrival, ...loaded, settings }, DECODING);
      const now = store.get().arrival;
      if (matches === null || now === null || !answer?.record) return;
      const known = await asWanted(answer.record);
      if (known !== null && store.get().arrival === now) take(now, answer.record, known, false);
    },
    openRecordText: async (text, name, mode = 'look', example = false) => {
      const answer = await read(start(name, hashText(text), text));
      const now = store.get().arrival;
      if (!answer?.record || now === null) return;
      const known = await asWanted(answer.record);
      if (store.get().arrival === now && (mode === 'take' || known !== null)) take(now, answer.record, known, example);
    },
    changeDialect: async (settings) => {
      const { arrival } = store.get();
      if (arrival === null) return;
      // Another sheet is another table: nothing that was settled about the last one holds.
      if (settings.sheet !== undefined) {
        await reload({ ...arrival, settings: { sheet: settings.sheet } });
        return;
      }
      const next = { ...arrival, settings: { ...arrival.settings, ...settings } };
      if (settings.encoding !== undefined && arrival.files.length > 0) {
        await reload(next);
        return;
      }
      if (arrival.pieces.length < 2) {
        await read(next);
        return;
      }
      const joined = await joinPieces(client, arrival.pieces, next.settings);
      if (joined.ok) await read({ ...next, ...joined.value });
      else giveUp(joined.failure, arrival.fileName);
    },
    acceptArrival: () => {
      const { arrival } = store.get();
      if (!arrival?.answer?.record || arrival.reading) return;
      const { record } = arrival.answer;
      // Only repairs take time; without them the record is there at once.
      if ((wanted()?.repairs.length ?? 0) === 0)
        take(arrival, record, wanted()?.seriesHash === record.series.hash ? record : null, false);
      else
        void asWanted(record).then((known) => {
          if (store.get().arrival === arrival) take(arrival, record, known, false);
        });
    },
    stopReading: () => {
      newest += 1;
      client.abortReading();
      show(settled);
    },
    dismissArrival,
    forgetRecord: () => {
      history.remember();
      jobs.cancel();
      newest += 1;
      settled = null;
      store.set((state) => ({ ...state, records: [], active: null, prediction: null, arrival: null }));
    },
  };
}
