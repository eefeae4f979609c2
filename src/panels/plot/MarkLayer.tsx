import { useState, type PointerEvent, type RefObject } from 'react';
import type { TimeAxis } from './plotlyBundle.ts';

interface MarkLayerProps {
  readonly frame: RefObject<HTMLDivElement | null>;
  readonly onMark: (from: number, to: number) => void;
}

interface Drag {
  readonly axis: TimeAxis;
  readonly start: number;
  readonly end: number;
}

/** Lies over a chart while a stretch is marked: a drag reports its two ends on the time axis, a click one point. */
export function MarkLayer({ frame, onMark }: MarkLayerProps) {
  const [drag, setDrag] = useState<Drag | null>(null);
  const x = (event: PointerEvent<HTMLDivElement>) => event.clientX - event.currentTarget.getBoundingClientRect().left;
  const timeOf = ({ left, width, from, to }: TimeAxis, at: number) =>
    from + ((to - from) * Math.min(Math.max(at - left, 0), width)) / width;

  const begin = async (event: PointerEvent<HTMLDivElement>) => {
    const at = x(event);
    const element = event.currentTarget;
    const { pointerId } = event;
    const { timeAxis } = await import('./plotlyBundle.ts');
    const axis = frame.current === null ? null : timeAxis(frame.current);
    if (axis === null) return;
    element.setPointerCapture(pointerId);
    setDrag({ axis, start: at, end: at });
  };
  const finish = () => {
    if (drag === null) return;
    const ends = [timeOf(drag.axis, drag.start), timeOf(drag.axis, drag.end)] as const;
    setDrag(null);
    onMark(Math.min(...ends), Math.max(...ends));
  };

  return (
    <div
      className="mark-layer"
      aria-hidden="true"
      onPointerDown={(event) => void begin(event)}
      onPointerMove={(event) => {
        if (drag !== null) setDrag({ ...drag, end: x(event) });
      }}
      onPointerUp={finish}
      onPointerCancel={() => setDrag(null)}
    >
      {drag !== null && (
        <span
          className="mark-band"
          style={{ left: Math.min(drag.start, drag.end), width: Math.max(2, Math.abs(drag.end - drag.start)) }}
        />
      )}
    </div>
  );
}
