import { expect, test } from 'vitest';
import { placeAtChart, placeOfTime, chartTime, timeAt, typedTime } from '../../../src/format/axisTime.ts';
import { failureText } from '../../../src/format/failureText.ts';
import { findingText, offerText, reportSentence, untestedSentence } from '../../../src/format/findingText.ts';
import { axesOf, changeText } from '../../../src/format/repairText.ts';
import { moveRepair, orderMatters } from '../../../src/state/moveRepair.ts';
import type { EffectCode, Finding, FindingCode } from '../../../workers/contract/forensics.ts';
import type { Axis, Repair, RepairChange } from '../../../workers/contract/series.ts';
import { applyRepairs } from '../../../workers/forensics/applyRepairs.ts';

const axis: Axis = { kind: 'seconds', start: Date.UTC(2024, 2, 13) / 1000, step: 60, zone: null };
const repairOf = (id: string, change: RepairChange): Repair => ({ id, at: '2025-01-01T00:00:00Z', why: '', ...change });

const numbers = {
  value: -999,
  kinds: 1,
  longest: 12,
  least: 4,
  readings: 40,
  share: 0.4,
  expected: 0.001,
  kept: 0.6,
  step: 0.5,
  inDeviations: 2.1,
  noise: 0.1,
  largest: 8.2,
  statistic: 9,
  limit: 5.5,
  size: 3.1,
  at: 40,
  ratio: 2,
  p: 1e-5,
  shorter: 60,
  longer: 300,
  missing: 1,
  repeated: 0,
  window: 5,
  depth: 0.02,
  ends: 1,
};
const all: [FindingCode, EffectCode][] = [
  ['sentinel', 'meaningless'],
  ['clipped', 'tailsCut'],
  ['frozen', 'memoryInvented'],
  ['interpolated', 'memoryInvented'],
  ['quantised', 'roundingNoise'],
  ['outlier', 'memoryHidden'],
  ['levelStep', 'memoryInvented'],
  ['varianceChange', 'intervalsWrong'],
  ['intervalChange', 'mixedIntervals'],
  ['clockChange', 'patternShifted'],
  ['averaged', 'filteredSignal'],
];

test.each(all)('%s is told in whole sentences, with an effect and a way on', (code, effect) => {
  for (const offered of [[], [{ kind: 'gap', from: 1, to: 2 } as const]])
    for (const count of [1, 3]) {
      const finding: Finding = { code, count, places: [{ from: 60, to: 62 }], numbers, effect, offered };
      const { says, where, effect: does, advice } = findingText(finding, axis, 'bar');
      expect(says).toMatch(/^[A-Z0-9].*\.$/u);
      expect(where).toContain('2024-03-13 01:00');
      expect(does).toMatch(/\.$/u);
      expect(advice === '').toBe(offered.length > 0);
      expect(`${says}${does}${advice}`).not.toMatch(/undefined|NaN/u);
    }
});

test('buttons and the line of the whole report', () => {
  const finding: Finding = {
    code: 'interpolated',
    count: 12,
    places: [
      { from: 1, to: 2 },
      { from: 5, to: 9 },
    ],
    numbers,
    effect: 'memoryInvented',
    offered: [],
  };
  expect(offerText(finding, { kind: 'gaps', runs: [1, 1] }, axis)).toBe('Make the 12 stretches gaps');
  expect(offerText({ ...finding, code: 'outlier', count: 1 }, { kind: 'gap', from: 1, to: 2 }, axis)).toBe(
    'Make the reading a gap',
  );
  expect(offerText(finding, { kind: 'regrid', step: 300, rule: 'binMean' }, axis)).toBe(
    'Regrid every 5 minutes, the mean of the readings in each interval',
  );
  const report = { seriesHash: '', untested: [], resolution: 0, innovationScale: 1 };
  expect(reportSentence({ ...report, findings: [] })).toBe('nothing found');
  expect(reportSentence({ ...report, findings: [finding] })).toBe('straight lines (12)');
  expect(untestedSentence([{ code: 'averaged', reason: 'gaps' }])).toBe(
    'Not looked for, since too few readings stand side by side: averages.',
  );
});

test('repairs in words', () => {
  expect(changeText({ kind: 'gap', from: 60, to: 61 }, axis)).toBe('1 reading made a gap: 2024-03-13 01:00');
  expect(changeText({ kind: 'gaps', runs: [60, 2, 10, 3] }, axis)).toBe(
    '5 readings in 2 stretches made gaps, the first 2024-03-13 01:00 to 2024-03-13 01:01',
  );
  expect(changeText({ kind: 'scale', factor: 1.8, offset: 32, unit: '°F' }, axis)).toBe(
    'readings rescaled: 1.8 · reading + 32, in °F',
  );
  expect(changeText({ kind: 'scale', factor: 1, offset: 0, unit: 'kPa' }, axis)).toBe('unit set to kPa');
  expect(changeText({ kind: 'regrid', step: 300, rule: 'last' }, axis)).toBe(
    'laid on a grid every 5 minutes: the last reading of each interval',
  );
  const text = failureText({ code: 'repairRefused', id: 'm1', place: 2, kind: 'gap', reason: 'outside', readings: 40 });
  expect(text.what).toBe('A repair cannot be made: it names readings beyond the 40 places of the record.');
  expect(text.where).toBe('repair 2 (m1)');
});

test('typed times name places, with and without a zone', () => {
  expect(placeOfTime(axis, '2024-03-13 01:00')).toBe(60);
  expect(placeOfTime(axis, '2024-03-13T01:00:30')).toBe(61);
  expect(placeOfTime(axis, '2024-03-13')).toBe(0);
  expect(placeOfTime(axis, 'reading 12')).toBe(11);
  expect(placeOfTime(axis, 'soon')).toBeNull();
  expect(placeOfTime({ ...axis, kind: 'index', start: 1, step: 1 }, 'reading 12')).toBe(11);
  const months: Axis = { kind: 'months', start: 12 * 54, step: 1, zone: null };
  expect(placeOfTime(months, '2024-03')).toBe(2);
  const berlin: Axis = { ...axis, zone: 'Europe/Berlin' };
  for (const place of [0, 100, 30_000]) expect(placeOfTime(berlin, timeAt(berlin, place))).toBe(place);
  for (const one of [axis, months, { ...axis, step: 0.02 }]) {
    expect(placeAtChart(one, chartTime(one, 7))).toBe(7);
    expect(placeOfTime(one, typedTime(one, 7))).toBe(7);
  }
});

test('a gap moved across a regrid keeps its time', () => {
  const gap = repairOf('g', { kind: 'gap', from: 8, to: 12 });
  const grid = repairOf('r', { kind: 'regrid', step: 240, rule: 'binMean' });
  expect(orderMatters(gap, grid)).toBe(true);
  expect(orderMatters(gap, repairOf('s', { kind: 'scale', factor: 2, offset: 0, unit: '' }))).toBe(false);
  const behind = moveRepair(axis, [gap, grid], 'g', 1);
  expect(behind.map(({ id }) => id)).toEqual(['r', 'g']);
  expect(behind[1]).toMatchObject({ kind: 'gap', from: 2, to: 3 });
  const back = moveRepair(axis, behind, 'g', -1);
  expect(back).toEqual([gap, grid]);
  expect(moveRepair(axis, [gap, grid], 'g', -1)).toEqual([gap, grid]);
  const many = repairOf('m', { kind: 'gaps', runs: [5, 1, 1, 1, 8, 2] });
  expect(moveRepair(axis, [many, grid], 'm', 1)[1]).toMatchObject({ kind: 'gaps', runs: [1, 1, 2, 1] });
  const values = Float64Array.from({ length: 60 }, (_, t) => t);
  const raw = { values, axis, unit: '', hash: '' };
  const [one, other] = [applyRepairs(raw, [gap, grid]), applyRepairs(raw, behind)];
  expect(one.ok && other.ok && one.value.hash).toBe(other.ok && other.value.hash);
  expect(axesOf(axis, [grid, gap]).map(({ step }) => step)).toEqual([60, 240]);
});
