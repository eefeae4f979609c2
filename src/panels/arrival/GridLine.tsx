import { useState } from 'react';
import type { Dialect } from '../../../workers/contract/dialect.ts';
import type { Sniffed, Timing } from '../../../workers/contract/reading.ts';
import { Choice } from '../../components/Choice.tsx';
import { CommitField } from '../../components/CommitField.tsx';
import { gridText, ruleName, timingSentence } from '../../format/arrivalText.ts';
import { useActions } from '../../state/useApp.ts';
import { Told } from './Told.tsx';

type Grid = NonNullable<Dialect['grid']>;

const units = [
  ['1', 'seconds'],
  ['60', 'minutes'],
  ['3600', 'hours'],
  ['86400', 'days'],
] as const;
const ruleKinds = ['nearest', 'binMean', 'last'] as const;

/** Largest unit that leaves a plain number. */
const unitOf = (step: number): number => {
  const fitting = units.map(([seconds]) => Number(seconds)).filter((size) => (step / size) % 0.5 === 0);
  return fitting.at(-1) ?? 1;
};

/** What the interval is, what disturbs it, and the grid the record is laid on. */
export function GridLine({ sniffed, timing }: { readonly sniffed: Sniffed; readonly timing: Timing }) {
  const actions = useActions();
  const { grid } = sniffed.dialect;
  const [chosenUnit, setUnit] = useState<number | null>(null);
  const change = (next: Grid) => void actions.changeDialect({ grid: next });
  if (grid === null) return <li className="told">{timingSentence(timing, null)}</li>;
  const unit = grid.kind === 'seconds' ? (chosenUnit ?? unitOf(grid.step)) : 1;
  const [inUse, ...others] = timing.offers;
  return (
    <Told sentence={timingSentence(timing, grid)}>
      <Choice
        label="Grid takes"
        value={grid.rule}
        options={ruleKinds.map((rule) => [rule, ruleName(rule)] as const)}
        onChange={(rule) => change({ ...grid, rule: rule as Grid['rule'] })}
      />
      <CommitField
        label="Step of the grid"
        kind="number"
        min={0}
        value={String(Number((grid.step / unit).toPrecision(12)))}
        onCommit={(value) => {
          const step = Number(value) * unit;
          if (Number.isFinite(step) && step > 0) change({ ...grid, step });
        }}
      />
      {grid.kind === 'seconds' && (
        <Choice
          label="Unit of the step"
          value={String(unit)}
          options={units}
          onChange={(size) => setUnit(Number(size))}
        />
      )}
      {grid.rule === 'nearest' && (
        <CommitField
          label="Accept within, % of a step"
          kind="number"
          min={0}
          max={50}
          value={String(Number((100 * grid.tolerance).toPrecision(6)))}
          onCommit={(value) => {
            const tolerance = Number(value) / 100;
            if (tolerance >= 0) change({ ...grid, tolerance: Math.min(0.5, tolerance) });
          }}
        />
      )}
      {inUse !== undefined && others.length > 0 && (
        <div className="offers" role="group" aria-label="Grids offered">
          {timing.offers.map((offer) => (
            <button
              key={gridText(offer)}
              type="button"
              aria-pressed={offer.rule === grid.rule && offer.step === grid.step}
              onClick={() => change(offer)}
            >
              {gridText(offer)}
            </button>
          ))}
        </div>
      )}
    </Told>
  );
}
