import type { AppState } from './appState.ts';

/** Where a field of the state may be stored: in the session link, in the browser's own store, or nowhere. */
interface Places {
  readonly link: boolean;
  readonly browser: boolean;
}

/** A row for every field: a new field of the state does not compile until it says where it may go. */
export const persistedFields: { readonly [Field in keyof AppState]: Places } = {
  records: { link: true, browser: true },
  active: { link: true, browser: true },
  view: { link: true, browser: true },
  arrival: { link: false, browser: false },
  notices: { link: false, browser: false },
  undoDepth: { link: false, browser: false },
  redoDepth: { link: false, browser: false },
  comparison: { link: false, browser: false },
  prediction: { link: false, browser: false },
  picked: { link: false, browser: false },
  sweep: { link: false, browser: false },
  intervals: { link: false, browser: false },
  checks: { link: false, browser: false },
  forensics: { link: false, browser: false },
  opening: { link: false, browser: false },
};
