import fc from 'fast-check';
import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { decodeFile } from '../../src/import/decodeFile.ts';
import { isWorkbook } from '../../src/import/isWorkbook.ts';
import type { Dialect } from '../../workers/contract/dialect.ts';
import type { ReadAnswer, ReadingNote } from '../../workers/contract/reading.ts';
import { joinFiles } from '../../workers/reading/files/joinFiles.ts';
import { readRecord } from '../../workers/reading/readRecord.ts';
import { readWorkbook } from '../../workers/reading/workbook/readWorkbook.ts';

/** 2 000 in the suite; FUZZ_FILES=100000 for the long run. */
const files = Number(process.env['FUZZ_FILES'] ?? 2000);
const seed = Number(process.env['FUZZ_SEED'] ?? 20240313);
const folder = new URL('../../e2e/fixtures/', import.meta.url);
const fixtures = readdirSync(folder).map((name) => readFileSync(new URL(name, folder)));
const whole = readFileSync(new URL('export-2.csv', folder), 'utf8');
const pieces = [
  '"',
  "'",
  ',',
  ';',
  '\t',
  '|',
  ' ',
  '\n',
  '\r',
  '\r\n',
  '\0',
  '\ufeff',
  '-',
  '.',
  ':',
  'T',
  'Z',
  'NaN',
  '1e999',
].concat([
  '-999',
  '1,234.5',
  '2024-13-45',
  '29.02.2023',
  '99:99',
  '=SUM(A1)',
  '__proto__',
  '\u2212',
  'é',
  '999999999999999999999',
  '12/13/14',
  '<0.05',
  'BDL',
  'Bad',
  'Year,Month,Day',
]);

type Mutation =
  | { kind: 'insert'; at: number; piece: string }
  | { kind: 'remove' | 'double'; at: number; length: number }
  | { kind: 'flip'; at: number; byte: number }
  | { kind: 'lines'; at: number; to: number };

const place = fc.double({ min: 0, max: 1, noNaN: true });
const mutation: fc.Arbitrary<Mutation> = fc.oneof(
  fc.record({ kind: fc.constant<'insert'>('insert'), at: place, piece: fc.constantFrom(...pieces) }),
  fc.record({ kind: fc.constantFrom<('remove' | 'double')[]>('remove', 'double'), at: place, length: fc.nat(80) }),
  fc.record({ kind: fc.constant<'flip'>('flip'), at: place, byte: fc.nat(255) }),
  fc.record({ kind: fc.constant<'lines'>('lines'), at: place, to: place }),
);

function mutate(bytes: Buffer, change: Mutation): Buffer {
  const at = Math.floor(change.at * bytes.length);
  switch (change.kind) {
    case 'insert':
      return Buffer.concat([bytes.subarray(0, at), Buffer.from(change.piece), bytes.subarray(at)]);
    case 'remove':
      return Buffer.concat([bytes.subarray(0, at), bytes.subarray(at + change.length)]);
    case 'double':
      return Buffer.concat([bytes.subarray(0, at + change.length), bytes.subarray(at)]);
    case 'flip': {
      const copy = Buffer.from(bytes);
      if (at < copy.length) copy[at] = change.byte;
      return copy;
    }
    case 'lines': {
      // Two lines change places.
      const lines = bytes.toString('latin1').split('\n');
      const [one, other] = [Math.floor(change.at * lines.length), Math.floor(change.to * lines.length)];
      if (one >= lines.length || other >= lines.length) return bytes;
      [lines[one], lines[other]] = [lines[other]!, lines[one]!];
      return Buffer.from(lines.join('\n'), 'latin1');
    }
  }
}

const countOf = (notes: readonly ReadingNote[], ...kinds: ReadingNote['kind'][]) =>
  notes.filter(({ kind }) => kinds.includes(kind)).reduce((sum, { count }) => sum + count, 0);

/** Whatever the file: an answer that is a record or a failure, well formed, with every number of the column accounted for. */
function isSound({ sniffed, record, failure }: ReadAnswer, lines: number): void {
  expect(record === null).toBe(failure !== null);
  if (failure !== null && 'line' in failure) {
    expect(failure.line).toBeGreaterThanOrEqual(1);
    expect(failure.line).toBeLessThanOrEqual(lines);
  }
  if (record === null) return;
  const { series, notes, columns, dialect } = record;
  const finite = series.values.filter((value) => Number.isFinite(value)).length;
  expect(series.values.filter((value) => !Number.isFinite(value) && !Number.isNaN(value))).toHaveLength(0);
  expect(Number.isFinite(series.axis.start) && series.axis.step > 0).toBe(true);
  for (const values of Object.values(columns)) expect(values).toHaveLength(series.values.length);
  for (const { count, lines: places } of notes) {
    expect(count).toBeGreaterThan(0);
    for (const line of places) expect(line >= 1 && line <= lines).toBe(true);
  }
  if (dialect.layout === 'wide' && dialect.grid!.rule === 'nearest') {
    const { numbers } = sniffed!.columns[dialect.valueColumn]!;
    const lost = countOf(notes, 'duplicateTimes', 'offGrid', 'badStamps', 'noOffset', 'leftOutByStatus', 'clockChange');
    expect(numbers).toBeLessThanOrEqual(finite + lost);
  }
}

const workbookFailures = ['workbookDamaged', 'workbookTooLarge', 'workbookEmpty'];
const linesOf = (text: string) => text.split(/\r\n|\n|\r/u).length;

/** Reads a text alone, and put together with another file whose rows come later. */
function check(text: string, settings: Partial<Dialect>): void {
  isSound(readRecord({ text, fileName: 'damaged', settings }), linesOf(text));
  const joined = joinFiles({
    files: [
      { fileName: 'damaged', text },
      { fileName: 'whole', text: whole },
    ],
    settings: {},
  });
  if (!joined.ok) {
    expect(['filesDiffer', 'emptyFile']).toContain(joined.failure.code);
    return;
  }
  const { parts } = joined.value;
  isSound(readRecord({ text: joined.value.text, fileName: 'both', settings: {}, parts }), linesOf(joined.value.text));
}

it(`${files} damaged files are read or refused, and nothing is lost in silence`, async () => {
  await fc.assert(
    fc.asyncProperty(
      fc.nat(fixtures.length - 1),
      fc.array(mutation, { minLength: 1, maxLength: 6 }),
      async (index, changes) => {
        const bytes = changes.reduce(mutate, fixtures[index]!);
        const blob = new Blob([Uint8Array.from(bytes)]);
        if (await isWorkbook(blob)) {
          const taken = await readWorkbook({ bytes: await blob.arrayBuffer(), sheet: null });
          if (!taken.ok) expect(workbookFailures).toContain(taken.failure.code);
          else check(taken.value.text, taken.value.settings);
          return;
        }
        const decoded = await decodeFile(blob);
        if (!decoded.ok) {
          expect(['emptyFile', 'binaryFile']).toContain(decoded.failure.code);
          return;
        }
        check(decoded.value.text, {});
      },
    ),
    { numRuns: files, seed },
  );
}, 3_600_000);

describe('files made to be slow are read in time proportional to their length', () => {
  // A reader that takes quadratic time does not come back from these before the suite's own limit.
  const long = 400_000;
  const cases: Record<string, string> = {
    'quotes that never close': `time,v\n${'"a'.repeat(long)}`,
    'quotes inside quotes': `time,v\n"${'" '.repeat(long)}x`,
    'one line of delimiters': ','.repeat(long),
    'blanks alone in a line': `a,b\n1,${' '.repeat(long)}2\n`,
    'carriage returns before one line feed': `a\n${'\r'.repeat(long)}\n1`,
    'carriage returns before a letter': `a\n${'\r'.repeat(long)}x`,
    'one number of many digits': `v\n${'7'.repeat(long)}\n`,
    'a stamp of many digits': `time,v\n${'1:'.repeat(long)},7\n`,
    'many short lines': 'a\n'.repeat(long),
    'many blank lines': `v\n${'\n'.repeat(long)}1\n`,
    'an open quote in each of many lines': 'a,"b\n'.repeat(long / 4),
    'a word of many letters': `time,v\n2024-05-01,${'x'.repeat(long)}\n`,
  };
  for (const [name, text] of Object.entries(cases)) {
    it(name, () => {
      const answer = readRecord({ text, fileName: name, settings: {} });
      expect(answer.record).toBeNull();
      expect(answer.failure).not.toBeNull();
    });
  }
});
