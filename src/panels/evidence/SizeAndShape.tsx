import type { SignConvention } from '../../../workers/contract/envelope.ts';
import { Choice } from '../../components/Choice.tsx';
import { equationLines, signSentence } from '../../format/equationText.ts';
import { candidateName } from '../../format/notation.ts';
import type { RecordState } from '../../state/appState.ts';
import { chosenRow, shownEvidence } from '../../state/selectors.ts';
import { useActions, useAppState } from '../../state/useApp.ts';
import { EstimateTable } from './EstimateTable.tsx';
import { HowSure } from './HowSure.tsx';

/** Size and shape of the chosen model: the equation in numbers and the estimates. */
export function SizeAndShape({ record }: { readonly record: RecordState }) {
  const actions = useActions();
  const row = useAppState(chosenRow);
  const signs = useAppState((state) => state.view.signs);
  const shown = shownEvidence(row);
  if (shown === null || record.source.kind !== 'loaded') return null;
  const { fit, judgement, old } = shown;
  const { equation } = judgement.evidence;
  const { unit } = record.source.record.series;
  return (
    <section aria-labelledby="equation-name" className={old ? 'shape old' : 'shape'} id="panel-estimates">
      <h3 id="equation-name">Size and shape · {candidateName(fit.candidate)}</h3>
      {equationLines(fit, equation, unit).map((line, i) => (
        <p key={line} className={i === 0 ? 'equation' : undefined}>
          {line}
        </p>
      ))}
      <div className="estimates">
        <div className="scroll" role="region" aria-label="Estimates" tabIndex={0}>
          <EstimateTable fit={fit} equation={equation} signs={signs} series={record.source.record.series} />
        </div>
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
      <HowSure fit={fit} />
    </section>
  );
}
