import type { ShapeLags } from '../../workers/contract/shape.ts';
import { counted } from '../format/numbers.ts';
import { baseAxis, baseLayout, type Figure, type Palette } from './figure.ts';

/**
 * Memory of the record over the lag in one instrument: autocorrelations as bars, partial autocorrelations as open diamonds on the same axis. The shaded
 * area is where independent readings would keep a correlation; the stepped line where it would stay if the memory had ended before that lag.
 */
export function memoryFigure(
  { correlations, partials, pairs, independentBand, endedBand }: ShapeLags,
  palette: Palette,
): Figure {
  const lags = Array.from(correlations, (_, i) => i + 1);
  const steps = (band: Float64Array, sign: number) =>
    lags.flatMap((lag, i) => [`${lag - 0.5},${sign * band[i]!}`, `${lag + 0.5},${sign * band[i]!}`]);
  const area = [...steps(independentBand, 1), ...steps(independentBand, -1).reverse()];
  const outside = lags.map((_, i) => Math.abs(correlations[i]!) > endedBand[i]!);
  const all = [...correlations, ...partials].filter((value) => !Number.isNaN(value));
  const band = 1.3 * Math.max(0.1, ...independentBand.filter((value) => !Number.isNaN(value)));
  const low = Math.max(-1.05, Math.min(-band, ...all.map((value) => 1.12 * value)));
  const high = Math.min(1.05, Math.max(band, ...all.map((value) => 1.12 * value)));
  const line = (sign: number) => ({
    type: 'path',
    path: `M${steps(endedBand, sign).join('L')}`,
    line: { width: 1, color: palette.faint, dash: 'dot' },
    yref: 'y',
  });
  return {
    data: [
      {
        type: 'bar',
        x: lags,
        y: correlations,
        width: 0.5,
        marker: { color: outside.map((out) => (out ? palette.ink : palette.faint)), line: { width: 0 } },
        customdata: Array.from(pairs),
        hovertemplate: 'lag %{x}: r = %{y:.3f}, %{customdata} pairs<extra></extra>',
      },
      {
        type: 'scatter',
        mode: 'markers',
        x: lags,
        y: partials,
        marker: { symbol: 'diamond', size: 8, color: palette.ground, line: { width: 1.5, color: palette.accent } },
        hovertemplate: 'partial %{y:.3f}<extra></extra>',
      },
    ],
    layout: {
      ...baseLayout(palette),
      xaxis: baseAxis(palette, { range: [0.3, lags.length + 0.7], title: { text: 'lag', standoff: 4 } }),
      yaxis: baseAxis(palette, {
        range: [low, high],
        title: { text: 'r', standoff: 4 },
        zeroline: true,
        zerolinecolor: palette.hairline,
      }),
      shapes: [
        { type: 'path', path: `M${area.join('L')}Z`, fillcolor: palette.band, line: { width: 0 }, layer: 'below' },
        line(1),
        line(-1),
      ],
    },
    says: `Autocorrelations and partial autocorrelations at lags 1 to ${lags.length}: ${counted(outside.filter(Boolean).length, 'autocorrelation')} outside the band.`,
  };
}
