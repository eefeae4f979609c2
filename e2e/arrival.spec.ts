import { expect, test, type Locator, type Page } from '@playwright/test';
import { fileURLToPath } from 'node:url';

const fixture = (name: string) => fileURLToPath(new URL(`./fixtures/${name}`, import.meta.url));

/** Opens files and waits until they have been read. */
async function open(page: Page, ...names: string[]): Promise<Locator> {
  await page.goto('/');
  await page.getByLabel('Record file').setInputFiles(names.map(fixture));
  await settled(page);
  return page.locator('.arrival');
}
const settled = async (page: Page) => {
  await expect(page.locator('.arrival')).toHaveAttribute('aria-busy', 'false');
};

test('a workbook is read from its sheet with numbers, and from another one on demand', async ({ page }) => {
  const sheet = await open(page, 'workbook-with-cover.xlsx');
  await expect(sheet).toContainText('Read from the sheet “Data”, one of 3');
  await expect(sheet).toContainText('24 places, every 10 minutes');
  await sheet.getByLabel('Sheet').selectOption('Limits');
  await settled(page);
  await expect(sheet).toContainText('Read from the sheet “Limits”');
  await expect(sheet.getByRole('table')).toContainText('T3');
});

test('a workbook that would fill the memory is refused, and the file before it stays', async ({ page }) => {
  const sheet = await open(page, 'plain-comma-iso.csv');
  await page.getByLabel('Record file').setInputFiles(fixture('workbook-that-would-fill-the-memory.xlsx'));
  await expect(page.locator('.notice').getByText(/would take .* MB/)).toBeVisible();
  await expect(sheet).toContainText('Reading plain-comma-iso.csv');
  await expect(page.getByRole('button', { name: 'Use this record' })).toBeEnabled();
});

test('several files stand in the order of time; of contradicting readings the person says which stays', async ({
  page,
}) => {
  const sheet = await open(page, 'export-3-turned.csv', 'export-2-corrected.csv', 'export-1.csv');
  await expect(sheet).toContainText('3 files put together in the order of time');
  await expect(sheet).toContainText('1 row repeat');
  await expect(sheet).toContainText('the first is kept');
  await expect(sheet).toContainText('24 places, every day');
  await sheet.getByLabel('Of repeated times').selectOption('gap');
  await settled(page);
  await expect(sheet).toContainText('none is kept');
  await page.getByRole('button', { name: 'Use this record' }).click();
  await expect(page.getByRole('table', { name: 'Candidates' }).getByText('fitted', { exact: true })).toHaveCount(3);
});

test('files that do not belong together are refused by name', async ({ page }) => {
  await page.goto('/');
  await page.getByLabel('Record file').setInputFiles(['export-1.csv', 'export-of-another-tag.csv'].map(fixture));
  await expect(page.locator('.notice').getByText(/other columns/)).toBeVisible();
  await expect(page.locator('.notice')).toContainText('export-of-another-tag.csv');
});

test('rows marked bad are left out, and come back when their word is ticked', async ({ page }) => {
  const sheet = await open(page, 'good-and-bad.csv');
  await expect(sheet).toContainText('left out “Bad” (2)');
  await expect(sheet.getByRole('table')).toContainText('left out by its status');
  await sheet.getByLabel('Bad (2)').check();
  await settled(page);
  await expect(sheet).toContainText('left out none');
  await expect(sheet.getByRole('table')).not.toContainText('left out by its status');
});

test('stamps that fit no interval are laid on a grid that is offered', async ({ page }) => {
  const sheet = await open(page, 'irregular-stamps.csv');
  await expect(sheet.getByRole('alert')).toContainText('No regular interval');
  await expect(sheet.getByRole('table')).toContainText('off the interval');
  await sheet.getByRole('button', { name: 'mean of the bin, 15 minutes' }).click();
  await settled(page);
  await expect(sheet).toContainText('every 15 minutes');
  await expect(sheet).toContainText('their mean is taken');
  await sheet.getByLabel('Step of the grid').fill('1');
  await sheet.getByLabel('Unit of the step').focus();
  await settled(page);
  await sheet.getByLabel('Grid takes').selectOption('last');
  await settled(page);
  await expect(sheet).toContainText('every minute');
});

test('another encoding is tried on the same bytes, and another time column, with the controls', async ({ page }) => {
  const sheet = await open(page, 'windows-1252-degree.csv');
  await expect(sheet.getByLabel('Encoding')).toHaveValue('windows-1252');
  await expect(sheet.getByRole('table')).toContainText('Größe');
  await sheet.getByLabel('Encoding').selectOption('utf-8');
  await settled(page);
  await expect(sheet.getByRole('table')).not.toContainText('Größe');
  await sheet.getByLabel('Encoding').selectOption('windows-1252');
  await settled(page);
  await expect(sheet.getByRole('table')).toContainText('Größe');
  await sheet.getByLabel('Time from').selectOption('none');
  await settled(page);
  await expect(sheet).toContainText('No time: the readings are numbered.');
});

test('words for gaps and for the detection limit are changed by hand', async ({ page }) => {
  const sheet = await open(page, 'code-for-gaps.csv');
  await sheet.getByLabel('Words for a gap, parted by ;').fill('-999; n/a');
  await sheet.getByLabel('Words for a gap, parted by ;').press('Enter');
  await settled(page);
  await expect(sheet).toContainText('1 empty cell');
});

test('a large file shows how far it is, can be stopped, and what was there stays', async ({ page }) => {
  await open(page, 'plain-comma-iso.csv');
  const start = Date.UTC(2024, 0, 1);
  const rows = Array.from({ length: 900_000 }, (_, k) => {
    const stamp = new Date(start + k * 60_000).toISOString().slice(0, 19);
    return `${stamp},${(7 + ((k * 7919) % 101) / 100).toFixed(2)},${k % 97},${k % 89}`;
  });
  const buffer = Buffer.from(['time,pH,flow,level', ...rows].join('\n'));
  await page.getByLabel('Record file').setInputFiles({ name: 'year.csv', mimeType: 'text/csv', buffer });
  await page.getByRole('button', { name: 'Stop reading' }).click();
  await expect(page.locator('.arrival')).toContainText('Reading plain-comma-iso.csv');
  await expect(page.getByRole('button', { name: 'Use this record' })).toBeEnabled();
  await page.getByRole('button', { name: 'Dismiss' }).click();
  await expect(page.locator('.arrival')).toHaveCount(0);
});
