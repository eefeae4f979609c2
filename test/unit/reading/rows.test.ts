import { describe, expect, it } from 'vitest';
import { splitRows } from '../../../workers/reading/rows/splitRows.ts';

function split(text: string, delimiter: ',' | ' ' | ';' = ',', quote: '"' | null = '"') {
  const rows: { cells: string[]; line: number }[] = [];
  const end = splitRows(
    { text, delimiter, quote, from: 0, line: 1 },
    {
      row: (cells, line) => {
        rows.push({ cells, line });
        return true;
      },
    },
  );
  return { rows, end, cells: rows.map(({ cells }) => cells) };
}

describe('splitRows', () => {
  // The examples of RFC 4180 § 2, rules 1 to 7.
  it.each([
    [
      'aaa,bbb,ccc\r\nzzz,yyy,xxx\r\n',
      [
        ['aaa', 'bbb', 'ccc'],
        ['zzz', 'yyy', 'xxx'],
      ],
    ],
    [
      'aaa,bbb,ccc\r\nzzz,yyy,xxx',
      [
        ['aaa', 'bbb', 'ccc'],
        ['zzz', 'yyy', 'xxx'],
      ],
    ],
    [
      '"aaa","bbb","ccc"\r\nzzz,yyy,xxx',
      [
        ['aaa', 'bbb', 'ccc'],
        ['zzz', 'yyy', 'xxx'],
      ],
    ],
    [
      '"aaa","b\r\nbb","ccc"\r\nzzz,yyy,xxx',
      [
        ['aaa', 'b\r\nbb', 'ccc'],
        ['zzz', 'yyy', 'xxx'],
      ],
    ],
    ['"aaa","b""bb","ccc"', [['aaa', 'b"bb', 'ccc']]],
  ])('%j', (text, rows) => {
    expect(split(text).cells).toEqual(rows);
  });

  it('counts lines through quoted line breaks', () => {
    expect(split('a\n"x\ny\nz",1\nb\n\nc').rows.map(({ line }) => line)).toEqual([1, 2, 5, 6, 7]);
  });

  it('takes runs of blanks as one delimiter', () => {
    expect(split('  1.5   2\n3 4  \n', ' ').cells).toEqual([
      ['1.5', '2'],
      ['3', '4'],
    ]);
  });

  it('names the line of a quote that is never closed', () => {
    expect(split('a,b\n1,2\n"x,3\n4,5\n').end.openQuote).toBe(3);
    expect(split('a,b\n1,2\n"x,3\n4,5\n', ',', null).cells).toHaveLength(4);
  });

  it('splits the same wherever its pieces end', () => {
    const rows = Array.from({ length: 30_000 }, (_, k) => [
      String(k),
      k % 7 === 0 ? 'x\ny,"z"' : 'plain',
      k % 5000 === 1 ? 'w\n'.repeat(40_000) : '',
    ]);
    const quoted = (cell: string) => (/[",\n]/u.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell);
    const text = rows.map((cells) => cells.map(quoted).join(',')).join('\n');
    const read = split(text);
    expect(read.cells).toEqual(rows);
    expect(read.end.line - 1).toBe(text.split('\n').length);
  });
});
