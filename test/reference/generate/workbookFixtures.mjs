// Writes the workbooks of e2e/fixtures from published series (test/reference/series): the least that ECMA-376 part 1 asks of a
// workbook, packed as ZIP. Run: node test/reference/generate/workbookFixtures.mjs
import { readFileSync, writeFileSync } from 'node:fs';
import { strToU8, zipSync } from 'fflate';

const folder = new URL('../../../e2e/fixtures/', import.meta.url);
const series = (name) => JSON.parse(readFileSync(new URL(`../series/${name}.json`, import.meta.url), 'utf8')).values;
const hormone = series('luteinisingHormone').slice(0, 24);
const main = 'http://schemas.openxmlformats.org/spreadsheetml/2006/main';
const office = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships';
const rels = 'http://schemas.openxmlformats.org/package/2006/relationships';
const head = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>';
const escape = (text) => text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;');
const letter = (column) => String.fromCharCode(65 + column);

/** A cell: number, text, boolean, null for none, { date } for a serial shown as date and time, { clock } as time, { error }. */
function cellXml(cell, row, column) {
  const at = `r="${letter(column)}${row + 1}"`;
  if (cell === null) return '';
  if (typeof cell === 'number') return `<c ${at}><v>${cell}</v></c>`;
  if (typeof cell === 'boolean') return `<c ${at} t="b"><v>${cell ? 1 : 0}</v></c>`;
  if (typeof cell === 'string') return `<c ${at} t="inlineStr"><is><t>${escape(cell)}</t></is></c>`;
  if ('error' in cell) return `<c ${at} t="e"><v>${cell.error}</v></c>`;
  return 'clock' in cell ? `<c ${at} s="2"><v>${cell.clock}</v></c>` : `<c ${at} s="1"><v>${cell.date}</v></c>`;
}
const sheetXml = (rows) =>
  `${head}<worksheet xmlns="${main}"><sheetData>${rows
    .map(
      (cells, row) => `<row r="${row + 1}">${cells.map((cell, column) => cellXml(cell, row, column)).join('')}</row>`,
    )
    .join('')}</sheetData></worksheet>`;

function workbook(sheets, properties = '') {
  const names = Object.keys(sheets);
  const kind = 'application/vnd.openxmlformats-officedocument.spreadsheetml';
  const files = {
    '[Content_Types].xml': `${head}<Types xmlns="http://schemas.openxmlformats.org/package/2006/content-types"><Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/><Override PartName="/xl/workbook.xml" ContentType="${kind}.sheet.main+xml"/><Override PartName="/xl/styles.xml" ContentType="${kind}.styles+xml"/>${names.map((_, i) => `<Override PartName="/xl/worksheets/sheet${i + 1}.xml" ContentType="${kind}.worksheet+xml"/>`).join('')}</Types>`,
    '_rels/.rels': `${head}<Relationships xmlns="${rels}"><Relationship Id="rId1" Type="${office}/officeDocument" Target="xl/workbook.xml"/></Relationships>`,
    'xl/workbook.xml': `${head}<workbook xmlns="${main}" xmlns:r="${office}">${properties}<sheets>${names.map((name, i) => `<sheet name="${escape(name)}" sheetId="${i + 1}" r:id="rId${i + 1}"/>`).join('')}</sheets></workbook>`,
    'xl/_rels/workbook.xml.rels': `${head}<Relationships xmlns="${rels}">${names.map((_, i) => `<Relationship Id="rId${i + 1}" Type="${office}/worksheet" Target="worksheets/sheet${i + 1}.xml"/>`).join('')}<Relationship Id="rId${names.length + 1}" Type="${office}/styles" Target="styles.xml"/></Relationships>`,
    // Number formats 22 and 20 are date with time and time (§ 18.8.30).
    'xl/styles.xml': `${head}<styleSheet xmlns="${main}"><cellXfs count="3"><xf numFmtId="0"/><xf numFmtId="22" applyNumberFormat="1"/><xf numFmtId="20" applyNumberFormat="1"/></cellXfs></styleSheet>`,
  };
  names.forEach((name, i) => (files[`xl/worksheets/sheet${i + 1}.xml`] = sheetXml(sheets[name])));
  const packed = Object.fromEntries(Object.entries(files).map(([path, text]) => [path, strToU8(text)]));
  return Buffer.from(zipSync(packed, { mtime: '2024-03-14T00:00:00', level: 9 }));
}
const put = (name, bytes) => writeFileSync(new URL(name, folder), bytes);

// 13 March 2024 is day 45364 of the calendar that begins with 1900 (§ 18.17.4.1), 43902 of the one that begins with 1904.
const day = 45364;
const serial = (k) => day + (8 * 60 + 10 * k) / 1440;
const record = hormone.map((v, k) => [{ date: serial(k) }, v]);
const plain = workbook({ 'Sheet 1': [['time', 'LH [IU/L]'], ...record] });
put('workbook.xlsx', plain);
put(
  'workbook-with-cover.xlsx',
  workbook({
    Cover: [
      ['Station', 4],
      ['Operator', 'night shift'],
      ['Exported', { date: day + 1 }],
    ],
    Data: [
      ['Logger 7'],
      [],
      ['time', 'LH', 'remark'],
      ...record.map((row, k) => [...row, k === 3 ? 'pump "B"\toff' : null]),
    ],
    Limits: [['tag', 'low', 'high'], ...Array.from({ length: 12 }, (_, k) => [`T${k}`, k / 7, k + 0.5])],
  }),
);
put(
  'workbook-of-1904.xlsx',
  workbook(
    { 'Sheet 1': [['time', 'LH'], ...hormone.map((v, k) => [{ date: serial(k) - 1462 }, v])] },
    '<workbookPr date1904="1"/>',
  ),
);
put(
  'workbook-of-texts.xlsx',
  workbook({
    'Sheet 1': [
      ['time', 'LH'],
      ...hormone.map((v, k) => [
        `13.03.2024 ${String(8 + Math.floor(k / 6)).padStart(2, '0')}:${k % 6}0`,
        v.toFixed(1).replace('.', ','),
      ]),
    ],
  }),
);
put(
  'workbook-with-errors.xlsx',
  workbook({
    'Sheet 1': [
      ['time', 'LH', 'running'],
      ...record.map(([time, v], k) => [
        time,
        k === 5 ? { error: '#N/A' } : k === 9 ? { error: '#DIV/0!' } : k === 12 ? null : v,
        k % 7 > 0,
      ]),
    ],
  }),
);
put(
  'workbook-date-and-clock.xlsx',
  workbook({
    'Sheet 1': [
      ['date', 'clock', 'LH'],
      ...hormone.map((v, k) => [{ date: day }, { clock: (8 * 60 + 10 * k) / 1440 }, v]),
    ],
  }),
);
put('workbook-of-words.xlsx', workbook({ Notes: [['valve stuck'], ['valve freed']], More: [[null, 'nothing']] }));
put('workbook-cut-off.xlsx', plain.subarray(0, 900));
// The directory names four gigabytes; nothing of the kind is packed.
const bomb = Buffer.from(plain);
const entry = bomb.indexOf(Buffer.from([0x50, 0x4b, 0x01, 0x02]));
bomb.writeUInt32LE(0xfffffff0, entry + 24);
put('workbook-that-would-fill-the-memory.xlsx', bomb);
put(
  'table.ods',
  Buffer.from(
    zipSync(
      {
        mimetype: [strToU8('application/vnd.oasis.opendocument.spreadsheet'), { level: 0 }],
        'content.xml': strToU8('<a/>'),
      },
      { mtime: '2024-03-14T00:00:00' },
    ),
  ),
);
