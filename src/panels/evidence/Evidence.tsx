import { useMemo } from 'react';
import { lagFigure } from '../../figures/lagFigure.ts';
import { failureText } from '../../format/failureText.ts';
import { candidateName } from '../../format/notation.ts';
import type { RecordState } from '../../state/appState.ts';
import { chosenRow, shownEvidence } from '../../state/selectors.ts';
import { useAppState } from '../../state/useApp.ts';
import { Plot } from '../plot/Plot.tsx';
import { usePalette } from '../plot/usePalette.ts';
import { VerdictPanel } from './VerdictPanel.tsx';

/** The evidence for the chosen candidate, verdict first. */
export function Evidence({ record }: { readonly record: RecordState }) {
  const row = useAppState(chosenRow);
  const palette = usePalette();
  const shown = useMemo(() => shownEvidence(row), [row]);
  const judgement = shown?.judgement ?? null;
  const old = shown?.old === true;
  const figure = useMemo(
    () => (judgement === null ? null : lagFigure(judgement.evidence, palette)),
    [judgement, palette],
  );
  const axis = record.source.kind === 'loaded' ? record.source.record.series.axis : null;

  return (
    <div className={old ? 'evidence old' : 'evidence'}>
      {old && (
        <p className="quiet" role="status">
          Before the last change; the new result is on its way.
        </p>
      )}
      <section className="verdict" aria-label="Verdict">
        {row === null ? (
          <p className="question">Choose a candidate: may it be defended, and on what evidence?</p>
        ) : judgement === null || axis === null ? (
          <>
            <h2>{candidateName(row.candidate)}</h2>
            <p className="question">
              {row.progress.kind === 'failed'
                ? failureText(row.progress.failure).what
                : record.source.kind === 'wanted'
                  ? 'The verdict waits for the record.'
                  : row.progress.kind === 'waiting'
                    ? 'Not fitted yet.'
                    : 'Fitting …'}
            </p>
          </>
        ) : (
          <VerdictPanel candidate={shown?.fit.candidate ?? row.candidate} verdict={judgement.verdict} axis={axis} />
        )}
      </section>
      {figure !== null && (
        <section aria-labelledby="lags-name" id="panel-lags">
          <h3 id="lags-name">Memory left over</h3>
          <Plot figure={figure} label="Residual correlogram and portmanteau p-values by lag" height={300} />
          <p className="quiet">
            Shaded: the range of chance, above for the residuals of a fitted model at 95 %, below p under 0.05.
            Ljung–Box on standardised innovations, degrees of freedom reduced by the coefficients.
          </p>
        </section>
      )}
    </div>
  );
}
