import type { View } from '../../workers/contract/envelope.ts';
import type { AppState } from './appState.ts';

/** Columns of the candidate table in the order they are shown at first. */
export const defaultColumns = ['k', 'lnL', 'aicc', 'bic', 'delta', 'whiteness'] as const;

export const initialView: View = {
  chosen: null,
  sort: { column: 'aicc', descending: false },
  columns: [...defaultColumns],
  signs: 'plus',
  coverage: 0.95,
};

export const initialState: AppState = {
  records: [],
  active: null,
  view: initialView,
  arrival: null,
  notices: [],
  undoDepth: 0,
  redoDepth: 0,
  comparison: { rowIds: [], groups: [] },
  prediction: null,
  picked: null,
  sweep: null,
  intervals: [],
  checks: [],
  forensics: null,
  opening: true,
};
