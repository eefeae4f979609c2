import type { SignConvention } from '../../../workers/contract/envelope.ts';
import { Choice } from '../../components/Choice.tsx';
import { equationLines, estimateLines, signSentence } from '../../format/equationText.ts';
import { candidateName, estimatorName } from '../../format/notation.ts';
import type { RecordState } from '../../state/appState.ts';
import { chosenRow } from '../../state/selectors.ts';
import { useActions, useAppState } from '../../state/useApp.ts';

/** Size and shape of the chosen model: the equation in numbers and the estimates. */
export function SizeAndShape({ record }: { readonly record: RecordState }) {
  const actions = useActions();
  const row = useAppState(chosenRow);
  const signs = useAppState((state) => state.view.signs);
  if (row?.progress.kind !== 'fitted' || row.progress.judgement === null || record.source.kind !== 'loaded')
    return null;
  const { fit, judgement } = row.progress;
  const { equation } = judgement.evidence;
  const { unit } = record.source.record.series;
  return (
    <section aria-labelledby="equation-name" className="shape" id="panel-estimates">
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
  );
}
