import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { decodeFile } from '../../src/import/decodeFile.ts';
import { isWorkbook } from '../../src/import/isWorkbook.ts';
import type { Dialect } from '../../workers/contract/dialect.ts';
import type { ReadAnswer } from '../../workers/contract/reading.ts';
import { readRecord } from '../../workers/reading/readRecord.ts';
import { readWorkbook } from '../../workers/reading/workbook/readWorkbook.ts';
import { joinedFixtures } from './plantFixtures.ts';
import { readings, refusals } from './readingFixtures.ts';

const folder = new URL('../../e2e/fixtures/', import.meta.url);

async function read(file: string, settings: Partial<Dialect> = {}): Promise<ReadAnswer> {
  const blob = new Blob([readFileSync(new URL(file, folder))]);
  if (await isWorkbook(blob)) {
    const taken = await readWorkbook({ bytes: await blob.arrayBuffer(), sheet: settings.sheet ?? null });
    if (!taken.ok) return { sniffed: null, record: null, failure: taken.failure };
    return readRecord({ text: taken.value.text, fileName: file, settings: { ...taken.value.settings, ...settings } });
  }
  const decoded = await decodeFile(blob);
  if (!decoded.ok) return { sniffed: null, record: null, failure: decoded.failure };
  const { text, encoding } = decoded.value;
  return readRecord({ text, fileName: file, settings: { encoding, ...settings } });
}

const plain = (values: ArrayLike<number>) => Array.from(values, (value) => (Number.isNaN(value) ? null : value));

describe('records as exporters write them', () => {
  for (const expected of readings) {
    const { file, values, axis, settings = {} } = expected;
    const how = Object.keys(settings).length > 0 ? ` with ${JSON.stringify(settings)}` : '';
    it(`${file}${how}`, async () => {
      const { sniffed, record, failure } = await read(file, settings);
      expect(failure).toBeNull();
      const { digits } = expected;
      const rounded = record!.series.values.map((x) => (digits === undefined ? x : Number(x.toFixed(digits))));
      expect(plain(rounded)).toEqual(plain(values));
      expect(record!.series.axis).toEqual({ ...axis, step: expect.closeTo(axis.step, 9) as number });
      expect(record!.name).toBe(expected.name ?? 'LH');
      expect(record!.series.unit).toBe(expected.unit ?? '');
      expect(Object.fromEntries(record!.notes.map(({ kind, count }) => [kind, count]))).toEqual(expected.notes ?? {});
      if (expected.asks !== undefined) expect(sniffed!.questions.map(({ about }) => about)).toEqual(expected.asks);
      expect(record!.dialect).toMatchObject(expected.detected ?? {});
    });

    it(`${file}${how} reads the same again by the dialect it was read by`, async () => {
      const first = await read(file, settings);
      const again = await read(file, first.record!.dialect);
      expect(again.record!.dialect).toEqual(first.record!.dialect);
      expect(again.record!.series).toEqual(first.record!.series);
      expect(again.record!.columns).toEqual(first.record!.columns);
    });
  }
});

describe('files that are no record are refused with the place', () => {
  for (const { file, failure } of refusals) {
    it(file, async () => {
      const answer = await read(file);
      expect(answer.record).toBeNull();
      expect(answer.failure).toMatchObject(failure);
    });
  }
});

it('every fixture is expected to be something', () => {
  const known = new Set([...[...readings, ...refusals].map(({ file }) => file), ...joinedFixtures]);
  expect(readdirSync(folder).filter((file) => !known.has(file))).toEqual([]);
  expect(known.size).toBeGreaterThanOrEqual(120);
});
