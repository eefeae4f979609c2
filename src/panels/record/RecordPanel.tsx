import { useMemo, useState } from 'react';
import { recordFigure } from '../../figures/recordFigure.ts';
import { gapRuns } from '../../figures/gapRuns.ts';
import { formatInterval, formatSpan, placeAtChart, typedTime } from '../../format/axisTime.ts';
import { noteSentence } from '../../format/dialectText.ts';
import { counted } from '../../format/numbers.ts';
import type { RecordState } from '../../state/appState.ts';
import { chosenRow, shownEvidence } from '../../state/selectors.ts';
import { useActions, useAppState } from '../../state/useApp.ts';
import { ForensicsPanel } from '../forensics/ForensicsPanel.tsx';
import { Plot } from '../plot/Plot.tsx';
import { PickedReading } from './PickedReading.tsx';
import { usePalette } from '../plot/usePalette.ts';

/** The record along the top, with the innovations of the chosen candidate beneath it on the same time axis. */
export function RecordPanel({ record }: { readonly record: RecordState }) {
  const actions = useActions();
  const row = useAppState(chosenRow);
  const picked = useAppState((state) => state.picked);
  const events = row?.candidate.regressors;
  const prediction = useAppState((state) => state.prediction);
  const palette = usePalette();
  const [ends, setEnds] = useState<readonly [string, string]>(['', '']);
  const [marking, setMarking] = useState(false);
  const { source } = record;
  const evidence = shownEvidence(row)?.judgement.evidence ?? null;
  const forecast = prediction?.rowId === row?.id ? (prediction?.prediction ?? null) : null;
  const onlyGaps = record.repairs.every(({ kind }) => kind === 'gap' || kind === 'gaps');
  const figure = useMemo(
    () =>
      source.kind === 'loaded'
        ? recordFigure(
            {
              series: source.record.series,
              name: source.record.name,
              evidence,
              prediction: forecast,
              ...(events === undefined ? {} : { events }),
              picked,
              ...(onlyGaps ? { raw: source.raw.series } : {}),
            },
            palette,
          )
        : null,
    [source, evidence, forecast, events, picked, palette, onlyGaps],
  );

  if (source.kind === 'wanted' || figure === null)
    return (
      <section className="record wanted" aria-labelledby="record-name" id="panel-record">
        <h2 id="record-name">The record of this session is wanted</h2>
        <p>
          The link brought {counted(record.rows.length, 'candidate')} and all settings, but not the readings. Drop or
          open the file they were made with; its fingerprint is checked (file {record.fileHash.slice(0, 12)}…, readings{' '}
          {record.seriesHash.slice(0, 12)}…).
        </p>
      </section>
    );

  const { series, name, notes } = source.record;
  const mark = (from: number, to: number) => {
    const inside = (place: number) => Math.min(Math.max(place, 0), series.values.length - 1);
    const place = (x: number) => typedTime(series.axis, inside(placeAtChart(series.axis, x)));
    setEnds([place(from), place(to)]);
  };
  const gaps = series.values.reduce((sum, value) => sum + (Number.isNaN(value) ? 1 : 0), 0);
  return (
    <section className="record" aria-labelledby="record-name" id="panel-record">
      <div className="record-head">
        <h2 id="record-name">
          {name}
          {series.unit !== '' && <span className="unit"> {series.unit}</span>}
        </h2>
        {source.example && <span className="tag">Invented example</span>}
        <p className="facts">
          {source.fileName} · {counted(series.values.length - gaps, 'reading')}, {formatInterval(series.axis)} ·{' '}
          {formatSpan(series.axis, record.window)} ·{' '}
          {gaps === 0
            ? 'no gaps'
            : `${counted(gaps, 'missing reading')} in ${counted(gapRuns(series.values).length, 'gap')}`}
        </p>
        {notes.length > 0 && (
          <details className="drawer notes">
            <summary>{counted(notes.length, 'note')} from reading</summary>
            <ul className="drawer-body">
              {notes.map((one) => (
                <li key={one.kind}>{noteSentence(one)}</li>
              ))}
            </ul>
          </details>
        )}
      </div>
      <Plot
        figure={figure}
        label={evidence === null ? 'Record' : 'Record and innovations'}
        height={280}
        onPick={actions.pick}
        onMark={marking ? mark : undefined}
      />
      <PickedReading series={series} />
      <ForensicsPanel record={record} ends={ends} onEnds={setEnds} marking={marking} onMarking={setMarking} />
    </section>
  );
}
