import { useMemo, useState } from 'react';
import { predictionFigure } from '../../figures/recordFigure.ts';
import { timeAt } from '../../format/axisTime.ts';
import { cautions } from '../../format/cautions.ts';
import { formatWithUncertainty } from '../../format/numbers.ts';
import type { RecordState } from '../../state/appState.ts';
import { chosenRow } from '../../state/selectors.ts';
import { useActions, useAppState } from '../../state/useApp.ts';
import { Plot } from '../plot/Plot.tsx';
import { usePalette } from '../plot/usePalette.ts';

const most = 500;

/** Predicted readings after the end of the record, from the innovations alone. */
export function PredictStation({ record }: { readonly record: RecordState }) {
  const actions = useActions();
  const row = useAppState(chosenRow);
  const made = useAppState((state) => state.prediction);
  const palette = usePalette();
  const [horizon, setHorizon] = useState(24);
  const fit = row?.progress.kind === 'fitted' ? row.progress.fit : null;
  const current = made !== null && made.fit === fit ? made.prediction : null;
  const source = record.source.kind === 'loaded' ? record.source : null;
  const figure = useMemo(
    () =>
      current === null || source === null
        ? null
        : predictionFigure(source.record.series, source.record.name, current, palette),
    [current, source, palette],
  );
  if (fit === null || source === null) return null;
  const { series } = source.record;
  return (
    <section className="station" aria-label="Predict">
      <div className="panel-head">
        <h2>Predict</h2>
        <form
          onSubmit={(event) => {
            event.preventDefault();
            actions.predict(horizon);
          }}
        >
          <label className="field inline">
            Readings ahead
            <input
              type="number"
              min={1}
              max={most}
              value={horizon}
              onChange={(event) => setHorizon(Math.min(most, Math.max(1, event.target.valueAsNumber || 1)))}
            />
          </label>
          <button type="submit" className="main-action">
            Predict
          </button>
        </form>
      </div>
      {current !== null && figure !== null && (
        <>
          <div className="station-body">
            <Plot figure={figure} label="Prediction" height={260} />
            <div className="scroll tall" role="region" aria-label="Predicted readings" tabIndex={0}>
              <table>
                <caption>
                  Predicted readings{series.unit === '' ? '' : `, ${series.unit}`}; band{' '}
                  {Math.round(100 * current.coverage)} %
                </caption>
                <thead>
                  <tr>
                    <th scope="col">time</th>
                    <th scope="col" className="number">
                      predicted
                    </th>
                    <th scope="col" className="number">
                      from
                    </th>
                    <th scope="col" className="number">
                      to
                    </th>
                  </tr>
                </thead>
                <tbody>
                  {Array.from(current.median, (median, h) => {
                    const spread = (current.upper[h]! - current.lower[h]!) / 4;
                    const show = (value: number) => formatWithUncertainty(value, spread).value;
                    return (
                      <tr key={h}>
                        <th scope="row">{timeAt(series.axis, series.values.length + h)}</th>
                        <td className="number">{show(median)}</td>
                        <td className="number">{show(current.lower[h]!)}</td>
                        <td className="number">{show(current.upper[h]!)}</td>
                      </tr>
                    );
                  })}
                </tbody>
              </table>
            </div>
          </div>
          <p className="quiet">
            The band holds for parameters taken as known and normal innovations; it is too narrow by the uncertainty of
            the estimates.
          </p>
          <ul className="cautions">
            {cautions.map((each) => (
              <li key={each}>{each}</li>
            ))}
          </ul>
        </>
      )}
    </section>
  );
}
