import type { Dialect } from '../../workers/contract/dialect.ts';
import type { ReadingNote } from '../../workers/contract/reading.ts';
import type { Axis } from '../../workers/contract/series.ts';
import { publishedSeries } from '../helpers/publishedSeries.ts';

/** What a record of e2e/fixtures must be read to; written by rule from a published series (generate/readingFixtures.mjs). */
export interface Reading {
  readonly file: string;
  readonly values: Float64Array;
  /** Digits behind the point to which values agree; left out: all. */
  readonly digits?: number;
  readonly axis: Axis;
  readonly name?: string;
  readonly unit?: string;
  readonly notes?: Partial<Record<ReadingNote['kind'], number>>;
  readonly asks?: readonly string[];
  readonly settings?: Partial<Dialect>;
  readonly detected?: Partial<Dialect>;
}

const hormone = publishedSeries('luteinisingHormone').slice(0, 24);
const airline = publishedSeries('airline').slice(0, 36);
const without = (...gaps: number[]) => hormone.map((value, k) => (gaps.includes(k) ? NaN : value));
const tenMinutes: Axis = { kind: 'seconds', start: Date.UTC(2024, 2, 13, 8) / 1000, step: 600, zone: null };
const days: Axis = { kind: 'seconds', start: Date.UTC(2024, 2, 13) / 1000, step: 86400, zone: null };
const months: Axis = { kind: 'months', start: (1949 - 1970) * 12, step: 1, zone: null };
const usual = (file: string, more: Partial<Reading> = {}): Reading => {
  return { file, values: hormone, axis: tenMinutes, ...more };
};
const bins = (rule: 'binMean' | 'last') => ({ kind: 'seconds', step: 600, rule, tolerance: 0.25 }) as const;
const sheet = (name: string): Partial<Dialect> => ({ delimiter: '\t', sheet: name });

/** Files of generate/plantFixtures.mjs and generate/workbookFixtures.mjs. */
export const plantReadings: readonly Reading[] = [
  usual('year-month-day-apart.csv', { axis: days, detected: { stampColumns: [0, 1, 2], stamp: 'yearFirst' } }),
  usual('day-month-year-apart.csv', { axis: days, detected: { stampColumns: [2, 1, 0], timeColumn: 2 } }),
  usual('year-to-minute-by-blanks.txt', { unit: 'IU/L', detected: { stampColumns: [0, 1, 2, 3, 4], unitsRow: true } }),
  usual('hours-and-minutes-in-one.csv', { detected: { stampColumns: [0, 1, 2, 3] } }),
  usual('year-and-month-apart.csv', { values: airline, axis: months, name: 'passengers' }),
  usual('month-name-beside-year.csv', {
    values: airline,
    axis: months,
    name: 'passengers',
    detected: { stampColumns: [1, 0] },
  }),
  usual('jahr-monat-tag-uhrzeit.csv', { detected: { stampColumns: [0, 1, 2], clockColumn: 3, decimal: ',' } }),
  usual('parts-without-header.csv', { name: 'column 6', detected: { stampColumns: [0, 1, 2, 3, 4] } }),
  usual('good-and-bad.csv', {
    values: without(3, 11),
    notes: { leftOutByStatus: 2 },
    detected: { status: { column: 2, keep: ['Good'] } },
  }),
  usual('good-and-bad.csv', {
    values: hormone.map((value, k) => (k === 3 || k === 11 ? 0 : value)),
    settings: { status: null },
  }),
  usual('quality-byte.csv', {
    values: without(3, 11),
    notes: { leftOutByStatus: 2 },
    detected: { status: { column: 2, keep: ['192'] } },
  }),
  usual('flag-of-one-and-nought.csv', {
    values: hormone.map((value, k) => (k === 3 || k === 11 ? 0 : value)),
    detected: { status: null },
  }),
  usual('flag-of-one-and-nought.csv', {
    values: without(3, 11),
    settings: { status: { column: 2, keep: ['0'] } },
    notes: { leftOutByStatus: 2 },
  }),
  usual('status-words-unknown.csv', { detected: { status: null } }),
  usual('zustand-der-messung.csv', { values: without(3, 11), notes: { leftOutByStatus: 2 } }),
  usual('letters-below-limit.csv', { values: without(5), notes: { belowLimit: 1 } }),
  usual('letters-below-limit.csv', {
    values: without(5),
    settings: { limitWords: [], gapWords: ['bdl'] },
    notes: { gapCells: 1 },
  }),
  usual('comma-below-limit.csv', { values: without(5), notes: { belowLimit: 1 }, detected: { decimal: ',' } }),
  usual('logged-on-change.csv', { settings: { grid: bins('last') } }),
  usual('many-readings-a-bin.csv', { settings: { grid: bins('binMean') }, digits: 9, notes: { sharedPlaces: 72 } }),
  usual('workbook.xlsx', { unit: 'IU/L', detected: sheet('Sheet 1') }),
  usual('workbook-with-cover.xlsx', { detected: sheet('Data') }),
  usual('workbook-of-1904.xlsx'),
  usual('workbook-of-texts.xlsx', { detected: { decimal: ',', stamp: 'dayFirst' } }),
  usual('workbook-with-errors.xlsx', { values: without(5, 9, 12), notes: { gapCells: 3 } }),
  usual('workbook-date-and-clock.xlsx', { detected: { timeColumn: 0, clockColumn: 1 } }),
];

/** Files to be opened together; read in test/unit/reading/joinFiles.test.ts. */
export const joinedFixtures: readonly string[] = [
  'export-1.csv',
  'export-2.csv',
  'export-2-corrected.csv',
  'export-3-turned.csv',
  'export-of-another-tag.csv',
];
