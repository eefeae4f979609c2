// Writes the records of e2e/fixtures: node test/reference/generate/readingFixtures.mjs
// Every file is a published series of ../series written in one habit of exporters, and named for the habit; what each
// must be read to stands in ../readingFixtures.test.ts.
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';

const folder = new URL('../../../e2e/fixtures/', import.meta.url);
mkdirSync(folder, { recursive: true });
const series = (name) => JSON.parse(readFileSync(new URL(`../series/${name}.json`, import.meta.url), 'utf8')).values;
const hormone = series('luteinisingHormone').slice(0, 24);
const nile = series('nile').slice(0, 24);
const overshorts = series('overshorts').slice(0, 24);
const airline = series('airline').slice(0, 36);
const lake = series('lakeHuron').slice(0, 40);
const presidents = series('presidents').slice(0, 40);

const two = (number) => String(number).padStart(2, '0');
const start = Date.UTC(2024, 2, 13, 8);
const at = (index, seconds = 600, from = start) => {
  const date = new Date(from + index * seconds * 1000);
  const [y, m, d] = [date.getUTCFullYear(), date.getUTCMonth() + 1, date.getUTCDate()];
  const [h, i, s] = [date.getUTCHours(), date.getUTCMinutes(), date.getUTCSeconds()];
  return { y, m, d, h, i, s, epoch: date.getTime() / 1000, iso: `${y}-${two(m)}-${two(d)} ${two(h)}:${two(i)}` };
};
const dot = (value) => value.toFixed(1);
const comma = (value) => value.toFixed(1).replace('.', ',');
const lines = (list, end = '\n') => list.join(end) + end;
const put = (name, text, encoding = 'utf8') => writeFileSync(new URL(name, folder), Buffer.from(text, encoding));
/** Rows of stamp and reading. */
const rows = (values, stamp, write = dot, between = ',') =>
  values.map((value, k) => `${stamp(k)}${between}${write(value, k)}`);
const iso = (k) => at(k).iso;
const plain = (header = 'time,LH') => lines([header, ...rows(hormone, iso)]);

// Delimiters, encodings, line ends
put('plain-comma-iso.csv', plain());
put('semicolon-decimal-comma.csv', lines(['time;LH', ...rows(hormone, iso, comma, ';')], '\r\n'));
put('tab-separated.tsv', lines(['time\tLH', ...rows(hormone, iso, dot, '\t')]));
put('pipe-separated.txt', lines(['time|LH', ...rows(hormone, iso, dot, '|')]));
put(
  'aligned-by-blanks.txt',
  lines(['Date        Time      LH', ...hormone.map((v, k) => `${iso(k).replace(' ', '  ')}   ${dot(v).padStart(6)}`)]),
);
put('utf8-with-mark.csv', `\ufeff${plain()}`);
put('utf16-little-with-mark.txt', `\ufeff${lines(['time\tLH', ...rows(hormone, iso, dot, '\t')], '\r\n')}`, 'utf16le');
put('utf16-big-without-mark.csv', Buffer.from(plain(), 'utf16le').swap16());
put('windows-1252-degree.csv', plain('time,Größe [°C]'), 'latin1');
put('windows-line-ends-none-at-end.csv', plain().trimEnd().replaceAll('\n', '\r\n'));
put('carriage-returns-only.csv', plain().replaceAll('\n', '\r'));
put('doubled-carriage-returns.csv', plain().replaceAll('\n', '\r\r\n'));
put('separator-named-in-first-line.csv', `sep=;\r\n${lines(['time;LH', ...rows(hormone, iso, comma, ';')], '\r\n')}`);

// What stands above, below and beside the data
put(
  'preamble-of-lines.csv',
  lines([
    'Station;4',
    'Exported;2024-03-14 07:00',
    'Operator;night shift',
    '',
    'time;LH',
    ...rows(hormone, iso, comma, ';'),
  ]),
);
put('commented-preamble.csv', `# logger 7, firmware 2.1\n# all times plant clock\n${plain()}`);
put('units-row.csv', lines(['time,LH,room', ',IU/L,°C', ...rows(hormone, iso, (v, k) => `${dot(v)},${20 + (k % 3)}`)]));
put('unit-in-brackets.csv', plain('time,LH [IU/L]'));
put('unit-behind-slash.csv', plain('time,T / K'));
put('rule-under-header.txt', lines(['time|LH', '----|--', ...rows(hormone, iso, dot, '|')]));
put('no-header.csv', lines(rows(hormone, iso)));
put('totals-at-the-end.csv', lines([plain().trimEnd(), 'Minimum,1.5', 'Maximum,3.2', '', 'end of report']));
put('trailing-delimiter.csv', lines(['time,LH,', ...rows(hormone, iso, (v) => `${dot(v)},`)]));
put('empty-columns-behind.csv', lines(['time,LH,,,', ...rows(hormone, iso, (v) => `${dot(v)},,,`), ',,,,', ',,,,']));
put(
  'header-again-every-day.csv',
  lines(['time,LH', ...rows(hormone, iso).flatMap((row, k) => (k === 12 ? ['time,LH', row] : [row]))]),
);
put(
  'blank-lines-between.csv',
  lines(['time,LH', ...rows(hormone, iso).flatMap((row, k) => (k % 6 === 5 ? [row, ''] : [row]))]),
);
put('counter-column.csv', lines(['No.,LH,room', ...hormone.map((v, k) => `${k + 1},${dot(v)},${20 + (k % 3)}`)]));
put('counter-without-name.csv', lines(['LH', ...hormone.map((v, k) => `${k},${dot(v)}`)]));
put('file-of-many-tags.csv', lines(['time,TI-1,LH,FI-2', ...rows(hormone, iso, (v, k) => `20.0,${dot(v)},${k % 4}`)]));

// Quotes
put(
  'all-quoted.csv',
  lines([
    '"time","LH"',
    ...rows(
      hormone,
      (k) => `"${iso(k)}"`,
      (v) => `"${dot(v)}"`,
    ),
  ]),
);
put(
  'apostrophes-as-quotes.csv',
  lines([
    "'time','LH'",
    ...rows(
      hormone,
      (k) => `'${iso(k)}'`,
      (v) => `'${dot(v)}'`,
    ),
  ]),
);
put('line-break-in-header.csv', lines(['"time","LH\n(IU/L)"', ...rows(hormone, (k) => `"${iso(k)}"`)], '\r\n'));
put(
  'delimiter-in-remark.csv',
  lines(['time,LH,remark', ...rows(hormone, iso, (v, k) => `${dot(v)},${k === 5 ? '"pump off, ""B"" running"' : ''}`)]),
);
put('decimal-comma-in-quotes.csv', lines(['time,LH', ...rows(hormone, iso, (v) => `"${comma(v)}"`)]));
put('inch-mark-inside.csv', lines(['time,LH,pipe', ...rows(hormone, iso, (v) => `${dot(v)},main 3" line`)]));
put(
  'open-quote.csv',
  lines(['time,LH,remark', ...rows(hormone, iso, (v, k) => `${dot(v)},${k === 7 ? '"valve stuck' : ''}`)]),
);

// Numbers
put('values-with-a-sum.txt', lines([...hormone.map(dot), 'Sum 51.3']));
put('values-only.txt', lines(hormone.map(dot)));
put('values-only-decimal-comma.txt', lines(['LH', ...hormone.map(comma)]));
put('blank-line-for-a-gap.txt', lines(['LH', ...hormone.map((v, k) => (k === 9 ? '' : dot(v))), '', '']));
const day = (k) => at(k, 86400).iso.slice(0, 10);
const grouped = (mark, decimal) => (v) =>
  `${Math.floor(v / 1000) > 0 ? `${Math.floor(v / 1000)}${mark}` : ''}${Math.floor(v / 1000) > 0 ? String(v % 1000).padStart(3, '0') : v}${decimal}5`;
put('thousands-point.csv', lines(['day;flow', ...rows(nile, day, grouped('.', ','), ';')]));
put('thousands-comma-in-quotes.csv', lines(['day,flow', ...rows(nile, day, (v) => `"${grouped(',', '.')(v)}"`)]));
put('thousands-narrow-blank.csv', lines(['day;flow', ...rows(nile, day, grouped('\u202f', ','), ';')]));
put('thousands-apostrophe.csv', lines(['day;flow', ...rows(nile, day, grouped("'", '.'), ';')]));
put(
  'thousands-only-later.csv',
  lines(['day;flow', ...rows(nile, day, (v, k) => (k < 20 ? String(v) : grouped('.', ',')(v)), ';')]),
);
put('scientific-notation.csv', lines(['time,LH', ...rows(hormone, iso, (v) => v.toExponential(4).toUpperCase())]));
put('fortran-exponents.txt', lines(hormone.map((v) => `  ${(v / 10).toFixed(5)}D+01`)));
put('minus-behind.csv', lines(['day;overshort', ...rows(overshorts, day, (v) => (v < 0 ? `${-v}-` : String(v)), ';')]));
put(
  'typographic-minus.csv',
  lines(['day,overshort', ...rows(overshorts, day, (v) => String(v).replace('-', '\u2212'))]),
);
put('unit-in-every-cell.csv', lines(['time,LH', ...rows(hormone, iso, (v) => `${dot(v)} IU/L`)]));
put(
  'words-for-values.csv',
  lines(['time,LH', ...rows(hormone, iso, (v, k) => (k === 4 ? 'Bad' : k === 5 ? 'No Data' : dot(v)))]),
);
put('below-detection-limit.csv', lines(['time,LH', ...rows(hormone, iso, (v) => (v < 1.6 ? '<1.6' : dot(v)))]));
put(
  'words-for-gaps.csv',
  lines(['time,LH', ...rows(hormone, iso, (v, k) => ['NaN', 'n/a', '', '-', 'NULL'][k - 6] ?? dot(v))]),
);
put('code-for-gaps.csv', lines(['time,LH', ...rows(hormone, iso, (v, k) => (k === 6 ? '-999.0' : dot(v)))]));
put(
  'quality-column.csv',
  lines(['time,LH,quality', ...rows(hormone, iso, (v, k) => `${dot(v)},${k === 3 || k === 11 ? 'Bad' : 'Good'}`)]),
);
put('decimal-commas-between-commas.csv', lines(['time,LH', ...rows(hormone, iso, comma)]));
put(
  'unquoted-delimiter-in-remark.csv',
  lines(['time,LH,remark', ...rows(hormone, iso, (v, k) => `${dot(v)},${k === 5 ? 'off, B on' : ''}`)]),
);
put('last-row-cut-off.csv', `${lines(['time,LH,room', ...rows(hormone, iso, (v) => `${dot(v)},21`)])}2024-03-13 12:`);

// Dates and times
const date = (write, seconds) => (k) => write(at(k, seconds));
const dmy = ({ d, m, y }, mark) => `${two(d)}${mark}${two(m)}${mark}${y}`;
const hm = ({ h, i }, mark = ':') => `${two(h)}${mark}${two(i)}`;
put(
  'day-first-slashes.csv',
  lines([
    'time,LH',
    ...rows(
      hormone,
      date((t) => `${dmy(t, '/')} ${hm(t)}`),
    ),
  ]),
);
put(
  'month-first-slashes.csv',
  lines([
    'time,LH',
    ...rows(
      hormone,
      date((t) => `${t.m}/${t.d}/${t.y} ${hm(t)}`),
    ),
  ]),
);
const early = (write) => (k) => write(at(k, 600, Date.UTC(2024, 3, 3, 8)));
put(
  'day-or-month-open.csv',
  lines([
    'time,LH',
    ...rows(
      hormone,
      early((t) => `${dmy(t, '/')} ${hm(t)}`),
    ),
  ]),
);
put(
  'day-or-month-with-points.csv',
  lines([
    'time;LH',
    ...rows(
      hormone,
      early((t) => `${dmy(t, '.')} ${hm(t)}`),
      comma,
      ';',
    ),
  ]),
);
put(
  'day-or-month-told-by-gap.csv',
  lines([
    'time,LH',
    ...rows(hormone, (k) => {
      const t = at(k, 7200, Date.UTC(2024, 3, 3, 8));
      return `${dmy(t, '/')} ${hm(t)}`;
    }),
  ]),
);
put(
  'two-digit-years.csv',
  lines([
    'time;LH',
    ...rows(
      hormone,
      date((t) => `${dmy(t, '.').replace('2024', '24')} ${hm(t)}`),
      comma,
      ';',
    ),
  ]),
);
const english = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];
put(
  'month-by-name.csv',
  lines([
    'time,LH',
    ...rows(
      hormone,
      date((t) => `${t.d}-${english[t.m - 1].toUpperCase()}-${t.y} ${hm(t)}:00`),
    ),
  ]),
);
put(
  'month-by-german-name.csv',
  lines([
    'Zeit;LH',
    ...rows(
      hormone,
      date((t) => `${t.d}. März ${t.y} ${hm(t)}`),
      comma,
      ';',
    ),
  ]),
  'latin1',
);
put(
  'twelve-hour-clock.csv',
  lines([
    'time,LH',
    ...rows(
      hormone,
      date((t) => `${t.m}/${t.d}/${t.y} ${((t.h + 11) % 12) + 1}:${two(t.i)}:00 ${t.h < 12 ? 'AM' : 'PM'}`),
    ),
  ]),
);
put(
  'date-and-time-apart.csv',
  lines([
    'date;time;LH',
    ...rows(
      hormone,
      date((t) => `${dmy(t, '.')};${hm(t)}:00`),
      comma,
      ';',
    ),
  ]),
);
put(
  'time-before-date.csv',
  lines([
    'time,date,LH',
    ...rows(
      hormone,
      date((t) => `${hm(t)},${t.y}-${two(t.m)}-${two(t.d)}`),
    ),
  ]),
);
put(
  'points-in-the-time.csv',
  lines([
    'time;LH',
    ...rows(
      hormone,
      date((t) => `${dmy(t, '.')} ${hm(t, '.')}`),
      comma,
      ';',
    ),
  ]),
);
put(
  'digits-only-stamps.csv',
  lines([
    'time,LH',
    ...rows(
      hormone,
      date((t) => `${t.y}${two(t.m)}${two(t.d)}${two(t.h)}${two(t.i)}00`),
    ),
  ]),
);
put(
  'iso-with-offset.csv',
  lines([
    'time,LH',
    ...rows(
      hormone,
      date((t) => `${t.iso.replace(' ', 'T')}:00+01:00`),
    ),
  ]),
);
put(
  'iso-with-z-and-milliseconds.csv',
  lines([
    'time,LH',
    ...rows(
      hormone,
      date((t) => `${t.iso.replace(' ', 'T')}:00.000Z`),
    ),
  ]),
);
put(
  'offset-changes-with-the-clock.csv',
  lines([
    'time,LH',
    ...rows(hormone, (k) => {
      const utc = at(k, 3600, Date.UTC(2024, 2, 30, 16)).epoch;
      const offset = utc >= Date.UTC(2024, 2, 31, 1) / 1000 ? 2 : 1;
      return `${at(0, 1, (utc + offset * 3600) * 1000).iso.replace(' ', 'T')}:00+0${offset}:00`;
    }),
  ]),
);
const autumn = (k) => {
  const utc = Date.UTC(2024, 9, 26, 12) / 1000 + k * 3600;
  return at(0, 1, (utc + (utc >= Date.UTC(2024, 9, 27, 1) / 1000 ? 1 : 2) * 3600) * 1000).iso;
};
put('hour-twice-in-autumn.csv', lines(['time,LH', ...rows(hormone, autumn)]));
put(
  'epoch-seconds.csv',
  lines([
    'ts,LH',
    ...rows(
      hormone,
      date((t) => t.epoch),
    ),
  ]),
);
put(
  'epoch-milliseconds.csv',
  lines([
    'ts,LH',
    ...rows(
      hormone,
      date((t) => t.epoch * 1000),
    ),
  ]),
);
put('elapsed-seconds.csv', lines(['elapsed [s],LH', ...rows(hormone, (k) => (k * 0.1).toFixed(1))]));
put('time-of-day-over-midnight.csv', lines(['time,LH', ...rows(hormone, (k) => `${hm(at(k, 3600))}:00`)]));
put('stamp-that-is-no-date.csv', lines(['time,LH', ...rows(hormone, (k) => (k === 3 ? '2024-02-30 08:30' : iso(k)))]));
put('unreadable-stamps.csv', lines(['time,LH', ...rows(hormone, (k) => (k % 2 ? `shift ${k}` : iso(k)))]));

// Axes
put('rows-left-out.csv', lines(['time,LH', ...rows(hormone, iso).filter((_, k) => k !== 7 && k !== 8 && k !== 15)]));
put(
  'rows-twice.csv',
  lines(['time,LH', ...rows(hormone, iso).flatMap((row, k) => (k === 6 ? [row, `${iso(k)},9.9`] : [row]))]),
);
put('newest-first.csv', lines(['time,LH', ...rows(hormone, iso).reverse()]));
put(
  'seconds-that-jitter.csv',
  lines([
    'time,LH',
    ...rows(hormone, (k) => {
      const t = at(0, 1, start + (k * 600 + ((k * 5) % 11) - 5) * 1000);
      return `${t.iso}:${two(t.s)}`;
    }),
  ]),
);
put(
  'interval-changes.csv',
  lines(['time,LH', ...hormone.map((v, k) => `${at(k < 12 ? 2 * k : 12 + k).iso},${dot(v)}`)]),
);
put(
  'irregular-stamps.csv',
  lines([
    'time,LH',
    ...rows(hormone, (k) => {
      const t = at(0, 1, start + Math.round(600 * (k + 0.45 * Math.sin(7.3 * k * k))) * 1000);
      return `${t.iso}:${two(t.s)}`;
    }),
  ]),
);
put(
  'mistyped-year.csv',
  lines(['time,LH', ...rows(hormone, (k) => (k === 10 ? iso(k).replace('2024', '2204') : iso(k)))]),
);
put(
  'months-by-number.csv',
  lines(['month,passengers', ...airline.map((v, k) => `${1949 + Math.floor(k / 12)}-${two((k % 12) + 1)},${v}`)]),
);
put(
  'months-by-name.csv',
  lines(['month,passengers', ...airline.map((v, k) => `${english[k % 12]} ${1949 + Math.floor(k / 12)},${v}`)]),
);
put(
  'months-at-their-end.csv',
  lines(['date;passengers', ...airline.map((v, k) => `${dmy(at(0, 1, Date.UTC(1949, k + 1, 0)), '.')};${v}`)]),
);
put(
  'quarters.csv',
  lines(['quarter,approval', ...presidents.map((v, k) => `${1945 + Math.floor(k / 4)} Q${(k % 4) + 1},${v ?? 'NA'}`)]),
);
put('years.csv', lines(['year,level', ...lake.map((v, k) => `${1875 + k},${v}`)]));
put(
  'iso-weeks.csv',
  lines([
    'week,LH',
    ...hormone.map((v, k) => `${2020 + Math.floor((k + 40) / 53)}-W${two(((k + 40) % 53) + 1)},${dot(v)}`),
  ]),
);

put('seconds-cut-off.csv', lines(['time,LH', ...rows(hormone, (k) => at(k, 20).iso)]));

put(
  'blanks-around-am-and-pm.txt',
  lines([
    'Date Time LH',
    ...hormone.map((v, k) => {
      const t = at(k, 3600);
      return `${t.m}/${t.d}/${t.y} ${((t.h + 11) % 12) + 1}:00 ${t.h < 12 ? 'AM' : 'PM'} ${dot(v)}`;
    }),
  ]),
);
put(
  'fifty-readings-a-second.csv',
  lines(['time,LH', ...hormone.map((v, k) => `${new Date(start + 20 * k).toISOString()},${dot(v)}`)]),
);

// Several tags
put(
  'one-row-a-tag.csv',
  lines([
    'time,tag,value',
    ...hormone.flatMap((v, k) => [`${iso(k)},LH-1,${dot(v)}`, `${iso(k)},TI-2,${20 + (k % 3)}`]),
  ]),
);
put(
  'one-tag-after-the-other.csv',
  lines([
    'tag;time;value',
    ...hormone.map((v, k) => `TI-2;${iso(k)};${20 + (k % 3)},5`),
    ...hormone.map((v, k) => `LH-1;${iso(k)};${comma(v)}`),
  ]),
);

// Files that cannot be a record
put('empty.csv', '');
put('blank-lines-only.csv', '\r\n\r\n  \r\n');
put('header-only.csv', 'time,LH\n');
put('words-only.csv', lines(['remark', 'pump off', 'valve stuck', 'all well']));
put('three-readings.csv', lines(['time,LH', ...rows(hormone.slice(0, 3), iso)]));
put('one-value-throughout.csv', lines(['time,LH', ...rows(hormone, iso, () => '7.0')]));
put('gaps-only.csv', lines(['time,LH', ...rows(hormone, iso, () => '')]));
put('photo.jpg', Buffer.from([0xff, 0xd8, 0xff, 0xe0, 0, 16, 0x4a, 0x46, 0x49, 0x46, 0, 1, 1, 0, 0, 1, 0, 1, 0, 0]));
put('machine-data.csv', Buffer.from(Float64Array.from(hormone).buffer));
