import type { Figure } from '../../figures/figure.ts';
import bar from 'plotly.js/lib/bar';
import Plotly from 'plotly.js/lib/core';

/* The one place that knows the chart library: its core draws lines, and bars are added. Loaded lazily. */
Plotly.register([bar]);

/** No tool bar, and above all no button that would send a chart to somebody's cloud. */
const config = {
  displayModeBar: false,
  displaylogo: false,
  showSendToCloud: false,
  responsive: false,
  doubleClick: 'reset',
};

export function draw(
  element: HTMLElement,
  figure: { data: readonly object[]; layout: object },
  size: { width: number; height: number },
) {
  return Plotly.react(element, figure.data, { ...figure.layout, ...size, autosize: false }, config);
}

export function erase(element: HTMLElement): void {
  Plotly.purge(element);
}

/** A figure as the text of one SVG document, drawn off the screen. */
export async function svgText(figure: Figure, width: number, height: number): Promise<string> {
  const address = await Plotly.toImage(
    { data: figure.data, layout: { ...figure.layout, width, height } },
    { format: 'svg', width, height },
  );
  return decodeURIComponent(address.slice(address.indexOf(',') + 1));
}
