import { useState } from 'react';
import type { Row } from '../../state/appState.ts';
import { failureText } from '../../format/failureText.ts';
import { candidateName, estimatorName, orderNotation } from '../../format/notation.ts';
import { formatFixed, formatNumber, formatPValue } from '../../format/numbers.ts';
import { shownEvidence, shownFit, standingOf, whitenessOf } from '../../state/selectors.ts';
import { useActions, useAppState } from '../../state/useApp.ts';
import { LevelSwitch } from './LevelSwitch.tsx';
import { OrderEditor } from './OrderEditor.tsx';
import { ResidualStrip } from './ResidualStrip.tsx';

interface RowProps {
  readonly row: Row;
  readonly chosen: boolean;
  readonly columns: readonly string[];
}

/** One candidate: notation, level switch, criteria, what is left over, verdict. A click or Enter chooses it. */
export function CandidateRow({ row, chosen, columns }: RowProps) {
  const actions = useActions();
  const [editing, setEditing] = useState(false);
  const { candidate, progress } = row;
  const old = shownFit(row)?.old === true;
  const shown = shownEvidence(row);
  const judgement = shown?.judgement ?? null;
  const failure = progress.kind === 'failed' ? failureText(progress.failure) : null;
  const state = progress.kind === 'fitted' && progress.judgement === null ? 'searching on' : progress.kind;

  return (
    <>
      <tr
        className={`candidate-row ${chosen ? 'chosen' : ''}`}
        aria-current={chosen ? 'true' : undefined}
        onClick={() => actions.choose(row.id)}
      >
        <th scope="row">
          <button
            type="button"
            className="name"
            aria-label={`Choose ${candidateName(candidate)}`}
            onClick={() => actions.choose(row.id)}
          >
            {orderNotation(candidate.order)}
          </button>
          {candidate.estimator !== 'exact' && (
            <span className="quiet small"> {estimatorName(candidate.estimator)}</span>
          )}
          <button
            type="button"
            className="edit"
            aria-expanded={editing}
            aria-label={`Edit ${candidateName(candidate)}`}
            onClick={(event) => {
              event.stopPropagation();
              setEditing(!editing);
            }}
          >
            {editing ? 'close' : 'edit'}
          </button>
        </th>
        <td>
          <LevelSwitch row={row} />
        </td>
        {columns.map((name) => (
          <td key={name} className={old ? 'number grey' : 'number'}>
            <Cell name={name} row={row} />
          </td>
        ))}
        <td className="strip-column">
          <ResidualStrip correlogram={judgement?.evidence.correlogram ?? null} />
        </td>
        <td className="standing">
          {judgement !== null && (
            <span className={`mark ${judgement.verdict.standing} ${shown?.old === true ? 'grey' : ''}`}>
              {judgement.verdict.standing}
            </span>
          )}
          <span className={`state ${state}`}>{state}</span>
          {shown?.old === true && <span className="grey">numbers before the last change</span>}
        </td>
      </tr>
      {failure !== null && (
        <tr className="reason-row">
          <td colSpan={4 + columns.length}>
            <strong>{failure.what}</strong> {failure.todo}
          </td>
        </tr>
      )}
      {editing && (
        <tr className="editor-row">
          <td colSpan={4 + columns.length}>
            <OrderEditor row={row} />
          </td>
        </tr>
      )}
    </>
  );
}

function Cell({ name, row }: { readonly name: string; readonly row: Row }) {
  const comparison = useAppState((state) => state.comparison);
  const fit = shownFit(row)?.fit;
  if (fit === undefined) return <>–</>;
  switch (name) {
    case 'lnL':
      return <>{formatFixed(fit.logLikelihood, 2)}</>;
    case 'sigma':
      return <>{formatNumber(Math.sqrt(fit.parameters.innovationVariance), 4)}</>;
    case 'k':
      return <>{fit.parameterCount}</>;
    case 'aic':
    case 'aicc':
    case 'bic':
    case 'hq':
      return <>{formatFixed(fit.criteria[name], 2)}</>;
    case 'delta':
      return <>{formatFixed(standingOf(comparison, row.id)?.differences.aicc ?? null, 2)}</>;
    case 'whiteness':
      return <>{formatPValue(whitenessOf(row))}</>;
    default:
      return <>–</>;
  }
}
