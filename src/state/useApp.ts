import { createContext, useContext, useSyncExternalStore } from 'react';
import type { Actions } from './actionTypes.ts';
import type { AppState } from './appState.ts';
import type { Store } from './store.ts';

/** The store and actions of the page, given by `main.tsx`. */
export const AppContext = createContext<{ readonly store: Store; readonly actions: Actions } | null>(null);

function useContextValue() {
  const value = useContext(AppContext);
  if (value === null) throw new Error('The page is drawn without its store');
  return value;
}

/** A part of the state; the panel is drawn again when that part changes. The selector must return parts, not new objects. */
export function useAppState<T>(selector: (state: AppState) => T): T {
  const { store } = useContextValue();
  return useSyncExternalStore(store.subscribe, () => selector(store.get()));
}

export function useActions(): Actions {
  return useContextValue().actions;
}
