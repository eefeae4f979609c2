import type { Fit } from '../../../workers/contract/fit.ts';
import type { SweepRange, SweepReport } from '../../../workers/contract/selection.ts';
import type { CoreClient } from '../../workerClient/clients.ts';
import type { SweepState } from '../appState.ts';
import { chosenRow } from '../selectors.ts';
import { candidateKey, plainCandidate } from '../startingCandidates.ts';
import type { Store } from '../store.ts';
import { activeRecord } from '../updates.ts';

const seed = 1;

export interface SweepJobs {
  readonly sweep: (range: SweepRange) => void;
  readonly stop: () => void;
}

/** Sweeps of the active record, one at a time, shared out over the pool. */
export function createSweepJobs(store: Store, client: CoreClient): SweepJobs {
  let runs = 0;

  const change = (run: number, part: (sweep: SweepState) => SweepState) => {
    if (run !== runs) return;
    store.set((state) => (state.sweep === null ? state : { ...state, sweep: part(state.sweep) }));
  };

  const end = () => {
    for (let part = 0; part < client.workers; part += 1) client.abort(`sweep-${part}`);
  };

  const run = async (range: SweepRange): Promise<void> => {
    end();
    runs += 1;
    const own = runs;
    const state = store.get();
    const record = activeRecord(state);
    if (record?.source.kind !== 'loaded') return;
    const like = chosenRow(state)?.candidate ?? plainCandidate({}, 'none');
    const begun = { recordId: record.id, range, mode: 'all', size: 0, fits: [], failed: 0, passedOver: 0 } as const;
    store.set((now) => ({ ...now, sweep: { ...begun, running: true, ranking: null, failure: null } }));
    const planned = await client.planSweep('sweep-plan', range, { ...like, estimator: 'exact' }, client.workers);
    if (!planned.ok) {
      change(own, (sweep) => ({ ...sweep, running: false, failure: planned.failure }));
      return;
    }
    const { mode, size, parts } = planned.value;
    change(own, (sweep) => ({ ...sweep, mode, size }));
    const { series, columns } = record.source.record;
    const take = ({ fits, failed, passedOver }: SweepReport) =>
      change(own, (sweep) => ({
        ...sweep,
        fits: withNew(sweep.fits, fits),
        failed: sweep.failed + failed,
        passedOver: sweep.passedOver + passedOver,
      }));
    const { window, seriesHash } = record;
    const answers = await Promise.all(
      parts.map((candidates, part) =>
        client.sweep(
          `sweep-${part}`,
          { values: series.values, columns, window, candidates, mode, range, seed, seriesHash },
          take,
        ),
      ),
    );
    const failure = answers.flatMap((answer) => (answer.ok ? [] : [answer.failure]))[0] ?? null;
    const fits = own === runs ? (store.get().sweep?.fits ?? []) : [];
    const ranked = fits.length > 0 ? await client.rankSweep('sweep-rank', fits) : null;
    change(own, (sweep) => ({
      ...sweep,
      running: false,
      ranking: ranked?.ok === true ? ranked.value : null,
      failure: failure?.code === 'cancelled' ? null : failure,
    }));
  };

  return { sweep: (range) => void run(range), stop: end };
}

/** A candidate fitted again takes the place of its earlier fit. */
function withNew(fits: readonly Fit[], more: readonly Fit[]): Fit[] {
  const keys = new Set(more.map(({ candidate }) => candidateKey(candidate)));
  return [...fits.filter(({ candidate }) => !keys.has(candidateKey(candidate))), ...more];
}
