import { describe, expect, it } from 'vitest';
import type { StampForm } from '../../../workers/contract/dialect.ts';
import { civilFromDays } from '../../../workers/reading/stamps/civilFromDays.ts';
import { daysFromCivil } from '../../../workers/reading/stamps/daysFromCivil.ts';
import { exchangeDayMonth } from '../../../workers/reading/stamps/exchangeDayMonth.ts';
import { StampReader } from '../../../workers/reading/stamps/stampReader.ts';
import { isZone, resolveZone } from '../../../workers/reading/stamps/zoneResolver.ts';

const utc = (iso: string) => Date.parse(`${iso}Z`) / 1000;
const read = (text: string, form: StampForm = 'iso') => new StampReader(form, '.').read(text);

describe('daysFromCivil and civilFromDays', () => {
  it('agree with the calendar of ECMA-262 from year 1 to 9999, both ways', () => {
    for (let days = -719162; days <= 2932896; days += 397) {
      const date = new Date(days * 86400000);
      const civil = { year: date.getUTCFullYear(), month: date.getUTCMonth() + 1, day: date.getUTCDate() };
      expect(civilFromDays(days)).toEqual(civil);
      expect(daysFromCivil(civil.year, civil.month, civil.day)).toBe(days);
    }
  });

  it('refuse dates that do not exist', () => {
    const wrong = [
      [2023, 2, 29],
      [1900, 2, 29],
      [2024, 4, 31],
      [2024, 13, 1],
      [2024, 0, 1],
      [2024, 1, 0],
    ] as const;
    for (const [year, month, day] of wrong) expect(daysFromCivil(year, month, day)).toBeNaN();
    expect(daysFromCivil(2000, 2, 29)).toBe(11016);
  });
});

describe('stamps', () => {
  // ISO 8601-1:2019 writes 12 April 1985 in its three calendars; RFC 3339 § 5.8 gives the examples with times.
  it.each([
    ['1985-04-12', '1985-04-12T00:00:00', NaN],
    ['19850412', '1985-04-12T00:00:00', NaN],
    ['1985-102', '1985-04-12T00:00:00', NaN],
    ['1985-W15-5', '1985-04-12T00:00:00', NaN],
    ['1985W155', '1985-04-12T00:00:00', NaN],
    ['1985-04', '1985-04-01T00:00:00', NaN],
    ['1985-04-12T23:20:50.52Z', '1985-04-12T23:20:50.520', 0],
    ['1996-12-19T16:39:57-08:00', '1996-12-19T16:39:57', -480],
    ['1990-12-31T23:59:60Z', '1991-01-01T00:00:00', 0],
    ['1937-01-01T12:00:27.87+00:20', '1937-01-01T12:00:27.870', 20],
    ['19850412T101530', '1985-04-12T10:15:30', NaN],
    ['1985-04-12T24:00', '1985-04-13T00:00:00', NaN],
    ['1985-04-12T10', '1985-04-12T10:00:00', NaN],
    ['1985-04-12 10:15:30,5', '1985-04-12T10:15:30.500', NaN],
    ['19850412101530', '1985-04-12T10:15:30', NaN],
  ])('%s', (text, iso, offset) => {
    const reader = new StampReader('iso', '.');
    expect(reader.read(text)).toBeCloseTo(utc(iso), 6);
    expect(reader.offset).toBe(offset);
  });

  // Habits of writing, from common practice.
  it.each([
    ['dayFirst', '01.05.2024 10:20', '2024-05-01T10:20'],
    ['monthFirst', '01/05/2024 10:20', '2024-01-05T10:20'],
    ['dayFirst', '1/5/24 3:05 PM', '2024-05-01T15:05'],
    ['monthFirst', '12/31/1999 12:00:00 AM', '1999-12-31T00:00'],
    ['monthFirst', '12/31/1999 12:00:00 p.m.', '1999-12-31T12:00'],
    ['dayFirst', '31.12.69', '1969-12-31T00:00'],
    ['dayFirst', '31.12.68', '2068-12-31T00:00'],
    ['yearFirst', '24-05-13', '2024-05-13T00:00'],
    ['yearFirst', '2024/5/3 7:05', '2024-05-03T07:05'],
    ['dayFirst', '03-APR-2024 10:20:30', '2024-04-03T10:20:30'],
    ['dayFirst', '3. März 2024', '2024-03-03T00:00'],
    ['dayFirst', '3 février 2024', '2024-02-03T00:00'],
    ['dayFirst', 'Wed, 03 Apr 2024 10:20:30', '2024-04-03T10:20:30'],
    ['monthFirst', 'Apr 3, 2024', '2024-04-03T00:00'],
    ['dayFirst', '01.05.2024 10.20', '2024-05-01T10:20'],
    ['dayFirst', '01/05/2024 10h20', '2024-05-01T10:20'],
    ['iso', '2024-05-01-10.20.30.250000', '2024-05-01T10:20:30.250'],
    ['iso', '2024-Q3', '2024-07-01T00:00'],
    ['epochSeconds', '1714550400', '2024-05-01T08:00'],
    ['epochMilliseconds', '1714550400500', '2024-05-01T08:00:00.500'],
  ] as const)('%s: %s', (form, text, iso) => {
    expect(read(text, form)).toBeCloseTo(utc(iso), 6);
  });

  it.each([
    ['iso', '2023-02-29'],
    ['iso', '2024-05-01 25:00'],
    ['iso', '2024-05-01 10:60'],
    ['iso', '2024-05-01 24:01'],
    ['iso', '2024-W53-1'],
    ['iso', '2023-366'],
    ['iso', '01.05.2024'],
    ['iso', '7.31'],
    ['iso', 'pump off'],
    ['iso', ''],
    ['dayFirst', '31/04/2024'],
    ['dayFirst', '12/31/2024'],
    ['monthFirst', '31/12/2024'],
    ['dayFirst', '1/5/24 13:05 PM'],
    ['dayFirst', '1 Brumaire 2024'],
    ['number', '2024-05-01'],
  ] as const)('%s: %j is no stamp', (form, text) => {
    expect(read(text, form)).toBeNaN();
  });

  it('counts how the order of day and month is told', () => {
    const reader = new StampReader('dayFirst', '.');
    for (const text of ['01/02/2024', '01/02/2024', '02/02/2024', '13/02/2024', '02/13/2024']) reader.read(text);
    expect(reader.tally).toEqual({ own: 1, other: 1, open: 1 });
  });
});

describe('exchangeDayMonth', () => {
  it('exchanges day and month and keeps the time of day; what is no date then is none', () => {
    const times = Float64Array.from(['2024-05-01T10:20', '2024-12-11', '2024-01-13'].map(utc));
    const other = exchangeDayMonth(Float64Array.from([...times, NaN]));
    expect([...other]).toEqual([utc('2024-01-05T10:20'), utc('2024-11-12'), NaN, NaN]);
  });
});

describe('resolveZone', () => {
  // Directive 2000/84/EC: clocks change at 01:00 UTC on the last Sundays of March and October.
  it('refuses the hour that the clock skipped in March', () => {
    const local = Float64Array.from(['2024-03-31T01:30', '2024-03-31T02:30', '2024-03-31T03:30'].map(utc));
    const { times, missing, twice } = resolveZone(local, 'Europe/Berlin');
    expect([...times]).toEqual([utc('2024-03-31T00:30'), NaN, utc('2024-03-31T01:30')]);
    expect([missing, twice]).toEqual([[1], []]);
  });

  it('gives the hour that came twice in October to its first and then to its second pass', () => {
    const clock = ['01:40', '02:00', '02:20', '02:40', '02:00', '02:20', '02:40', '03:00'];
    const local = Float64Array.from(clock.map((time) => utc(`2024-10-27T${time}`)));
    const { times, twice } = resolveZone(local, 'Europe/Berlin');
    const start = utc('2024-10-26T23:40');
    expect([...times]).toEqual(clock.map((_, k) => start + k * 1200));
    expect(twice).toEqual([1, 2, 3, 4, 5, 6]);
  });

  it('knows the half hours of some zones and refuses unknown names', () => {
    expect([...resolveZone(Float64Array.of(utc('2024-01-01T12:00')), 'Asia/Kolkata').times]).toEqual([
      utc('2024-01-01T06:30'),
    ]);
    expect([isZone('Europe/Berlin'), isZone('Plant/Clock')]).toEqual([true, false]);
  });
});
