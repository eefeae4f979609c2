import type { ReadRecord } from '../../../workers/contract/reading.ts';
import type { AppState, Arrival, RecordState } from '../appState.ts';
import { startingCandidates } from '../startingCandidates.ts';
import { activeRecord, freshId, withRecord } from '../updates.ts';

/** The wanted record of a link with its readings, raw and repaired: candidates as the link has them. */
export function filledRecord(
  state: AppState,
  wanted: RecordState,
  arrival: Arrival,
  raw: ReadRecord,
  record: ReadRecord,
  example: boolean,
): AppState {
  return withRecord(state, wanted.id, (one) => ({
    ...one,
    source: { kind: 'loaded', fileName: arrival.fileName, text: arrival.text, record, raw, example },
  }));
}

/** A new record in place of the old; candidates of a session that wanted another file go along. */
export function replacedRecord(state: AppState, arrival: Arrival, record: ReadRecord, example: boolean): AppState {
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
    source: { kind: 'loaded', fileName: arrival.fileName, text: arrival.text, record, raw: record, example },
  };
  return {
    ...state,
    records: [next],
    active: id,
    view: { ...state.view, chosen: kept === null ? null : state.view.chosen },
  };
}
