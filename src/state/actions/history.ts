import type { AppState, RecordState } from '../appState.ts';
import type { Store } from '../store.ts';
import { isUnderWay, waitingRow } from '../updates.ts';

interface Snapshot {
  readonly records: readonly RecordState[];
  readonly active: string | null;
}

const MOST = 200;

/** Rows that were under way when they were remembered have lost their jobs: they wait again. */
function settled(record: RecordState): RecordState {
  return record.rows.some(isUnderWay)
    ? { ...record, rows: record.rows.map((row) => (isUnderWay(row) ? waitingRow(row) : row)) }
    : record;
}

/** Undo and redo over records, not over the view. */
export interface History {
  /** Call before an undoable change. */
  remember(): void;
  undo(): void;
  redo(): void;
  clear(): void;
}

export function createHistory(store: Store): History {
  let past: Snapshot[] = [];
  let future: Snapshot[] = [];
  const here = ({ records, active }: AppState): Snapshot => ({ records, active });
  const depths = () => ({ undoDepth: past.length, redoDepth: future.length });
  const move = (from: Snapshot[], to: Snapshot[]) => {
    const snapshot = from.pop();
    if (snapshot === undefined) return;
    to.push(here(store.get()));
    store.set((state) => ({ ...state, ...snapshot, records: snapshot.records.map(settled), ...depths() }));
  };
  return {
    remember: () => {
      past = [...past, here(store.get())].slice(-MOST);
      future = [];
      store.set((state) => ({ ...state, ...depths() }));
    },
    undo: () => move(past, future),
    redo: () => move(future, past),
    clear: () => {
      past = [];
      future = [];
      store.set((state) => ({ ...state, ...depths() }));
    },
  };
}
