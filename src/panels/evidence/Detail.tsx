import { maximumText } from '../../format/maximumText.ts';
import { estimatorName } from '../../format/notation.ts';
import { counted, formatFixed, formatNumber } from '../../format/numbers.ts';
import { warningText } from '../../format/warningText.ts';
import type { RecordState } from '../../state/appState.ts';
import { chosenRow, shownEvidence } from '../../state/selectors.ts';
import { useAppState } from '../../state/useApp.ts';
import { RootTable } from './RootTable.tsx';

/** Roots of the chosen model, and how it was found. */
export function Detail({ record }: { readonly record: RecordState }) {
  const row = useAppState(chosenRow);
  const shown = shownEvidence(row);
  if (shown === null || record.source.kind !== 'loaded') return null;
  const { fit, judgement, old } = shown;
  const { roots } = judgement.evidence;
  const { axis } = record.source.record.series;
  const { outcome, criteria } = fit;
  const maxima = outcome.maxima.filter(({ admissible }) => admissible);
  return (
    <div className={old ? 'detail old' : 'detail'}>
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
          <dt>Estimator</dt>
          <dd>{estimatorName(fit.candidate.estimator)}</dd>
          <dt>Maxima within 2 of the best</dt>
          <dd>
            {maxima.length === 0
              ? 'none: closed form'
              : maxima.map((maximum, i) => (
                  <span key={i} className="line">
                    {maximumText(maximum)}
                  </span>
                ))}
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
