import type { Candidate } from '../../../workers/contract/candidate.ts';
import type { RepairedRecord } from '../../../workers/contract/forensics.ts';
import type { Repair, Span } from '../../../workers/contract/series.ts';
import type { CoreClient } from '../../workerClient/clients.ts';
import type { Actions } from '../actionTypes.ts';
import type { RecordState } from '../appState.ts';
import { moveRepair } from '../moveRepair.ts';
import type { Store } from '../store.ts';
import { activeRecord, freshId, trouble, waitingRow, withActive, withNotice, withRecord } from '../updates.ts';
import type { History } from './history.ts';
import type { Jobs } from './jobs.ts';

type RepairActions = Pick<Actions, 'repair' | 'removeRepair' | 'moveRepair' | 'explainRepair'>;

/** Repairs and the report on what the logger did, made anew whenever the readings are others. */
export function createRepairs(store: Store, client: CoreClient, jobs: Jobs, history: History): RepairActions {
  inspectWhenChanged(store, client);
  /** Changes wait for each other: each is made to the list as the one before left it. */
  let queue: Promise<void> = Promise.resolve();

  const change = (edit: (record: RecordState) => readonly Repair[]): Promise<void> => {
    queue = queue.then(async () => {
      const record = activeRecord(store.get());
      if (record?.source.kind !== 'loaded') return;
      const { raw } = record.source;
      const repairs = edit(record);
      if (repairs === record.repairs) return;
      const answer = await client.repair(raw.series, repairs, raw.columns);
      const now = activeRecord(store.get());
      if (now?.id !== record.id || now.repairs !== record.repairs || now.source.kind !== 'loaded') return;
      if (!answer.ok) {
        store.set((state) => withNotice(state, trouble(answer.failure)));
        return;
      }
      history.remember();
      for (const { id } of now.rows) jobs.abortRow(id);
      store.set((state) => ({
        ...withRecord(state, record.id, (one) => repaired(one, repairs, answer.value)),
        prediction: null,
      }));
      jobs.fitWaiting();
    });
    return queue;
  };

  return {
    repair: (made, why) =>
      change(({ repairs }) => [...repairs, { id: freshId('m'), at: new Date().toISOString(), why, ...made }]),
    removeRepair: (id) =>
      change(({ repairs }) =>
        repairs.some((one) => one.id === id) ? repairs.filter((one) => one.id !== id) : repairs,
      ),
    moveRepair: (id, by) =>
      change(({ repairs, source }) =>
        source.kind === 'loaded' ? moveRepair(source.raw.series.axis, repairs, id, by) : repairs,
      ),
    explainRepair: (id, why) => {
      const repair = activeRecord(store.get())?.repairs.find((one) => one.id === id);
      if (repair === undefined || repair.why === why) return;
      history.remember();
      const explained = (one: Repair) => (one.id === id ? { ...one, why } : one);
      store.set((state) => withActive(state, (record) => ({ ...record, repairs: record.repairs.map(explained) })));
    },
  };
}

/** The record with these repairs: window, hold-out and events keep their times, candidates stay and wait for their fits. */
function repaired(record: RecordState, repairs: readonly Repair[], made: RepairedRecord): RecordState {
  if (record.source.kind !== 'loaded') return record;
  const { source } = record;
  const before = source.record.series;
  const { series, columns } = made;
  const length = series.values.length;
  const ratio = before.axis.step / series.axis.step;
  const place = (t: number) => (ratio === 1 ? t : Math.round(t * ratio));
  const moved = ({ from, to }: Span): Span => {
    const end = to >= before.values.length ? length : Math.min(length, place(to));
    return { from: Math.min(place(from), end - 1), to: end };
  };
  const same = before.hash === series.hash;
  return {
    ...record,
    repairs,
    seriesHash: series.hash,
    window: moved(record.window),
    holdOut: record.holdOut === null ? null : moved(record.holdOut),
    rows: record.rows.map((row) => {
      const candidate = ratio === 1 ? row.candidate : withEvents(row.candidate, place, length);
      return same && candidate === row.candidate ? row : waitingRow({ ...row, candidate });
    }),
    source: { ...source, record: { ...source.raw, series, columns } },
  };
}

function withEvents(candidate: Candidate, place: (t: number) => number, length: number): Candidate {
  const regressors = candidate.regressors.map((regressor) =>
    'at' in regressor ? { ...regressor, at: Math.min(length - 1, place(regressor.at)) } : regressor,
  );
  return { ...candidate, regressors };
}

/** Asks for the report whenever the active record holds other readings than the report is about. */
function inspectWhenChanged(store: Store, client: CoreClient): void {
  let asked = '';
  store.subscribe(() => {
    const state = store.get();
    const record = activeRecord(state);
    if (record?.source.kind !== 'loaded') {
      asked = '';
      if (state.forensics !== null) store.set((now) => ({ ...now, forensics: null }));
      return;
    }
    const { series, notes } = record.source.record;
    const wanted = `${record.id} ${series.hash} ${series.axis.step}`;
    if (asked === wanted) return;
    asked = wanted;
    void client.inspect(series, notes).then((answer) => {
      if (asked !== wanted) return;
      // A cancelled inspection is asked for again with the next change.
      if (!answer.ok && answer.failure.code === 'cancelled') asked = '';
      else store.set((now) => ({ ...now, forensics: { seriesHash: series.hash, answer } }));
    });
  });
}
