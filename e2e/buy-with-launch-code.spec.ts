import { createHash } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import { expect, test } from '@playwright/test';
import { expectAccessible } from './support/axe.js';
import { awaitMail, linkIn, mailsTo } from './support/mailbox.js';
import { watchHosts } from './support/own-host.js';

const email = `wren.${Date.now()}@mail.example`;

test('a buyer redeems the launch discount, pays, gets the e-mail and downloads the bundle', async ({
  page,
}) => {
  const hosts = watchHosts(page);

  await test.step('finds the kit on the first page and hears a pipe', async () => {
    await page.goto('/');
    await expect(page.getByRole('heading', { level: 1 })).toHaveText(/Instruments\s*you print\./);
    await expect(page.getByText('A third off for the first 150').first()).toBeVisible();
    await expectAccessible(page, 'home');
    await page.getByRole('link', { name: 'See Curlew, the new kit' }).click();
    await expect(page.getByRole('heading', { level: 1, name: 'Curlew' })).toBeVisible();
  });

  await test.step('sees the price with the code, and puts it in the basket', async () => {
    await expect(page.getByText(/With code WINDFALL, 1[0-9]{2} of 150 left/)).toBeVisible();
    await expect(page.getByText('€16.00').first()).toBeVisible();
    await page.getByText('All 28 parts, with sizes').click();
    await expect(page.getByText('P-72').filter({ visible: true }).first()).toBeVisible();
    await expectAccessible(page, 'kit');
    await page.getByRole('button', { name: 'Put in basket' }).click();
    await page.getByRole('link', { name: 'In your basket' }).click();
  });

  await test.step('uses the code in the basket', async () => {
    await expect(page.getByRole('heading', { level: 1, name: 'Basket' })).toBeVisible();
    const code = page.getByRole('textbox', { name: 'Code', exact: true });
    if (await code.isVisible()) {
      await code.fill('nosuchcode');
      await page.getByRole('button', { name: 'Use this code' }).click();
      await expect(page.getByText(/no (such )?code|There is no/i).first()).toBeVisible();
      await code.fill('windfall');
      await page.getByRole('button', { name: 'Use this code' }).click();
    }
    await expect(page.getByText(/takes off €8\.00/)).toBeVisible();
    await expect(page.getByText(/of 150 left/).first()).toBeVisible();
    await expectAccessible(page, 'basket');
  });

  await test.step('checks out, is declined once, and pays', async () => {
    await page.getByRole('textbox', { name: 'E-mail' }).fill(email);
    await page.getByRole('combobox', { name: 'Country' }).selectOption('IE');
    await page.getByRole('checkbox', { name: /Hand the files over at once/ }).check();
    await page.getByRole('button', { name: 'Pay €16.00' }).click();
    await page.waitForURL(/\/pay\//);
    await expect(page.getByText(/stand-in/i).first()).toBeVisible();
    await page.getByLabel('Billing country').selectOption('IE');
    await page.getByRole('button', { name: /Is declined/ }).click();
    await page.getByRole('button', { name: 'Pay €16.00' }).click();
    await expect(page.getByText(/declined/i).first()).toBeVisible();
    await page.getByRole('button', { name: /Succeeds/ }).click();
    await page.getByRole('button', { name: 'Pay €16.00' }).click();
  });

  await test.step('sees the order paid, with a receipt number', async () => {
    await page.waitForURL(/\/orders\//);
    await expect(page.getByRole('heading', { level: 1, name: 'Paid' })).toBeVisible({ timeout: 30_000 });
    expect(page.url(), 'the key of the order leaves the address').not.toContain('key=');
    await expect(page.getByText(`We have written to ${email}.`)).toBeVisible();
    await expect(page.getByText(/VAT 23 % on €13\.01 net/)).toBeVisible();
    await expectAccessible(page, 'order');
  });

  await test.step('gets one e-mail with a link to a page, not to a file', async () => {
    const mail = await awaitMail(email, /Curlew/);
    expect(mail.text).toContain('Total: €16.00');
    expect(mail.text).toMatch(/Receipt: \S+/);
    await page.goto(linkIn(mail, '/collect/'));
    await expect(page.getByRole('heading', { level: 1, name: 'Your files' })).toBeVisible();
    await expectAccessible(page, 'collect');
  });

  await test.step('downloads the bundle, whose hash is the one shown', async () => {
    const download = page.waitForEvent('download');
    await page.getByRole('button', { name: /Get the bundle/ }).click();
    const file = await download;
    expect(file.suggestedFilename()).toMatch(/curlew.*\.zip$/i);
    const bytes = await readFile(await file.path());
    const sha256 = createHash('sha256').update(bytes).digest('hex');
    await expect(page.getByText(sha256.slice(0, 16)).first()).toBeVisible();
    await page.reload();
    await expect(page.getByText('Downloads left').locator('..')).toContainText('9');
    expect(await mailsTo(email)).toHaveLength(1);
  });

  hosts.check();
});

test('an order given up frees its coupon place and charges nothing', async ({ page }) => {
  const left = async (): Promise<number> => {
    const offers = (await (await page.request.get('/api/offers')).json()) as { code: string; left: number }[];
    return offers.find((one) => one.code === 'WINDFALL')?.left ?? -1;
  };
  const before = await left();
  const kit = (await (await page.request.get('/api/kits/curlew')).json()) as { licences: { id: string }[] };
  const placed = await page.request.post('/api/checkout', {
    headers: { 'X-Windchest': '1' },
    data: {
      items: [{ licenceId: kit.licences[0]?.id }],
      couponCode: 'WINDFALL',
      email: `ebb.${Date.now()}@mail.example`,
      country: 'IE',
      hasConsented: true,
      attempt: crypto.randomUUID(),
    },
  });
  const { orderId, orderKey } = (await placed.json()) as { orderId: string; orderKey: string };
  expect(await left()).toBe(before - 1);
  await page.goto(`/orders/${orderId}#key=${orderKey}`);
  await expect(page.getByRole('heading', { level: 1, name: /Waiting for the payment/ })).toBeVisible();
  await page.getByRole('button', { name: 'Give up this order' }).click();
  await page.getByRole('button', { name: 'Give up the order' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'You gave this order up' })).toBeVisible();
  expect(await left()).toBe(before);
});
