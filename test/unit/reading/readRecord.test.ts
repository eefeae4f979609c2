import { describe, expect, it } from 'vitest';
import type { Dialect } from '../../../workers/contract/dialect.ts';
import { readRecord } from '../../../workers/reading/readRecord.ts';
import { publishedSeries } from '../../helpers/publishedSeries.ts';

const hormone = publishedSeries('luteinisingHormone');
const stamp = (k: number) => new Date(Date.UTC(2024, 2, 13, 8) + k * 600_000).toISOString().slice(0, 16);
const csv = (cell: (value: number, k: number) => string = String) =>
  ['time,LH,room', ...Array.from(hormone, (value, k) => `${stamp(k)},${cell(value, k)},${20 + (k % 3)}`)].join('\n');
const read = (text: string, settings: Partial<Dialect> = {}) => readRecord({ text, fileName: 'lh.csv', settings });

describe('settings of the person go before detection', () => {
  it('another value column', () => {
    const { record } = read(csv(), { valueColumn: 2 });
    expect(record!.name).toBe('room');
    expect([...record!.series.values.slice(0, 4)]).toEqual([20, 21, 22, 20]);
    expect([...record!.columns['LH']!]).toEqual([...hormone]);
  });

  it('no time: readings are numbered', () => {
    const { record } = read(csv(), { timeColumn: null });
    expect(record!.series.axis).toEqual({ kind: 'index', start: 1, step: 1, zone: null });
    expect([...record!.series.values]).toEqual([...hormone]);
  });

  it('a coarser grid of means', () => {
    const grid = { kind: 'seconds', step: 1800, rule: 'binMean', tolerance: 0.25 } as const;
    const { record } = read(csv(), { grid });
    expect(record!.series.values).toHaveLength(16);
    expect(record!.series.values[5]).toBeCloseTo((hormone[15]! + hormone[16]! + hormone[17]!) / 3, 14);
    expect(record!.dialect.grid).toEqual(grid);
  });

  it('a zone; a name that is no zone is left out', () => {
    const { axis } = read(csv(), { zone: 'Europe/Berlin' }).record!.series;
    // 08:00 in Berlin on 13 March 2024 is 07:00 UTC.
    expect(axis).toEqual({ kind: 'seconds', start: Date.UTC(2024, 2, 13, 7) / 1000, step: 600, zone: 'Europe/Berlin' });
    expect(read(csv(), { zone: 'Plant/Clock' }).record!.dialect.zone).toBeNull();
  });

  it('tags without time are numbered, and no other tag is set beside them', () => {
    const rows = Array.from(hormone, (value, k) => `${stamp(k)},LH,${value}\n${stamp(k)},TI,${k % 3}`);
    const text = ['time,tag,value', ...rows].join('\n');
    expect(Object.keys(read(text).record!.columns)).toEqual(['TI']);
    const { record } = read(text, { timeColumn: null, tagColumn: 1, layout: 'long', tag: 'LH' });
    expect([...record!.series.values]).toEqual([...hormone]);
    expect(record!.columns).toEqual({});
  });

  it('a column that is not there is named', () => {
    const { failure, sniffed } = read(csv(), { valueColumn: 7 });
    expect(failure).toEqual({ code: 'noSuchColumn', column: 8, columns: 3 });
    expect(sniffed!.first).toHaveLength(12);
  });

  it('a header that is none, lines that are skipped', () => {
    expect(read(csv(), { header: false }).record).toMatchObject({ name: 'column 2', dialect: { preambleLines: 1 } });
    const kinds = read(csv(), { header: false, preambleLines: 0 }).record!.notes.map(({ kind }) => kind);
    expect(kinds).toEqual(['badStamps', 'textCells']);
    expect(read(csv(), { preambleLines: 3 }).record!.series.values).toHaveLength(46);
  });

  it('another delimiter leaves no numbers, and says so', () => {
    expect(read(csv(), { delimiter: '|' }).failure).toMatchObject({ code: 'noNumbers', line: 2, column: 1 });
  });
});

describe('the preview', () => {
  it('shows the first rows and the worst, with what is wrong', () => {
    const text = csv((value, k) => (k === 30 ? 'Bad' : String(value))).replace('2024-03-13T14:40', '2024-03-13T25:40');
    const { sniffed } = read(`${text}\n${stamp(20)},9.9,21`);
    expect(sniffed!.first[0]).toEqual({
      line: 2,
      cells: ['2024-03-13T08:00', '2.4', '20'],
      time: Date.UTC(2024, 2, 13, 8) / 1000,
      value: 2.4,
      trouble: 'none',
    });
    expect(sniffed!.worst.map(({ line, trouble }) => [line, trouble])).toEqual([
      [32, 'badValue'],
      [42, 'badStamp'],
      [50, 'duplicate'],
    ]);
  });

  it('is there when the reading fails', () => {
    const { sniffed, record } = read(
      csv(() => '7'),
      { valueColumn: 1 },
    );
    expect(record).toBeNull();
    expect(sniffed!.columns.map(({ name, role }) => [name, role])).toEqual([
      ['time', 'time'],
      ['LH', 'value'],
      ['room', 'value'],
    ]);
  });
});

it('an hour that the plant clock had twice is noted where the stamps turn back', () => {
  const autumn = (k: number) => {
    const utc = Date.UTC(2024, 9, 26, 22) + k * 600_000;
    return new Date(utc + (utc >= Date.UTC(2024, 9, 27, 1) ? 1 : 2) * 3_600_000).toISOString().slice(0, 16);
  };
  const text = ['time,LH', ...Array.from(hormone, (value, k) => `${autumn(k)},${value}`)].join('\n');
  const { record } = read(text);
  const notes = record!.notes.map(({ kind, count, lines }) => ({ kind, count, lines }));
  expect(notes).toContainEqual({ kind: 'clockChange', count: 1, lines: [20] });
  expect(notes).toContainEqual(expect.objectContaining({ kind: 'duplicateTimes', count: 6 }));
  expect(read(text, { zone: 'Europe/Berlin' }).record!.series.values).toHaveLength(48);
});

it('names that repeat are told apart, and odd ones do no harm', () => {
  const rows = Array.from(hormone, (value, k) => `${stamp(k)},${value},${k % 3},${k % 5}`);
  const { record } = read(['time,LH,LH,__proto__', ...rows].join('\n'));
  expect(Object.keys(record!.columns)).toEqual(['LH (2)', '__proto__']);
});

it('the answer crosses a thread boundary unchanged', () => {
  const answer = read(csv((value, k) => (k === 5 ? '' : String(value))));
  expect(structuredClone(answer)).toEqual(answer);
});

it('a million rows are read, with progress that never goes back', () => {
  const parts = ['ts,v'];
  for (let k = 0; k < 1_000_000; k++) parts.push(`${1_700_000_000 + 60 * k},${k % 1000}`);
  const told: number[] = [];
  const { record, failure } = readRecord({ text: parts.join('\n'), fileName: 'big.csv', settings: {} }, (fraction) =>
    told.push(fraction),
  );
  expect(failure).toBeNull();
  expect(record!.rows).toBe(1_000_000);
  expect(record!.series.axis).toEqual({ kind: 'seconds', start: 1_700_000_000, step: 60, zone: 'UTC' });
  expect(record!.series.values.reduce((sum, value) => sum + value, 0)).toBe(499_500_000);
  expect(record!.notes).toEqual([]);
  expect(told.length).toBeGreaterThan(20);
  expect(told.at(-1)).toBe(1);
  expect(told.every((fraction, k) => fraction >= (told[k - 1] ?? 0) && fraction <= 1)).toBe(true);
});
