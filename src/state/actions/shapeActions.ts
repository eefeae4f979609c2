import type { CoreClient } from '../../workerClient/clients.ts';
import type { Actions } from '../actionTypes.ts';
import { candidateKey } from '../startingCandidates.ts';
import type { Store } from '../store.ts';
import { activeRecord, freshId, note, withActive, withNotice } from '../updates.ts';
import type { History } from './history.ts';
import type { Jobs } from './jobs.ts';

type ShapeActions = Pick<Actions, 'describeShape' | 'addCandidates'>;

/** Looking at a record before any model, and taking the candidates that this advises. */
export function createShapeActions(store: Store, client: CoreClient, jobs: Jobs, history: History): ShapeActions {
  return {
    describeShape: async (order, transform) => {
      const record = activeRecord(store.get());
      if (record?.source.kind !== 'loaded') return { ok: false, failure: { code: 'cancelled' } };
      const { values, axis } = record.source.record.series;
      const { coverage } = store.get().view;
      // One key: a newer question replaces an older one that still waits.
      client.abort('shape');
      return client.shape('shape', { values, axis, window: record.window, order, transform, coverage });
    },
    addCandidates: (candidates) => {
      const record = activeRecord(store.get());
      if (record === null) return;
      const known = new Set(record.rows.map((row) => candidateKey(row.candidate)));
      const fresh = candidates.filter((candidate) => !known.has(candidateKey(candidate)));
      if (fresh.length === 0) {
        store.set((state) => withNotice(state, note('These candidates are already in the table.')));
        return;
      }
      history.remember();
      const rows = fresh.map((candidate) => ({
        id: freshId('c'),
        candidate,
        progress: { kind: 'waiting' as const },
        grey: null,
      }));
      store.set((state) => ({
        ...withActive(state, (one) => ({ ...one, rows: [...one.rows, ...rows] })),
        view: { ...state.view, chosen: record.rows.length },
        prediction: null,
      }));
      jobs.fitWaiting();
    },
  };
}
