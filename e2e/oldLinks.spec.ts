import { readdirSync, readFileSync } from 'node:fs';
import { expect, test } from '@playwright/test';

/**
 * Links of every version the session format has had, kept for ever. Each was made on the example the page opens with, so that its record
 * is found by its fingerprint among the examples. Expected: ln L of the candidates as the page showed them when the link was made.
 */
const expected: Record<string, string[]> = {
  'version-1.txt': ['1548.03', '1536.89', '1147.31', '1514.36'],
};
const folder = new URL('./links/', import.meta.url);

for (const name of readdirSync(folder)) {
  test(`${name} still opens`, async ({ page }) => {
    expect(expected[name], `numbers expected of ${name}`).toBeDefined();
    await page.goto(`/${readFileSync(new URL(name, folder), 'utf8').trim()}`);
    const table = page.getByRole('table', { name: 'Candidates' });
    for (const number of expected[name]!) await expect(table).toContainText(number);
    await expect(page.locator('.notice.trouble')).toHaveCount(0);
  });
}
