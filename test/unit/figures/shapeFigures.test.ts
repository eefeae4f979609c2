import { describe, expect, it } from 'vitest';
import type { Palette } from '../../../src/figures/figure.ts';
import { memoryFigure } from '../../../src/figures/memoryFigure.ts';
import { periodFigure } from '../../../src/figures/periodFigure.ts';
import { seasonFigure } from '../../../src/figures/seasonFigure.ts';
import { spreadFigure } from '../../../src/figures/spreadFigure.ts';
import {
  adviceHeadline,
  differencingName,
  outcomeSentences,
  periodName,
  placeName,
  reasonSentence,
} from '../../../src/format/shapeText.ts';
import { describeShape } from '../../../workers/identification/describeShape.ts';
import { publishedSeries } from '../../helpers/publishedSeries.ts';

const palette: Palette = {
  ink: '#000',
  faint: '#666',
  ground: '#fff',
  hairline: '#ccc',
  band: '#eee',
  accent: '#00f',
  sound: '#0a0',
  doubtful: '#aa0',
  unsound: '#a00',
};
const axis = { kind: 'months', start: -252, step: 1, zone: null } as const;
const answer = describeShape({ values: publishedSeries('airline'), axis, order: { d: 1, D: 0, s: 0 } });
if (!answer.ok) throw new Error(JSON.stringify(answer.failure));
const shape = answer.value;

describe('charts of the shape', () => {
  it('memory: a bar and a diamond a lag, and a sentence that counts', () => {
    const { data, says } = memoryFigure(shape.lags, palette);
    expect(data.map(({ x }) => x.length)).toEqual([26, 26]);
    expect(says).toMatch(/lags 1 to 26: \d+ autocorrelations? outside/);
  });

  it('periods: named in months, every tick within the axis', () => {
    const { layout, says } = periodFigure(shape.spectrum, axis, palette);
    expect(says).toContain('a year');
    const { tickvals, range } = layout['xaxis'] as { tickvals: number[]; range: [number, number] };
    expect(tickvals.length).toBeGreaterThan(3);
    tickvals.forEach((tick) => {
      expect(Math.log10(tick)).toBeGreaterThanOrEqual(range[0]);
      expect(Math.log10(tick)).toBeLessThanOrEqual(range[1]);
    });
  });

  it('season: the airline record is highest in July and lowest in November, from its monthly means (Box & Jenkins, figure 9.1, by eye)', () => {
    const view = shape.seasonal.find(({ by }) => by === 'month')!;
    expect(seasonFigure(view, 'thousands', palette).says).toMatch(/highest at Jul.*lowest at Nov/);
    expect(placeName(view, 11)).toBe('Dec');
  });

  it('spread: logarithmic axes with a fitted power, linear ones without where readings are not positive', () => {
    const type = (figure: { layout: Readonly<Record<string, unknown>> }) =>
      (figure.layout['xaxis'] as { type: string }).type;
    expect(type(spreadFigure(shape.spread, '', palette))).toBe('log');
    const other = describeShape({
      values: publishedSeries('overshorts'),
      axis: { kind: 'index', start: 1, step: 1, zone: null },
      order: { d: 0, D: 0, s: 0 },
    });
    if (!other.ok) throw new Error('overshorts');
    const figure = spreadFigure(other.value.spread, '', palette);
    expect(type(figure)).toBe('linear');
    expect(figure.data).toHaveLength(1);
  });
});

describe('words of the shape', () => {
  it('names periods in the time of the record', () => {
    const seconds = { kind: 'seconds', start: 0, step: 600, zone: null } as const;
    const day = { name: 'day', readings: 144, harmonic: 1 } as const;
    expect(periodName(seconds, { period: 143.8, calendar: day })).toBe('a day');
    expect(periodName(seconds, { period: 72, calendar: { ...day, harmonic: 2 } })).toBe('half a day');
    expect(periodName(seconds, { period: 6, calendar: { name: 'hour', readings: 6, harmonic: 1 } })).toBe('an hour');
    expect(periodName(seconds, { period: 9, calendar: null })).toBe('90 minutes');
    expect(periodName({ ...axis, kind: 'index' }, { period: 3.3134, calendar: null })).toBe('3.31 readings');
  });

  it('writes differencing with the backshift notation of the trade', () => {
    expect(differencingName({ d: 0, D: 0, s: 0 })).toBe('the record itself');
    expect(differencingName({ d: 1, D: 1, s: 12 })).toBe('∇∇₁₂');
    expect(differencingName({ d: 2, D: 0, s: 0 })).toBe('∇²');
  });

  it('says the advice first and every reason as a sentence without a hole in it', () => {
    expect(adviceHeadline(shape)).toMatch(/^Try \(\d,1,\d\)×\(\d,1,\d\)₁₂, .*logarithm first/);
    expect(shape.advice.reasons.length).toBeGreaterThan(4);
    for (const reason of shape.advice.reasons)
      expect(reasonSentence(reason, axis)).not.toMatch(/(^| )–( |[.,:]|$)|NaN|undefined/);
    expect(new Set(Object.values(outcomeSentences)).size).toBe(4);
  });
});
