import { expect, test, type Page } from '@playwright/test';
import { expectAccessible } from './support/axe.js';
import { demoPerson, signIn } from './support/demo.js';

const writeDown = async (page: Page, sides: [string, string, string], filament: string, price: string) => {
  const dialog = page.getByRole('dialog');
  for (const [at, label] of ['Width', 'Depth', 'Height'].entries())
    await dialog.getByLabel(label).fill(sides[at]!);
  await dialog.getByLabel('Filament', { exact: true }).fill(filament);
  await dialog.getByLabel(/^Price per kg/).fill(price);
  await dialog.getByRole('button', { name: 'Keep this printer' }).click();
  await expect(dialog).toBeHidden();
};

test('a visitor sees a kit on their own plates, lists what fits, and keeps the printer when signing in', async ({
  page,
}) => {
  test.setTimeout(120_000);
  const asked: string[] = [];
  page.on('request', (request) => asked.push(new URL(request.url()).pathname));
  await page.goto('/kits/curlew', { waitUntil: 'networkidle' });
  expect(asked.filter((path) => /plates|printer-card|\/print$/.test(path))).toEqual([]);

  await page.getByRole('button', { name: 'Write down my printer' }).click();
  await writeDown(page, ['120', '120', '170'], 'PETG', '22.90');
  const section = page.getByRole('region', { name: 'Will it print on your machine?' });
  await expect(section.getByText('All 28 parts fit 120 × 120 × 170 mm.')).toBeVisible();
  await expect(section.getByRole('heading', { name: /^\d plates, .* of filament, about €/ })).toBeVisible();
  expect(asked.filter((path) => /plates\.worker/.test(path))).toHaveLength(1);

  const first = section.getByRole('img', {
    name: /^Plate 1 of \d, drawn to scale on a bed of 120 × 120 × 170/,
  });
  await expect(first).toBeVisible();
  await section.getByRole('button', { name: 'Next plate' }).click();
  await expect(section.getByRole('img', { name: /^Plate 2 of/ })).toBeVisible();
  await section.locator('summary').getByText('All 28 parts on this printer').click();
  await expectAccessible(page, 'a kit on plates');

  await section.getByLabel('Along the edges').fill('58');
  await expect(section.getByText(/On no plate, because a margin of 58 mm/)).toBeVisible();
  await section.getByLabel('Along the edges').fill('60');
  await expect(section.getByText(/leaves no room on the bed/)).toBeVisible();
  await section.getByLabel('Along the edges').fill('3');
  await expect(section.getByText(/leaves no room on the bed/)).toBeHidden();

  await page.goto('/');
  await page.getByRole('link', { name: 'Only what fits my printer' }).click();
  await expect(page.getByText('Only what fits 120 × 120 × 170 mm')).toBeVisible();
  await expect(page.getByRole('heading', { name: 'Curlew' })).toBeVisible();
  await expect(page.getByRole('heading', { name: 'Teal' })).toHaveCount(0);
  await page.goto('/?fits=20x20x20');
  await expect(page.getByRole('heading', { name: 'No kit fits 20 × 20 × 20 mm' })).toBeVisible();

  await signIn(page, demoPerson('helper'));
  await page.goto('/account');
  const printers = page.getByRole('region', { name: 'Printers' });
  await printers.getByRole('button', { name: 'Keep it on my account' }).click();
  await expect(printers.getByRole('listitem')).toHaveCount(1);
  await expect(printers.getByText('main printer')).toBeVisible();
  await printers.getByRole('button', { name: 'Write down a printer' }).click();
  await page.getByRole('dialog').getByLabel('Name').fill('Second');
  await expectAccessible(page, 'the dialog of a printer card');
  await writeDown(page, ['300', '300', '300'], 'PLA', '');
  await expect(printers.getByRole('listitem')).toHaveCount(2);
  await printers.getByRole('button', { name: 'Make Second the main one' }).click();
  await expect(printers.getByRole('listitem').first()).toContainText('Second');
  await printers.getByRole('button', { name: 'Throw Second away' }).click();
  await expect(page.getByText('My printer becomes the main printer.')).toBeVisible();
  await page.getByRole('button', { name: 'Throw away', exact: true }).last().click();
  await expect(printers.getByRole('listitem')).toHaveCount(1);
  await page.goto('/kits/curlew');
  await expect(page.getByText('My printer, 120 × 120 × 170 mm', { exact: true })).toBeVisible();
});
