import type { jsPDF } from 'jspdf';

/** Millimetres on A4. */
export const sheet = { width: 210, height: 297, left: 20, right: 20, top: 20, bottom: 20 } as const;
export const textWidth = sheet.width - sheet.left - sheet.right;
export const fontName = 'Lagwright Sans';

/** Ink of the dossier; the same as the light theme's. */
export const inks = { ink: '#26221c', faint: '#665e51', hairline: '#d6cebf' } as const;

/** A place on the page that moves down as things are written, and turns the page when it is full. */
export class Cursor {
  y: number = sheet.top;

  constructor(readonly pdf: jsPDF) {}

  /** Makes room for so many millimetres. */
  need(height: number): void {
    if (this.y + height <= sheet.height - sheet.bottom) return;
    this.pdf.addPage();
    this.y = sheet.top;
  }

  font(size: number, bold = false, color: string = inks.ink): void {
    this.pdf.setFont(fontName, bold ? 'bold' : 'normal');
    this.pdf.setFontSize(size);
    this.pdf.setTextColor(color);
  }

  /** Wrapped text; `x` from the left margin. Height of a line follows the size. */
  text(
    words: string,
    size: number,
    options: { bold?: boolean; color?: string; x?: number; width?: number } = {},
  ): void {
    const { bold = false, color = inks.ink, x = 0, width = textWidth - x } = options;
    this.font(size, bold, color);
    const line = size * 0.3528 * 1.35;
    const lines = this.pdf.splitTextToSize(words, width) as string[];
    for (const each of lines) {
      this.need(line);
      this.font(size, bold, color);
      this.pdf.text(each, sheet.left + x, this.y + line * 0.76);
      this.y += line;
    }
  }

  rule(color: string = inks.hairline): void {
    this.pdf.setDrawColor(color);
    this.pdf.setLineWidth(0.15);
    this.pdf.line(sheet.left, this.y, sheet.left + textWidth, this.y);
  }
}
