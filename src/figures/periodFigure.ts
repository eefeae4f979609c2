import type { Axis } from '../../workers/contract/series.ts';
import type { ShapeSpectrum } from '../../workers/contract/shape.ts';
import { formatReadings } from '../format/axisTime.ts';
import { periodName } from '../format/shapeText.ts';
import { baseAxis, baseLayout, type Figure, type Palette } from './figure.ts';

const HOUR = 3600;
const DAY = 24 * HOUR;
const SECONDS = [1, 10, 60, 600, HOUR, 3 * HOUR, 6 * HOUR, 12 * HOUR, DAY, 2 * DAY, 7 * DAY, 30 * DAY, 365.25 * DAY];
/** Ticks stand at least this share of the axis apart. */
const APART = 0.09;
const MONTHS = [1, 2, 3, 4, 6, 12, 24, 60, 120, 240];
const PLAIN = [2, 3, 5, 10, 20, 50, 100, 200, 500, 1000, 2000, 5000, 10_000, 100_000];
const TICK_NAMES: Readonly<Record<number, string>> = {
  [30 * DAY]: '30 days',
  [365.25 * DAY]: 'a year',
};

/**
 * Periodogram over the length of the period, both axes logarithmic, with what its surroundings would give without a period as a shaded area, and the
 * periods that stand out of it named.
 */
export function periodFigure(
  { frequencies, ordinates, background, periods }: ShapeSpectrum,
  axis: Axis,
  palette: Palette,
): Figure {
  const length = Array.from(frequencies, (f) => 1 / f);
  const size = axis.kind === 'index' ? 1 : axis.step;
  const table = axis.kind === 'seconds' ? SECONDS : axis.kind === 'months' ? MONTHS : PLAIN;
  const longest = length[0] ?? 2;
  const shortest = length.at(-1) ?? 2;
  const span = Math.log(longest / shortest);
  const ticks: number[] = [];
  for (const tick of table) {
    const period = tick / size;
    const before = (ticks.at(-1) ?? 0) / size;
    if (period < 0.98 * shortest || period > 0.97 * longest) continue;
    if (before === 0 || Math.log(period / before) > APART * span) ticks.push(tick);
  }
  const positive = Array.from(ordinates, (value) => (value > 0 ? value : null));
  // The lowest of the ordinates says nothing: the axis starts where their surroundings do.
  const floor = Math.min(...Array.from(background).filter((value) => value > 0)) / 30;
  const top = Math.max(...ordinates);
  const bottom = Math.max(floor, top * 1e-9);
  const strongest = periods.slice(0, 3).sort((a, b) => a.period - b.period);
  // Names of neighbours stand on different heights.
  const close = (i: number) => i > 0 && Math.log(strongest[i]!.period / strongest[i - 1]!.period) < 0.25 * span;
  return {
    data: [
      {
        type: 'scatter',
        mode: 'lines',
        x: length,
        y: Array.from(background, () => bottom),
        line: { color: 'rgba(0,0,0,0)', width: 0 },
        hoverinfo: 'skip',
      },
      {
        type: 'scatter',
        mode: 'lines',
        x: length,
        y: background,
        line: { color: palette.hairline, width: 1 },
        fill: 'tonexty',
        fillcolor: palette.band,
        hoverinfo: 'skip',
      },
      {
        type: 'scatter',
        mode: 'lines',
        x: length,
        y: positive,
        line: { color: palette.ink, width: 1 },
        text: length.map((period) => formatReadings(axis, period)),
        hovertemplate: '%{text}<extra></extra>',
      },
      {
        type: 'scatter',
        mode: 'markers',
        x: periods.map(({ period }) => period),
        y: periods.map(({ frequency }) => ordinates[nearest(frequencies, frequency)]!),
        marker: { symbol: 'circle', size: 8, color: palette.accent },
        text: periods.map((one) => periodName(axis, one)),
        hovertemplate: '%{text}<extra></extra>',
      },
    ],
    layout: {
      ...baseLayout(palette),
      hovermode: 'closest',
      margin: { l: 64, r: 12, t: 24, b: 40 },
      xaxis: baseAxis(palette, {
        type: 'log',
        tickvals: ticks.map((tick) => tick / size),
        ticktext: ticks.map((tick) => TICK_NAMES[tick] ?? formatReadings(axis, tick / size).replace(/ readings?$/, '')),
        title: { text: axis.kind === 'index' ? 'period, readings' : 'period', standoff: 4 },
        range: [Math.log10(shortest) - 0.03, Math.log10(longest) + 0.03],
      }),
      yaxis: baseAxis(palette, {
        type: 'log',
        range: [Math.log10(bottom), Math.log10(top) + 0.16 * Math.log10(top / bottom)],
        title: { text: 'periodogram', standoff: 4 },
        exponentformat: 'power',
        nticks: 4,
      }),
      annotations: strongest.map((one, i) => ({
        x: Math.log10(one.period),
        y: Math.log10(ordinates[nearest(frequencies, one.frequency)]!),
        text: periodName(axis, one),
        showarrow: false,
        yshift: close(i) && !close(i - 1) ? 28 : 13,
        font: { color: palette.accent },
      })),
    },
    says:
      periods.length === 0
        ? 'Periodogram: no period stands out.'
        : `Periodogram: ${periods.map((one) => periodName(axis, one)).join(', ')} stand out.`,
  };
}

function nearest(frequencies: Float64Array, frequency: number): number {
  let best = 0;
  for (let i = 1; i < frequencies.length; i++)
    if (Math.abs(frequencies[i]! - frequency) < Math.abs(frequencies[best]! - frequency)) best = i;
  return best;
}
