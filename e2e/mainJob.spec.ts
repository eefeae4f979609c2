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

async function takeHormone(page: Page): Promise<void> {
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
  const first = rows(page).first();
  const before = await first.innerText();
  const others = await rows(page).nth(1).innerText();
  await first.getByRole('radio', { name: 'none' }).check();
  await expect(first).toContainText('fitted', { ignoreCase: true });
  await expect.poll(async () => (await first.innerText()) !== before).toBe(true);
  expect((await rows(page).nth(1).innerText()).split('\n')[0]).toBe(others.split('\n')[0]);
  await first.getByRole('radio', { name: 'mean' }).check();
  await allFitted(page, 3);

  // Sorting by mouse and by keyboard.
  const heading = table(page).getByRole('columnheader', { name: /^AICc/ });
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

test('a missing row becomes a gap and the exact likelihood uses the rest', async ({ page }) => {
  await page.goto('/');
  await dropFile(page, 'hormone-gap.csv', hormoneCsv(20));
  await expect(page.getByText(/gap/i).first()).toBeVisible();
  await page.getByRole('button', { name: 'Use this record' }).click();
  await allFitted(page, 3);
});

test('axe finds nothing serious, on the example and on the empty sheet', async ({ page }) => {
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
