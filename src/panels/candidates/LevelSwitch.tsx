import type { Level } from '../../../workers/contract/candidate.ts';
import type { Row } from '../../state/appState.ts';
import { useActions } from '../../state/useApp.ts';

const levels: readonly Level[] = ['none', 'mean', 'drift'];

/** What is estimated beside the ARMA part; a mean only without differencing, a drift only with it. */
export function LevelSwitch({ row }: { readonly row: Row }) {
  const actions = useActions();
  const { order, level } = row.candidate;
  const differences = order.d + order.D;
  const barred = (each: Level) =>
    each === 'mean' && differences > 0
      ? 'differencing takes the mean away'
      : each === 'drift' && differences === 0
        ? 'a drift needs differencing'
        : null;
  return (
    <div role="radiogroup" aria-label="Level" className="level">
      {levels.map((each) => {
        const reason = barred(each);
        return (
          <label key={each} title={reason ?? undefined} className={reason === null ? undefined : 'barred'}>
            <input
              type="radio"
              name={`level-${row.id}`}
              checked={level === each}
              disabled={reason !== null}
              onChange={() => actions.changeCandidate(row.id, { level: each })}
              onClick={(event) => event.stopPropagation()}
            />
            <span>{each}</span>
          </label>
        );
      })}
    </div>
  );
}
