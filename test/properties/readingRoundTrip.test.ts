import fc from 'fast-check';
import { expect, it } from 'vitest';
import type { Dialect } from '../../workers/contract/dialect.ts';
import { joinFiles } from '../../workers/reading/files/joinFiles.ts';
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
  /** Year, month, day, hour, minute and second in columns of their own. */
  readonly inParts: boolean;
  /** A quality column, with rows that it marks as bad. */
  readonly bad: readonly boolean[] | null;
  readonly step: number;
  readonly digits: number;
  /** Values in units of the last digit; null for a gap. */
  readonly counts: readonly (number | null)[];
}

const two = (value: number) => String(value).padStart(2, '0');
// Days above twelve are within every record, so that the order of day and month is told.
const START = Date.UTC(2023, 10, 21, 6) / 1000;

function stampOf(seconds: number, { stamp, apart, delimiter, inParts }: Written): string {
  const date = new Date(seconds * 1000);
  if (inParts)
    return [
      date.getUTCFullYear(),
      date.getUTCMonth() + 1,
      date.getUTCDate(),
      date.getUTCHours(),
      date.getUTCMinutes(),
      date.getUTCSeconds(),
    ].join(delimiter);
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

function write(record: Written, first = 0): string {
  const { delimiter, units, header, preamble, counts, step, apart, end, mark, inParts, bad } = record;
  const time = inParts
    ? ['year', 'month', 'day', 'hour', 'minute', 'second'].join(delimiter)
    : apart
      ? `date${delimiter}time`
      : 'time';
  const before = inParts ? 6 : apart ? 2 : 1;
  const lines = Array.from({ length: preamble }, (_, k) => `exported by station ${k}`);
  const quality = bad === null ? '' : `${delimiter}quality`;
  if (header) lines.push(`${time}${delimiter}flow${delimiter}other${quality}`);
  if (header && units) lines.push(`${delimiter.repeat(before)}m³/h${delimiter}°C${bad === null ? '' : delimiter}`);
  counts.forEach((count, k) => {
    lines.push(
      `${stampOf(START + (first + k) * step, record)}${delimiter}${numberOf(count, record)}${delimiter}${(first + k) % 5}${bad === null ? '' : `${delimiter}${bad[k] === true ? 'Bad' : 'Good'}`}`,
    );
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
    inParts: fc.boolean(),
    bad: fc.option(fc.array(fc.boolean(), { minLength: 3, maxLength: 12 })),
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
    // Headings tell parts of stamps from readings.
    header: record.header || record.inParts,
    apart: record.apart && !record.inParts && !record.stamp.startsWith('epoch'),
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
      const isOut = (k: number) => record.bad?.[k] === true;
      const numbers = counts.map((count, k) =>
        count === null || isOut(k) ? NaN : Number((count / 10 ** digits).toFixed(digits)),
      );
      // Division by a power of ten is correctly rounded, as reading the digits is: the numbers are equal, not merely near.
      expect(Array.from(series.values)).toEqual(numbers);
      expect(series.axis.kind).toBe('seconds');
      expect(series.axis.start).toBe(START);
      expect(series.axis.step).toBe(step);
      expect(series.unit).toBe(header && units ? 'm³/h' : '');
      if (header) expect(name).toBe('flow');
      const gaps = counts.filter((count) => count === null).length;
      const out = counts.filter((_, k) => isOut(k)).length;
      expect(notes.map(({ kind, count }) => [kind, count])).toEqual([
        ...(gaps > 0 ? [['gapCells', gaps]] : []),
        ...(out > 0 ? [['leftOutByStatus', out]] : []),
      ]);
    }),
    { numRuns: 300 },
  );
}, 60_000);

it('a record cut into files that overlap is put together to the same record', () => {
  fc.assert(
    fc.property(written, fc.nat(1000), fc.nat(3), fc.boolean(), (record, place, overlap, turned) => {
      const { counts, step, bad } = record;
      const cut = 8 + (place % (counts.length - 16));
      const part = (from: number, to: number) => {
        const own = {
          ...record,
          counts: counts.slice(from, to),
          bad: bad === null ? null : counts.map((_, k) => bad[k] === true).slice(from, to),
        };
        return write(own, from);
      };
      // The head of each file must show its marks of numbers and the order of its dates.
      fc.pre(record.decimal === '.' && record.thousands === null && record.stamp === 'iso' && record.header);
      const files = [
        { fileName: 'early', text: part(0, cut + overlap) },
        { fileName: 'late', text: part(cut, counts.length) },
      ];
      const joined = joinFiles({ files: turned ? files.toReversed() : files, settings: {} });
      if (!joined.ok) throw new Error(JSON.stringify(joined.failure));
      const { text, parts } = joined.value;
      const answer = readRecord({ text, fileName: 'both', settings: {}, parts });
      const alone = readRecord({ text: write(record), fileName: 'one', settings: {} });
      expect(answer.failure).toBeNull();
      expect(answer.record!.series).toEqual(alone.record!.series);
      expect(answer.record!.series.axis.step).toBe(step);
      const count = (kind: string) => answer.record!.notes.find((note) => note.kind === kind)?.count ?? 0;
      expect(count('overlappingFiles')).toBe(overlap);
      expect(count('duplicateTimes')).toBe(overlap);
      expect(count('conflictingTimes')).toBe(0);
    }),
    { numRuns: 40 },
  );
}, 60_000);
