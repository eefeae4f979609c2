import { useState } from 'react';
import type { Regressor } from '../../../workers/contract/candidate.ts';
import type { Axis } from '../../../workers/contract/series.ts';
import { Choice } from '../../components/Choice.tsx';
import { timeAt } from '../../format/axisTime.ts';
import { inputName } from '../../format/inputName.ts';
import { placeOf } from '../../format/placeOf.ts';
import { useAppState } from '../../state/useApp.ts';

interface InputsProps {
  readonly inputs: readonly Regressor[];
  readonly axis: Axis;
  readonly length: number;
  /** Names of the other columns of the record. */
  readonly columns: readonly string[];
  readonly onChange: (inputs: readonly Regressor[]) => void;
}

type Kind = Regressor['kind'];

const kinds: readonly (readonly [Kind, string])[] = [
  ['step', 'step'],
  ['pulse', 'pulse'],
  ['ramp', 'ramp'],
  ['harmonic', 'harmonic of a period'],
  ['column', 'other column'],
];

/** Events and covariates of one candidate: a list, and a line to add one. */
export function InputsEditor({ inputs, axis, length, columns, onChange }: InputsProps) {
  const picked = useAppState((state) => state.picked);
  const [kind, setKind] = useState<Kind>('step');
  const [typed, setTyped] = useState('');
  const [period, setPeriod] = useState(12);
  const [k, setK] = useState(1);
  const [column, setColumn] = useState(columns[0] ?? '');
  const [lag, setLag] = useState(0);
  const [trouble, setTrouble] = useState('');
  const isEvent = kind === 'step' || kind === 'pulse' || kind === 'ramp';

  const made = (): Regressor | string => {
    if (isEvent) {
      const at = typed === '' && picked !== null ? picked : placeOf(axis, typed, length);
      return at === null
        ? `Type a time of the record, such as ${timeAt(axis, Math.floor(length / 2))}, or click a reading in the chart.`
        : { kind, at };
    }
    if (kind === 'harmonic')
      return period > 0 && k >= 1 && k <= period / 2 ? { kind, period, k } : 'k runs from 1 to half the period.';
    return column === '' ? 'The file has no other column of numbers.' : { kind: 'column', id: column, lag };
  };
  const add = () => {
    const next = made();
    if (typeof next === 'string') {
      setTrouble(next);
      return;
    }
    setTrouble('');
    setTyped('');
    onChange([...inputs, next]);
  };

  return (
    <fieldset className="inputs">
      <legend>Events and covariates</legend>
      {inputs.length > 0 && (
        <ul className="plain">
          {inputs.map((input, i) => (
            <li key={JSON.stringify(input)}>
              {inputName(input, axis)}{' '}
              <button
                type="button"
                className="edit"
                aria-label={`Remove ${inputName(input, axis)}`}
                onClick={() => onChange(inputs.filter((_, j) => j !== i))}
              >
                remove
              </button>
            </li>
          ))}
        </ul>
      )}
      <div className="editor">
        <Choice
          label="Kind of input"
          value={kind}
          options={kinds.filter(([each]) => each !== 'column' || columns.length > 0)}
          onChange={(value) => setKind(value as Kind)}
        />
        {isEvent && (
          <label className="field">
            at
            <input
              type="text"
              aria-label="Time of the event"
              placeholder={timeAt(axis, picked ?? Math.floor(length / 2))}
              value={typed}
              onChange={(event) => setTyped(event.target.value)}
              onKeyDown={(event) => {
                if (event.key === 'Enter') add();
              }}
            />
          </label>
        )}
        {kind === 'harmonic' && (
          <>
            <NumberField label="period, in readings" least={2} value={period} onChange={setPeriod} />
            <NumberField label="k" least={1} value={k} onChange={setK} />
          </>
        )}
        {kind === 'column' && (
          <>
            <Choice
              label="Column"
              value={column}
              options={columns.map((name) => [name, name] as const)}
              onChange={setColumn}
            />
            <NumberField label="readings earlier" least={0} value={lag} onChange={setLag} />
          </>
        )}
        <button type="button" onClick={add}>
          Add input
        </button>
      </div>
      {trouble !== '' && (
        <p className="quiet" role="alert">
          {trouble}
        </p>
      )}
    </fieldset>
  );
}

interface NumberProps {
  readonly label: string;
  readonly least: number;
  readonly value: number;
  readonly onChange: (value: number) => void;
}

function NumberField({ label, least, value, onChange }: NumberProps) {
  return (
    <label className="field">
      {label}
      <input
        type="number"
        min={least}
        value={value}
        onChange={(event) => onChange(Math.max(least, Math.round(event.target.valueAsNumber) || least))}
      />
    </label>
  );
}
