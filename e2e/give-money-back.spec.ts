import { expect, test } from '@playwright/test';
import { expectAccessible } from './support/axe.js';
import { demoPerson, signIn } from './support/demo.js';
import { awaitMail, linkIn } from './support/mailbox.js';

const stripeUrl = process.env['WINDCHEST_STRIPE_URL'] ?? '';

interface Kit {
  licences: { id: string }[];
}

test('the bookkeeper gives part of an order back, and the buyer hears of it and holds the papers', async ({
  page,
  browser,
}) => {
  test.setTimeout(120_000);
  const email = `phalarope.${Date.now()}@mail.example`;
  const headers = { 'X-Windchest': '1' };
  const items = await Promise.all(
    ['teal', 'godwit'].map(async (slug) => {
      const kit = (await (await page.request.get(`/api/kits/${slug}`)).json()) as Kit;
      return { licenceId: kit.licences[0]?.id };
    }),
  );
  const body = { items, email, country: 'DE', hasConsented: true, attempt: crypto.randomUUID() };
  const placed = (await (await page.request.post('/api/checkout', { headers, data: body })).json()) as {
    orderId: string;
    paymentUrl: string;
  };
  await page.request.post(`${stripeUrl}/control/sessions/${placed.paymentUrl.split('/').at(-1)}/pay`, {
    data: { country: 'DE', cardCountry: 'DE' },
  });
  await awaitMail(email, /^Your files/);

  await signIn(page, demoPerson('bookkeeper'));
  await page.goto(`/workshop/orders/${placed.orderId}`);
  await page.getByRole('button', { name: 'Give money back' }).click();
  await page.getByLabel(/^Teal Mk/).fill('9.00');
  await page.getByLabel(/^Godwit Mk/).fill('4.00');
  await page.getByLabel('Godwit stays with the buyer all the same').check();
  await expect(page.getByText('The right to the files of Teal ends')).toBeVisible();
  await expectAccessible(page, 'giving money back');
  await page.getByRole('button', { name: 'Give €13.00 back' }).click();
  await expect(page.getByText('Write why, in a line.')).toBeVisible();
  await page.getByLabel('Reason').fill('Two bars out of tune.');
  await page.getByRole('button', { name: 'Give €13.00 back' }).click();
  await expect(page.getByText(/^Credit note \d{4}-C\d{5} is written/)).toBeVisible();
  await page.getByRole('button', { name: 'Close' }).click();
  await expect(page.getByRole('heading', { name: 'Money back' })).toBeVisible();
  await expectAccessible(page, 'an order with a refund');
  await page.goto('/workshop/ledger/receipts');
  await expect(page.getByRole('link', { name: /-C\d{5}$/ }).first()).toBeVisible();
  await expectAccessible(page, 'receipts');

  const mail = await awaitMail(email, /^Refund of €13\.00/);
  expect(mail.text).toContain('your right to the files of Teal ends');
  const elsewhere = await browser.newContext();
  const visitor = await elsewhere.newPage();
  await visitor.goto(linkIn(mail, '/orders'));
  await expect(visitor.getByText('The right to the files has ended.')).toHaveCount(1);
  const papers = visitor.getByRole('link', { name: /^(Receipt|Credit note) \d{4}-/ });
  await expect(papers).toHaveCount(2);
  for (const href of await papers.evaluateAll((links) => links.map((link) => link.getAttribute('href')))) {
    const pdf = await visitor.request.get(new URL(href ?? '', visitor.url()).href);
    expect(pdf.headers()['content-type']).toBe('application/pdf');
    expect((await pdf.body()).subarray(0, 5).toString()).toBe('%PDF-');
  }
  await expectAccessible(visitor, 'an order that was refunded in part');
  await elsewhere.close();
});
