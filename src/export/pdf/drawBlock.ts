import type { Block } from '../report/report.ts';
import { type Cursor, inks, sheet, textWidth } from './page.ts';

const small = 8.5;
const line = 4.2;
const nameWidth = 46;

/** Writes everything but figures. */
export function drawBlock(cursor: Cursor, block: Exclude<Block, { kind: 'figure' }>): void {
  switch (block.kind) {
    case 'paragraph':
      cursor.text(block.text, block.strong === true ? 12 : small);
      cursor.y += 1;
      return;
    case 'list':
      for (const item of block.items) {
        cursor.need(line);
        cursor.font(small);
        cursor.pdf.text('–', sheet.left, cursor.y + 3.1);
        cursor.text(item, small, { x: 4 });
        cursor.y += 0.6;
      }
      cursor.y += 1.5;
      return;
    case 'facts':
      for (const [name, value] of block.rows) {
        cursor.need(line);
        cursor.font(small, false, inks.faint);
        cursor.pdf.text(name, sheet.left, cursor.y + 3.1);
        cursor.text(value, small, { x: nameWidth });
      }
      cursor.y += 2;
      return;
    case 'table':
      drawTable(cursor, block);
  }
}

function drawTable(cursor: Cursor, { head, rows, numbers }: Extract<Block, { kind: 'table' }>): void {
  const width = Math.min(textWidth / head.length, 36);
  const put = (cells: readonly string[], color: string) => {
    cursor.need(line + 1);
    cursor.font(small, false, color);
    cells.forEach((cell, i) => {
      const right = numbers.includes(i);
      const x = sheet.left + i * width + (right ? width - 4 : 0);
      cursor.pdf.text(cell, x, cursor.y + 3.3, { align: right ? 'right' : 'left' });
    });
    cursor.y += line + 0.6;
  };
  cursor.need(3 * line);
  put(head, inks.faint);
  cursor.rule(inks.ink);
  for (const row of rows) {
    put(row, inks.ink);
    cursor.rule();
  }
  cursor.y += 3;
}
