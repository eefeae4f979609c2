import type { Candidate } from '../../../workers/contract/candidate.ts';
import type { Fit } from '../../../workers/contract/fit.ts';
import type { CoreClient } from '../../workerClient/clients.ts';
import type { AppState, RecordState, Row } from '../appState.ts';
import { shownFit } from '../selectors.ts';
import { candidateKey } from '../startingCandidates.ts';
import type { Store } from '../store.ts';
import { activeRecord, isUnderWay, waitingRow, withProgress, withRecord, withRow } from '../updates.ts';

/** Seed of every search, carried in each fit. */
const seed = 1;
/** A larger candidate this far below a smaller one nested in it is searched again from there. */
const shortfall = 1e-6;

export interface Jobs {
  /** Fits every row of the active record that waits. */
  readonly fitWaiting: () => void;
  /** Ends all jobs; rows under way wait again. */
  readonly cancel: () => void;
  readonly abortRow: (rowId: string) => void;
  readonly predict: (horizon: number) => void;
  /** Intervals of a row's fit, where they are not known yet. */
  readonly wantIntervals: (rowId: string) => void;
}

interface Ticket {
  readonly recordId: string;
  readonly rowId: string;
  readonly key: string;
  readonly seriesHash: string;
}

/** Whether an answer may still be written: its row asks for just this candidate on just this record. */
function stillWanted(state: AppState, ticket: Ticket): Row | null {
  const record = state.records.find(({ id }) => id === ticket.recordId);
  const row = record?.rows.find(({ id }) => id === ticket.rowId);
  if (record === undefined || row === undefined || record.seriesHash !== ticket.seriesHash) return null;
  return candidateKey(row.candidate) === ticket.key ? row : null;
}

/** @param wantIntervals asks for the intervals of a row that has been judged */
export function createJobs(store: Store, client: CoreClient, wantIntervals: (rowId: string) => void): Jobs {
  const set = (ticket: Ticket, change: (row: Row) => Row) =>
    store.set((state) =>
      stillWanted(state, ticket) === null
        ? state
        : withRecord(state, ticket.recordId, (record) => withRow(record, ticket.rowId, change)),
    );

  const fitRow = async (record: RecordState, row: Row): Promise<void> => {
    if (record.source.kind !== 'loaded') return;
    const { series, columns } = record.source.record;
    const ticket = {
      recordId: record.id,
      rowId: row.id,
      key: candidateKey(row.candidate),
      seriesHash: record.seriesHash,
    };
    set(ticket, (one) => withProgress(one, { kind: 'fitting' }));
    const values = series.values;
    const request = {
      values,
      candidate: row.candidate,
      seed,
      window: record.window,
      columns,
      neighbours: fitsOf(record),
      seriesHash: record.seriesHash,
    };
    // The quick answer is shown at once; the wide search goes on and corrects it where it finds a higher maximum.
    const quick = await client.fit(row.id, { ...request, effort: 'first' });
    if (quick.ok) set(ticket, (one) => withProgress(one, { kind: 'fitted', fit: quick.value, judgement: null }));
    const answer = quick.ok ? await client.fit(row.id, { ...request, effort: 'thorough' }) : quick;
    if (!answer.ok) {
      if (answer.failure.code !== 'cancelled')
        set(ticket, (one) => withProgress(one, { kind: 'failed', failure: answer.failure }));
      return;
    }
    const fit = answer.value;
    set(ticket, (one) => withProgress(one, { kind: 'fitted', fit, judgement: null }));
    const { coverage } = store.get().view;
    const judged = await client.diagnose(row.id, { fit, values, columns, coverage });
    if (judged.ok) set(ticket, (one) => withProgress(one, { kind: 'fitted', fit, judgement: judged.value }));
    else if (judged.failure.code !== 'cancelled')
      set(ticket, (one) => withProgress(one, { kind: 'failed', failure: judged.failure }));
    searchAgain(record.id);
    await compareRows();
    wantIntervals(row.id);
  };

  /** A larger candidate may never have the lower ln L: it is searched again from the smaller one's parameters. */
  const searchAgain = (recordId: string) => {
    const record = store.get().records.find(({ id }) => id === recordId);
    if (record === undefined) return;
    const fits = fitsOf(record);
    for (const row of record.rows) {
      if (row.progress.kind !== 'fitted' || row.progress.judgement === null) continue;
      const own = row.progress.fit;
      if (own.outcome.status === 'closedForm') continue;
      const better = fits.some(
        (fit) => mayHold(fit.candidate, own.candidate) && fit.logLikelihood > own.logLikelihood + shortfall,
      );
      if (better) void fitRow(record, row);
    }
  };

  let comparisons = 0;
  const compareRows = async () => {
    comparisons += 1;
    const own = comparisons;
    const record = activeRecord(store.get());
    if (record === null) return;
    // Rows on their way take part with their old result, so that they keep their place among the others.
    const rows = record.rows.filter((row) => shownFit(row) !== null);
    const answer = await client.compare(
      `compare-${own}`,
      rows.map((row) => shownFit(row)!.fit),
    );
    if (answer.ok && own === comparisons)
      store.set((state) => {
        const comparison = { rowIds: rows.map(({ id }) => id), groups: answer.value };
        return { ...state, comparison, view: withChoice(state, comparison) };
      });
  };

  const fitWaiting = () => {
    const record = activeRecord(store.get());
    if (record === null || record.source.kind !== 'loaded') return;
    const waiting = record.rows.filter(({ progress }) => progress.kind === 'waiting');
    if (waiting.length === 0) void compareRows();
    for (const row of waiting) void fitRow(record, row);
  };

  const predict = (horizon: number) => {
    const state = store.get();
    const record = activeRecord(state);
    const row = record?.rows[state.view.chosen ?? -1];
    if (record?.source.kind !== 'loaded' || row?.progress.kind !== 'fitted') return;
    const { fit } = row.progress;
    const { values } = record.source.record.series;
    void client.predict('predict', { fit, values, horizon, coverage: state.view.coverage }).then((answer) => {
      store.set((now) => {
        if (!answer.ok) return now;
        return { ...now, prediction: { rowId: row.id, fit, prediction: answer.value } };
      });
    });
  };

  return {
    fitWaiting,
    predict,
    wantIntervals,
    abortRow: (rowId) => client.abort(rowId),
    cancel: () => {
      client.abortAll();
      store.set((state) => ({
        ...state,
        checks: state.checks.filter(({ answer }) => answer !== null),
        records: state.records.map((record) => ({
          ...record,
          rows: record.rows.map((row) => (isUnderWay(row) ? waitingRow(row) : row)),
        })),
      }));
    },
  };
}

const ranks = ['sound', 'doubtful', 'unsound'] as const;

/** Until the person chooses, the row with the best verdict is shown, the best of its group by criteria, once all are judged. */
function withChoice(state: AppState, { rowIds, groups }: AppState['comparison']): AppState['view'] {
  const all = activeRecord(state)?.rows ?? [];
  if (state.view.chosen !== null || rowIds.length < all.length) return state.view;
  const ranked = groups.flatMap(({ members }) => members.map(({ index }) => rowIds[index]));
  const rankOf = (id: string | undefined) => {
    const progress = all.find((row) => row.id === id)?.progress;
    return progress?.kind === 'fitted' && progress.judgement !== null
      ? ranks.indexOf(progress.judgement.verdict.standing)
      : -1;
  };
  if (ranked.some((id) => rankOf(id) < 0)) return state.view;
  const best = ranked.reduce((one, other) => (rankOf(other) < rankOf(one) ? other : one), ranked[0]);
  return { ...state.view, chosen: all.findIndex(({ id }) => id === best) };
}

function fitsOf(record: RecordState): Fit[] {
  return record.rows.flatMap(({ progress }) => (progress.kind === 'fitted' ? [progress.fit] : []));
}

/** Whether the smaller candidate may be a special case of the larger, by orders and level; the core decides exactly. */
function mayHold(smaller: Candidate, larger: Candidate): boolean {
  const { order: low } = smaller;
  const { order: high } = larger;
  const held = Object.values(larger.zeroLags).some((lags: readonly number[]) => lags.length > 0);
  return (
    !held &&
    smaller.estimator === 'exact' &&
    larger.estimator === 'exact' &&
    low.d === high.d &&
    low.D === high.D &&
    (low.s === high.s || low.P + low.D + low.Q === 0) &&
    low.p <= high.p &&
    low.q <= high.q &&
    low.P <= high.P &&
    low.Q <= high.Q &&
    (smaller.level === larger.level || smaller.level === 'none') &&
    JSON.stringify([smaller.transform, smaller.regressors]) === JSON.stringify([larger.transform, larger.regressors])
  );
}
