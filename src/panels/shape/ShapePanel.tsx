import { useMemo, useState } from 'react';
import { adviceHeadline, differencingName } from '../../format/shapeText.ts';
import { failureText } from '../../format/failureText.ts';
import type { RecordState } from '../../state/appState.ts';
import { useActions } from '../../state/useApp.ts';
import { Advice } from './Advice.tsx';
import { DifferencingTable } from './DifferencingTable.tsx';
import { LookControls } from './LookControls.tsx';
import { ShapeCharts } from './ShapeCharts.tsx';
import { UnitRootTable } from './UnitRootTable.tsx';
import { useShape, type ShapeLook } from './useShape.ts';
import './shape.css';

const plain: ShapeLook = { order: { d: 0, D: 0, s: 0 }, transform: { kind: 'none' } };

/** The shape of the record before any model: one line of advice, and what it rests on when opened. */
export function ShapePanel({ record }: { readonly record: RecordState }) {
  const actions = useActions();
  const [open, setOpen] = useState(false);
  const [chosen, setChosen] = useState<{ readonly record: string; readonly look: ShapeLook } | null>(null);
  const look = chosen?.record === record.id ? chosen.look : plain;
  const { shape, failure, busy, again } = useShape(record, look);
  const trouble = useMemo(() => (failure === null ? null : failureText(failure)), [failure]);
  if (record.source.kind !== 'loaded') return null;
  const { series } = record.source.record;
  const change = (next: ShapeLook) => setChosen({ record: record.id, look: next });

  return (
    <section className="look" aria-labelledby="look-name" id="panel-shape" aria-busy={busy}>
      <div className="look-line">
        <h2 id="look-name">Shape</h2>
        <p>{shape === null ? (busy ? 'Looking at the record…' : '') : adviceHeadline(shape)}</p>
        {shape !== null && (
          <button type="button" onClick={() => actions.addCandidates(shape.advice.candidates)}>
            Try these
          </button>
        )}
        <span className="spring" />
        <button type="button" aria-expanded={open} aria-controls="look-body" onClick={() => setOpen(!open)}>
          {open ? 'Hide what this rests on' : 'What this rests on'}
        </button>
      </div>
      {trouble !== null && (
        <p className="look-trouble" role="alert">
          {failure?.code === 'tooFewReadings'
            ? `Too few readings for this view: ${failure.readings} are left, ${failure.needed} are needed.`
            : trouble.what}{' '}
          {failure?.code === 'cancelled' || failure?.code === 'workerDied' || failure?.code === 'timeout' ? (
            <button type="button" onClick={again}>
              Look again
            </button>
          ) : (
            <button type="button" onClick={() => change(plain)}>
              Show the record itself
            </button>
          )}
        </p>
      )}
      <div id="look-body" hidden={!open}>
        {open && shape !== null && (
          <div className="look-body">
            <Advice shape={shape} axis={series.axis} />
            <div className="look-tables">
              <DifferencingTable shape={shape} unit={series.unit} />
              <UnitRootTable shape={shape} />
            </div>
            <div className="look-shown">
              <h3>
                Shown for {differencingName(shape.order)}
                {shape.transform.kind === 'log' ? ' of the logarithm' : ''}
              </h3>
              <LookControls shape={shape} look={look} onChange={change} />
            </div>
            <ShapeCharts
              shape={shape}
              axis={series.axis}
              unit={shape.transform.kind === 'log' ? 'log' : series.unit}
              raw={series.unit}
            />
          </div>
        )}
      </div>
    </section>
  );
}
