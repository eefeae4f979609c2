import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type { Dialect } from '../../../workers/contract/dialect.ts';
import { joinFiles } from '../../../workers/reading/files/joinFiles.ts';
import { readRecord } from '../../../workers/reading/readRecord.ts';
import { publishedSeries } from '../../helpers/publishedSeries.ts';

/** The files hold the first 24 readings of the hormone (appendix of Diggle 1990), one a day from 13 March 2024. */
const hormone = Array.from(publishedSeries('luteinisingHormone').slice(0, 24));
const load = (fileName: string) => {
  return { fileName, text: readFileSync(new URL(`../../../e2e/fixtures/${fileName}`, import.meta.url), 'utf8') };
};

function readTogether(names: readonly string[], settings: Partial<Dialect> = {}) {
  const joined = joinFiles({ files: names.map(load), settings });
  if (!joined.ok) throw new Error(joined.failure.code);
  const { text, parts } = joined.value;
  const answer = readRecord({ text, fileName: 'several', settings, parts });
  expect(answer.failure).toBeNull();
  const record = answer.record!;
  return { text, parts, record, counts: Object.fromEntries(record.notes.map(({ kind, count }) => [kind, count])) };
}

describe('several files', () => {
  it('stand in the order of time however they are given, equal readings merged, columns and delimiter brought into line', () => {
    const orders = [
      ['export-1.csv', 'export-2.csv', 'export-3-turned.csv'],
      ['export-2.csv', 'export-3-turned.csv', 'export-1.csv'],
    ];
    const [one, other] = orders.map((order) => readTogether(order));
    expect(Array.from(one!.record.series.values)).toEqual(hormone);
    expect(one!.record.series.axis).toEqual({
      kind: 'seconds',
      start: Date.UTC(2024, 2, 13) / 1000,
      step: 86400,
      zone: null,
    });
    expect(one!.counts).toEqual({ duplicateTimes: 2, overlappingFiles: 2, reversedTimes: 1 });
    expect(other!.text).toBe(one!.text);
    expect(one!.parts).toEqual([
      { fileName: 'export-1.csv', line: 1, ownLine: 1 },
      { fileName: 'export-2.csv', line: 13, ownLine: 4 },
      { fileName: 'export-3-turned.csv', line: 21, ownLine: 2 },
    ]);
    const overlap = one!.record.notes.find(({ kind }) => kind === 'overlappingFiles')!;
    expect(overlap.lines).toEqual([13, 14]);
    expect(overlap.texts).toEqual(['export-1.csv', 'export-2.csv']);
  });

  it('that contradict each other are reported, and the person says which reading stays', () => {
    const names = ['export-1.csv', 'export-2-corrected.csv'];
    const expected = (tenth: number) => hormone.slice(0, 16).map((value, k) => (k === 9 ? tenth : value));
    for (const [repeats, tenth] of [
      ['first', hormone[9]!],
      ['last', 9.9],
      ['gap', NaN],
    ] as const) {
      const { record, counts } = readTogether(names, { repeats });
      expect(Array.from(record.series.values)).toEqual(expected(tenth));
      expect(counts).toMatchObject({ conflictingTimes: 1, overlappingFiles: 2 });
    }
  });

  it('with other columns, decimal marks or stamps are not put together, and both are named', () => {
    const first = load('export-1.csv');
    const failureOf = (text: string) => {
      const joined = joinFiles({ files: [first, { fileName: 'b.csv', text }], settings: {} });
      return joined.ok ? null : joined.failure;
    };
    expect(failureOf(load('export-of-another-tag.csv').text)).toEqual({
      code: 'filesDiffer',
      fileName: 'b.csv',
      firstName: 'export-1.csv',
      what: 'columns',
      expected: 'day, LH, state',
      found: 'day, flow, state',
    });
    const rows = Array.from({ length: 9 }, (_, k) => k);
    const days = rows.map((k) => `2${k}.04.2024;${k},5;good`);
    expect(failureOf(['day;LH;state', ...days].join('\n'))).toMatchObject({ what: 'stamp', found: 'dayFirst' });
    const commas = rows.map((k) => `2024-04-2${k};${k},25;good`);
    expect(failureOf(['day;LH;state', ...commas].join('\n'))).toMatchObject({ what: 'decimal', found: ',' });
  });

  it('without time are put together as they are given', () => {
    const files = [3, 1].map((k) => ({
      fileName: `${k}.txt`,
      text: `flow\n${Array.from({ length: 6 }, (_, i) => `${k}.${(i * i) % 7}`).join('\n')}`,
    }));
    const joined = joinFiles({ files, settings: {} });
    expect(joined.ok && joined.value.text.split('\n')[1]).toBe('3.0');
    expect(joined.ok && joined.value.parts.map(({ line }) => line)).toEqual([1, 8]);
  });
});
