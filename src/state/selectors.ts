import type { Criteria, Fit } from '../../workers/contract/fit.ts';
import type { ComparisonGroup } from '../../workers/contract/selection.ts';
import type { Judgement } from '../../workers/contract/diagnostics.ts';
import type { AppState, FitIntervals, Row } from './appState.ts';
import { activeRecord } from './updates.ts';

export { activeRecord } from './updates.ts';

const noRows: readonly Row[] = [];

export function activeRows(state: AppState): readonly Row[] {
  return activeRecord(state)?.rows ?? noRows;
}

export function chosenRow(state: AppState): Row | null {
  return activeRows(state)[state.view.chosen ?? -1] ?? null;
}

/** Intervals of a fit; null before they are known. */
export function intervalsOf(state: AppState, fit: Fit | null): FitIntervals['answer'] | null {
  return state.intervals.find((each) => each.fit === fit)?.answer ?? null;
}

/** The fit a row shows: its own, or the one before the last edit while the new one is on its way. */
export function shownFit({ progress, grey }: Row): { readonly fit: Fit; readonly old: boolean } | null {
  if (progress.kind === 'fitted') return { fit: progress.fit, old: false };
  return progress.kind === 'failed' || grey === null ? null : { fit: grey.fit, old: true };
}

/** A judged fit as the panels show it; `old` where it is the one before the last edit. */
export interface ShownEvidence {
  readonly fit: Fit;
  readonly judgement: Judgement;
  readonly old: boolean;
}

/** The evidence a row shows, with the fit it was computed from. */
export function shownEvidence(row: Row | null): ShownEvidence | null {
  if (row === null || row.progress.kind === 'failed') return null;
  const { progress, grey } = row;
  if (progress.kind === 'fitted' && progress.judgement !== null)
    return { fit: progress.fit, judgement: progress.judgement, old: false };
  return grey === null || grey.judgement === null ? null : { fit: grey.fit, judgement: grey.judgement, old: true };
}

/** How many rows of the active record have come how far. */
export function progressCounts(rows: readonly Row[]): { done: number; failed: number; busy: number; waiting: number } {
  const counts = { done: 0, failed: 0, busy: 0, waiting: 0 };
  for (const { progress } of rows) {
    if (progress.kind === 'failed') counts.failed += 1;
    else if (progress.kind === 'waiting') counts.waiting += 1;
    else if (progress.kind === 'fitting' || progress.judgement === null) counts.busy += 1;
    else counts.done += 1;
  }
  return counts;
}

/** Differences of a row's criteria to the best comparable row, and its group; null before they are known. */
export function standingOf(
  comparison: AppState['comparison'],
  rowId: string,
): { readonly group: ComparisonGroup; readonly differences: Criteria; readonly weight: number } | null {
  const index = comparison.rowIds.indexOf(rowId);
  for (const group of comparison.groups) {
    const member = group.members.find((one) => one.index === index);
    if (member !== undefined) return { group, differences: member.differences, weight: member.weight };
  }
  return null;
}

/** Value of a row in a column, for sorting; null goes last. */
export function sortValue(row: Row, column: string, comparison: AppState['comparison']): number | string | null {
  const { order, level, estimator } = row.candidate;
  if (column === 'notation') {
    const { p, d, q, P, D, Q, s } = order;
    return [d + D, p + q + P + Q, p, d, q, P, D, Q, s].map((value) => String(value).padStart(4, '0')).join();
  }
  if (column === 'level') return level;
  if (column === 'estimator') return estimator;
  if (column === 'state') return row.progress.kind;
  // A row being fitted again keeps its place by the old result until the new one is there.
  const fit = shownFit(row)?.fit;
  if (fit === undefined) return null;
  const judgement = shownEvidence(row)?.judgement ?? null;
  switch (column) {
    case 'lnL':
      return fit.logLikelihood;
    case 'sigma':
      return fit.parameters.innovationVariance;
    case 'k':
      return fit.parameterCount;
    case 'aic':
    case 'aicc':
    case 'bic':
    case 'hq':
      return fit.criteria[column];
    case 'delta':
      return standingOf(comparison, row.id)?.differences.aicc ?? null;
    case 'whiteness':
      return judgement === null ? null : whitenessOf(row);
    case 'leftOver':
      return judgement === null ? null : Math.max(...judgement.evidence.correlogram.correlations.map(Math.abs));
    case 'verdict':
      return judgement === null ? null : ['sound', 'doubtful', 'unsound'].indexOf(judgement.verdict.standing);
    default:
      return null;
  }
}

/** Joint p-value of the portmanteau reading that the verdict rests on; null where there is none. */
export function whitenessOf(row: Row): number | null {
  const item = shownEvidence(row)?.judgement.verdict.items.find(
    ({ reason }) => reason === 'white' || reason === 'notWhite',
  );
  return item?.numbers['p'] ?? null;
}

/** Rows in the order of the view, with their index among the record's rows; ties keep the order they were added in. */
export function sortedRows(
  rows: readonly Row[],
  sort: AppState['view']['sort'],
  comparison: AppState['comparison'],
): readonly { readonly row: Row; readonly index: number }[] {
  const keyed = rows.map((row, index) => ({ row, index, value: sortValue(row, sort.column, comparison) }));
  const sign = sort.descending ? -1 : 1;
  return keyed.sort((a, b) => {
    if (a.value === b.value) return a.index - b.index;
    if (a.value === null) return 1;
    if (b.value === null) return -1;
    return a.value < b.value ? -sign : sign;
  });
}
