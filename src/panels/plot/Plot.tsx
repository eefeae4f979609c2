import { useEffect, useRef } from 'react';
import type { Figure } from '../../figures/figure.ts';
import { enqueueDrawing } from './drawQueue.ts';
import { MarkLayer } from './MarkLayer.tsx';

interface PlotProps {
  readonly figure: Figure;
  readonly label: string;
  readonly height: number;
  /** Called with the index of the reading that is clicked. */
  readonly onPick?: (index: number) => void;
  /** Given while a stretch is to be marked: a drag across the chart reports its ends on the time axis. */
  readonly onMark?: ((from: number, to: number) => void) | undefined;
}

/** A chart. Its text alternative stands beside it; the drawing itself is hidden from readers of the screen. */
export function Plot({ figure, label, height, onPick, onMark }: PlotProps) {
  const frame = useRef<HTMLDivElement>(null);
  const current = useRef(figure);

  useEffect(() => {
    const element = frame.current;
    if (element === null) return undefined;
    current.current = figure;
    let gone = false;
    const redraw = () =>
      enqueueDrawing(async () => {
        if (gone || current.current !== figure) return;
        const width = element.clientWidth;
        if (width === 0) return;
        const { draw, onClickedMark } = await import('./plotlyBundle.ts');
        await draw(element, figure, { width, height });
        if (onPick !== undefined) onClickedMark(element, onPick);
        element.dataset['drawn'] = 'true';
      });
    redraw();
    let width = element.clientWidth;
    const observer = new ResizeObserver(() => {
      if (Math.abs(element.clientWidth - width) < 2) return;
      width = element.clientWidth;
      redraw();
    });
    observer.observe(element);
    return () => {
      gone = true;
      observer.disconnect();
    };
  }, [figure, height, onPick]);

  useEffect(() => {
    const element = frame.current;
    return () => {
      if (element !== null) void import('./plotlyBundle.ts').then(({ erase }) => erase(element));
    };
  }, []);

  return (
    <figure className="plot" aria-label={label}>
      <div ref={frame} className="plot-frame" style={{ height }} aria-hidden="true" />
      {onMark !== undefined && <MarkLayer frame={frame} onMark={onMark} />}
      <figcaption className="unseen">{figure.says}</figcaption>
    </figure>
  );
}
