import { expect, test } from '@playwright/test';
import { dropFile, hormoneCsv } from './support/records.ts';

test('a sweep ranks a range of orders, says how clear its best is, and a good one is taken into the table', async ({
  page,
}) => {
  test.slow();
  await page.goto('/');
  await dropFile(page, 'hormone.csv', hormoneCsv());
  await page.getByRole('button', { name: 'Use this record' }).click();
  await page.getByText('Sweep a range of orders').click();
  await page.getByRole('button', { name: 'Sweep', exact: true }).click();
  const best = page.getByRole('region', { name: 'Sweep, group 1' });
  await expect(best).toBeVisible({ timeout: 60_000 });
  await expect(page.locator('.sweep')).toContainText('of the weight');
  await expect(page.locator('.sweep')).toContainText('fitted of 48');
  // Luteinising hormone: AR(1) with mean is the usual choice (Venables & Ripley, chapter 14, by AIC among AR orders: AR(3) 64.18, AR(1) 64.76).
  await expect(best).toContainText('(1,0,0), with mean');

  const rows = page.getByRole('table', { name: 'Candidates' }).getByRole('radiogroup', { name: 'Level' });
  const before = await rows.count();
  await best.getByRole('button', { name: 'Take (3,0,0), with mean into the table' }).click();
  await expect(rows).toHaveCount(before + 1);
});
