import type { Axis, Repair } from '../../../workers/contract/series.ts';
import { axesOf, changeText } from '../../format/repairText.ts';
import { orderMatters } from '../../state/moveRepair.ts';
import { useActions } from '../../state/useApp.ts';

/** The repairs in the order they are replayed from the raw file, each with its reason and a way back. */
export function RepairList({ repairs, axis }: { readonly repairs: readonly Repair[]; readonly axis: Axis }) {
  const actions = useActions();
  if (repairs.length === 0) return <p className="quiet">None: the record stands as it was read.</p>;
  const axes = axesOf(axis, repairs);
  const may = (index: number) => {
    const [first, second] = [repairs[index], repairs[index + 1]];
    return first !== undefined && second !== undefined && orderMatters(first, second);
  };
  return (
    <ol className="repairs" aria-label="Repairs">
      {repairs.map((repair, index) => (
        <li key={repair.id}>
          <p>{changeText(repair, axes[index]!)}</p>
          <div className="repair-tools">
            <label className="field why">
              Why
              <input
                type="text"
                key={repair.why}
                defaultValue={repair.why}
                maxLength={500}
                onBlur={(event) => actions.explainRepair(repair.id, event.target.value.trim())}
                onKeyDown={(event) => {
                  if (event.key === 'Enter') event.currentTarget.blur();
                }}
              />
            </label>
            {may(index - 1) && (
              <button
                type="button"
                aria-label={`Move repair ${index + 1} up`}
                onClick={() => void actions.moveRepair(repair.id, -1)}
              >
                ↑
              </button>
            )}
            {may(index) && (
              <button
                type="button"
                aria-label={`Move repair ${index + 1} down`}
                onClick={() => void actions.moveRepair(repair.id, 1)}
              >
                ↓
              </button>
            )}
            <button
              type="button"
              aria-label={`Remove repair ${index + 1}`}
              onClick={() => void actions.removeRepair(repair.id)}
            >
              Remove
            </button>
          </div>
        </li>
      ))}
    </ol>
  );
}
