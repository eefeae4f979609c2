import { useEffect, useRef } from 'react';
import { formatInterval } from '../../format/axisTime.ts';
import { dialectSentence, noteSentence } from '../../format/dialectText.ts';
import { failureText } from '../../format/failureText.ts';
import { counted } from '../../format/numbers.ts';
import type { Arrival } from '../../state/appState.ts';
import { useActions } from '../../state/useApp.ts';
import { PreviewTable } from './PreviewTable.tsx';
import { Questions } from './Questions.tsx';
import { TextLines } from './TextLines.tsx';
import { TimeLines } from './TimeLines.tsx';
import { ValueLines } from './ValueLines.tsx';
import './arrival.css';

/** How far reading has come, with the way to stop it. */
function Progress({ fraction }: { readonly fraction: number }) {
  const actions = useActions();
  return (
    <span className="arrival-progress" role="status">
      <progress max={1} value={fraction} aria-label="Reading" /> {Math.floor(100 * fraction)} %
      <button type="button" onClick={actions.stopReading}>
        Stop reading
      </button>
    </span>
  );
}

/** A file before the record is taken from it: what was detected, each with a control, and a preview. Nothing is computed yet. */
export function ArrivalSheet({ arrival }: { readonly arrival: Arrival }) {
  const actions = useActions();
  const heading = useRef<HTMLHeadingElement>(null);
  const { answer, fileName, fraction, reading } = arrival;
  useEffect(() => heading.current?.focus(), [fileName]);

  const record = answer?.record ?? null;
  const sniffed = answer?.sniffed ?? null;
  const failure = answer?.failure ?? null;
  const words = failure === null ? null : failureText(failure);
  return (
    <section className="arrival" aria-labelledby="arrival-name" aria-busy={reading}>
      <div className="arrival-head">
        <h2 id="arrival-name" tabIndex={-1} ref={heading}>
          Reading {fileName}
        </h2>
        <button
          type="button"
          className="main-action"
          disabled={record === null || reading}
          onClick={actions.acceptArrival}
        >
          Use this record
        </button>
        <button type="button" onClick={actions.dismissArrival}>
          Dismiss
        </button>
        {reading && <Progress fraction={fraction} />}
      </div>
      {words !== null && (
        <div className="notice trouble" role="alert">
          <p>
            <strong>{words.what}</strong> {words.where !== '' && <span className="where">{words.where}</span>}{' '}
            {words.todo}
          </p>
        </div>
      )}
      {sniffed !== null && (
        <>
          <p className="sentence">{dialectSentence(sniffed)}</p>
          {record !== null && (
            <p>
              Record “{record.name}”: {counted(record.series.values.length, 'place')},{' '}
              {formatInterval(record.series.axis)}
              {record.series.unit === '' ? '' : `, in ${record.series.unit}`}.
            </p>
          )}
          <Questions questions={sniffed.questions} columns={sniffed.columns} />
          {record !== null && record.notes.length > 0 && (
            <ul className="plain">
              {record.notes.map((one) => (
                <li key={one.kind}>{noteSentence(one)}</li>
              ))}
            </ul>
          )}
          <div className="arrival-body">
            <div className="told-groups">
              <section aria-label="Readings">
                <h3>Readings</h3>
                <ValueLines sniffed={sniffed} />
              </section>
              <section aria-label="Time">
                <h3>Time</h3>
                <TimeLines sniffed={sniffed} />
              </section>
              <section aria-label="Text">
                <h3>Text</h3>
                <TextLines sniffed={sniffed} arrival={arrival} />
              </section>
            </div>
            <PreviewTable sniffed={sniffed} />
          </div>
        </>
      )}
    </section>
  );
}
