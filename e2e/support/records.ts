import type { Page } from '@playwright/test';

/**
 * Luteinising hormone in blood of one person, 48 readings ten minutes apart. Diggle, P. J. (1990), Time Series: A
 * Biostatistical Introduction, Oxford, table A.1. Checksum: n 48, sum 115.2, sum of squares 290.78.
 */
export const hormone = [
  2.4, 2.4, 2.4, 2.2, 2.1, 1.5, 2.3, 2.3, 2.5, 2.0, 1.9, 1.7, 2.2, 1.8, 3.2, 3.2, 2.7, 2.2, 2.2, 1.9, 1.9, 1.8, 2.7,
  3.0, 2.3, 2.0, 2.0, 2.9, 2.9, 2.7, 2.7, 2.3, 2.6, 2.4, 1.8, 1.7, 1.5, 1.4, 2.1, 3.3, 3.5, 3.5, 3.1, 2.6, 2.1, 3.4,
  3.0, 2.9,
];

/** The record as a plant system would export it: semicolons, decimal comma, a second column, one row absent if asked. */
export function hormoneCsv(without?: number): string {
  const rows = hormone.flatMap((value, index) => {
    if (index === without) return [];
    const minutes = index * 10;
    const hh = String(8 + Math.floor(minutes / 60)).padStart(2, '0');
    const mm = String(minutes % 60).padStart(2, '0');
    return [`2024-03-13 ${hh}:${mm};${value.toFixed(1).replace('.', ',')};${20 + (index % 3)}`];
  });
  return ['time;LH;room', ';IU/L;°C', ...rows, ''].join('\r\n');
}

/** Drops a file on the page the way a person does. */
export async function dropFile(page: Page, name: string, text: string): Promise<void> {
  const transfer = await page.evaluateHandle(
    ([fileName, content]) => {
      const data = new DataTransfer();
      data.items.add(new File([content!], fileName!, { type: 'text/csv' }));
      return data;
    },
    [name, text],
  );
  const body = page.locator('body');
  await body.dispatchEvent('dragenter', { dataTransfer: transfer });
  await body.dispatchEvent('dragover', { dataTransfer: transfer });
  await body.dispatchEvent('drop', { dataTransfer: transfer });
}
