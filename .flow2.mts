import { chromium } from '@playwright/test';
const base = 'http://127.0.0.1:4800';
const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox','--disable-dev-shm-usage'] });
const only = process.argv[2];
for (const [width, scheme] of [[1280,'light'],[768,'dark'],[360,'light'],[360,'dark']] as const) {
const context = await browser.newContext({ viewport: { width, height: 900 }, baseURL: base, locale: 'en-IE', colorScheme: scheme });
const page = await context.newPage();
page.on('pageerror', (e) => console.log('pageerror', e.message));
const over = async (what: string) => { const o = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth); if (o > 0) console.log('OVERFLOW', what, width, o); };
if (!only || only === 'basket') {
  await page.goto('/kits/teal'); await page.getByRole('button', { name: /basket/i }).first().click(); await page.waitForTimeout(300);
  await page.goto('/kits/curlew'); await page.getByRole('button', { name: /basket/i }).first().click(); await page.waitForTimeout(300);
  await page.goto('/basket'); await page.getByLabel('E-mail').waitFor();
  await page.getByLabel('Country').selectOption('DE'); await page.waitForTimeout(900);
  await page.screenshot({ path: `/tmp/ledger/basket-a-${width}-${scheme}.png`, fullPage: true });
  await page.getByLabel('I buy for a business').check();
  await page.getByLabel('Company name').fill('Reed Works'); await page.getByLabel('VAT number').fill('DE 123 456 789');
  await page.getByLabel('This is a gift for another address').check();
  await page.getByLabel('Their e-mail').fill('wren@mail.example');
  await page.waitForTimeout(900); await over('basket');
  await page.screenshot({ path: `/tmp/ledger/basket-b-${width}-${scheme}.png`, fullPage: true });
}
if (!only || only === 'coupon') {
  await page.request.post('/api/session', { headers: { 'X-Windchest': '1' }, data: { email: 'tamsin@saltmarsh.example', passphrase: 'eleven millimetre bores' } });
  await page.goto('/workshop/coupons'); await page.getByRole('link', { name: 'WINDFALL' }).click();
  await page.getByText('Orders with this code').first().waitFor(); await page.waitForTimeout(900); await over('coupon');
  await page.screenshot({ path: `/tmp/ledger/coupon-${width}-${scheme}.png`, fullPage: true });
}
await context.close();
}
await browser.close();
