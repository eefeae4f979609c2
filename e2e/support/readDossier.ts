import { readFile } from 'node:fs/promises';
import { getDocument, OPS } from 'pdfjs-dist/legacy/build/pdf.mjs';

export interface DossierContent {
  /** Text of each page. */
  pages: string[];
  /** Drawn paths over all pages. */
  paths: number;
  /** Bitmap images over all pages. */
  images: number;
}

/** Reads a PDF back: its selectable text page by page, and how much of it is vector drawing. */
export async function readDossier(path: string): Promise<DossierContent> {
  const document = await getDocument({ data: new Uint8Array(await readFile(path)), verbosity: 0 }).promise;
  const content: DossierContent = { pages: [], paths: 0, images: 0 };
  for (let number = 1; number <= document.numPages; number += 1) {
    const page = await document.getPage(number);
    const text = await page.getTextContent();
    content.pages.push(text.items.map((item) => ('str' in item ? item.str : '')).join(' '));
    const operators = await page.getOperatorList();
    for (const operator of operators.fnArray) {
      if (operator === OPS.constructPath) content.paths += 1;
      if (operator === OPS.paintImageXObject || operator === OPS.paintInlineImageXObject) content.images += 1;
    }
  }
  return content;
}
