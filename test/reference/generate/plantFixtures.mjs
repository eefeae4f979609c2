// Writes those files of e2e/fixtures that hold parts of stamps, status columns, irregular stamps and several files, from published
// series (test/reference/series). Run: node test/reference/generate/plantFixtures.mjs
import { readFileSync, writeFileSync } from 'node:fs';

const folder = new URL('../../../e2e/fixtures/', import.meta.url);
const series = (name) => JSON.parse(readFileSync(new URL(`../series/${name}.json`, import.meta.url), 'utf8')).values;
const hormone = series('luteinisingHormone').slice(0, 24);
const airline = series('airline').slice(0, 36);
const two = (number) => String(number).padStart(2, '0');
const start = Date.UTC(2024, 2, 13, 8);
const at = (index, seconds = 600) => {
  const date = new Date(start + index * seconds * 1000);
  const [y, m, d] = [date.getUTCFullYear(), date.getUTCMonth() + 1, date.getUTCDate()];
  const [h, i, s] = [date.getUTCHours(), date.getUTCMinutes(), date.getUTCSeconds()];
  return { y, m, d, h, i, s, iso: `${y}-${two(m)}-${two(d)} ${two(h)}:${two(i)}` };
};
const lines = (list, end = '\n') => list.join(end) + end;
const put = (name, text, encoding = 'utf8') => writeFileSync(new URL(name, folder), Buffer.from(text, encoding));
const dot = (value) => value.toFixed(1);
const comma = (value) => value.toFixed(1).replace('.', ',');
const daily = (write) => hormone.map((v, k) => write(at(k, 86400), v, k));
const ten = (write) => hormone.map((v, k) => write(at(k), v, k));
const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

// Parts of the stamp in columns of their own
put('year-month-day-apart.csv', lines(['Year,Month,Day,LH', ...daily((t, v) => `${t.y},${t.m},${t.d},${dot(v)}`)]));
put(
  'year-to-minute-by-blanks.txt',
  lines([
    '#YY  MM DD hh mm   LH',
    '#yr  mo dy hr mn IU/L',
    ...ten((t, v) => `${t.y} ${two(t.m)} ${two(t.d)} ${two(t.h)} ${two(t.i)} ${dot(v).padStart(5)}`),
  ]),
);
put(
  'hours-and-minutes-in-one.csv',
  lines(['YYYY,MM,DD,hhmm,LH', ...ten((t, v) => `${t.y},${t.m},${t.d},${t.h * 100 + t.i},${dot(v)}`)]),
);
put(
  'year-and-month-apart.csv',
  lines(['Year,Month,passengers', ...airline.map((v, k) => `${1949 + Math.floor(k / 12)},${(k % 12) + 1},${v}`)]),
);
put(
  'month-name-beside-year.csv',
  lines(['Month;Year;passengers', ...airline.map((v, k) => `${months[k % 12]};${1949 + Math.floor(k / 12)};${v}`)]),
);
put(
  'jahr-monat-tag-uhrzeit.csv',
  lines(['Jahr;Monat;Tag;Uhrzeit;LH', ...ten((t, v) => `${t.y};${t.m};${t.d};${two(t.h)}:${two(t.i)};${comma(v)}`)]),
);
put('parts-without-header.csv', lines(ten((t, v) => `${t.y},${t.m},${t.d},${t.h},${t.i},${dot(v)}`)));
put('day-month-year-apart.csv', lines(['Day,Month,Year,LH', ...daily((t, v) => `${t.d},${t.m},${t.y},${dot(v)}`)]));

// Status columns
const poor = new Set([3, 11]);
put(
  'good-and-bad.csv',
  lines([
    'time,LH,quality',
    ...ten((t, v, k) => `${t.iso},${poor.has(k) ? '0.0' : dot(v)},${poor.has(k) ? 'Bad' : 'Good'}`),
  ]),
);
put(
  'quality-byte.csv',
  lines(['time,LH,Quality', ...ten((t, v, k) => `${t.iso},${poor.has(k) ? '0.0' : dot(v)},${poor.has(k) ? 24 : 192}`)]),
);
put(
  'flag-of-one-and-nought.csv',
  lines(['time,LH,flag', ...ten((t, v, k) => `${t.iso},${poor.has(k) ? '0.0' : dot(v)},${poor.has(k) ? 1 : 0}`)]),
);
put(
  'status-words-unknown.csv',
  lines(['time,LH,status', ...ten((t, v, k) => `${t.iso},${dot(v)},${poor.has(k) ? 'Modus B' : 'Modus A'}`)]),
);
put(
  'zustand-der-messung.csv',
  lines(['Zeit;LH;Zustand', ...ten((t, v, k) => `${t.iso};${comma(v)};${poor.has(k) ? 'gestört' : 'gut'}`)]),
);

// Limits
put('letters-below-limit.csv', lines(['time,LH', ...ten((t, v) => `${t.iso},${v < 1.6 ? 'BDL' : dot(v)}`)]));
put('comma-below-limit.csv', lines(['time;LH', ...ten((t, v) => `${t.iso};${v < 1.6 ? '<1,6' : comma(v)}`)]));

// Logged when something changed: the reading holds until the next
put(
  'logged-on-change.csv',
  lines([
    'time,LH',
    ...hormone.map((v, k) => {
      const stamp = new Date(start + (k * 600 - (k % 3) * 130) * 1000);
      return `${stamp.toISOString().slice(0, 19).replace('T', ' ')},${dot(v)}`;
    }),
  ]),
);
// Four readings in each ten minutes, unevenly, whose mean is the published one
put(
  'many-readings-a-bin.csv',
  lines([
    'time,LH',
    ...hormone.flatMap((v, k) =>
      [
        [17, -0.2],
        [140, 0.1],
        [333, 0.2],
        [590, -0.1],
      ].map(([second, shift]) => {
        const stamp = new Date(start + (k * 600 + second) * 1000);
        return `${stamp.toISOString().slice(0, 19).replace('T', ' ')},${dot(v + shift)}`;
      }),
    ),
  ]),
);

// A month each, to be opened together: the second repeats the last two days of the first, the third has its columns turned round
const part = (from, to, write = (t, v) => `${t.iso.slice(0, 10)},${dot(v)},good`) =>
  hormone.slice(from, to).map((v, k) => write(at(from + k, 86400), v, from + k));
put('export-1.csv', lines(['# export 1', 'day,LH,state', ...part(0, 10)]));
put('export-2.csv', lines(['# export 2', '# second line', 'day,LH,state', ...part(8, 16)]));
put('export-3-turned.csv', lines(['state;day;LH', ...part(16, 24, (t, v) => `good;${t.iso.slice(0, 10)};${dot(v)}`)]));
put(
  'export-2-corrected.csv',
  lines(['day,LH,state', ...part(8, 16, (t, v, k) => `${t.iso.slice(0, 10)},${dot(k === 9 ? 9.9 : v)},good`)]),
);
put('export-of-another-tag.csv', lines(['day,flow,state', ...part(8, 16)]));
