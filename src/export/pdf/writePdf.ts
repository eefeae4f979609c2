import { jsPDF } from 'jspdf';
import 'svg2pdf.js';
import type { Figure, Palette } from '../../figures/figure.ts';
import type { Report } from '../report/report.ts';
import { drawBlock } from './drawBlock.ts';
import { figureSvg } from './figureSvg.ts';
import { Cursor, fontName, inks, sheet, textWidth } from './page.ts';

/** Pixels a figure is drawn at for the width of the text. */
const figureWidth = 660;
const figureHeights = { record: 300, lags: 300, prediction: 240 } as const;

/** The report as a PDF: vector drawings, selectable text in the page's own typeface, every page numbered. */
export async function writePdf(
  report: Report,
  figures: Readonly<Record<'record' | 'lags', Figure>> & { readonly prediction: Figure | null },
  colours: Pick<Palette, 'sound' | 'doubtful' | 'unsound'>,
): Promise<Blob> {
  const pdf = new jsPDF({ unit: 'mm', format: 'a4', compress: true });
  await addFonts(pdf);
  pdf.setProperties({ title: report.title, subject: report.subtitle, creator: 'Lagwright' });
  const cursor = new Cursor(pdf);
  cursor.text(report.title, 17, { bold: true });
  cursor.text(report.subtitle, 9, { color: inks.faint });
  cursor.y += 3;
  cursor.text(report.standingWords, 13, { bold: true, color: colours[report.standing] });
  cursor.y += 2;
  for (const { heading, blocks } of report.sections) {
    cursor.need(18);
    cursor.rule(inks.ink);
    cursor.y += 1.5;
    cursor.text(heading, 11, { bold: true });
    cursor.y += 1.5;
    for (const block of blocks) {
      if (block.kind !== 'figure') drawBlock(cursor, block);
      else {
        const figure = figures[block.name];
        if (figure !== null) await drawFigure(cursor, figure, figureHeights[block.name], block.caption);
      }
    }
  }
  numberPages(cursor, report.foot);
  return pdf.output('blob');
}

async function drawFigure(cursor: Cursor, figure: Figure, pixels: number, caption: string): Promise<void> {
  const height = (pixels / figureWidth) * textWidth;
  cursor.need(height + 10);
  // The drawing starts with the font that is set: a bold heading before it would make its texts bold.
  cursor.font(9);
  const svg = await figureSvg(figure, figureWidth, pixels);
  try {
    await cursor.pdf.svg(svg, { x: sheet.left, y: cursor.y, width: textWidth, height });
  } finally {
    svg.parentElement?.remove();
  }
  cursor.y += height + 1;
  cursor.text(caption, 8, { color: inks.faint });
  cursor.y += 3;
}

function numberPages({ pdf }: Cursor, foot: string): void {
  const pages = pdf.getNumberOfPages();
  for (let page = 1; page <= pages; page += 1) {
    pdf.setPage(page);
    pdf.setFont(fontName, 'normal');
    pdf.setFontSize(7.5);
    pdf.setTextColor(inks.faint);
    pdf.text(foot, sheet.left, sheet.height - 10);
    pdf.text(`${page} / ${pages}`, sheet.width - sheet.right, sheet.height - 10, { align: 'right' });
  }
}

async function addFonts(pdf: jsPDF): Promise<void> {
  for (const [file, style] of [
    ['lagwright-sans.ttf', 'normal'],
    ['lagwright-sans-bold.ttf', 'bold'],
  ] as const) {
    const response = await fetch(`fonts/${file}`);
    if (!response.ok) throw new Error(`The font ${file} could not be loaded`);
    const bytes = new Uint8Array(await response.arrayBuffer());
    let binary = '';
    for (let i = 0; i < bytes.length; i += 0x8000) binary += String.fromCharCode(...bytes.subarray(i, i + 0x8000));
    pdf.addFileToVFS(file, btoa(binary));
    pdf.addFont(file, fontName, style);
  }
}
