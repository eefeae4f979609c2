import type { Series } from '../../../workers/contract/series.ts';
import { timeAt } from '../../format/axisTime.ts';
import { formatReading } from '../../format/numbers.ts';
import { chosenRow } from '../../state/selectors.ts';
import { useActions, useAppState } from '../../state/useApp.ts';

const events = [
  ['step', 'Step from here on'],
  ['pulse', 'Pulse here'],
  ['ramp', 'Ramp from here on'],
] as const;

/** The reading clicked in the chart, and what may have happened there: each adds a candidate with that event. */
export function PickedReading({ series }: { readonly series: Series }) {
  const actions = useActions();
  const picked = useAppState((state) => state.picked);
  const row = useAppState(chosenRow);
  if (picked === null || picked >= series.values.length) return null;
  return (
    <div className="picked" role="group" aria-label="Reading picked">
      <span>
        {timeAt(series.axis, picked)}: <strong>{formatReading(series.values[picked]!)}</strong> {series.unit}
      </span>
      {row !== null &&
        events.map(([kind, words]) => (
          <button
            key={kind}
            type="button"
            title="adds the chosen candidate once more, with this event"
            onClick={() => {
              actions.addCandidate({
                ...row.candidate,
                regressors: [...row.candidate.regressors, { kind, at: picked }],
              });
              actions.pick(null);
            }}
          >
            {words}
          </button>
        ))}
      <button type="button" className="edit" onClick={() => actions.pick(null)}>
        close
      </button>
    </div>
  );
}
