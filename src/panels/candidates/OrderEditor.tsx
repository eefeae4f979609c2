import type { Estimator, Order } from '../../../workers/contract/candidate.ts';
import { Choice } from '../../components/Choice.tsx';
import { candidateName, estimatorName } from '../../format/notation.ts';
import type { Row } from '../../state/appState.ts';
import { useActions } from '../../state/useApp.ts';

const fields: readonly (readonly [keyof Order, string, number])[] = [
  ['p', 'AR order p', 20],
  ['d', 'differences d', 3],
  ['q', 'MA order q', 20],
  ['P', 'seasonal AR order P', 6],
  ['D', 'seasonal differences D', 2],
  ['Q', 'seasonal MA order Q', 6],
  ['s', 'season s, in readings', 100_000],
];
const estimators: readonly Estimator[] = ['exact', 'conditional', 'yuleWalker', 'burg', 'leastSquares'];

/** Orders and estimator of one row; every change refits that row only. */
export function OrderEditor({ row }: { readonly row: Row }) {
  const actions = useActions();
  const { order, estimator } = row.candidate;
  const change = (field: keyof Order, value: number) => {
    if (!Number.isInteger(value) || value < 0) return;
    const next = { ...order, [field]: value };
    if (field === 's' && value === 0) Object.assign(next, { P: 0, D: 0, Q: 0 });
    if ((field === 'P' || field === 'D' || field === 'Q') && value > 0 && next.s < 2) next.s = 12;
    actions.changeCandidate(row.id, { order: next });
  };
  return (
    <div className="editor" role="group" aria-label={`Settings of ${candidateName(row.candidate)}`}>
      {fields.map(([field, says, most]) => (
        <label key={field} className="field" title={says}>
          {field}
          <input
            type="number"
            min={0}
            max={most}
            aria-label={says}
            value={order[field]}
            onChange={(event) => change(field, event.target.valueAsNumber)}
          />
        </label>
      ))}
      <Choice
        label="Estimator"
        value={estimator}
        options={estimators.map((each) => [each, estimatorName(each)] as const)}
        onChange={(value) => actions.changeCandidate(row.id, { estimator: value as Estimator })}
      />
      <button type="button" onClick={() => actions.duplicateCandidate(row.id)}>
        Add one with p + 1
      </button>
      <button type="button" onClick={() => actions.removeCandidate(row.id)}>
        Remove
      </button>
    </div>
  );
}
