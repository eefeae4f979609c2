import type { Estimator, Order, Transform, ZeroLags } from '../../../workers/contract/candidate.ts';
import { Choice } from '../../components/Choice.tsx';
import { CommitField } from '../../components/CommitField.tsx';
import { fittingZeroLags, lagsFrom } from '../../format/inputName.ts';
import { candidateName, estimatorName } from '../../format/notation.ts';
import type { Row } from '../../state/appState.ts';
import { activeRecord } from '../../state/selectors.ts';
import { useActions, useAppState } from '../../state/useApp.ts';
import { InputsEditor } from './InputsEditor.tsx';

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
const factors: readonly (readonly [keyof ZeroLags, 'p' | 'q' | 'P' | 'Q', string])[] = [
  ['ar', 'p', 'φ left out at lags'],
  ['ma', 'q', 'θ left out at lags'],
  ['seasonalAr', 'P', 'Φ left out at seasons'],
  ['seasonalMa', 'Q', 'Θ left out at seasons'],
];

/** Every setting of one row; a change refits that row only. */
export function OrderEditor({ row }: { readonly row: Row }) {
  const actions = useActions();
  const record = useAppState(activeRecord);
  const { order, estimator, zeroLags, regressors } = row.candidate;
  const change = (field: keyof Order, value: number) => {
    if (!Number.isInteger(value) || value < 0) return;
    const next = { ...order, [field]: value };
    if (field === 's' && value === 0) Object.assign(next, { P: 0, D: 0, Q: 0 });
    if ((field === 'P' || field === 'D' || field === 'Q') && value > 0 && next.s < 2) next.s = 12;
    actions.changeCandidate(row.id, { order: next, zeroLags: fittingZeroLags({ order: next, zeroLags }) });
  };
  const loaded = record?.source.kind === 'loaded' ? record.source.record : null;
  return (
    <div className="settings" role="group" aria-label={`Settings of ${candidateName(row.candidate)}`}>
      <div className="editor">
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
        {factors
          .filter(([, size]) => order[size] > 1)
          .map(([factor, size, says]) => (
            <CommitField
              key={factor}
              label={says}
              value={zeroLags[factor].join(', ')}
              onCommit={(text) => {
                const lags = lagsFrom(text)?.filter((lag) => lag < order[size]);
                if (lags !== undefined) actions.changeCandidate(row.id, { zeroLags: { ...zeroLags, [factor]: lags } });
              }}
            />
          ))}
      </div>
      <div className="editor">
        <TransformChoice row={row} />
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
      {loaded !== null && (
        <InputsEditor
          inputs={regressors}
          axis={loaded.series.axis}
          length={loaded.series.values.length}
          columns={Object.keys(loaded.columns)}
          onChange={(inputs) => actions.changeCandidate(row.id, { regressors: inputs })}
        />
      )}
    </div>
  );
}

function TransformChoice({ row }: { readonly row: Row }) {
  const actions = useActions();
  const { transform } = row.candidate;
  const kind = transform.kind === 'boxCox' && transform.lambda === 'estimate' ? 'estimate' : transform.kind;
  const choose = (value: string) => {
    const next: Transform =
      value === 'boxCox'
        ? { kind: 'boxCox', lambda: 0.5 }
        : value === 'estimate'
          ? { kind: 'boxCox', lambda: 'estimate' }
          : { kind: value === 'log' ? 'log' : 'none' };
    actions.changeCandidate(row.id, { transform: next });
  };
  return (
    <>
      <Choice
        label="Transform"
        value={kind}
        options={[
          ['none', 'none'],
          ['log', 'natural logarithm'],
          ['boxCox', 'power λ, given'],
          ['estimate', 'power λ, estimated'],
        ]}
        onChange={choose}
      />
      {transform.kind === 'boxCox' && transform.lambda !== 'estimate' && (
        <CommitField
          label="λ"
          kind="number"
          min={-3}
          max={3}
          value={String(transform.lambda)}
          onCommit={(text) => {
            const lambda = Number(text);
            if (text !== '' && Number.isFinite(lambda))
              actions.changeCandidate(row.id, { transform: { kind: 'boxCox', lambda } });
          }}
        />
      )}
    </>
  );
}
