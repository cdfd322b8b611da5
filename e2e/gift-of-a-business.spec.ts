import { expect, test } from '@playwright/test';
import { expectAccessible } from './support/axe.js';
import { demoPerson, signIn } from './support/demo.js';
import { awaitMail, linkIn, mailsTo } from './support/mailbox.js';

const friend = `turnstone.${Date.now()}@mail.example`;

test('a business gives a kit away without VAT, and the bookkeeper finds it in the quarter', async ({
  page,
  browser,
}) => {
  test.setTimeout(150_000);

  await test.step('puts a kit in the basket, signs in, and finds it there still', async () => {
    await page.goto('/kits/teal');
    await page.getByRole('button', { name: 'Put in basket' }).click();
    await signIn(page, demoPerson('buyer'));
    await page.goto('/basket');
    await expect(page.getByRole('link', { name: 'Teal' })).toBeVisible();
    await expect(page.getByText('Prices include tax.')).toBeVisible();
  });

  await test.step('buys it for a business, as a gift', async () => {
    await page.getByRole('combobox', { name: 'Country' }).selectOption('DE');
    await expect(page.getByText(/including €1\.44 VAT \(19 %, Germany\)/)).toBeVisible();
    await page.getByRole('checkbox', { name: 'I buy for a business' }).check();
    await page.getByLabel('Company name').fill('Tidewater Music School');
    await page.getByLabel('Address', { exact: true }).fill('Am Siel 12\n26506 Norden');
    await page.getByLabel(/^VAT number/).fill('DE12345');
    await page.getByRole('checkbox', { name: 'This is a gift for another address' }).check();
    await page.getByLabel('Their e-mail').fill(friend);
    await page.getByRole('textbox', { name: /^From/ }).fill('The school');
    await page.getByLabel('A line to go with it').fill('For the long evenings.');
    await page.getByRole('checkbox', { name: /Hand the files over at once/ }).check();
    await page.getByRole('button', { name: 'Pay €9.00' }).click();
    await expect(page.getByText('such as DE123456789')).toBeVisible();
    await page.getByLabel(/^VAT number/).fill('DE 123 456 789');
    // 9.00 / 1.19 = 7.56
    await expect(page.getByText(/your business owes it in Germany/)).toBeVisible();
    await expectAccessible(page, 'basket of a business');
    await page.getByRole('button', { name: 'Pay €7.56' }).click();
    await page.waitForURL(/\/pay\//);
    await page.getByLabel('Billing country').selectOption('DE');
    await page
      .getByRole('button', { name: /Succeeds/ })
      .first()
      .click();
    await page.getByRole('button', { name: /^Pay €7\.56/ }).click();
    await expect(page.getByRole('heading', { name: 'The gift' })).toBeVisible({ timeout: 30_000 });
    await expect(page.getByText(/owes it in its own country/)).toBeVisible();
    await expectAccessible(page, 'order of a gift');
  });

  await test.step('the one it is for gets the files, and no sum', async () => {
    const mail = await awaitMail(friend, /The school gives you Teal/);
    expect(mail.text).toContain('For the long evenings.');
    expect(mail.text).not.toContain('€');
    expect((await mailsTo(friend)).length).toBe(1);
    const stranger = await (await browser.newContext()).newPage();
    await stranger.goto(linkIn(mail, '/collect/'));
    await expect(stranger.getByRole('heading', { name: /Teal/ }).first()).toBeVisible();
    await stranger.context().close();
  });

  await test.step('the bookkeeper finds it under reverse charge, and holds the books together', async () => {
    const books = await (await browser.newContext()).newPage();
    await signIn(books, demoPerson('bookkeeper'));
    await books.goto('/workshop/ledger');
    await expect(books.getByRole('heading', { level: 1, name: 'Sales' })).toBeVisible();
    await expectAccessible(books, 'sales');
    await books.getByRole('link', { name: 'Quarters' }).click();
    await books
      .getByRole('link', { name: /quarter/ })
      .first()
      .click();
    await expect(books.getByRole('heading', { name: /Reverse charge: the buyer owes/ })).toBeVisible();
    await expect(books.getByText('DE123456789').first()).toBeVisible();
    await expectAccessible(books, 'quarter');
    await books.getByRole('link', { name: 'Comparison' }).click();
    const today = new Date().toISOString().slice(0, 10);
    await books.getByLabel('First day').fill(today);
    await books.getByLabel('Last day').fill(today);
    await books.getByRole('button', { name: 'Compare' }).click();
    await expect(books.getByRole('heading', { name: 'Movements' })).toBeVisible({ timeout: 30_000 });
    await expectAccessible(books, 'comparison');
    await books.context().close();
  });
});
