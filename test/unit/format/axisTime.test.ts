import { expect, test } from 'vitest';
import { formatDuration, formatInterval, formatReadings, formatSpan, timeAt } from '../../../src/format/axisTime.ts';
import type { Axis } from '../../../workers/contract/series.ts';

const seconds = (step: number, start = Date.UTC(2024, 2, 13, 8) / 1000): Axis => ({
  kind: 'seconds',
  start,
  step,
  zone: null,
});

test('times are written in ISO 8601 order, as exact as the interval needs', () => {
  expect(timeAt(seconds(600), 3)).toBe('2024-03-13 08:30');
  expect(timeAt(seconds(1), 61)).toBe('2024-03-13 08:01:01');
  expect(timeAt(seconds(86400, Date.UTC(2024, 1, 28) / 1000), 2)).toBe('2024-03-01');
  expect(timeAt({ kind: 'months', start: 12 * 54, step: 1, zone: null }, 13)).toBe('2025-02');
  expect(timeAt({ kind: 'index', start: 1, step: 1, zone: null }, 6)).toBe('reading 7');
});

test('a record in a zone is shown in that zone (07:00 UTC is 08:00 in Berlin in winter)', () => {
  const axis: Axis = { kind: 'seconds', start: Date.UTC(2024, 0, 10, 7) / 1000, step: 3600, zone: 'Europe/Berlin' };
  expect(timeAt(axis, 0)).toBe('2024-01-10 08:00');
});

test('durations, intervals and stretches', () => {
  expect(formatDuration(600)).toBe('10 minutes');
  expect(formatDuration(86400)).toBe('1 day');
  expect(formatDuration(5400)).toBe('90 minutes');
  expect(formatInterval(seconds(600))).toBe('every 10 minutes');
  expect(formatInterval(seconds(3600))).toBe('every hour');
  expect(formatInterval({ kind: 'months', start: 0, step: 12, zone: null })).toBe('every year');
  expect(formatReadings(seconds(600), 12)).toBe('2 hours');
  expect(formatSpan(seconds(600), { from: 0, to: 4 })).toBe('2024-03-13 08:00 to 2024-03-13 08:30');
});
