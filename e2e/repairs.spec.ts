import { expect, test, type Locator, type Page } from '@playwright/test';
import { messyCsv } from './support/messyRecord.ts';
import { readDossier } from './support/readDossier.ts';
import { dropFile } from './support/records.ts';

const panel = (page: Page): Locator => page.locator('details.forensics');
const rows = (page: Page): Locator =>
  page
    .getByRole('table', { name: 'Candidates' })
    .getByRole('row')
    .filter({ has: page.getByRole('radiogroup', { name: 'Level' }) });
const repairs = (page: Page): Locator => panel(page).getByRole('list', { name: 'Repairs' }).getByRole('listitem');

async function allFitted(page: Page): Promise<void> {
  await expect(rows(page)).toHaveCount(3);
  for (let index = 0; index < 3; index += 1)
    await expect(rows(page).nth(index)).toContainText('fitted', { timeout: 30_000 });
}

const facts = (page: Page): Promise<string> => page.locator('.record-head .facts').innerText();

/** The likelihoods as the table prints them. */
async function likelihoods(page: Page): Promise<string[]> {
  return rows(page).evaluateAll((elements) =>
    elements.map((row) => (row as HTMLTableRowElement).cells[3]?.innerText ?? ''),
  );
}

test.slow();

async function takeMessy(page: Page): Promise<void> {
  await page.goto('/');
  await allFitted(page);
  await dropFile(page, 'acidity.csv', messyCsv());
  const use = page.getByRole('button', { name: 'Use this record' });
  await expect(use).toBeEnabled();
  await use.click();
  await allFitted(page);
  await expect(panel(page)).toContainText('codes for no reading');
}

/** Offered repairs in the order they are taken; each is gone once its repair is made. One of the drawn lines is flat: it stood still. */
const offers = [
  /^Make the 3 readings gaps/,
  /^Make the 2 stretches gaps/,
  /^Make the \d+ stretches gaps/,
  /^Make the reading a gap/,
];

test('from the messiest record to a repaired one and a fitted model, by mouse, and all the way back', async ({
  page,
  browser,
}) => {
  await takeMessy(page);
  const before = await facts(page);
  const raw = await likelihoods(page);
  await panel(page).locator('summary').click();
  for (const [index, offer] of offers.entries()) {
    await panel(page).getByRole('button', { name: offer }).click();
    await expect(repairs(page)).toHaveCount(index + 1);
  }
  await expect(panel(page).locator('summary')).toContainText(/nothing found.*4 repairs/);
  // By hand: two readings dragged over on the plot.
  await panel(page).getByRole('button', { name: 'Mark on the plot' }).click();
  const box = (await page.locator('.record .mark-layer').boundingBox())!;
  await page.mouse.move(box.x + 300, box.y + 60);
  await page.mouse.down();
  await page.mouse.move(box.x + 320, box.y + 60, { steps: 4 });
  await page.mouse.up();
  await expect(panel(page).getByLabel('From')).toHaveValue(/2024-03-13 0\d:\d\d/);
  await panel(page).getByRole('button', { name: 'Mark as gap' }).click();
  await expect(repairs(page)).toHaveCount(5);
  await allFitted(page);
  await expect(page.getByRole('region', { name: 'Verdict' })).toContainText(/sound|doubtful|unsound/i);
  const mended = await likelihoods(page);
  expect(mended).not.toEqual(raw);
  expect(await facts(page)).not.toBe(before);

  // The session link carries the repairs; another browser replays them to the same numbers.
  await page.getByLabel('include the readings').check();
  await page.getByRole('button', { name: 'Copy session link' }).click();
  const link = await page.evaluate(() => navigator.clipboard.readText());
  const colleague = await browser.newContext();
  const other = await colleague.newPage();
  await other.goto(link);
  await allFitted(other);
  await panel(other).locator('summary').click();
  await expect(repairs(other)).toHaveCount(5);
  expect(await likelihoods(other)).toEqual(mended);
  await colleague.close();

  // The dossier lists them.
  await rows(page).first().click();
  const [download] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('button', { name: 'Save dossier' }).click(),
  ]);
  const text = (await readDossier(await download.path())).pages.join('\n').replace(/\s+/g, ' ');
  expect(text).toContain('Repair 1:');
  expect(text).toContain('Repair 5:');
  expect(text).toContain('Marked by hand');

  // Undone one by one, the raw record stands there untouched, with the fits it had.
  for (let count = 4; count >= 0; count -= 1) {
    await page.getByRole('button', { name: 'Undo' }).click();
    await expect(repairs(page)).toHaveCount(count);
  }
  expect(await facts(page)).toBe(before);
  await allFitted(page);
  await expect.poll(() => likelihoods(page)).toEqual(raw);
  await expect(panel(page).locator('summary')).toContainText('no repairs');
});

test('the same without a mouse', async ({ page }) => {
  await page.goto('/');
  await allFitted(page);
  const press = async (target: Locator, key = 'Enter') => {
    await target.focus();
    await expect(target).toBeFocused();
    await page.keyboard.press(key);
  };
  await press(page.locator('summary', { hasText: 'Paste' }));
  await page.getByRole('textbox').first().focus();
  await page.keyboard.insertText(messyCsv());
  await press(page.getByRole('button', { name: 'Read it' }));
  const use = page.getByRole('button', { name: 'Use this record' });
  await expect(use).toBeEnabled();
  await press(use);
  await allFitted(page);
  const before = await facts(page);
  await press(panel(page).locator('summary'));
  for (const [index, offer] of offers.entries()) {
    await press(panel(page).getByRole('button', { name: offer }));
    await expect(repairs(page)).toHaveCount(index + 1);
  }
  // A stretch by typed times, and what is no time is said.
  const from = panel(page).getByLabel('From');
  await from.fill('soon');
  await page.keyboard.press('Enter');
  await expect(panel(page).getByRole('alert')).toContainText('such as 2024-03-13 00:00');
  await from.fill('2024-03-13 01:00');
  await panel(page).getByLabel('To', { exact: true }).fill('2024-03-13 01:05');
  await page.keyboard.press('Enter');
  await expect(repairs(page)).toHaveCount(5);
  await expect(repairs(page).nth(4)).toContainText('6 readings made a gap: 2024-03-13 01:00 to 2024-03-13 01:05');
  // A unit and a coarser grid, put in another order, and taken away again.
  await panel(page).getByLabel('Factor').fill('2,5');
  await page.keyboard.press('Enter');
  await expect(repairs(page)).toHaveCount(6);
  await panel(page).getByLabel('Intervals in one').fill('2');
  await page.keyboard.press('Enter');
  await expect(repairs(page)).toHaveCount(7);
  await press(panel(page).getByRole('button', { name: 'Remove repair 7' }));
  await expect(repairs(page)).toHaveCount(6);
  await press(panel(page).getByRole('button', { name: 'Remove repair 6' }));
  await expect(repairs(page)).toHaveCount(5);
  await allFitted(page);
  while ((await repairs(page).count()) > 0) {
    const count = await repairs(page).count();
    await press(panel(page).getByRole('button', { name: `Remove repair ${count}` }));
    await expect(repairs(page)).toHaveCount(count - 1);
  }
  expect(await facts(page)).toBe(before);
  await allFitted(page);
});

test('repairs are there again after a reload', async ({ page }) => {
  await takeMessy(page);
  await panel(page).locator('summary').click();
  await panel(page).getByRole('button', { name: offers[0]! }).click();
  await expect(repairs(page)).toHaveCount(1);
  await panel(page).getByLabel('Why').fill('Analyser offline');
  await page.keyboard.press('Enter');
  await allFitted(page);
  const numbers = await likelihoods(page);
  await page.waitForTimeout(1500); // the browser's own store is written a moment after the last change
  await page.reload();
  await allFitted(page);
  await panel(page).locator('summary').click();
  await expect(panel(page).getByLabel('Why')).toHaveValue('Analyser offline');
  expect(await likelihoods(page)).toEqual(numbers);
});
