import { expect, test, type Page } from '@playwright/test';
import { readDossier } from './support/readDossier.ts';
import { dropFile, hormoneCsv } from './support/records.ts';

async function takeHormone(page: Page): Promise<void> {
  await page.goto('/');
  await dropFile(page, 'hormone.csv', hormoneCsv());
  await page.getByRole('button', { name: 'Use this record' }).click();
  await expect(page.getByText('hormone.csv').first()).toBeVisible();
  await page.getByRole('button', { name: 'Choose (1,0,0), with mean' }).click();
}

const line = (page: Page, name: string) =>
  page
    .locator('#panel-estimates')
    .getByRole('row')
    .filter({ has: page.getByRole('rowheader', { name, exact: true }) });

test('every estimate carries an interval, which can be checked by simulation and stands in the dossier', async ({
  page,
}) => {
  await takeHormone(page);
  await expect(page.locator('#panel-estimates')).toContainText('95 % interval');
  // Luteinising hormone AR(1): φ .574 (.116), mean 2.41 (.147); a short record, so that the interval is wider than ± 2 standard errors.
  await expect(line(page, 'φ₁')).toContainText('0.57');
  await expect(line(page, 'φ₁').getByRole('cell').nth(1)).toContainText('…');
  await expect(line(page, 'mean').getByRole('cell').nth(1)).toContainText(/1\.\d+ … 2\.\d+/u);
  await expect(line(page, 'time constant')).toContainText('…');

  await page.getByText('How sure is this?').click();
  await expect(page.locator('.how-sure')).toContainText('no AR root is nearer to the unit circle than');
  await expect(page.getByRole('region', { name: 'Measured coverage' }).getByRole('row')).toHaveCount(13);

  await page.getByRole('button', { name: 'Check φ₁ by simulation' }).click();
  await expect(line(page, 'φ₁')).toContainText(/simulated −?0\.\d+ … 0\.\d+/u, { timeout: 60_000 });

  const [saved] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('button', { name: 'Save dossier' }).click(),
  ]);
  const { pages } = await readDossier(await saved.path());
  const words = pages.join(' ');
  expect(words).toContain('checked by simulation');
  expect(words).toContain('Measured coverage');
  expect(words).toContain('time constant');
});

test('a check under way can be stopped, and the other sign convention turns the interval', async ({ page }) => {
  await takeHormone(page);
  await expect(line(page, 'mean').getByRole('cell').nth(1)).toContainText('…');
  await page.getByRole('button', { name: 'Check mean by simulation' }).click();
  await page.getByRole('button', { name: 'stop' }).click();
  await expect(page.getByRole('button', { name: 'Check mean by simulation' })).toBeVisible();
  const before = await line(page, 'φ₁').getByRole('cell').nth(1).innerText();
  await page.getByLabel('Signs shown').selectOption('polynomial');
  const after = await line(page, 'φ₁').getByRole('cell').nth(1).innerText();
  const [low, high] = before.split(' … ').map(parseFloat);
  expect(after.replaceAll('−', '-')).toContain(`${-high!} … ${-low!}`);
});
