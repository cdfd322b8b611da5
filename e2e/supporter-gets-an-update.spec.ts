import { expect, test, type APIRequestContext, type Page } from '@playwright/test';
import { expectAccessible } from './support/axe.js';
import { demoPerson } from './support/demo.js';
import { awaitMail, linkIn, mailsTo } from './support/mailbox.js';
import { watchHosts } from './support/own-host.js';
import { backToNow, cardsWillFail, daysGoBy, setBilling } from './support/payment-service.js';

const email = `plover.${Date.now()}@mail.example`;
const own = { headers: { 'X-Windchest': '1' } };

const read = async <T>(request: APIRequestContext, path: string): Promise<T> =>
  (await (await request.get(`/api${path}`)).json()) as T;
const send = async <T>(
  request: APIRequestContext,
  method: 'post' | 'patch',
  path: string,
  data: object = {},
): Promise<T> => {
  const answer = await request[method](`/api${path}`, { ...own, data });
  expect([path, answer.status(), answer.ok() ? '' : await answer.text()]).toEqual([
    path,
    answer.status(),
    '',
  ]);
  return (answer.headers()['content-type']?.includes('json') ? await answer.json() : undefined) as T;
};

interface Revision {
  id: string;
  label: string;
  state: string;
}

/** The workshop releases the next issue of a kit, with other notes and the same parts. */
const releaseIssue = async (maker: APIRequestContext, slug: string): Promise<Revision> => {
  const kits = await read<{ items: { id: string; slug: string }[] }>(maker, '/workshop/kits?size=100');
  const kitId = kits.items.find((kit) => kit.slug === slug)?.id ?? '';
  const draft = await send<Revision>(maker, 'post', `/workshop/kits/${kitId}/revisions`, { step: 'issue' });
  await send(maker, 'patch', `/workshop/revisions/${draft.id}`, {
    changeNotes: '### Changed\n\n- The notes say how long the glue takes.\n',
  });
  await send(maker, 'post', `/workshop/revisions/${draft.id}/release`);
  await expect
    .poll(async () => (await read<Revision>(maker, `/workshop/revisions/${draft.id}`)).state, {
      timeout: 30_000,
    })
    .toBe('released');
  return draft;
};

const download = async (page: Page, name: RegExp): Promise<string> => {
  const started = page.waitForEvent('download');
  await page.getByRole('button', { name }).first().click();
  const file = await started;
  await file.path();
  return file.suggestedFilename();
};

test.afterAll(backToNow);

test('a supporter pledges, gets an update and what to reprint; when payments fail, what stays is right', async ({
  page,
  playwright,
  baseURL,
}) => {
  const hosts = watchHosts(page);
  const maker = await playwright.request.newContext({ baseURL });
  const { email: makerEmail, passphrase } = demoPerson('maker');
  await send(maker, 'post', '/session', { email: makerEmail, passphrase });
  await setBilling({ retryDays: [1, 2], afterRetries: 'cancel' });

  await test.step('joins, and is led back to the plan after signing in', async () => {
    await send(page.request, 'post', '/accounts', {
      email,
      name: 'Plover',
      passphrase: 'plovers run and then stand',
    });
    await page.goto('/support');
    await expect(page.getByRole('heading', { level: 1, name: 'Pledge to the workshop' })).toBeVisible();
    await page.getByRole('radio', { name: 'High water' }).check();
    await page.getByRole('link', { name: 'Sign in to pledge' }).click();
    await expect(page.getByRole('heading', { level: 1, name: 'Sign in' })).toBeVisible();
    await page.getByLabel('E-mail').fill(email);
    await page.getByLabel('Passphrase', { exact: true }).fill('plovers run and then stand');
    await page.getByRole('button', { name: 'Sign in' }).click();
    await expect(page.getByText('Confirm your address first')).toBeVisible();
    await page.goto(linkIn(await awaitMail(email, /address/i), '/verify'));
    await expect(page.getByText('Your address is confirmed')).toBeVisible();
  });

  await test.step('pledges on the payment service’s page', async () => {
    await page.goto('/support');
    await page.getByRole('radio', { name: 'High water' }).check();
    await page.getByRole('combobox', { name: 'Country' }).selectOption('IE');
    await page.getByRole('checkbox', { name: /Put the kits on my shelf at once/ }).check();
    await page.getByRole('button', { name: 'Pledge €9.00 a month' }).click();
    await page.waitForURL(/\/pay\//);
    await page.getByLabel('Billing country').selectOption('IE');
    await page
      .getByRole('button', { name: /Succeeds/ })
      .first()
      .click();
    await page.getByRole('button', { name: /^Pay €9\.00/ }).click();
    await page.waitForURL(/\/account\/pledge/);
    await expect(page.getByRole('heading', { level: 1, name: 'Your pledge' })).toBeVisible();
    await expect(page.getByText('ends in 4242')).toBeVisible();
    await expectAccessible(page, 'own pledge');
  });

  await test.step('finds the plan’s kits on the shelf and downloads an older revision', async () => {
    await page.goto('/shelf/curlew');
    await expect(page.getByText(/^Pledge, until /)).toBeVisible();
    await page.getByRole('heading', { level: 3, name: 'Mk 1.0' }).click();
    expect(await download(page, /^Get Mk 1\.0/)).toMatch(/curlew.*1\.0.*\.zip$/i);
  });

  await test.step('sees what to reprint for the newer one, and downloads it', async () => {
    await expect(page.getByText(/You hold Mk 1\.0\./)).toBeVisible();
    await expect(page.getByText(/reprint \d+ of \d+ parts/).first()).toBeVisible();
    expect(await download(page, /^Get the whole bundle/)).toMatch(/curlew.*\.zip$/i);
    await expect(page.getByText(/It is the newest: nothing to reprint/)).toBeVisible();
  });

  const pledgeId = await test.step('a month later it is paid, with one receipt', async () => {
    await daysGoBy(32);
    const { items } = await read<{ items: { id: string }[] }>(page.request, '/account/pledges');
    const id = items[0]?.id ?? '';
    await expect
      .poll(async () => (await read<{ total: number }>(page.request, `/pledges/${id}/payments`)).total)
      .toBe(2);
    await awaitMail(email, /^Receipt \d{4}-\d{6} for your pledge/);
    return id;
  });

  const issue = await test.step('a new revision stands on the shelf at once', async () => {
    const released = await releaseIssue(maker, 'dunlin');
    await page.goto('/shelf/dunlin');
    await expect(page.getByText(`${released.label} is yours.`)).toBeVisible();
    return released;
  });

  await test.step('a payment fails: grace days, and the way to pay', async () => {
    const { customerId } = await read<{ customerId: string }>(maker, `/workshop/supporters/${pledgeId}`);
    await cardsWillFail(customerId);
    await daysGoBy(31);
    await awaitMail(email, /^The payment for High water did not go through/);
    await page.goto('/account/pledge');
    await expect(page.getByRole('heading', { level: 1, name: 'A payment is open' })).toBeVisible();
    await expect(page.getByRole('link', { name: 'Pay with another card' })).toHaveAttribute('href', /^http/);
  });

  await test.step('it lapses, and what was released meanwhile stays, nothing else', async () => {
    await daysGoBy(8);
    await awaitMail(email, /^Your pledge has lapsed/);
    await page.goto('/account/pledge');
    await expect(page.getByRole('heading', { level: 1, name: 'Your pledge has lapsed' })).toBeVisible();
    await page.goto('/shelf');
    const shelf = page.getByRole('list', { name: 'My shelf' });
    await expect(shelf.getByRole('heading', { level: 2 })).toHaveText(['Dunlin']);
    await expect(shelf.getByText(/^Pledge, ended /)).toBeVisible();
    await page.goto('/shelf/dunlin');
    expect(await download(page, /^Get the whole bundle/)).toMatch(/dunlin.*\.zip$/i);
    await expect(page.getByText(`You hold ${issue.label}.`)).toBeVisible();
    await expect(page.getByRole('heading', { level: 3, name: 'Mk 1.0' })).toHaveCount(0);
    expect((await mailsTo(email)).filter(({ subject }) => /go through|lapse/.test(subject))).toHaveLength(2);
  });

  hosts.check();
  await maker.dispose();
});
