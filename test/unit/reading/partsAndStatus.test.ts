import { describe, expect, it } from 'vitest';
import { CellReader } from '../../../workers/reading/cells/cellReader.ts';
import { readRecord } from '../../../workers/reading/readRecord.ts';
import { ColumnTally } from '../../../workers/reading/rows/columnTally.ts';
import { sniffStatus } from '../../../workers/reading/sniff/sniffStatus.ts';
import { joinStampParts } from '../../../workers/reading/stamps/joinStampParts.ts';

describe('a stamp of parts', () => {
  it.each([
    [['2024', '3', '7'], '2024-03-07'],
    [['2024', 'Mrz.', '7'], '2024-03-07'],
    [['24', '12', '31', '23', '5'], '24-12-31 23:05'],
    [['2024', '3', '7', '905'], '2024-03-07 09:05'],
    [['2024', '3', '7', '9', '5', '7,25'], '2024-03-07 09:05:07.25'],
    [['2024', '3'], '2024-03-01'],
    [['2024.0', '3.0', '7.0'], '2024-03-07'],
    [['2024', '', '7'], '?'],
    [['2024', '3', '7.5'], '?'],
  ])('%j is %s', (cells, stamp) => {
    expect(joinStampParts(cells, [...cells.keys()])).toBe(stamp);
  });

  it('numbers that make no dates are no stamp', () => {
    const rows = Array.from({ length: 20 }, (_, k) => `${1900 + k},${(k % 12) + 1},${(k * 7) % 40}`);
    const { sniffed } = readRecord({ text: ['Year,Month,Day', ...rows].join('\n'), fileName: 'a', settings: {} });
    expect(sniffed!.dialect.stampColumns).not.toEqual([0, 1, 2]);
  });

  it('a record of one column of readings beside its parts keeps it', () => {
    const rows = Array.from({ length: 20 }, (_, k) => `2024,1,${k + 1},${(k * 7) % 11}`);
    const { record } = readRecord({ text: ['Year,Month,Day,v', ...rows].join('\n'), fileName: 'a', settings: {} });
    expect(record!.dialect).toMatchObject({ stampColumns: [0, 1, 2], valueColumn: 3 });
    expect(record!.columns).toEqual({});
  });
});

describe('a status column', () => {
  const tally = (cells: string[]) => {
    const column = new ColumnTally('');
    const reader = new CellReader({ decimal: '.', thousands: null, gapWords: [] });
    cells.forEach((cell, row) => column.take(cell, row, reader));
    return column;
  };
  const found = (name: string, ...cells: string[]) => sniffStatus([tally(cells)], [name], new Set());

  it('is taken where its words say good and bad', () => {
    expect(found('quality', 'Good', 'Bad', 'Good')).toEqual({ column: 0, keep: ['Good'] });
    expect(found('', 'ok', 'ok', 'error')).toEqual({ column: 0, keep: ['ok'] });
    expect(found('Status', 'good', 'Bad - sensor', 'ramp')).toEqual({ column: 0, keep: ['good', 'ramp'] });
    expect(found('valid', 'TRUE', 'FALSE')).toEqual({ column: 0, keep: ['TRUE'] });
  });
  it('is left alone where they may mean either', () => {
    expect(found('flag', '0', '1')).toBeNull();
    expect(found('running', 'TRUE', 'FALSE')).toBeNull();
    expect(found('Status', 'A', 'B')).toBeNull();
    expect(found('Status', 'Good', 'Good')).toBeNull();
    expect(found('remark', 'ok', 'error', 'pump swapped')).toBeNull();
  });
  it('of quality bytes keeps those with both high bits (OPC Data Access 3.00, § 6.8)', () => {
    expect(found('Quality', '192', '0', '216', '64')).toEqual({ column: 0, keep: ['192', '216'] });
    expect(found('level', '192', '0')).toBeNull();
  });
});

it('places below a detection limit are marked, unless another row fills them', () => {
  const cells = ['1.2', '<0.5', '1.4', 'BDL', '1.1', '1.7', '1.3', '1.9', '1.0', '1.5'];
  const rows = cells.map((cell, k) => `2024-05-0${Math.floor(k / 5) + 1} 0${k % 5}:00,${cell}`);
  rows.push('2024-05-01 01:00,0.7');
  const { record } = readRecord({ text: ['time,v', ...rows].join('\n'), fileName: 'a', settings: {} });
  expect([...record!.limitPlaces]).toEqual([3]);
  expect(record!.series.values[1]).toBe(0.7);
  expect(record!.notes.find(({ kind }) => kind === 'belowLimit')).toMatchObject({ count: 2, texts: ['<0.5', 'BDL'] });
});

it('a stamp without offset among stamps of two offsets is left out, and said so', () => {
  const stamp = (k: number) => (k === 4 ? '04:00' : `2024-03-31T0${k}:00:00+0${k < 3 ? 1 : 2}:00`);
  const rows = [0, 1, 3, 4, 5, 6, 7, 8, 9].map((k) => `${stamp(k)},${k * k}.5`);
  const { record } = readRecord({ text: ['time,v', ...rows, ''].join('\n'), fileName: 'a', settings: {} });
  expect([...record!.series.values]).toEqual([0.5, 1.5, 9.5, NaN, 25.5, 36.5, 49.5, 64.5, 81.5]);
  expect(record!.notes.find(({ kind }) => kind === 'noOffset')).toMatchObject({ count: 1, lines: [5] });
});
