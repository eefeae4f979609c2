import fc from 'fast-check';
import { expect, it } from 'vitest';
import type { Dialect } from '../../workers/contract/dialect.ts';
import { readRecord } from '../../workers/reading/readRecord.ts';

/** A way of writing a record, and a record to be written. */
interface Written {
  readonly delimiter: Dialect['delimiter'];
  readonly decimal: '.' | ',';
  readonly thousands: Dialect['thousands'];
  readonly quoted: boolean;
  readonly header: boolean;
  readonly units: boolean;
  readonly preamble: number;
  readonly mark: boolean;
  readonly end: '\n' | '\r\n' | '\r';
  readonly stamp: 'iso' | 'yearFirst' | 'dayFirst' | 'monthFirst' | 'epochSeconds' | 'epochMilliseconds';
  readonly apart: boolean;
  readonly step: number;
  readonly digits: number;
  /** Values in units of the last digit; null for a gap. */
  readonly counts: readonly (number | null)[];
}

const two = (value: number) => String(value).padStart(2, '0');
// Days above twelve are within every record, so that the order of day and month is told.
const START = Date.UTC(2023, 10, 21, 6) / 1000;

function stampOf(seconds: number, { stamp, apart, delimiter }: Written): string {
  const date = new Date(seconds * 1000);
  const [y, m, d] = [String(date.getUTCFullYear()), two(date.getUTCMonth() + 1), two(date.getUTCDate())];
  const between = apart ? delimiter : ' ';
  const clock = `${two(date.getUTCHours())}:${two(date.getUTCMinutes())}:${two(date.getUTCSeconds())}`;
  if (stamp === 'epochSeconds') return String(seconds);
  if (stamp === 'epochMilliseconds') return String(seconds * 1000);
  const days = {
    iso: `${y}-${m}-${d}`,
    yearFirst: `${y}/${m}/${d}`,
    dayFirst: `${d}.${m}.${y}`,
    monthFirst: `${m}/${d}/${y}`,
  };
  return `${days[stamp]}${between}${clock}`;
}

function numberOf(count: number | null, { decimal, thousands, digits, quoted }: Written): string {
  if (count === null) return '';
  const [whole, fraction] = (Math.abs(count) / 10 ** digits).toFixed(digits).split('.') as [string, string];
  const grouped = thousands === null ? whole : whole.replace(/\B(?=(\d{3})+$)/gu, thousands);
  const text = `${count < 0 ? '-' : ''}${grouped}${decimal}${fraction}`;
  return quoted ? `"${text}"` : text;
}

function write(record: Written): string {
  const { delimiter, units, header, preamble, counts, step, apart, end, mark } = record;
  const time = apart ? `date${delimiter}time` : 'time';
  const lines = Array.from({ length: preamble }, (_, k) => `exported by station ${k}`);
  if (header) lines.push(`${time}${delimiter}flow${delimiter}other`);
  if (header && units) lines.push(`${apart ? delimiter : ''}${delimiter}m³/h${delimiter}°C`);
  counts.forEach((count, k) => {
    lines.push(`${stampOf(START + k * step, record)}${delimiter}${numberOf(count, record)}${delimiter}${k % 5}`);
  });
  return `${mark ? '\ufeff' : ''}${lines.join(end)}${end}`;
}

const written: fc.Arbitrary<Written> = fc
  .record({
    delimiter: fc.constantFrom<Dialect['delimiter'][]>(',', ';', '\t', '|'),
    decimal: fc.constantFrom<('.' | ',')[]>('.', ','),
    thousands: fc.constantFrom<Dialect['thousands'][]>(null, '.', ',', ' ', "'"),
    quoted: fc.boolean(),
    header: fc.boolean(),
    units: fc.boolean(),
    preamble: fc.nat(4),
    mark: fc.boolean(),
    end: fc.constantFrom<Written['end'][]>('\n', '\r\n', '\r'),
    stamp: fc.constantFrom<Written['stamp'][]>(
      'iso',
      'yearFirst',
      'dayFirst',
      'monthFirst',
      'epochSeconds',
      'epochMilliseconds',
    ),
    apart: fc.boolean(),
    step: fc.constantFrom(1, 60, 600, 3600, 28800, 86400),
    digits: fc.constantFrom(1, 2, 4),
    counts: fc.array(fc.option(fc.integer({ min: -99_999_999, max: 99_999_999 }), { freq: 12 }), {
      minLength: 24,
      maxLength: 60,
    }),
  })
  .map((record) => ({
    ...record,
    thousands: record.thousands === record.decimal ? null : record.thousands,
    apart: record.apart && !record.stamp.startsWith('epoch'),
    quoted: record.quoted || record.delimiter === record.decimal || record.delimiter === record.thousands,
  }))
  .filter(({ counts }) => counts.filter((count) => count !== null).length >= 12 && new Set(counts).size > 4);

it('a record written in any dialect is read back to the same numbers, times and gaps', () => {
  fc.assert(
    fc.property(written, (record) => {
      const text = write(record);
      const answer = readRecord({ text, fileName: 'record.csv', settings: {} });
      expect(answer.failure).toBeNull();
      const { series, name, notes } = answer.record!;
      const { counts, digits, step, header, units } = record;
      const numbers = counts.map((count) => (count === null ? NaN : Number((count / 10 ** digits).toFixed(digits))));
      // Division by a power of ten is correctly rounded, as reading the digits is: the numbers are equal, not merely near.
      expect(Array.from(series.values)).toEqual(numbers);
      expect(series.axis.kind).toBe('seconds');
      expect(series.axis.start).toBe(START);
      expect(series.axis.step).toBe(step);
      expect(series.unit).toBe(header && units ? 'm³/h' : '');
      if (header) expect(name).toBe('flow');
      const gaps = counts.filter((count) => count === null).length;
      expect(notes.map(({ kind, count }) => [kind, count])).toEqual(gaps > 0 ? [['gapCells', gaps]] : []);
    }),
    { numRuns: 300 },
  );
}, 60_000);
