import { expect, test } from 'vitest';
import { buildReport } from '../../../src/export/report/buildReport.ts';
import { initialView } from '../../../src/state/initialState.ts';
import { fitCandidate } from '../../../workers/estimation/fitCandidate.ts';
import { candidateOf } from '../../../workers/model/candidateOf.ts';
import { predictReadings } from '../../../workers/prediction/predictReadings.ts';
import { readRecord } from '../../../workers/reading/readRecord.ts';
import { integratedIntervals } from '../../../workers/uncertainty/integratedIntervals.ts';
import { judgeFit } from '../../../workers/verdict/judgeFit.ts';
import { publishedSeries } from '../../helpers/publishedSeries.ts';

const text = [
  'time,level (ft)',
  ...Array.from(publishedSeries('lakeHuron'), (value, t) => `${1875 + t}-01-01,${value}`),
].join('\n');

function report() {
  const { record } = readRecord({ text, fileName: 'lake.csv', settings: {} });
  if (record === null) throw new Error('not read');
  const { values } = record.series;
  const candidate = candidateOf({ order: { p: 2, d: 0, q: 0, P: 0, D: 0, Q: 0, s: 0 }, level: 'mean' });
  const fit = fitCandidate({ values, candidate, seed: 7 });
  if (!fit.ok) throw new Error(fit.failure.code);
  const judged = judgeFit({ fit: fit.value, values, coverage: 0.95 });
  if (!judged.ok) throw new Error(judged.failure.code);
  return buildReport({
    fileName: 'lake.csv',
    fileHash: 'f'.repeat(32),
    example: false,
    dialect: record.dialect,
    repairs: [],
    record,
    fit: fit.value,
    judgement: judged.value,
    prediction: predictReadings(fit.value, values, 5, { coverage: 0.95 }),
    intervals: integratedIntervals({ fit: fit.value, values, coverage: 0.95, seed: 1 }),
    checks: [],
    view: initialView,
    madeAt: new Date(Date.UTC(2026, 0, 2, 3, 4)),
  });
}

/** Published: Lake Huron AR(2), φ 1.044 −0.250, AICC 213.54 for the mean removed (Brockwell & Davis, ch. 5); with the mean estimated ln L −103.6332. */
test('the dossier holds the facts, the settings, the numbers and the cautions', () => {
  const made = report();
  const words = JSON.stringify(made);
  expect(made.sections.map(({ heading }) => heading)).toEqual([
    'Verdict',
    'Record',
    'Model',
    'Evidence',
    'Prediction',
    'How it was found',
    'Cautions',
  ]);
  for (const part of [
    'lake.csv',
    'f'.repeat(32),
    '1.04',
    '−0.25',
    '−103.6332',
    '579.0',
    'constant',
    'AICc',
    'σ² among them',
    'Seed',
    'safety limits',
  ])
    expect(words).toContain(part);
  expect(words).toContain('2026-01-02 03:04 UTC');
  expect(words).not.toMatch(/undefined|NaN|null/);
  const figures = made.sections.flatMap(({ blocks }) =>
    blocks.flatMap((block) => (block.kind === 'figure' ? [block.name] : [])),
  );
  expect(figures).toEqual(['record', 'lags', 'prediction']);
});
