import { expect, test } from '@playwright/test';
import { expectAccessible } from './support/axe.js';
import { signIn } from './support/demo.js';

test('a buyer says which clearance they print; bundle and reprint list keep to it', async ({ page }) => {
  const { demoSignIns } = await import('../seed-data/dist/sign-ins.js');
  const pia = demoSignIns.find((one) => one.email.startsWith('pia')) ?? { email: '', passphrase: '' };
  await signIn(page, pia);
  await page.goto('/shelf/curlew');
  // Her printer card says that she prints parts as they are drawn.
  const asMyPrinter = page.getByRole('radio', { name: /As my printer: 0 as drawn/ });
  await expect(asMyPrinter).toBeChecked();
  await expect(page.getByRole('button', { name: /Get the bundle in 0/ })).toBeVisible();
  const tongue = page.getByRole('row', { name: /J-01/ });
  await expect(tongue).toContainText('−0.24 mm depth');
  await expectAccessible(page, 'shelf kit with clearances');

  await page.getByRole('radio', { name: '+ looser' }).check();
  await expect(page.getByRole('button', { name: /Get the bundle in \+/ })).toBeVisible();
  await expect(tongue).toContainText('Locking tongue, in +');
  await expect(tongue).toContainText('Printed in 0, you print in +');
  await page.reload();
  await expect(page.getByRole('radio', { name: '+ looser' })).toBeChecked();

  await asMyPrinter.check();
  await expect(page.getByRole('button', { name: /Get the bundle in 0/ })).toBeVisible();
});
