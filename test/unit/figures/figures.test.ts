import { describe, expect, test } from 'vitest';
import { gapRuns } from '../../../src/figures/gapRuns.ts';
import { lagFigure } from '../../../src/figures/lagFigure.ts';
import { recordFigure } from '../../../src/figures/recordFigure.ts';
import { thinned } from '../../../src/figures/thinned.ts';
import type { Palette } from '../../../src/figures/figure.ts';
import { diagnoseFit } from '../../../workers/diagnostics/diagnoseFit.ts';
import { fitCandidate } from '../../../workers/estimation/fitCandidate.ts';
import { candidateOf } from '../../../workers/model/candidateOf.ts';
import { publishedSeries } from '../../helpers/publishedSeries.ts';

const palette: Palette = {
  ink: 'ink',
  faint: 'faint',
  ground: 'ground',
  hairline: 'hairline',
  band: 'band',
  accent: 'accent',
  sound: 'sound',
  doubtful: 'doubtful',
  unsound: 'unsound',
};

function evidence(values: Float64Array) {
  const candidate = candidateOf({ order: { p: 1, d: 0, q: 0, P: 0, D: 0, Q: 0, s: 0 }, level: 'mean' });
  const fit = fitCandidate({ values, candidate, seed: 1 });
  if (!fit.ok) throw new Error(fit.failure.code);
  const found = diagnoseFit({ fit: fit.value, values, coverage: 0.95 });
  if (!found.ok) throw new Error(found.failure.code);
  return found.value;
}

describe('thinning keeps what an engineer must see', () => {
  const values = Float64Array.from({ length: 100_000 }, (_, t) => Math.sin(t / 50));
  values[77_777] = 12;
  values[33_333] = -9;
  values[50_000] = NaN;
  const { index, value } = thinned(values);
  test('a spike of one reading, in order, and the ends', () => {
    expect(index.length).toBeLessThan(6100);
    expect(index).toContain(77_777);
    expect(index).toContain(33_333);
    expect(index[0]).toBe(0);
    expect(index.at(-1)).toBe(99_999);
    expect([...index].sort((a, b) => a - b)).toEqual(index);
  });
  test('a gap of one reading breaks the line', () => {
    expect(value[index.indexOf(50_000)]).toBeNull();
  });
  test('a short record is left as it is', () => {
    expect(thinned(Float64Array.of(1, NaN, 3))).toEqual({ index: [0, 1, 2], value: [1, null, 3] });
  });
});

test('gaps as half-open stretches', () => {
  expect(gapRuns(Float64Array.of(NaN, 1, NaN, NaN, 2, NaN))).toEqual([
    { from: 0, to: 1 },
    { from: 2, to: 4 },
    { from: 5, to: 6 },
  ]);
  expect(gapRuns(Float64Array.of(1, 2))).toEqual([]);
});

test('the lag instrument draws no p-value where there is none, and clips the smallest', () => {
  const found = evidence(publishedSeries('lakeHuron'));
  const figure = lagFigure(found, palette);
  const [correlations, p] = figure.data;
  expect(correlations!.x.length).toBe(found.correlogram.lags.length);
  expect(Array.from(p!.x)).not.toContain(1); // one coefficient: nothing can be said up to lag 1
  expect(Array.from(p!.x)[0]).toBe(2);
  expect(Math.min(...Array.from(p!.y, Number))).toBeGreaterThanOrEqual(-4);
  expect(figure.says).toMatch(/Residual autocorrelations at lags 1 to \d+/);
});

test('record and innovations share one time axis; gaps are hatched', () => {
  const values = publishedSeries('presidents');
  const series = { values, axis: { kind: 'months', start: -300, step: 3, zone: null } as const, unit: '%', hash: 'h' };
  const figure = recordFigure({ series, name: 'approval', evidence: evidence(values), prediction: null }, palette);
  const hatched = figure.data.filter(({ marker }) => marker?.['pattern'] !== undefined);
  expect(hatched).toHaveLength(1);
  expect(hatched[0]!.x.length).toBe(gapRuns(values).length);
  expect(figure.data.every(({ xaxis }) => xaxis === undefined)).toBe(true);
  expect(figure.data.some(({ yaxis }) => yaxis === 'y2')).toBe(true);
  const drawn = figure.data.find(({ mode }) => mode === 'lines')!;
  expect(Array.from(drawn.y).filter((value) => value === null)).toHaveLength(6);
});
