import type { AppState, Notice, RecordState, Row, RowProgress } from './appState.ts';
import type { Failure } from '../../workers/contract/failures.ts';

/** Pure changes of the state, shared by the actions. */

export function activeRecord(state: AppState): RecordState | null {
  return state.records.find((record) => record.id === state.active) ?? null;
}

export function withRecord(state: AppState, id: string, change: (record: RecordState) => RecordState): AppState {
  return { ...state, records: state.records.map((record) => (record.id === id ? change(record) : record)) };
}

/** Changes the active record; nothing where there is none. */
export function withActive(state: AppState, change: (record: RecordState) => RecordState): AppState {
  return state.active === null ? state : withRecord(state, state.active, change);
}

export function withRow(record: RecordState, rowId: string, change: (row: Row) => Row): RecordState {
  return { ...record, rows: record.rows.map((row) => (row.id === rowId ? change(row) : row)) };
}

/** Fitting, or fitted and still being searched and checked. */
export function isUnderWay({ progress }: Row): boolean {
  return progress.kind === 'fitting' || (progress.kind === 'fitted' && progress.judgement === null);
}

/** A row that waits for its result again, keeping the old one in grey. */
export function waitingRow(row: Row): Row {
  const { progress, grey } = row;
  // A result that is not judged yet does not replace one that is.
  const done = progress.kind === 'fitted' && (progress.judgement !== null || grey === null);
  const old = done ? { fit: progress.fit, judgement: progress.judgement } : grey;
  return { ...row, progress: { kind: 'waiting' }, grey: old };
}

export function withProgress(row: Row, progress: RowProgress): Row {
  return progress.kind === 'fitted' && progress.judgement !== null
    ? { ...row, progress, grey: null }
    : { ...row, progress };
}

let count = 0;
/** An identifier that is new in this page. */
export function freshId(prefix: string): string {
  count += 1;
  return `${prefix}${Date.now().toString(36)}${count.toString(36)}`;
}

export function withNotice(state: AppState, notice: Omit<Notice, 'id'>): AppState {
  const same = state.notices.filter(({ text, failure }) => text !== notice.text || failure !== notice.failure);
  return { ...state, notices: [...same.slice(-3), { ...notice, id: freshId('n') }] };
}

export function trouble(failure: Failure, text = ''): Omit<Notice, 'id'> {
  return { tone: 'trouble', failure, text };
}

export function note(text: string): Omit<Notice, 'id'> {
  return { tone: 'note', failure: null, text };
}
