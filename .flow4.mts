import { chromium } from '@playwright/test';
const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox','--disable-dev-shm-usage'] });
for (const [width, scheme] of [[1280,'light'],[360,'dark']] as const) {
const context = await browser.newContext({ viewport: { width, height: 900 }, baseURL: 'http://127.0.0.1:4800', locale:'en-IE', colorScheme: scheme });
const page = await context.newPage();
page.on('pageerror', (e) => console.log('pageerror', e.message));
const signIn = (email: string, passphrase: string) => page.request.post('/api/session', { headers: { 'X-Windchest': '1' }, data: { email, passphrase } });
await signIn('pia.lund@mail.example','eighteen pipes on a sill');
const mine = await (await page.request.get('/api/account/orders')).json();
const gift = mine.items.find((o: any) => o.gift);
await page.goto('/orders/' + gift.id); await page.waitForTimeout(1200);
await page.screenshot({ path: `/tmp/ledger/order-gift-${width}-${scheme}.png`, fullPage: true });
await signIn('jonas.abara@mail.example','chime bars by the window');
const his = await (await page.request.get('/api/account/orders')).json();
const biz = his.items.find((o: any) => o.business);
await page.goto('/orders/' + biz.id); await page.waitForTimeout(1200);
await page.screenshot({ path: `/tmp/ledger/order-biz-${width}-${scheme}.png`, fullPage: true });
await signIn('ines@saltmarsh.example','every cent finds its line');
for (const [n, id] of [['biz', biz.id], ['gift', gift.id]]) {
await page.goto('/workshop/orders/' + id); await page.waitForTimeout(1200);
await page.screenshot({ path: `/tmp/ledger/worder-${n}-${width}-${scheme}.png`, fullPage: true });
}
await context.close();
}
await browser.close();
