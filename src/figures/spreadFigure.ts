import type { SpreadAgainstLevel } from '../../workers/contract/shape.ts';
import { formatNumber } from '../format/numbers.ts';
import { baseAxis, baseLayout, type Figure, type Palette } from './figure.ts';

/** Standard deviation of each block against its mean; logarithmic axes with the fitted power where all means are positive. */
export function spreadFigure(spread: SpreadAgainstLevel, unit: string, palette: Palette): Figure {
  const { means, deviations, slope } = spread;
  const power = !Number.isNaN(slope);
  const sorted = Array.from(means).sort((a, b) => a - b);
  const ends = [sorted[0] ?? NaN, sorted.at(-1) ?? NaN];
  const middle = (values: Float64Array) => values.reduce((sum, value) => sum + Math.log(value), 0) / values.length;
  const height = (x: number) => Math.exp(middle(deviations) + slope * (Math.log(x) - middle(means)));
  const of = (name: string) => (unit === '' ? name : `${name} (${unit})`);
  return {
    data: [
      {
        type: 'scatter',
        mode: 'markers',
        x: means,
        y: deviations,
        marker: { symbol: 'circle-open', size: 6, color: palette.ink },
        hovertemplate: 'level %{x:.4g}, spread %{y:.3g}<extra></extra>',
      },
      ...(power
        ? [
            {
              type: 'scatter' as const,
              mode: 'lines' as const,
              x: ends,
              y: ends.map(height),
              line: { color: palette.accent, width: 2 },
              hoverinfo: 'skip' as const,
            },
          ]
        : []),
    ],
    layout: {
      ...baseLayout(palette),
      hovermode: 'closest',
      xaxis: baseAxis(palette, {
        type: power ? 'log' : 'linear',
        title: { text: of('level of a block'), standoff: 4 },
        nticks: 5,
      }),
      yaxis: baseAxis(palette, {
        type: power ? 'log' : 'linear',
        title: { text: of('spread'), standoff: 4 },
        nticks: 5,
      }),
    },
    says: power
      ? `Spread against level over ${means.length} blocks of ${spread.block} readings: the spread goes as the ${formatNumber(slope, 2)} power of the level.`
      : `Spread against level over ${means.length} blocks of ${spread.block} readings.`,
  };
}
