import { expect, test } from '@playwright/test';
import { expectAccessible } from './support/axe.js';
import { signIn } from './support/demo.js';

test('a buyer says which clearance they print; bundle and reprint list keep to it', async ({ page }) => {
  const { demoSignIns } = await import('../seed-data/dist/sign-ins.js');
  const pia = demoSignIns.find((one) => one.email.startsWith('pia')) ?? { email: '', passphrase: '' };
  await signIn(page, pia);
  await page.goto('/shelf/curlew');
  await expect(page.getByText(/Print the gauge first, G-01 Tongue gauge/)).toBeVisible();
  await expect(page.getByRole('button', { name: /Get the whole bundle/ })).toBeVisible();
  const tongue = page.getByRole('row', { name: /J-01/ });
  await expect(tongue).toContainText('In 0: −0.24 mm depth');
  await expectAccessible(page, 'shelf kit with clearances');

  await page.getByRole('radio', { name: '+ looser' }).check();
  await expect(page.getByRole('button', { name: /Get the bundle in \+/ })).toBeVisible();
  await expect(tongue).toContainText('Locking tongue, in +');
  await expect(tongue).toContainText('−0.44 mm depth');
  await page.reload();
  await expect(page.getByRole('radio', { name: '+ looser' })).toBeChecked();

  await page.getByRole('radio', { name: /Not known yet/ }).check();
  await expect(page.getByRole('button', { name: /Get the whole bundle/ })).toBeVisible();
});
