import type { Shape } from '../../../workers/contract/shape.ts';
import { Choice } from '../../components/Choice.tsx';
import type { ShapeLook } from './useShape.ts';

interface LookControlsProps {
  readonly shape: Shape;
  readonly look: ShapeLook;
  readonly onChange: (look: ShapeLook) => void;
}

/** Differencing and transform of what is shown; the record and the candidates stay as they are. */
export function LookControls({ shape, look, onChange }: LookControlsProps) {
  const { order, transform } = look;
  const { advice } = shape;
  const season = order.s > 1 ? order.s : advice.order.s;
  const powers = ['0', '1', '2'].map((value) => [value, value] as const);
  return (
    <div className="look-controls">
      <Choice
        label="Differences d"
        value={String(order.d)}
        options={powers}
        onChange={(value) => onChange({ ...look, order: { ...order, d: Number(value) } })}
      />
      <Choice
        label="Seasonal D"
        value={String(order.D)}
        options={powers.slice(0, 2)}
        onChange={(value) =>
          onChange({
            ...look,
            order: { ...order, D: Number(value), s: Number(value) > 0 ? Math.max(2, season) : order.s },
          })
        }
      />
      <label className="field">
        Season s
        <input
          type="number"
          min={0}
          max={400}
          value={season}
          onChange={(event) => {
            const s = Math.min(400, Math.max(0, Math.round(event.target.valueAsNumber || 0)));
            onChange({ ...look, order: { ...order, s: s === 1 ? 2 : s, D: s > 1 ? order.D : 0 } });
          }}
        />
      </label>
      <Choice
        label="Transform"
        value={transform.kind}
        options={[
          ['none', 'none'],
          ['log', 'logarithm'],
        ]}
        onChange={(value) => onChange({ ...look, transform: { kind: value === 'log' ? 'log' : 'none' } })}
      />
      <button type="button" onClick={() => onChange({ order: advice.order, transform: advice.transform })}>
        As advised
      </button>
    </div>
  );
}
