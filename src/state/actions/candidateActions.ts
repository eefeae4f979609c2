import type { Candidate } from '../../../workers/contract/candidate.ts';
import type { Actions } from '../actionTypes.ts';
import type { RecordState } from '../appState.ts';
import type { History } from './history.ts';
import type { Jobs } from './jobs.ts';
import { candidateKey } from '../startingCandidates.ts';
import type { Store } from '../store.ts';
import { activeRecord, freshId, note, waitingRow, withActive, withNotice, withRow } from '../updates.ts';

type CandidateActions = Pick<
  Actions,
  | 'addCandidate'
  | 'duplicateCandidate'
  | 'removeCandidate'
  | 'changeCandidate'
  | 'fitAll'
  | 'cancel'
  | 'choose'
  | 'predict'
>;

/** Level that fits the differencing: a mean becomes a drift and the other way round. */
function withFittingLevel(candidate: Candidate): Candidate {
  const differences = candidate.order.d + candidate.order.D;
  if (candidate.level === 'mean' && differences > 0) return { ...candidate, level: 'none' };
  if (candidate.level === 'drift' && differences === 0) return { ...candidate, level: 'mean' };
  return candidate;
}

export function createCandidateActions(store: Store, jobs: Jobs, history: History): CandidateActions {
  const change = (edit: (record: RecordState) => RecordState) => {
    history.remember();
    store.set((state) => withActive(state, edit));
    jobs.fitWaiting();
  };
  const choose = (rowId: string | null) => {
    store.set((state) => {
      const index = activeRecord(state)?.rows.findIndex(({ id }) => id === rowId) ?? -1;
      return { ...state, view: { ...state.view, chosen: index < 0 ? null : index }, prediction: null };
    });
    if (rowId !== null) jobs.wantIntervals(rowId);
  };
  const has = (candidate: Candidate, except: string | null) =>
    activeRecord(store.get())?.rows.some(
      (row) => row.id !== except && candidateKey(row.candidate) === candidateKey(candidate),
    ) ?? false;
  const refuse = () => store.set((state) => withNotice(state, note('This candidate is already in the table.')));

  const add = (candidate: Candidate) => {
    if (activeRecord(store.get()) === null) return;
    if (has(candidate, null)) {
      refuse();
      return;
    }
    const id = freshId('c');
    change((record) => ({
      ...record,
      rows: [...record.rows, { id, candidate, progress: { kind: 'waiting' }, grey: null }],
    }));
    choose(id);
  };

  return {
    choose,
    addCandidate: add,
    duplicateCandidate: (rowId) => {
      const row = activeRecord(store.get())?.rows.find(({ id }) => id === rowId);
      if (row === undefined) return;
      const { order } = row.candidate;
      add(withFittingLevel({ ...row.candidate, order: { ...order, p: order.p + 1 } }));
    },
    removeCandidate: (rowId) => {
      jobs.abortRow(rowId);
      const chosen = activeRecord(store.get())?.rows[store.get().view.chosen ?? -1]?.id ?? null;
      change((record) => ({ ...record, rows: record.rows.filter(({ id }) => id !== rowId) }));
      choose(chosen === rowId ? (activeRecord(store.get())?.rows[0]?.id ?? null) : chosen);
    },
    changeCandidate: (rowId, part) => {
      const row = activeRecord(store.get())?.rows.find(({ id }) => id === rowId);
      if (row === undefined) return;
      const candidate = withFittingLevel({ ...row.candidate, ...part });
      if (candidateKey(candidate) === candidateKey(row.candidate)) return;
      if (has(candidate, rowId)) {
        refuse();
        return;
      }
      jobs.abortRow(rowId);
      change((record) => withRow(record, rowId, (one) => waitingRow({ ...one, candidate })));
      store.set((state) => ({ ...state, prediction: null }));
    },
    fitAll: () => {
      store.set((state) => withActive(state, (record) => ({ ...record, rows: record.rows.map(waitingRow) })));
      jobs.fitWaiting();
    },
    cancel: jobs.cancel,
    predict: jobs.predict,
  };
}
