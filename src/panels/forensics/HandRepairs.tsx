import { useState, type ReactNode } from 'react';
import type { RepairChange, Series } from '../../../workers/contract/series.ts';
import { formatDuration, placeOfTime, timeAt } from '../../format/axisTime.ts';
import { useActions } from '../../state/useApp.ts';

interface HandRepairsProps {
  readonly series: Series;
  /** Ends of the stretch to be marked, as typed or dragged. */
  readonly ends: readonly [string, string];
  readonly onEnds: (ends: readonly [string, string]) => void;
  readonly marking: boolean;
  readonly onMarking: (marking: boolean) => void;
}

/** Repairs by hand: a stretch or a single reading made a gap, another unit, a coarser grid. */
export function HandRepairs({ series, ends, onEnds, marking, onMarking }: HandRepairsProps) {
  const { axis, unit, values } = series;
  const [trouble, setTrouble] = useState('');
  const actions = useActions();
  const repair = (change: RepairChange, why: string) => {
    setTrouble('');
    void actions.repair(change, why);
  };

  const markGap = () => {
    const [first, last] = [placeOfTime(axis, ends[0]), placeOfTime(axis, ends[1].trim() === '' ? ends[0] : ends[1])];
    const form = axis.kind === 'index' ? 'a number such as 12' : `a time such as ${timeAt(axis, 0)}`;
    if (first === null || last === null)
      setTrouble(`${first === null ? 'From' : 'To'} is not understood: write ${form}.`);
    else if (last < first) setTrouble('To lies before from.');
    else if (first < 0 || last >= values.length)
      setTrouble(`Outside the record, which goes from ${timeAt(axis, 0)} to ${timeAt(axis, values.length - 1)}.`);
    else {
      repair({ kind: 'gap', from: first, to: last + 1 }, 'Marked by hand');
      onEnds(['', '']);
      onMarking(false);
    }
  };

  return (
    <div className="hand">
      <Form name="Mark as gap" action={markGap}>
        <button type="button" aria-pressed={marking} onClick={() => onMarking(!marking)}>
          Mark on the plot
        </button>
        <Text label="From" value={ends[0]} hint={timeAt(axis, 0)} onValue={(text) => onEnds([text, ends[1]])} />
        <Text label="To" value={ends[1]} hint="the same reading" onValue={(text) => onEnds([ends[0], text])} />
      </Form>
      {trouble !== '' && (
        <p className="trouble" role="alert">
          {trouble}
        </p>
      )}
      <ScaleForm key={`${unit} ${series.hash}`} unit={unit} onRepair={repair} onTrouble={setTrouble} />
      <RegridForm key={axis.step} series={series} onRepair={repair} onTrouble={setTrouble} />
    </div>
  );
}

interface PartProps {
  readonly onRepair: (change: RepairChange, why: string) => void;
  readonly onTrouble: (text: string) => void;
}

function ScaleForm({ unit, onRepair, onTrouble }: PartProps & { readonly unit: string }) {
  const [factor, setFactor] = useState('1');
  const [offset, setOffset] = useState('0');
  const [name, setName] = useState(unit);
  const number = (text: string) => (text.trim() === '' ? NaN : Number(text.trim().replace(',', '.').replace('−', '-')));
  const rescale = () => {
    const [a, b] = [number(factor), number(offset)];
    if (!Number.isFinite(a) || a === 0) onTrouble('The factor must be a number other than 0.');
    else if (!Number.isFinite(b)) onTrouble('The offset must be a number.');
    else if (a === 1 && b === 0 && name.trim() === unit)
      onTrouble('Nothing to change: factor 1, offset 0, the same unit.');
    else onRepair({ kind: 'scale', factor: a, offset: b, unit: name.trim() }, 'Unit changed by hand');
  };
  return (
    <Form name="Rescale" action={rescale}>
      <Text label="Factor" value={factor} onValue={setFactor} />
      <Text label="Offset" value={offset} onValue={setOffset} />
      <Text label="Unit" value={name} onValue={setName} />
    </Form>
  );
}

const rules = [
  ['binMean', 'mean of each interval'],
  ['nearest', 'nearest reading'],
  ['last', 'last reading'],
] as const;

function RegridForm({ series, onRepair, onTrouble }: PartProps & { readonly series: Series }) {
  const { kind, step } = series.axis;
  const [times, setTimes] = useState('2');
  const [rule, setRule] = useState<(typeof rules)[number][0]>('binMean');
  const regrid = () => {
    const count = Number(times);
    if (!(count > 1)) onTrouble('Give the number of present intervals that make one new interval: 2 or more.');
    else onRepair({ kind: 'regrid', step: count * step, rule }, 'Regridded by hand');
  };
  const says = kind === 'seconds' && Number(times) > 1 ? `= ${formatDuration(Number(times) * step)}` : '';
  return (
    <Form name="Regrid" action={regrid}>
      <Text label="Intervals in one" value={times} onValue={setTimes} />
      <span className="quiet">{says}</span>
      <label className="field">
        By
        <select value={rule} onChange={(event) => setRule(event.target.value as typeof rule)}>
          {rules.map(([value, words]) => (
            <option key={value} value={value}>
              {words}
            </option>
          ))}
        </select>
      </label>
    </Form>
  );
}

function Form({
  name,
  action,
  children,
}: {
  readonly name: string;
  readonly action: () => void;
  readonly children: ReactNode;
}) {
  return (
    <form
      aria-label={name}
      onSubmit={(event) => {
        event.preventDefault();
        action();
      }}
    >
      {children}
      <button type="submit">{name}</button>
    </form>
  );
}

interface TextProps {
  readonly label: string;
  readonly value: string;
  readonly hint?: string;
  readonly onValue: (text: string) => void;
}

function Text({ label, value, hint = '', onValue }: TextProps) {
  return (
    <label className="field">
      {label}
      <input type="text" value={value} placeholder={hint} onChange={(event) => onValue(event.target.value)} />
    </label>
  );
}
