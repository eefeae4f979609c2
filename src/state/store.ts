import type { AppState } from './appState.ts';

/** The one store: a value, its readers, and one way to change it. */
export interface Store {
  readonly get: () => AppState;
  readonly set: (change: (state: AppState) => AppState) => void;
  readonly subscribe: (listener: () => void) => () => void;
}

export function createStore(initial: AppState): Store {
  let state = initial;
  const listeners = new Set<() => void>();
  return {
    get: () => state,
    set: (change) => {
      const next = change(state);
      if (next === state) return;
      state = next;
      for (const listener of [...listeners]) listener();
    },
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
}
