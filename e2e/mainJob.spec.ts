import AxeBuilder from '@axe-core/playwright';
import { expect, test, type Locator, type Page } from '@playwright/test';
import { watchOrigin } from './support/ownOrigin.ts';
import { readDossier } from './support/readDossier.ts';
import { dropFile, hormoneCsv } from './support/records.ts';

const table = (page: Page): Locator => page.getByRole('table', { name: 'Candidates' });
/** Rows that hold a candidate: those with a level switch. */
const rows = (page: Page): Locator =>
  table(page)
    .getByRole('row')
    .filter({ has: page.getByRole('radiogroup', { name: 'Level' }) });

async function allFitted(page: Page, count: number): Promise<void> {
  await expect(rows(page)).toHaveCount(count);
  for (let index = 0; index < count; index += 1) {
    await expect(rows(page).nth(index)).toContainText('fitted', { ignoreCase: true });
  }
}

/** The text of a row once all its numbers are there. */
async function settled(row: Locator): Promise<string> {
  await expect(row).not.toContainText('–');
  return row.innerText();
}

async function takeHormone(page: Page): Promise<void> {
  await allFitted(page, 3); // the example the page opens with
  await dropFile(page, 'hormone.csv', hormoneCsv());
  await expect(page.getByRole('button', { name: 'Use this record' })).toBeEnabled();
  await page.getByRole('button', { name: 'Use this record' }).click();
  await allFitted(page, 3);
}

/** Numbers of a column as the table shows them, with the minus sign made plain. */
async function column(page: Page, name: string): Promise<number[]> {
  const headings = await table(page).getByRole('columnheader').allInnerTexts();
  const index = headings.findIndex((heading) => heading.trim().startsWith(name));
  expect(index, `a column named ${name} among: ${headings.join(' | ')}`).toBeGreaterThanOrEqual(0);
  const cells = await rows(page).evaluateAll(
    (elements, at) => elements.map((row) => (row as HTMLTableRowElement).cells[at]?.innerText ?? ''),
    index,
  );
  return cells.map((cell) => Number(cell.replace('\u2212', '-').replace(/[^\d.e-]/gu, '')));
}

test('the page opens with a labelled example and three fitted candidates', async ({ page, context, baseURL }) => {
  const foreign = watchOrigin(context, baseURL!);
  await page.goto('/');
  await allFitted(page, 3);
  await expect(page.getByText(/invented example/i).first()).toBeVisible();
  await expect(page.getByRole('region', { name: 'Verdict' })).toContainText(/sound|doubtful|unsound/i);
  await expect(page.getByText(/share chart/i)).toHaveCount(0);
  expect(foreign).toEqual([]);
});

test('the whole job: drop, fit, toggle, sort, link, dossier', async ({ page, browser, context, baseURL }) => {
  const foreign = watchOrigin(context, baseURL!);
  await page.goto('/');
  await takeHormone(page);

  // Published: AR(1) with mean, ln L −29.38 (Venables & Ripley 2002, ch. 14, luteinising hormone).
  const likelihoods = await column(page, 'ln L');
  expect(likelihoods.some((value) => Math.abs(value + 29.38) < 0.006)).toBe(true);

  // The level switch refits its row only.
  const named = (orders: string) => rows(page).filter({ hasText: orders });
  const first = named('(1,0,0)');
  const before = await settled(first);
  const other1 = await settled(named('(0,1,1)'));
  await first.getByRole('radio', { name: 'none' }).check();
  await expect
    .poll(async () => /fitted/.test(await first.innerText()) && (await first.innerText()) !== before)
    .toBe(true);
  expect(await named('(0,1,1)').innerText()).toBe(other1);
  await first.getByRole('radio', { name: 'mean' }).check();
  await expect.poll(async () => first.innerText()).toBe(before);
  await allFitted(page, 3);

  // Sorting by mouse and by keyboard.
  const heading = table(page).getByRole('columnheader', { name: /^ln L/ });
  await heading.getByRole('button').click();
  await expect(heading).toHaveAttribute('aria-sort', 'ascending');
  await heading.getByRole('button').press('Enter');
  await expect(heading).toHaveAttribute('aria-sort', 'descending');

  // The session link, opened by a colleague who has never seen the page.
  await page.getByRole('button', { name: 'Copy session link' }).click();
  const link = await page.evaluate(() => navigator.clipboard.readText());
  expect(link).toContain('#');
  const numbers = (await column(page, 'ln L')).sort();
  const colleague = await browser.newContext({ acceptDownloads: true });
  const foreignToo = watchOrigin(colleague, baseURL!);
  const other = await colleague.newPage();
  await other.goto(link);
  await expect(rows(other)).toHaveCount(3);
  await dropFile(other, 'renamed.csv', hormoneCsv());
  const use = other.getByRole('button', { name: 'Use this record' });
  await Promise.race([
    use.waitFor({ state: 'visible' }).then(() => use.click()),
    expect(rows(other).first()).toContainText('fitted', { ignoreCase: true }),
  ]);
  await allFitted(other, 3);
  expect((await column(other, 'ln L')).sort()).toEqual(numbers);
  expect(foreignToo).toEqual([]);
  await colleague.close();

  // The dossier, read back: text, Greek, vector panels, page numbers, cautions.
  await rows(page).first().click();
  const [download] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('button', { name: 'Save dossier' }).click(),
  ]);
  const dossier = await readDossier(await download.path());
  const text = dossier.pages.join('\n');
  expect(text).toContain('φ');
  expect(text).toContain('σ');
  expect(text).toMatch(/hormone\.csv/);
  expect(text).toMatch(/AICc/);
  expect(text).toMatch(/constant/i);
  expect(text).toMatch(/statistical limits are not safety limits|must be rechecked/i);
  dossier.pages.forEach((content, index) => {
    expect(content).toMatch(new RegExp(`${index + 1} ?/ ?${dossier.pages.length}`));
  });
  expect(dossier.paths).toBeGreaterThan(60);
  expect(dossier.images).toBe(0);
  expect(foreign).toEqual([]);
});

test('undo takes back the level, the record and comes again with redo', async ({ page }) => {
  await page.goto('/');
  await takeHormone(page);
  const row = rows(page).filter({ hasText: '(1,0,0)' });
  const before = await settled(row);
  await row.getByRole('radio', { name: 'none' }).check();
  await expect.poll(async () => /fitted/.test(await row.innerText()) && (await row.innerText()) !== before).toBe(true);
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect.poll(async () => row.innerText()).toBe(before);
  await page.getByRole('button', { name: 'Redo' }).click();
  await expect(row.getByRole('radio', { name: 'none' })).toBeChecked();
  await page.getByRole('button', { name: 'Undo' }).click();
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(page.getByText('Invented example').first()).toBeVisible();
});

test('the session is there again after a reload, and the readings travel in the link when asked', async ({
  page,
  browser,
}) => {
  await page.goto('/');
  await takeHormone(page);
  await page.getByRole('button', { name: 'Add candidate' }).click();
  await allFitted(page, 4);
  const numbers = (await column(page, 'ln L')).sort();
  await page.waitForTimeout(1500); // the browser's own store is written a moment after the last change
  await page.reload();
  await allFitted(page, 4);
  expect((await column(page, 'ln L')).sort()).toEqual(numbers);
  await page.getByLabel('include the readings').check();
  await page.getByRole('button', { name: 'Copy session link' }).click();
  const link = await page.evaluate(() => navigator.clipboard.readText());
  const colleague = await browser.newContext();
  const other = await colleague.newPage();
  await other.goto('/');
  await allFitted(other, 3);
  await other.locator('summary', { hasText: 'Paste' }).click();
  await other.getByRole('textbox').fill(link.replace(/^[^#]*/, 'https://elsewhere.example/tool/'));
  await other.getByRole('button', { name: 'Read it' }).click();
  await allFitted(other, 4);
  expect((await column(other, 'ln L')).sort()).toEqual(numbers);
  await colleague.close();
});

test('the whole job without a mouse', async ({ page }) => {
  await page.goto('/');
  await allFitted(page, 3);
  const press = async (target: Locator, key = 'Enter') => {
    await target.focus();
    await expect(target).toBeFocused();
    await page.keyboard.press(key);
  };
  await press(page.locator('summary', { hasText: 'Paste' }));
  await page.getByRole('textbox').focus();
  await page.keyboard.insertText(hormoneCsv());
  await press(page.getByRole('button', { name: 'Read it' }));
  const use = page.getByRole('button', { name: 'Use this record' });
  await expect(use).toBeEnabled();
  await press(use);
  await allFitted(page, 3);
  const row = rows(page).filter({ hasText: '(1,0,0)' });
  await press(row.getByRole('button', { name: /^Choose/ }));
  await expect(row).toHaveAttribute('aria-current', 'true');
  await row.getByRole('radio', { name: 'mean' }).focus();
  await page.keyboard.press('ArrowLeft');
  await expect(row.getByRole('radio', { name: 'none' })).toBeChecked();
  await allFitted(page, 3);
  await press(row.getByRole('button', { name: /^Edit/ }));
  await page.getByLabel('AR order p', { exact: true }).focus();
  await page.keyboard.press('ArrowUp');
  await expect(rows(page).filter({ hasText: '(2,0,0)' })).toContainText('fitted');
  const [download] = await Promise.all([
    page.waitForEvent('download'),
    press(page.getByRole('button', { name: 'Save dossier' })),
  ]);
  expect(download.suggestedFilename()).toMatch(/\.pdf$/);
});

test('the narrow page has no sideways scroll', async ({ page }) => {
  await page.setViewportSize({ width: 390, height: 844 });
  await page.goto('/');
  await allFitted(page, 3);
  const width = await page.evaluate(() => document.documentElement.scrollWidth);
  expect(width).toBeLessThanOrEqual(390);
});

test('a missing row becomes a gap and the exact likelihood uses the rest', async ({ page }) => {
  await page.goto('/');
  await dropFile(page, 'hormone-gap.csv', hormoneCsv(20));
  await expect(page.getByText(/gap/i).first()).toBeVisible();
  await page.getByRole('button', { name: 'Use this record' }).click();
  await allFitted(page, 3);
});

test('axe finds nothing serious, on the example and on the empty sheet', async ({ page }) => {
  test.slow();
  for (const scheme of ['light', 'dark'] as const) {
    await page.emulateMedia({ colorScheme: scheme });
    await page.goto('/');
    await allFitted(page, 3);
    const { violations } = await new AxeBuilder({ page }).analyze();
    const grave = violations.filter(({ impact }) => impact === 'serious' || impact === 'critical');
    expect(grave.map(({ id, nodes }) => `${id}: ${nodes.map((node) => node.html).join(' ')}`)).toEqual([]);
  }
  await page.getByRole('button', { name: 'Forget record' }).click();
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.filter(({ impact }) => impact === 'serious' || impact === 'critical')).toEqual([]);
});
