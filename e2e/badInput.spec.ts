import { expect, test } from '@playwright/test';
import { dropFile } from './support/records.ts';

const row = (index: number, value: string) =>
  `2024-05-01 ${String(Math.floor(index / 60)).padStart(2, '0')}:${String(index % 60).padStart(2, '0')},${value}`;
const csv = (values: string[]) => ['time,flow', ...values.map((value, index) => row(index, value))].join('\n');

/** Each: what a person might drop by mistake, and words the message must hold (what, where or what to do). */
const cases: { name: string; text: string; says: RegExp }[] = [
  { name: 'empty.csv', text: '', says: /empty/i },
  {
    name: 'photo.jpg',
    text: '\u00ff\u00d8\u00ff\u00e0\u0000\u0010JFIF\u0000\u0001',
    says: /not a text|picture|binary|photo/i,
  },
  { name: 'words.csv', text: ['remark', 'pump off', 'valve stuck', 'all well'].join('\n'), says: /number/i },
  { name: 'three.csv', text: csv(['1.5', '1.7', '1.6']), says: /3 readings/i },
  { name: 'constant.csv', text: csv(Array.from({ length: 40 }, () => '7.0')), says: /same|constant|variation/i },
  { name: 'allgaps.csv', text: csv(Array.from({ length: 40 }, () => '')), says: /gap|no number|numbers/i },
];

for (const { name, text, says } of cases) {
  test(`${name} gets a clear message and the work so far is kept`, async ({ page }) => {
    await page.goto('/');
    const table = page.getByRole('table', { name: 'Candidates' });
    await expect(table.getByText(/fitted/i)).toHaveCount(3);
    await dropFile(page, name, text);
    await expect(page.locator('.notice').getByText(says).first()).toBeVisible();
    await expect(table.getByText(/fitted/i)).toHaveCount(3);
  });
}

test('a damaged or foreign link leaves a working page and says so', async ({ page }) => {
  for (const hash of ['#s1.AAAA_not-a-session', '#section-3', '#s1.' + 'x'.repeat(5000)]) {
    await page.goto('about:blank');
    await page.goto(`/${hash}`);
    await expect(page.locator('.notices').getByText(/link/i).first()).toBeVisible();
    await expect(page.getByRole('button', { name: 'Open record' })).toBeEnabled();
  }
});

/** Files that can be read in spite of a fault: what was found is said, with the line, before anything is computed. */
const faulty: { name: string; text: string; says: RegExp }[] = [
  {
    name: 'ragged.csv',
    text: [
      'time,flow,level',
      ...Array.from({ length: 40 }, (_, i) => (i === 7 ? row(i, '1.5') : `${row(i, String(i % 7))},2`)),
    ].join('\n'),
    says: /1 row with more or fewer cells than the header \(line 9\)/,
  },
  {
    name: 'twice.csv',
    text: ['time,flow', ...Array.from({ length: 40 }, (_, i) => row(i, String(i % 7))), row(39, '3')].join('\n'),
    says: /1 row repeats a time with another reading/,
  },
];

for (const { name, text, says } of faulty) {
  test(`${name} is read, and says what was found`, async ({ page }) => {
    await page.goto('/');
    await expect(page.getByRole('table', { name: 'Candidates' }).getByText(/fitted/i)).toHaveCount(3);
    await dropFile(page, name, text);
    await expect(page.locator('.arrival').getByText(says)).toBeVisible();
    await page.getByRole('button', { name: 'Use this record' }).click();
    await expect(page.getByRole('table', { name: 'Candidates' }).getByText('fitted', { exact: true })).toHaveCount(3);
  });
}

test('a million rows are read while the page stays in use', async ({ page }) => {
  const rows = ['second,flow'];
  for (let i = 0; i < 1_000_000; i += 1) rows.push(`${i},${((i * 7919) % 1000) / 100}`);
  await page.goto('/');
  await expect(page.getByRole('table', { name: 'Candidates' }).getByText(/fitted/i)).toHaveCount(3);
  await page
    .locator('input[type=file]')
    .setInputFiles({ name: 'million.csv', mimeType: 'text/csv', buffer: Buffer.from(rows.join('\n')) });
  await page.getByRole('button', { name: 'Dark' }).click();
  await expect(page.locator('html')).toHaveAttribute('data-theme', 'dark');
  await expect(page.locator('.arrival .sentence')).toContainText('1\u2009000\u2009000 rows', { timeout: 40_000 });
  await page.getByRole('button', { name: 'Dismiss' }).click();
  await expect(page.getByRole('table', { name: 'Candidates' }).getByText(/fitted/i)).toHaveCount(3);
});
