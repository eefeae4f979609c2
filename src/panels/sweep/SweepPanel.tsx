import { useState } from 'react';
import type { Level } from '../../../workers/contract/candidate.ts';
import type { SweepRange } from '../../../workers/contract/selection.ts';
import { failureText } from '../../format/failureText.ts';
import { candidateName } from '../../format/notation.ts';
import { counted, formatFixed } from '../../format/numbers.ts';
import { sweepSentence } from '../../format/sweepText.ts';
import type { RecordState, SweepState } from '../../state/appState.ts';
import { plausibleSeason } from '../../state/startingCandidates.ts';
import { useActions, useAppState } from '../../state/useApp.ts';

/** Rows of the ranking shown. */
const SHOWN = 12;
const levels: readonly (readonly [Level, string])[] = [
  ['none', 'no level'],
  ['mean', 'mean'],
  ['drift', 'drift'],
];

/** Every candidate of a range of orders, fitted and ranked; the good ones can be taken into the table. */
export function SweepPanel({ record }: { readonly record: RecordState }) {
  const actions = useActions();
  const sweep = useAppState((state) => (state.sweep?.recordId === record.id ? state.sweep : null));
  const axis = record.source.kind === 'loaded' ? record.source.record.series.axis : null;
  const [most, setMost] = useState({ p: 3, q: 3, P: 0, Q: 0 });
  const [d, setD] = useState<readonly number[]>([0, 1]);
  const [D, setSeasonalD] = useState<readonly number[]>([0]);
  const [season, setSeason] = useState<number | null>(null);
  const [chosen, setChosen] = useState<readonly Level[]>(['none', 'mean']);
  if (axis === null) return null;
  const s = season ?? plausibleSeason(axis, record.window.to - record.window.from);
  const range: SweepRange = {
    p: [0, most.p],
    q: [0, most.q],
    P: [0, most.P],
    Q: [0, most.Q],
    d,
    D,
    s,
    levels: chosen,
  };
  const running = sweep?.running === true;
  const toggle = <T,>(list: readonly T[], one: T) =>
    list.includes(one) ? list.filter((other) => other !== one) : [...list, one];
  return (
    <details className="sweep" open={sweep !== null ? true : undefined}>
      <summary>Sweep a range of orders</summary>
      <form
        className="editor"
        onSubmit={(event) => {
          event.preventDefault();
          actions.sweep(range);
        }}
      >
        {(['p', 'q', 'P', 'Q'] as const).map((name) => (
          <label key={name} className="field">
            {name} up to
            <input
              type="number"
              min={0}
              max={name === 'p' || name === 'q' ? 20 : 3}
              disabled={(name === 'P' || name === 'Q') && s < 2}
              value={most[name]}
              onChange={(event) =>
                setMost({ ...most, [name]: Math.max(0, Math.round(event.target.valueAsNumber) || 0) })
              }
            />
          </label>
        ))}
        <label className="field">
          season s
          <input
            type="number"
            min={0}
            value={s}
            onChange={(event) => setSeason(Math.max(0, Math.round(event.target.valueAsNumber) || 0))}
          />
        </label>
        <Checks
          legend="differences d"
          all={[0, 1, 2]}
          chosen={d}
          onToggle={(one) => setD(toggle(d, one))}
          text={String}
        />
        {s >= 2 && (
          <Checks
            legend="seasonal D"
            all={[0, 1]}
            chosen={D}
            onToggle={(one) => setSeasonalD(toggle(D, one))}
            text={String}
          />
        )}
        <Checks
          legend="level"
          all={levels.map(([level]) => level)}
          chosen={chosen}
          onToggle={(one) => setChosen(toggle(chosen, one))}
          text={(one) => levels.find(([level]) => level === one)?.[1] ?? one}
        />
        <button type="submit" className="main-action" disabled={running || d.length === 0 || chosen.length === 0}>
          Sweep
        </button>
        <button type="button" onClick={actions.stopSweep} disabled={!running}>
          Stop the sweep
        </button>
      </form>
      {sweep !== null && <SweepResult sweep={sweep} />}
    </details>
  );
}

interface ChecksProps<T> {
  readonly legend: string;
  readonly all: readonly T[];
  readonly chosen: readonly T[];
  readonly onToggle: (one: T) => void;
  readonly text: (one: T) => string;
}

function Checks<T extends string | number>({ legend, all, chosen, onToggle, text }: ChecksProps<T>) {
  return (
    <fieldset className="checks">
      <legend>{legend}</legend>
      {all.map((one) => (
        <label key={one} className="check">
          <input type="checkbox" checked={chosen.includes(one)} onChange={() => onToggle(one)} />
          {text(one)}
        </label>
      ))}
    </fieldset>
  );
}

function SweepResult({ sweep }: { readonly sweep: SweepState }) {
  const actions = useActions();
  const { fits, size, failed, passedOver, running, ranking, failure } = sweep;
  const done = fits.length + failed + passedOver;
  return (
    <>
      {running && (
        <p role="status" className="quiet">
          <progress max={Math.max(size, done, 1)} value={done} aria-label="Sweeping" /> {done} of{' '}
          {sweep.mode === 'walk' ? `at most ${size}` : size}
        </p>
      )}
      {failure !== null && <p role="alert">{failureText(failure).what}</p>}
      {!running && ranking !== null && <p role="status">{sweepSentence(sweep, ranking)}</p>}
      {(ranking?.groups ?? []).map((group, at) => (
        <div key={group.key} className="scroll" role="region" aria-label={`Sweep, group ${at + 1}`} tabIndex={0}>
          <table>
            <caption>
              {at === 0 ? 'Best of the sweep' : 'With another differencing, not to be compared by criteria'}
            </caption>
            <thead>
              <tr>
                <th scope="col">candidate</th>
                {['k', 'ln L', 'AICc', 'BIC', 'Δ', 'weight'].map((name) => (
                  <th key={name} scope="col" className="number">
                    {name}
                  </th>
                ))}
                <th scope="col">take</th>
              </tr>
            </thead>
            <tbody>
              {group.members.slice(0, at === 0 ? SHOWN : 4).map(({ index, differences, weight }) => {
                const fit = fits[index]!;
                const name = candidateName(fit.candidate);
                return (
                  <tr key={name}>
                    <th scope="row">{name}</th>
                    <td className="number">{fit.parameterCount}</td>
                    <td className="number">{formatFixed(fit.logLikelihood, 2)}</td>
                    <td className="number">{formatFixed(fit.criteria.aicc, 2)}</td>
                    <td className="number">{formatFixed(fit.criteria.bic, 2)}</td>
                    <td className="number">{formatFixed(differences[group.weightBy], 2)}</td>
                    <td className="number">{formatFixed(100 * weight, 0)} %</td>
                    <td>
                      <Take name={name} onTake={() => actions.addCandidate(fit.candidate)} />
                    </td>
                  </tr>
                );
              })}
            </tbody>
          </table>
          {group.members.length > SHOWN && (
            <p className="quiet">
              The first {at === 0 ? SHOWN : 4} of {counted(group.members.length, 'candidate')}.
            </p>
          )}
        </div>
      ))}
    </>
  );
}

function Take({ name, onTake }: { readonly name: string; readonly onTake: () => void }) {
  return (
    <button type="button" className="edit" aria-label={`Take ${name} into the table`} onClick={onTake}>
      take
    </button>
  );
}
