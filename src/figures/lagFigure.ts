import type { Evidence } from '../../workers/contract/diagnostics.ts';
import { counted, formatPValue } from '../format/numbers.ts';
import { baseAxis, baseLayout, type Figure, type Palette, type Trace } from './figure.ts';

/** p-values below this are drawn at the end of the scale; the hover text has the number. */
const FLOOR = 1e-4;
const TICKS = [1, 0.05, 0.01, 0.001, 1e-4];

/**
 * One instrument over the lag: above, the residual autocorrelations with the band they would keep within by chance; below,
 * hanging from the same axis, how small the portmanteau p-value up to each lag is, on a logarithmic scale. No p-value is drawn
 * where the lag does not exceed the number of coefficients.
 */
export function lagFigure({ correlogram, portmanteau }: Evidence, palette: Palette): Figure {
  const lags = Array.from(correlogram.lags);
  // The band as one area: along the upper edges, back along the lower ones. Areas lie under the bars as shapes; traces would cover them.
  const edge = (i: number, sign: 1 | -1): string[] => {
    const [left, right] = sign > 0 ? [-0.5, 0.5] : [0.5, -0.5];
    return [left, right].map((shift) => `${lags[i]! + shift},${sign * correlogram.bands[i]!}`);
  };
  const upper = lags.flatMap((_, i) => edge(i, 1));
  const lower = lags.flatMap((_, i) => edge(lags.length - 1 - i, -1));
  const outside = lags.map((_, i) => Math.abs(correlogram.correlations[i]!) > correlogram.bands[i]!);
  const shown = Array.from(portmanteau.lags).filter((_, i) => !Number.isNaN(portmanteau.pValues[i]!));
  const p = shown.map((lag) => portmanteau.pValues[Array.from(portmanteau.lags).indexOf(lag)]!);
  const data: Trace[] = [
    {
      type: 'bar',
      x: lags,
      y: correlogram.correlations,
      width: 0.34,
      marker: { color: outside.map((out) => (out ? palette.unsound : palette.ink)), line: { width: 0 } },
      hovertemplate: 'lag %{x}: r = %{y:.3f}<extra></extra>',
    },
    {
      type: 'bar',
      x: shown,
      y: p.map((value) => Math.log10(Math.max(value, FLOOR))),
      yaxis: 'y2',
      width: 0.62,
      text: p.map(formatPValue),
      textposition: 'none',
      marker: { color: p.map((value) => shade(value, palette)), line: { width: 0 } },
      hovertemplate: 'up to lag %{x}: p %{text}<extra></extra>',
    },
  ];
  const largest = Math.max(0.3, ...Array.from(correlogram.correlations, Math.abs), ...correlogram.bands) * 1.1;
  const low = Math.log10(FLOOR);
  const smallest = p.length === 0 ? NaN : Math.min(...p);
  return {
    data,
    layout: {
      ...baseLayout(palette),
      xaxis: baseAxis(palette, {
        anchor: 'y2',
        side: 'bottom',
        range: [0.3, lags.length + 0.7],
        title: { text: 'lag', standoff: 4 },
      }),
      yaxis: baseAxis(palette, {
        domain: [0.5, 1],
        range: [-largest, largest],
        title: { text: 'residual r', standoff: 4 },
        zeroline: true,
        zerolinecolor: palette.hairline,
      }),
      yaxis2: baseAxis(palette, {
        domain: [0, 0.46],
        range: [low, 0],
        tickvals: TICKS.map((value) => Math.log10(value)),
        ticktext: TICKS.map((value) => (value === FLOOR ? '≤ 0.0001' : String(value))),
        title: { text: 'p up to lag', standoff: 4 },
      }),
      shapes: [
        {
          type: 'path',
          path: `M${[...upper, ...lower].join('L')}Z`,
          fillcolor: palette.band,
          line: { width: 0 },
          layer: 'below',
          yref: 'y',
        },
        {
          type: 'rect',
          xref: 'paper',
          x0: 0,
          x1: 1,
          yref: 'y2',
          y0: low,
          y1: Math.log10(0.05),
          fillcolor: palette.band,
          line: { width: 0 },
          layer: 'below',
        },
      ],
    },
    says:
      `Residual autocorrelations at lags 1 to ${lags.length}: ${counted(outside.filter(Boolean).length, 'lag')} outside the band. ` +
      (p.length === 0
        ? 'No portmanteau p-value can be given.'
        : `Smallest portmanteau p-value ${formatPValue(smallest)}.`),
  };
}

function shade(p: number, palette: Palette): string {
  if (p < 0.01) return palette.unsound;
  return p < 0.05 ? palette.doubtful : palette.faint;
}
