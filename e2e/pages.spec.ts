import { expect, test } from '@playwright/test';
import { expectAccessible } from './support/axe.js';
import { demoPerson, signIn } from './support/demo.js';

test.describe('pages a visitor sees', () => {
  for (const path of [
    '/join',
    '/sign-in',
    '/forgot',
    '/shelf',
    '/cautions',
    '/kits/no-such-kit',
    '/support',
    '/no-such-page',
    '/collect/' + 'x'.repeat(43),
  ])
    test(`${path} is accessible in light and dark, wide and narrow`, async ({ page }) => {
      await page.goto(path);
      await expect(page.getByRole('heading', { level: 1 })).toHaveCount(1);
      await expectAccessible(page, path);
    });
});

test('an account is made, verified by the mailed link, and left again', async ({ page }) => {
  const { awaitMail, linkIn } = await import('./support/mailbox.js');
  const email = `tern.${Date.now()}@mail.example`;
  await page.goto('/join');
  await page.getByLabel('Name').fill('Tern');
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Passphrase', { exact: true }).fill('terns dive from on high');
  await page.getByRole('button', { name: 'Join' }).click();
  await expect(page.getByRole('heading', { name: 'Look in your mail' })).toBeVisible();
  await page.goto(linkIn(await awaitMail(email, /address/i), '/verify'));
  await page.waitForURL((url) => !url.hash.includes('token'));
  await expect
    .poll(
      async () =>
        ((await (await page.request.get('/api/session')).json()) as { person: { email: string } | null })
          .person?.email,
    )
    .toBe(email);
  await page.goto('/account');
  await expectAccessible(page, 'account');
  await page.getByRole('button', { name: 'Sign out' }).first().click();
  await expect
    .poll(async () => ((await (await page.request.get('/api/session')).json()) as { person: unknown }).person)
    .toBeNull();
});

test.describe('pages of the workshop', () => {
  test('are accessible and say who may see them', async ({ page }) => {
    test.setTimeout(180_000);
    await signIn(page, demoPerson('owner'));
    for (const path of [
      '/workshop',
      '/workshop/kits',
      '/workshop/kits/new',
      '/workshop/coupons',
      '/workshop/coupons/new',
      '/workshop/orders',
      '/workshop/supporters',
      '/workshop/plans',
      '/workshop/plans/new',
      '/workshop/people',
      '/workshop/log',
    ]) {
      await page.goto(path);
      await expect(page.getByRole('heading', { level: 1 })).toHaveCount(1);
      await expectAccessible(page, path);
    }
    await page.goto('/workshop/orders');
    await page.getByRole('link', { name: /^W-/ }).first().click();
    await expect(page.getByRole('heading', { level: 1, name: /^W-/ })).toBeVisible();
    await expectAccessible(page, 'workshop order');
  });

  test('show a helper no money', async ({ page }) => {
    await signIn(page, demoPerson('helper'));
    await page.goto('/workshop');
    await expect(page.getByRole('link', { name: 'Kits' }).first()).toBeVisible();
    await expect(page.getByRole('link', { name: 'Orders' })).toHaveCount(0);
    await expect(page.getByRole('link', { name: 'Coupons' })).toHaveCount(0);
    await expect(page.getByText(/Sales of the last/)).toHaveCount(0);
  });

  test('are closed to a buyer', async ({ page }) => {
    await signIn(page, demoPerson('buyer'));
    await page.goto('/workshop');
    await expect(page.getByText(/for the workshop’s staff/).first()).toBeVisible();
  });
});
