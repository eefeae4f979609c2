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

interface Clicked {
  readonly points: readonly { readonly customdata?: unknown }[];
}

interface Chart extends HTMLElement {
  on?(event: 'plotly_click', listener: (clicked: Clicked) => void): void;
  removeAllListeners?(event: 'plotly_click'): void;
}

/** Calls back with the number that the clicked mark carries. */
export function onClickedMark(element: Chart, call: (index: number) => void): void {
  element.removeAllListeners?.('plotly_click');
  element.on?.('plotly_click', ({ points }) => {
    const found = points.map(({ customdata }) => customdata).find((data) => typeof data === 'number');
    if (typeof found === 'number') call(found);
  });
}

/** Where the time axis of a drawn chart lies, in pixels from its left edge, and what it shows now; null before it is drawn. */
export function timeAxis(element: HTMLElement): TimeAxis | null {
  const axis = (element as { _fullLayout?: { xaxis?: DrawnAxis } })._fullLayout?.xaxis;
  if (axis === undefined) return null;
  const number = (value: number | string) =>
    typeof value === 'number' ? value : Date.parse(`${value.replace(' ', 'T')}${value.includes(' ') ? 'Z' : ''}`);
  return { left: axis._offset, width: axis._length, from: number(axis.range[0]), to: number(axis.range[1]) };
}

/** The part of a drawn axis that is used here. */
interface DrawnAxis {
  readonly _offset: number;
  readonly _length: number;
  readonly range: readonly [number | string, number | string];
}

export interface TimeAxis {
  readonly left: number;
  readonly width: number;
  readonly from: number;
  readonly to: number;
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
