import type { CoreClient } from '../../workerClient/clients.ts';
import type { Actions } from '../actionTypes.ts';
import { createArrivals } from './arrivals.ts';
import { createCandidateActions } from './candidateActions.ts';
import { createHistory } from './history.ts';
import { createSweepJobs } from './sweepJobs.ts';
import { createIntervalJobs } from './intervalJobs.ts';
import { createJobs } from './jobs.ts';
import { createLinks, type Links } from './links.ts';
import { createRepairs } from './repairs.ts';
import type { Platform } from './platform.ts';
import { createShapeActions } from './shapeActions.ts';
import { saveDossier } from './saveDossier.ts';
import type { Store } from '../store.ts';
import { trouble, withNotice } from '../updates.ts';

/** Ties the parts together. `links` is what start-up needs beside the actions. */
export function createActions(
  store: Store,
  client: CoreClient,
  platform: Platform,
): { actions: Actions; links: Links } {
  const history = createHistory(store);
  const sweepJobs = createSweepJobs(store, client);
  const intervalJobs = createIntervalJobs(store, client);
  const jobs = createJobs(store, client, intervalJobs.want);
  const arrivals = createArrivals(store, client, jobs, history, (text) => links.openSessionText(text));
  const links = createLinks(store, platform, arrivals, jobs, history);

  const openExample: Actions['openExample'] = async (name) => {
    const text = await platform.exampleByName(name);
    if (text === null) store.set((state) => withNotice(state, trouble({ code: 'exampleMissing', name })));
    else await arrivals.openRecordText(text, name, 'take', true);
  };

  const actions: Actions = {
    openFile: (file) => arrivals.openFiles([file]),
    openFiles: arrivals.openFiles,
    openText: async (text, name) => {
      if (!(await links.openSessionText(text))) await arrivals.openRecordText(text, name);
    },
    openExample,
    changeDialect: arrivals.changeDialect,
    acceptArrival: arrivals.acceptArrival,
    stopReading: arrivals.stopReading,
    dismissArrival: arrivals.dismissArrival,
    forgetRecord: arrivals.forgetRecord,
    ...createCandidateActions(store, jobs, history),
    pick: (index) => store.set((state) => ({ ...state, picked: index })),
    sweep: sweepJobs.sweep,
    stopSweep: sweepJobs.stop,
    checkInterval: intervalJobs.check,
    stopCheck: intervalJobs.stopCheck,
    ...createRepairs(store, client, jobs, history),
    ...createShapeActions(store, client, jobs, history),
    changeView: (part) => store.set((state) => ({ ...state, view: { ...state.view, ...part } })),
    undo: () => {
      history.undo();
      jobs.fitWaiting();
    },
    redo: () => {
      history.redo();
      jobs.fitWaiting();
    },
    dismissNotice: (id) =>
      store.set((state) => ({ ...state, notices: state.notices.filter((notice) => notice.id !== id) })),
    sessionLink: links.sessionLink,
    copySessionLink: links.copySessionLink,
    saveSessionFile: links.saveSessionFile,
    saveDossier: () => saveDossier(store, platform),
  };
  return { actions, links };
}
