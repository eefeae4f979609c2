import type { SignConvention } from '../../../workers/contract/envelope.ts';
import { Choice } from '../../components/Choice.tsx';
import { equationLines, estimateLines, signSentence } from '../../format/equationText.ts';
import { candidateName, estimatorName } from '../../format/notation.ts';
import { counted, formatFixed, formatNumber } from '../../format/numbers.ts';
import { warningText } from '../../format/warningText.ts';
import type { RecordState } from '../../state/appState.ts';
import { chosenRow } from '../../state/selectors.ts';
import { useActions, useAppState } from '../../state/useApp.ts';
import { RootTable } from './RootTable.tsx';

/** Size and shape of the chosen model: equation, estimates, roots, and how they were found. */
export function Detail({ record }: { readonly record: RecordState }) {
  const actions = useActions();
  const row = useAppState(chosenRow);
  const signs = useAppState((state) => state.view.signs);
  if (row?.progress.kind !== 'fitted' || row.progress.judgement === null || record.source.kind !== 'loaded')
    return null;
  const { fit, judgement } = row.progress;
  const { equation, roots } = judgement.evidence;
  const { unit, axis } = record.source.record.series;
  const { outcome, criteria } = fit;
  const rivals = outcome.maxima.filter(({ admissible }) => admissible).slice(1);
  return (
    <div className="detail">
      <section aria-labelledby="equation-name" className="wide" id="panel-estimates">
        <h3 id="equation-name">Size and shape · {candidateName(row.candidate)}</h3>
        {equationLines(fit, equation, unit).map((line, i) => (
          <p key={line} className={i === 0 ? 'equation' : undefined}>
            {line}
          </p>
        ))}
        <div className="estimates">
          <table>
            <caption>Estimates, {estimatorName(fit.candidate.estimator)}</caption>
            <thead>
              <tr>
                <th scope="col">coefficient</th>
                <th scope="col" className="number">
                  estimate
                </th>
                <th scope="col" className="number">
                  standard error
                </th>
                <th scope="col">unit</th>
              </tr>
            </thead>
            <tbody>
              {estimateLines(fit, equation, signs, unit).map((line) => (
                <tr key={line.name}>
                  <th scope="row">{line.name}</th>
                  <td className="number">{line.value}</td>
                  <td className="number">{line.uncertainty}</td>
                  <td>{line.unit}</td>
                </tr>
              ))}
            </tbody>
          </table>
          <div>
            <Choice
              label="Signs shown"
              value={signs}
              options={[
                ['plus', 'θ(B) = 1 + Σ θB'],
                ['minus', 'θ(B) = 1 − Σ θB'],
                ['polynomial', 'as in the polynomials'],
              ]}
              onChange={(value) => actions.changeView({ signs: value as SignConvention })}
            />
            <p className="quiet">{signSentence(signs)}.</p>
            <p className="quiet">
              Standard errors from the curvature of the exact ln L. The mean is that of the{' '}
              {fit.candidate.order.d + fit.candidate.order.D > 0 ? 'differenced ' : ''}
              record, never the constant of the equation.
            </p>
          </div>
        </div>
      </section>
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
