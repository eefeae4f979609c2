import type { Fit } from '../../../workers/contract/fit.ts';
import type { CoreClient } from '../../workerClient/clients.ts';
import type { IntervalCheck } from '../appState.ts';
import { chosenRow } from '../selectors.ts';
import type { Store } from '../store.ts';
import { activeRecord } from '../updates.ts';

/** Seed of the points and of the simulated records, carried in each answer. */
const seed = 1;
/** Answers kept: they belong to fits, which undo brings back. */
const kept = 80;
/** Records longer than this get their intervals when their row is chosen, not before: they take seconds. */
const long = 20_000;

export interface IntervalJobs {
  readonly want: (rowId: string) => void;
  readonly check: (about: string) => void;
  readonly stopCheck: (about: string) => void;
}

/** Intervals of fits: at once by weighing, on request by simulation. */
export function createIntervalJobs(store: Store, client: CoreClient): IntervalJobs {
  const asked = new WeakSet<Fit>();

  const readingsFor = () => {
    const record = activeRecord(store.get());
    if (record?.source.kind !== 'loaded') return null;
    const { series, columns } = record.source.record;
    return { values: series.values, columns };
  };

  const want = (rowId: string): void => {
    const state = store.get();
    const row = activeRecord(state)?.rows.find(({ id }) => id === rowId);
    const readings = readingsFor();
    if (row?.progress.kind !== 'fitted' || row.progress.judgement === null || readings === null) return;
    const { fit } = row.progress;
    const waits = fit.readingsUsed > long && chosenRow(state)?.id !== rowId;
    if (fit.candidate.estimator !== 'exact' || waits || asked.has(fit)) return;
    asked.add(fit);
    const { coverage } = state.view;
    void client.intervals(`intervals-${rowId}`, { fit, ...readings, coverage, seed }).then((answer) => {
      if (!answer.ok && answer.failure.code === 'cancelled') asked.delete(fit);
      else store.set((now) => ({ ...now, intervals: [{ fit, answer }, ...now.intervals].slice(0, kept) }));
    });
  };

  const place = (check: IntervalCheck | null, fit: Fit, about: string) =>
    store.set((state) => ({
      ...state,
      checks: [
        ...(check === null ? [] : [check]),
        ...state.checks.filter((other) => other.fit !== fit || other.about !== about),
      ].slice(0, kept),
    }));

  const check = (about: string): void => {
    const state = store.get();
    const row = chosenRow(state);
    const readings = readingsFor();
    if (row?.progress.kind !== 'fitted' || readings === null) return;
    const { fit } = row.progress;
    const { coverage } = state.view;
    place({ fit, about, fraction: 0, answer: null }, fit, about);
    // A report may come after the answer: it must not take its place.
    const isAwaited = () =>
      store.get().checks.some((one) => one.fit === fit && one.about === about && one.answer === null);
    const progress = (fraction: number) => {
      if (isAwaited()) place({ fit, about, fraction, answer: null }, fit, about);
    };
    void client.invert(`check-${about}`, { fit, ...readings, about, coverage, seed }, progress).then((answer) => {
      if (!answer.ok && answer.failure.code === 'cancelled') place(null, fit, about);
      else if (isAwaited()) place({ fit, about, fraction: 1, answer }, fit, about);
    });
  };

  return { want, check, stopCheck: (about) => client.abort(`check-${about}`) };
}
