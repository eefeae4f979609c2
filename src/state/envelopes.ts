import type { Envelope } from '../../workers/contract/envelope.ts';
import { currentVersion } from '../sessionUrl/migrate.ts';
import type { AppState, RecordState } from './appState.ts';
import { freshId } from './updates.ts';

/** The session as it is stored and sent; null where there is no record. */
export function envelopeOf({ records, active, view }: AppState): Envelope | null {
  if (active === null) return null;
  return {
    format: 'lagwright-session',
    version: currentVersion,
    records: records.map(({ id, fileHash, seriesHash, dialect, repairs, window, holdOut, rows }) => ({
      id,
      fileHash,
      seriesHash,
      dialect,
      repairs,
      window,
      holdOut,
      candidates: rows.map(({ candidate }) => candidate),
    })),
    active,
    view,
  };
}

/** Records of a session from outside: their candidates wait, and their readings are wanted. */
export function recordsOf(envelope: Envelope): RecordState[] {
  return envelope.records.map(({ candidates, ...entry }) => ({
    ...entry,
    rows: candidates.map((candidate) => ({
      id: freshId('c'),
      candidate,
      progress: { kind: 'waiting' as const },
      grey: null,
    })),
    source: { kind: 'wanted' as const },
  }));
}
