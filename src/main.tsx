import { createRoot } from 'react-dom/client';
import { App } from './App.tsx';
import { startAutosave, savedSession } from './state/actions/autosave.ts';
import { createActions } from './state/actions/createActions.ts';
import { initialState } from './state/initialState.ts';
import { browserPlatform } from './state/actions/platform.ts';
import { createStore } from './state/store.ts';
import { openSession } from './state/actions/openSession.ts';
import { AppContext } from './state/useApp.ts';
import { createCoreClient } from './workerClient/clients.ts';
import './styles/tokens.css';
import './styles/sheet.css';

const store = createStore(initialState);
const { actions, links } = createActions(store, createCoreClient(), browserPlatform);
startAutosave(store);

const root = document.getElementById('root');
if (root === null) throw new Error('index.html has no element #root');
createRoot(root).render(
  <AppContext value={{ store, actions }}>
    <App />
  </AppContext>,
);

/** The link has been opened; from here on the browser's own store keeps the session, and a reload must not go back to the link. */
const forgetHash = () => history.replaceState(null, '', location.pathname + location.search);

void openSession(store, actions, links, savedSession, location.hash).then(forgetHash);
addEventListener('hashchange', () => {
  if (location.hash.length > 1) void links.openHash(location.hash).then(forgetHash);
});
