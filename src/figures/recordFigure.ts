import type { Regressor } from '../../workers/contract/candidate.ts';
import type { Evidence } from '../../workers/contract/diagnostics.ts';
import type { Prediction } from '../../workers/contract/prediction.ts';
import type { Axis, Series } from '../../workers/contract/series.ts';
import { chartTime, timeAt } from '../format/axisTime.ts';
import { counted, formatNumber } from '../format/numbers.ts';
import { baseAxis, baseLayout, type Figure, type Palette, type Trace } from './figure.ts';
import { gapRuns } from './gapRuns.ts';
import { thinned } from './thinned.ts';

/** Innovations drawn as stems up to this many, as a line above. */
const MOST_STEMS = 1500;

export interface RecordParts {
  readonly series: Series;
  readonly name: string;
  readonly evidence: Evidence | null;
  readonly prediction: Prediction | null;
  /** Events of the chosen candidate, flagged; none when left out. */
  readonly events?: readonly Regressor[];
  /** The reading spoken of. */
  readonly picked?: number | null;
  /** The readings as they were read, on the same places: those made gaps since are drawn faintly. */
  readonly raw?: Series;
}

/**
 * The record along the top, gaps hatched; beneath it, on the same time axis, the standardised innovations of the chosen
 * candidate, or nothing where none is chosen.
 */
export function recordFigure(parts: RecordParts, palette: Palette): Figure {
  const { series, name, evidence, prediction, raw, events = [], picked = null } = parts;
  const { axis, values, unit } = series;
  const withInnovations = evidence !== null;
  const x = (index: readonly number[]) => index.map((t) => chartTime(axis, t));
  const line = thinned(values);
  const data: Trace[] = [
    ...hatched(values, axis, palette),
    ...(raw === undefined ? [] : setAside(raw, values, palette)),
    {
      type: 'scatter',
      mode: 'lines',
      x: x(line.index),
      y: line.value,
      line: { color: palette.ink, width: 1 },
      connectgaps: false,
      customdata: line.index,
      hovertemplate: '%{y}<extra></extra>',
    },
    ...predicted(series, prediction, palette),
    ...(withInnovations ? innovationTraces(evidence, axis, palette) : []),
  ];
  const title = unit === '' ? name : `${name} (${unit})`;
  const gaps = gapRuns(values).length;
  return {
    data,
    layout: {
      ...baseLayout(palette),
      xaxis: baseAxis(palette, {
        type: axis.kind === 'index' ? 'linear' : 'date',
        anchor: withInnovations ? 'y2' : 'y',
        title: axis.zone !== null ? { text: 'time (UTC)' } : { text: '' },
      }),
      yaxis: baseAxis(palette, { domain: withInnovations ? [0.46, 1] : [0, 1], title: { text: title, standoff: 4 } }),
      yaxis2: baseAxis(palette, {
        domain: [0, 0.38],
        title: { text: 'e/s', standoff: 4 },
        zeroline: true,
        zerolinecolor: palette.hairline,
      }),
      annotations: flags(events, axis, palette),
      shapes: [
        ...uprights(events, picked, axis, palette),
        ...(withInnovations
          ? [
              {
                type: 'rect',
                xref: 'paper',
                x0: 0,
                x1: 1,
                yref: 'y2',
                y0: -2,
                y1: 2,
                fillcolor: palette.band,
                line: { width: 0 },
                layer: 'below',
              },
            ]
          : []),
      ],
      yaxis3: { domain: [0, 1], range: [0, 1], fixedrange: true, visible: false, overlaying: 'y' },
    },
    says:
      `${name}: ${counted(values.length, 'place')} from ${timeAt(axis, 0)} to ${timeAt(axis, values.length - 1)}, ${counted(gaps, 'gap')}.` +
      (withInnovations ? ' Beneath it the standardised innovations of the chosen candidate.' : ''),
  };
}

type Event = Extract<Regressor, { at: number }>;

function eventsOf(inputs: readonly Regressor[]): Event[] {
  return inputs.filter((input): input is Event => 'at' in input);
}

/** Events as flags at the top of the record. */
function flags(inputs: readonly Regressor[], axis: Axis, palette: Palette): object[] {
  return eventsOf(inputs).map(({ kind, at }) => ({
    x: chartTime(axis, kind === 'pulse' ? at : at - 0.5),
    y: 1,
    yref: 'paper',
    yanchor: 'top',
    xanchor: 'left',
    text: kind,
    showarrow: false,
    font: { color: palette.accent, size: 12 },
    bgcolor: palette.ground,
  }));
}

/** Upright lines through record and innovations: events, and the reading spoken of. */
function uprights(inputs: readonly Regressor[], picked: number | null, axis: Axis, palette: Palette): object[] {
  const line = (x: number, dash: 'solid' | 'dot', color: string) => ({
    type: 'line',
    x0: x,
    x1: x,
    yref: 'paper',
    y0: 0,
    y1: 1,
    line: { color, width: 1, dash },
  });
  return [
    ...eventsOf(inputs).map(({ kind, at }) =>
      line(chartTime(axis, kind === 'pulse' ? at : at - 0.5), 'solid', palette.accent),
    ),
    ...(picked === null ? [] : [line(chartTime(axis, picked), 'dot', palette.ink)]),
  ];
}

/** Gaps as hatched columns over the whole height. */
function hatched(values: Float64Array, axis: Axis, palette: Palette): Trace[] {
  const runs = gapRuns(values).slice(0, 400);
  if (runs.length === 0) return [];
  return [
    {
      type: 'bar',
      x: runs.map(({ from, to }) => (chartTime(axis, from - 0.5) + chartTime(axis, to - 0.5)) / 2),
      y: runs.map(() => 1),
      width: runs.map(({ from, to }) => chartTime(axis, to - 0.5) - chartTime(axis, from - 0.5)),
      yaxis: 'y3',
      marker: {
        color: 'rgba(0,0,0,0)',
        line: { width: 0 },
        pattern: { shape: '/', size: 6, solidity: 0.25, fgcolor: palette.faint, bgcolor: palette.band },
      },
      hoverinfo: 'skip',
    },
  ];
}

/** Readings that were made gaps, as far as they lie near the others: a code of −999 would flatten the record. */
function setAside(raw: Series, values: Float64Array, palette: Palette): Trace[] {
  let [low, high] = [Infinity, -Infinity];
  for (const value of values) if (!Number.isNaN(value)) [low, high] = [Math.min(low, value), Math.max(high, value)];
  const margin = (high - low) / 2;
  const gone = raw.values.map((value, t) =>
    Number.isNaN(values[t]!) && value >= low - margin && value <= high + margin ? value : NaN,
  );
  if (gone.every((value) => Number.isNaN(value))) return [];
  const { index, value } = thinned(gone);
  return [
    {
      type: 'scatter',
      mode: 'lines+markers',
      x: index.map((t) => chartTime(raw.axis, t)),
      y: value,
      line: { color: palette.faint, width: 0.7 },
      marker: { size: 3, color: palette.faint },
      connectgaps: false,
      hovertemplate: 'made a gap: %{y}<extra></extra>',
    },
  ];
}

function innovationTraces({ innovations }: Evidence, axis: Axis, palette: Palette): Trace[] {
  const { standardised } = innovations;
  const { index, value } = thinned(standardised);
  const x = index.map((t) => chartTime(axis, t));
  const hovertemplate = '%{y:.2f} s<extra></extra>';
  if (standardised.length > MOST_STEMS)
    return [
      {
        type: 'scatter',
        mode: 'lines',
        x,
        y: value,
        yaxis: 'y2',
        line: { color: palette.ink, width: 0.7 },
        hovertemplate,
      },
    ];
  const width = 0.4 * (chartTime(axis, 1) - chartTime(axis, 0));
  return [
    { type: 'bar', x, y: value, yaxis: 'y2', width, marker: { color: palette.ink, line: { width: 0 } }, hovertemplate },
  ];
}

function predicted({ axis, values }: Series, prediction: Prediction | null, palette: Palette): Trace[] {
  if (prediction === null) return [];
  const x = Array.from(prediction.median, (_, h) => chartTime(axis, values.length + h));
  const edge = { color: palette.accent, width: 0.5 };
  return [
    { type: 'scatter', mode: 'lines', x, y: prediction.lower, line: edge, hoverinfo: 'skip' },
    {
      type: 'scatter',
      mode: 'lines',
      x,
      y: prediction.upper,
      line: edge,
      fill: 'tonexty',
      fillcolor: palette.band,
      hoverinfo: 'skip',
    },
    {
      type: 'scatter',
      mode: 'lines',
      x,
      y: prediction.median,
      line: { color: palette.accent, width: 2 },
      hovertemplate: '%{y}<extra></extra>',
    },
  ];
}

/** The forecast alone, with the last readings before it. */
export function predictionFigure(series: Series, name: string, prediction: Prediction, palette: Palette): Figure {
  const { axis, values, unit } = series;
  const from = Math.max(0, values.length - 3 * prediction.horizon - 20);
  const index = Array.from({ length: values.length - from }, (_, i) => from + i);
  const last = prediction.median.at(-1) ?? NaN;
  return {
    data: [
      {
        type: 'scatter',
        mode: 'lines+markers',
        x: index.map((t) => chartTime(axis, t)),
        y: index.map((t) => (Number.isNaN(values[t]!) ? null : values[t]!)),
        line: { color: palette.ink, width: 1 },
        marker: { size: 3, color: palette.ink },
        connectgaps: false,
        hovertemplate: '%{y}<extra></extra>',
      },
      ...predicted(series, prediction, palette),
    ],
    layout: {
      ...baseLayout(palette),
      xaxis: baseAxis(palette, { type: axis.kind === 'index' ? 'linear' : 'date' }),
      yaxis: baseAxis(palette, { title: { text: unit === '' ? name : `${name} (${unit})`, standoff: 4 } }),
    },
    says: `Prediction of the next ${counted(prediction.horizon, 'reading')}; at the end ${formatNumber(last, 5)} ${unit}.`,
  };
}
