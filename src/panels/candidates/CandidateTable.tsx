import { Fragment, useMemo } from 'react';
import type { Candidate } from '../../../workers/contract/candidate.ts';
import type { ComparisonGroup } from '../../../workers/contract/selection.ts';
import { counted } from '../../format/numbers.ts';
import type { RecordState, Row } from '../../state/appState.ts';
import { progressCounts, sortedRows, standingOf } from '../../state/selectors.ts';
import { candidateKey, plainCandidate } from '../../state/startingCandidates.ts';
import { useActions, useAppState } from '../../state/useApp.ts';
import { CandidateRow } from './CandidateRow.tsx';
import { choosable } from './columns.ts';
import { SortHeading } from './SortHeading.tsx';

const differs: Record<ComparisonGroup['differsIn'][number], string> = {
  readings: 'other readings',
  differencing: 'other differencing',
  likelihood: 'another kind of likelihood',
  events: 'events found by a search',
};

/** The candidates, sortable by every column, grouped by what may be compared. */
export function CandidateTable({ record }: { readonly record: RecordState }) {
  const actions = useActions();
  const view = useAppState((state) => state.view);
  const comparison = useAppState((state) => state.comparison);
  const { rows } = record;
  const counts = progressCounts(rows);
  const shown = view.columns.filter((name) => choosable[name] !== undefined);
  const groups = useMemo(() => {
    const sorted = sortedRows(rows, view.sort, comparison);
    const keys = [...comparison.groups.map(({ key }) => key), ''];
    return keys
      .map((key) => ({
        key,
        group: comparison.groups.find((one) => one.key === key) ?? null,
        members: sorted.filter(({ row }) => (standingOf(comparison, row.id)?.group.key ?? '') === key),
      }))
      .filter(({ members }) => members.length > 0);
  }, [rows, view.sort, comparison]);
  const busy = counts.busy > 0 && record.source.kind === 'loaded';

  const addNext = () => {
    const next = nextCandidate(rows, rows[view.chosen ?? 0]?.candidate ?? plainCandidate({}, 'mean'));
    if (next !== null) actions.addCandidate(next);
  };

  return (
    <section className="candidates" id="candidates" aria-labelledby="candidates-name">
      <div className="panel-head">
        <h2 id="candidates-name">Candidates</h2>
        <span className="quiet" role="status">
          {busy
            ? `fitting: ${counts.done} of ${rows.length} done`
            : `${counts.done} of ${rows.length} fitted${counts.failed > 0 ? `, ${counts.failed} failed` : ''}${counts.waiting > 0 ? `, ${counts.waiting} waiting` : ''}`}
        </span>
        {busy && <progress max={rows.length} value={counts.done} aria-label="Fitting" />}
        <span className="spring" />
        <button type="button" className="main-action" onClick={addNext}>
          Add candidate
        </button>
        <button type="button" onClick={actions.fitAll} disabled={record.source.kind !== 'loaded' || busy}>
          Fit all
        </button>
        <button type="button" onClick={actions.cancel} disabled={!busy}>
          Cancel
        </button>
        <ColumnChoice shown={shown} />
      </div>
      <div className="scroll">
        <table role="table" aria-label="Candidates" className="candidate-table">
          <thead>
            <tr>
              <SortHeading name="notation" heading="Candidate" says="orders (p,d,q)×(P,D,Q) with season" />
              <SortHeading name="level" heading="Level" says="what is estimated beside the ARMA part" />
              {shown.map((name) => (
                <SortHeading
                  key={name}
                  name={name}
                  heading={choosable[name]!.heading}
                  says={choosable[name]!.says}
                  number
                />
              ))}
              <SortHeading name="leftOver" heading="left over" says="residual correlations; sorts by the largest" />
              <SortHeading name="verdict" heading="Verdict" says="sound, doubtful or unsound" />
            </tr>
          </thead>
          {groups.map(({ key, group, members }, at) => (
            <tbody key={key === '' ? 'none' : key}>
              {at > 0 && (
                <tr className="group-row">
                  <th scope="rowgroup" colSpan={4 + shown.length}>
                    {group === null
                      ? 'Not fitted'
                      : `Not to be compared with the rows above by criteria: ${group.differsIn.map((one) => differs[one]).join(', ')}`}
                  </th>
                </tr>
              )}
              {members.map(({ row, index }) => (
                <Fragment key={row.id}>
                  <CandidateRow row={row} chosen={index === view.chosen} columns={shown} />
                </Fragment>
              ))}
            </tbody>
          ))}
        </table>
      </div>
      <p className="quiet">
        {counted(rows.length, 'candidate')}. Criteria rest on ln L with all constants kept; k counts every estimated
        coefficient and σ².
      </p>
    </section>
  );
}

/** Steps in (p, q) from the chosen candidate, nearest first. */
const steps = [
  [1, 0],
  [0, 1],
  [1, 1],
  [2, 0],
  [0, 2],
  [2, 1],
  [1, 2],
  [2, 2],
  [3, 0],
  [3, 3],
] as const;

/** The nearest larger neighbour of a candidate that is not in the table yet. */
function nextCandidate(rows: readonly Row[], from: Candidate): Candidate | null {
  const taken = new Set(rows.map(({ candidate }) => candidateKey(candidate)));
  const { order } = from;
  const near = steps.map(([p, q]) => ({ ...from, order: { ...order, p: order.p + p, q: order.q + q } }));
  return near.find((candidate) => !taken.has(candidateKey(candidate))) ?? null;
}

/** Which columns are shown; kept in the session. */
function ColumnChoice({ shown }: { readonly shown: readonly string[] }) {
  const actions = useActions();
  return (
    <details className="drawer end">
      <summary>Columns</summary>
      <div className="drawer-body">
        {Object.entries(choosable).map(([name, { heading, says }]) => (
          <label key={name} className="check" title={says}>
            <input
              type="checkbox"
              checked={shown.includes(name)}
              onChange={(event) =>
                actions.changeView({
                  columns: Object.keys(choosable).filter((each) =>
                    each === name ? event.target.checked : shown.includes(each),
                  ),
                })
              }
            />
            {heading}
            <span className="quiet"> {says}</span>
          </label>
        ))}
      </div>
    </details>
  );
}
