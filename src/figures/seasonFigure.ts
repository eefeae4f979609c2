import type { SeasonalView } from '../../workers/contract/shape.ts';
import { formatNumber } from '../format/numbers.ts';
import { placeName, viewNames } from '../format/shapeText.ts';
import { baseAxis, baseLayout, type Figure, type Palette } from './figure.ts';

/** Seasonal means as dots with the reach of two standard errors as upright lines. */
export function seasonFigure(view: SeasonalView, unit: string, palette: Palette): Figure {
  const { means, standardErrors, by } = view;
  const x = Array.from(means, (_, i) => i);
  const reach = Array.from(standardErrors, (error) => (Number.isNaN(error) ? 0 : 2 * error));
  const every = by === 'hour' ? 3 : Math.ceil(x.length / 12);
  const shown = x.filter((i) => i % every === 0);
  let high = 0;
  means.forEach((mean, i) => (high = mean > means[high]! ? i : high));
  let low = 0;
  means.forEach((mean, i) => (low = mean < means[low]! ? i : low));
  return {
    data: [
      {
        type: 'scatter',
        mode: 'lines',
        x: x.flatMap((i) => [i, i, null]),
        y: x.flatMap((i) => [means[i]! - reach[i]!, means[i]! + reach[i]!, null]),
        line: { color: palette.faint, width: 2 },
        hoverinfo: 'skip',
        connectgaps: false,
      },
      {
        type: 'scatter',
        mode: 'lines+markers',
        x,
        y: means,
        line: { color: palette.hairline, width: 1 },
        marker: { size: 6, color: palette.ink },
        text: x.map((i) => `${placeName(view, i)}: ${formatNumber(means[i]!, 3)} ± ${formatNumber(reach[i]!, 2)}`),
        hovertemplate: '%{text}<extra></extra>',
      },
    ],
    layout: {
      ...baseLayout(palette),
      xaxis: baseAxis(palette, {
        tickvals: shown,
        ticktext: shown.map((i) => (by === 'hour' ? String(i) : placeName(view, i))),
        tickangle: 0,
        title: { text: viewNames[by], standoff: 4 },
        range: [-0.6, x.length - 0.4],
      }),
      yaxis: baseAxis(palette, {
        title: { text: unit === '' ? 'departure' : `departure (${unit})`, standoff: 4 },
        zeroline: true,
        zerolinecolor: palette.hairline,
      }),
    },
    says: `Seasonal means by ${viewNames[by]}: highest at ${placeName(view, high)}, ${formatNumber(means[high]!, 3)}, lowest at ${placeName(view, low)}, ${formatNumber(means[low]!, 3)}.`,
  };
}
