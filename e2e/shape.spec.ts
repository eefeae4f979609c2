import AxeBuilder from '@axe-core/playwright';
import { expect, test, type Page } from '@playwright/test';
import { dropFile, hormoneCsv } from './support/records.ts';

const panel = (page: Page) => page.getByRole('region', { name: 'Shape', exact: true });
const rows = (page: Page) =>
  page
    .getByRole('table', { name: 'Candidates' })
    .getByRole('row')
    .filter({ has: page.getByRole('radiogroup', { name: 'Level' }) });

async function opened(page: Page): Promise<void> {
  await page.goto('/');
  await expect(rows(page)).toHaveCount(3);
  await expect(panel(page)).toContainText(/Try \(/);
}

async function takeHormone(page: Page): Promise<void> {
  await dropFile(page, 'hormone.csv', hormoneCsv());
  await page.getByRole('button', { name: 'Use this record' }).click();
  await expect(page.getByRole('heading', { name: /LH/ })).toBeVisible();
  await expect(panel(page)).toContainText(/Try \(1,0,0\)/);
}

test('closed, the shape is one line and the verdict stays on the first screen', async ({ page }) => {
  await opened(page);
  const box = (await panel(page).boundingBox())!;
  expect(box.height).toBeLessThan(60);
  const verdict = page.getByRole('region', { name: 'Verdict' });
  await expect(verdict).toContainText(/sound|doubtful|unsound/i);
  const below = (await verdict.boundingBox())!;
  expect(below.y + 60).toBeLessThan(900);
});

test('the advice comes with reasons, both hypotheses and a table of differencing', async ({ page }) => {
  await opened(page);
  await takeHormone(page);
  await panel(page).getByRole('button', { name: 'What this rests on' }).click();
  const tables = panel(page).getByRole('table');
  await expect(tables).toHaveCount(2);
  // r₁ of the record, 0.576, is printed with it (Diggle 1990, table A.1; Venables & Ripley 2002, chapter 14, figure 14.2: φ = 0.574).
  await expect(tables.first()).toContainText('0.58');
  await expect(tables.nth(1)).toContainText('a unit root, about a constant');
  await expect(tables.nth(1)).toContainText('stationary, about a constant');
  await expect(panel(page)).toContainText('They advise, they do not vote.');
  await expect(panel(page).getByRole('figure')).toHaveCount(3);
  await expect(panel(page)).toContainText('Levels differ only');
});

test('"Try these" adds the advised candidates that are not there yet, as one step to undo', async ({ page }) => {
  await opened(page);
  await takeHormone(page);
  const before = await rows(page).count();
  await panel(page).getByRole('button', { name: 'Try these' }).click();
  await expect.poll(() => rows(page).count()).toBeGreaterThan(before);
  const after = await rows(page).count();
  for (let i = 0; i < after; i += 1) await expect(rows(page).nth(i)).toContainText('fitted');
  await panel(page).getByRole('button', { name: 'Try these' }).click();
  await expect(page.getByText('already in the table')).toBeVisible();
  await expect(rows(page)).toHaveCount(after);
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(rows(page)).toHaveCount(before);
});

test('differencing on show changes the panel alone, by keyboard', async ({ page }) => {
  await opened(page);
  const candidates = await rows(page).count();
  const open = panel(page).getByRole('button', { name: 'What this rests on' });
  await open.focus();
  await page.keyboard.press('Enter');
  const switcher = panel(page).getByLabel('Differences d');
  await switcher.focus();
  await page.keyboard.press('ArrowDown');
  await expect(panel(page).getByRole('heading', { name: 'Shown for ∇' })).toBeVisible();
  await expect(panel(page).getByRole('heading', { name: 'A unit root or not, in ∇' })).toBeVisible();
  await expect(rows(page)).toHaveCount(candidates);
});

test('a season too long for the record says so and leads back', async ({ page }) => {
  await opened(page);
  await takeHormone(page);
  await panel(page).getByRole('button', { name: 'What this rests on' }).click();
  await panel(page).getByLabel('Season s').fill('40');
  await panel(page).getByLabel('Seasonal D').selectOption('1');
  await expect(panel(page).getByRole('alert')).toContainText('Too few readings for this view: 8 are left');
  await panel(page).getByRole('button', { name: 'Show the record itself' }).click();
  await expect(panel(page).getByRole('alert')).toHaveCount(0);
});

test('nothing serious for axe, and no sideways scroll at 390 px', async ({ page }) => {
  await page.setViewportSize({ width: 390, height: 844 });
  await opened(page);
  await panel(page).getByRole('button', { name: 'What this rests on' }).click();
  await expect(panel(page).getByRole('table')).toHaveCount(2);
  for (const scheme of ['light', 'dark'] as const) {
    await page.emulateMedia({ colorScheme: scheme });
    const { violations } = await new AxeBuilder({ page }).include('#panel-shape').analyze();
    expect(violations.filter(({ impact }) => impact === 'serious' || impact === 'critical')).toEqual([]);
  }
  expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(390);
});
