import type { Dialect } from '../../../workers/contract/dialect.ts';
import type { ReadAnswer, ReadRecord } from '../../../workers/contract/reading.ts';
import { decodeFile } from '../../import/decodeFile.ts';
import { hashText } from '../../import/hashFile.ts';
import type { CoreClient } from '../../workerClient/clients.ts';
import type { AppState, Arrival, RecordState } from '../appState.ts';
import type { History } from './history.ts';
import type { Jobs } from './jobs.ts';
import { startingCandidates } from '../startingCandidates.ts';
import type { Store } from '../store.ts';
import { activeRecord, freshId, trouble, withNotice, withRecord } from '../updates.ts';

export interface Arrivals {
  readonly openFile: (file: File) => Promise<void>;
  /** Text of a record, pasted or fetched. */
  readonly openRecordText: (text: string, name: string, take?: 'take' | 'look', example?: boolean) => Promise<void>;
  readonly changeDialect: (settings: Partial<Dialect>) => Promise<void>;
  readonly acceptArrival: () => void;
  readonly dismissArrival: () => void;
  readonly forgetRecord: () => void;
}

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

  const read = async (arrival: Arrival): Promise<ReadAnswer | null> => {
    newest += 1;
    const own = newest;
    store.set((state) => ({ ...state, arrival: { ...arrival, answer: null, fraction: 0 } }));
    const answer = await client.read(
      { text: arrival.text, fileName: arrival.fileName, settings: arrival.settings },
      (fraction) =>
        store.set((state) =>
          own === newest && state.arrival !== null ? { ...state, arrival: { ...state.arrival, fraction } } : state,
        ),
    );
    if (own !== newest) return null;
    store.set((state) =>
      state.arrival === null ? state : { ...state, arrival: { ...state.arrival, answer, fraction: 1 } },
    );
    return answer;
  };

  const wanted = (): RecordState | null => {
    const record = activeRecord(store.get());
    return record?.source.kind === 'wanted' ? record : null;
  };

  /** A file for a session that came by link is read the link's way. */
  const start = (fileName: string, fileHash: string, text: string): Arrival => {
    const settings = wanted()?.dialect ?? {};
    return { fileName, fileHash, text, settings, answer: null, fraction: 0 };
  };

  const take = (arrival: Arrival, record: ReadRecord, example: boolean) => {
    const waiting = wanted();
    const same = waiting !== null && waiting.seriesHash === record.series.hash;
    // What the page opens with is where undo ends.
    if (waiting === null && !store.get().opening) history.remember();
    newest += 1;
    store.set((state) => ({
      ...(same ? filled(state, waiting, arrival, record, example) : replaced(state, arrival, record, example)),
      arrival: null,
      prediction: null,
    }));
    if (waiting !== null && !same) {
      const sameFile = waiting.fileHash === arrival.fileHash;
      store.set((state) =>
        withNotice(state, trouble({ code: 'recordMismatch', fileName: arrival.fileName, sameFile })),
      );
    }
    jobs.fitWaiting();
  };

  return {
    openFile: async (file) => {
      const decoded = await decodeFile(file);
      if (!decoded.ok) {
        store.set((state) => withNotice(state, trouble(decoded.failure, file.name)));
        return;
      }
      if (await openSessionText(decoded.value.text)) return;
      const arrival = start(file.name, decoded.value.hash, decoded.value.text);
      const matches = wanted();
      const answer = await read({
        ...arrival,
        settings: { ...arrival.settings, ...(matches === null ? { encoding: decoded.value.encoding } : {}) },
      });
      const now = store.get().arrival;
      if (matches !== null && now !== null && answer?.record?.series.hash === matches.seriesHash)
        take(now, answer.record, false);
    },
    openRecordText: async (text, name, mode = 'look', example = false) => {
      const answer = await read(start(name, hashText(text), text));
      const now = store.get().arrival;
      if (answer?.record && now !== null && (mode === 'take' || wanted()?.seriesHash === answer.record.series.hash))
        take(now, answer.record, example);
    },
    changeDialect: async (settings) => {
      const { arrival } = store.get();
      if (arrival !== null) await read({ ...arrival, settings: { ...arrival.settings, ...settings } });
    },
    acceptArrival: () => {
      const { arrival } = store.get();
      if (arrival?.answer?.record) take(arrival, arrival.answer.record, false);
    },
    dismissArrival: () => {
      newest += 1;
      store.set((state) => ({ ...state, arrival: null }));
    },
    forgetRecord: () => {
      history.remember();
      jobs.cancel();
      store.set((state) => ({ ...state, records: [], active: null, prediction: null, arrival: null }));
    },
  };
}

/** The wanted record of a link with its readings: candidates as the link has them. */
function filled(
  state: AppState,
  wanted: RecordState,
  arrival: Arrival,
  record: ReadRecord,
  example: boolean,
): AppState {
  return withRecord(state, wanted.id, (one) => ({
    ...one,
    source: { kind: 'loaded', fileName: arrival.fileName, text: arrival.text, record, example },
  }));
}

/** A new record in place of the old; candidates of a session that wanted another file go along. */
function replaced(state: AppState, arrival: Arrival, record: ReadRecord, example: boolean): AppState {
  const old = activeRecord(state);
  const { values, axis, hash } = record.series;
  const kept = old?.source.kind === 'wanted' ? old.rows.map(({ candidate }) => candidate) : null;
  const candidates = kept ?? startingCandidates(axis, values.length);
  const id = freshId('r');
  const next: RecordState = {
    id,
    fileHash: arrival.fileHash,
    seriesHash: hash,
    dialect: record.dialect,
    repairs: [],
    window: { from: 0, to: values.length },
    holdOut: null,
    rows: candidates.map((candidate) => ({ id: freshId('c'), candidate, progress: { kind: 'waiting' }, grey: null })),
    source: { kind: 'loaded', fileName: arrival.fileName, text: arrival.text, record, example },
  };
  return {
    ...state,
    records: [next],
    active: id,
    view: { ...state.view, chosen: kept === null ? null : state.view.chosen },
  };
}
