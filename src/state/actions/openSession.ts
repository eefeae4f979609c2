import type { Payload } from '../../sessionUrl/encodeSession.ts';
import type { Actions } from '../actionTypes.ts';
import type { Links } from './links.ts';
import type { Store } from '../store.ts';

/** The record the page opens with when there is neither a link nor an earlier session. */
export const firstExample = 'neutralisation-ph.csv';

/**
 * What the page shows first: the session of the link; else the session of last time; else the first example, fitted. A
 * damaged link says so and the page goes on with the next.
 */
export async function openSession(
  store: Store,
  actions: Actions,
  links: Links,
  saved: () => Promise<Payload | null>,
  hash: string,
): Promise<void> {
  const opened = hash.length > 1 && (await links.openHash(hash));
  if (!opened) {
    const last = await saved();
    if (last !== null) await links.openSessionText(JSON.stringify(last));
    else await actions.openExample(firstExample);
  }
  store.set((state) => ({ ...state, opening: false }));
}
