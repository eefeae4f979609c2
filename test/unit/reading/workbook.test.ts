import { readFileSync } from 'node:fs';
import { expect, it } from 'vitest';
import { readWorkbook } from '../../../workers/reading/workbook/readWorkbook.ts';
import { sheetText } from '../../../workers/reading/workbook/sheetText.ts';
import { unpackedBytes } from '../../../workers/reading/workbook/unpackedBytes.ts';

const load = (name: string): ArrayBuffer => {
  const bytes = readFileSync(new URL(`../../../e2e/fixtures/${name}`, import.meta.url));
  return Uint8Array.from(bytes).buffer;
};

it('cells become text that reads back to the same values', () => {
  // ECMA-376 part 1, § 18.17.4.1: serial 45364 is 13 March 2024; a third of a day is 08:00, cut to milliseconds on the way.
  const eight = new Date(Date.UTC(2024, 2, 13, 8) - 1);
  const clock = new Date(Date.UTC(1899, 11, 31, 8));
  const rows = [
    ['time', 'say "x"', 'a\tb', 'clock', null],
    [eight, 0.1 + 0.2, true, clock, null],
    [null, -1e-7, 'x', null],
  ];
  expect(sheetText(rows)).toBe(
    'time\t"say ""x"""\t"a\tb"\tclock\n2024-03-13 08:00:00\t0.30000000000000004\tTRUE\t08:00:00\n\t-1e-7\tx\t\n',
  );
  expect(sheetText([])).toBe('');
});

it('dates that are all at midnight are days', () => {
  const days = [13, 14].map((day) => [new Date(Date.UTC(2024, 2, day))]);
  expect(sheetText(days)).toBe('2024-03-13\n2024-03-14\n');
});

it('the first sheet with numbers is taken, another one on demand, and all are listed', async () => {
  const bytes = load('workbook-with-cover.xlsx');
  const first = await readWorkbook({ bytes, sheet: null });
  expect(first.ok && first.value.sheet).toBe('Data');
  expect(first.ok && first.value.sheets).toEqual([
    { name: 'Cover', rows: 3, numbers: 1 },
    { name: 'Data', rows: 27, numbers: 24 },
    { name: 'Limits', rows: 13, numbers: 24 },
  ]);
  const other = await readWorkbook({ bytes, sheet: 'Limits' });
  expect(other.ok && other.value.text.split('\n')[2]).toBe('T1\t0.14285714285714285\t1.5');
  const none = await readWorkbook({ bytes, sheet: 'Sheet9' });
  expect(none).toEqual({
    ok: false,
    failure: { code: 'noSuchSheet', sheet: 'Sheet9', sheets: ['Cover', 'Data', 'Limits'] },
  });
});

it('an archive is measured by its directory and refused before it is unpacked', async () => {
  const bytes = load('workbook.xlsx');
  expect(unpackedBytes(bytes)).toBeGreaterThan(bytes.byteLength);
  expect(unpackedBytes(load('workbook-that-would-fill-the-memory.xlsx'))).toBeGreaterThan(4e9);
  for (const length of [0, 4, 21, 22, 100, bytes.byteLength - 1])
    expect(unpackedBytes(bytes.slice(0, length))).toBeNaN();
  const answer = await readWorkbook({ bytes: load('workbook-that-would-fill-the-memory.xlsx'), sheet: null });
  expect(answer).toMatchObject({ ok: false, failure: { code: 'workbookTooLarge' } });
});
