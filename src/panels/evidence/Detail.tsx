import { counted, formatFixed, formatNumber } from '../../format/numbers.ts';
import { warningText } from '../../format/warningText.ts';
import type { RecordState } from '../../state/appState.ts';
import { chosenRow } from '../../state/selectors.ts';
import { useAppState } from '../../state/useApp.ts';
import { RootTable } from './RootTable.tsx';

/** Roots of the chosen model, and how it was found. */
export function Detail({ record }: { readonly record: RecordState }) {
  const row = useAppState(chosenRow);
  if (row?.progress.kind !== 'fitted' || row.progress.judgement === null || record.source.kind !== 'loaded')
    return null;
  const { fit, judgement } = row.progress;
  const { roots } = judgement.evidence;
  const { axis } = record.source.record.series;
  const { outcome, criteria } = fit;
  const rivals = outcome.maxima.filter(({ admissible }) => admissible).slice(1);
  return (
    <div className="detail">
      <section aria-labelledby="roots-name" id="panel-roots">
        <h3 id="roots-name">Period against damping</h3>
        <RootTable roots={roots} axis={axis} />
      </section>
      <section aria-labelledby="search-name">
        <h3 id="search-name">How it was found</h3>
        <dl>
          <dt>ln L</dt>
          <dd>{formatFixed(fit.logLikelihood, 4)}</dd>
          <dt>AIC · AICc · BIC</dt>
          <dd>
            {formatFixed(criteria.aic, 2)} · {formatFixed(criteria.aicc, 2)} · {formatFixed(criteria.bic, 2)}
          </dd>
          <dt>Readings used</dt>
          <dd>
            {formatNumber(fit.readingsUsed, 9)}, k = {fit.parameterCount} (σ² counted)
          </dd>
          <dt>Search</dt>
          <dd>
            {outcome.status === 'closedForm'
              ? 'closed form, no search'
              : `${counted(outcome.starts, 'start')}, ${counted(outcome.evaluations, 'evaluation')}, ${outcome.status === 'boundary' ? 'on the boundary' : outcome.status}`}
          </dd>
          <dt>Other maxima within 2</dt>
          <dd>
            {rivals.length === 0
              ? 'none found'
              : rivals.map(({ logLikelihood }) => formatFixed(logLikelihood, 3)).join(', ')}
          </dd>
          <dt>Seed, core</dt>
          <dd>
            {fit.seed}, {fit.coreVersion}
          </dd>
        </dl>
        {fit.warnings.length > 0 && (
          <ul className="plain">
            {fit.warnings.map((warning) => {
              const { says, tryNext } = warningText(warning);
              return (
                <li key={warning.code}>
                  {says} <em>{tryNext}</em>
                </li>
              );
            })}
          </ul>
        )}
      </section>
    </div>
  );
}
