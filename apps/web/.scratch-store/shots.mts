import { chromium, type Page } from '@playwright/test';
import { AxeBuilder } from '@axe-core/playwright';
import { readFileSync, mkdirSync } from 'node:fs';
const base = process.env.BASE ?? 'http://127.0.0.1:5391';
const M = '/tmp/store-mock/';
const json = (f: string) => JSON.parse(readFileSync(M + f, 'utf8'));
const out = '/tmp/store-shots/'; mkdirSync(out, { recursive: true });
const only = process.argv[2]; const widths = (process.argv[3] ?? '1280,768,360').split(',').map(Number); const schemes = (process.argv[4] ?? 'light,dark').split(',');
const kits = json('kits.json'); const offers = json('offers.json'); const session = json('session.json');
for (const o of offers) o.left = 41;
const est = { plates: 6, massG: 640, lengthM: 210, hoursLow: 31, hoursHigh: 38, bed: { xMm: 220, yMm: 220, zMm: 250 } };
export interface Opt { empty?: boolean; noKits?: boolean; signedIn?: boolean; owned?: string[]; basket?: any[]; code?: string; printer?: any; estimate?: boolean; listFault?: boolean; kitFault?: boolean; quoteMode?: string; checkout?: string; string?: boolean; delay?: number }
const lic = (slug: string, i = 0) => { const k = json(`kit-${slug}.json`); return { kitSlug: slug, licenceId: k.licences[i].id }; };
async function mock(page: Page, o: Opt) {
  const problem = (status: number, code: string, title: string, detail: string) => ({ status, contentType: 'application/problem+json', body: JSON.stringify({ type: 'about:blank', title, status, code, detail, requestId: '01hx' }) });
  await page.addInitScript((o: any) => {
    if (!sessionStorage.getItem('init')) {
      sessionStorage.setItem('init', '1');
      if (o.basket) localStorage.setItem('windchest.basket', JSON.stringify(o.basket));
      if (o.code) sessionStorage.setItem('windchest.coupon', o.code);
      if (o.printer) localStorage.setItem('windchest.printer', JSON.stringify(o.printer));
    }
  }, o as any);
  await page.route('**/api/**', async (route) => {
    const url = new URL(route.request().url()); const p = url.pathname.slice(4); const m = route.request().method();
    const ok = (b: unknown) => route.fulfill({ contentType: 'application/json', body: JSON.stringify(b) });
    if (o.delay) await new Promise((r) => setTimeout(r, o.delay));
    if (p === '/session') return ok(o.signedIn ? { ...session, person: { id: 'x', email: 'wren@saltmarsh.example', name: 'Wren', role: 'buyer', isVerified: true } } : session);
    if (p === '/offers') return ok(offers);
    if (p === '/shelf/owned') return ok(o.owned ?? []);
    if (p === '/kits') {
      if (o.listFault) return route.fulfill(problem(500, 'internal', 'Something broke here', 'It is not your doing. Try again in a minute.'));
      if (o.noKits || Number(url.searchParams.get('page')) > 3) return ok({ items: [], page: 1, size: 20, total: 0 });
      const sort = url.searchParams.get('sort'); const page = Number(url.searchParams.get('page') ?? 1);
      let items = kits.items.map((k: any, i: number) => ({ ...k, printEstimate: o.estimate ? { ...est, plates: [6, 1, 2, 3][i], massG: [640, 58, 210, 300][i] } : k.printEstimate }));
      items = ['curlew', 'teal', 'dunlin', 'godwit'].map((s) => items.find((k: any) => k.slug === s));
      if (sort === 'name') items.sort((a: any, b: any) => a.name.localeCompare(b.name));
      if (sort === 'price') items.sort((a: any, b: any) => a.price.minor - b.price.minor);
      return ok({ items, page, size: 20, total: o.estimate ? 43 : items.length });
    }
    let x;
    if ((x = /^\/kits\/([a-z-]+)\/parts$/.exec(p))) { try { return ok(json(`parts-${x[1]}.json`)); } catch { return route.fulfill(problem(404, 'not-found', 'Not found', '')); } }
    if ((x = /^\/kits\/([a-z-]+)$/.exec(p))) {
      if (o.kitFault) return route.fulfill(problem(500, 'internal', 'Something broke here', 'It is not your doing. Try again in a minute.'));
      try { const k = json(`kit-${x[1]}.json`); return ok({ ...k, printEstimate: o.estimate ? est : k.printEstimate }); } catch { return route.fulfill(problem(404, 'not-found', 'Not found', 'There is no such kit.')); }
    }
    if (p === '/basket/quote') {
      const body = route.request().postDataJSON();
      if (o.quoteMode === 'down') return route.abort();
      const lines: any[] = []; const gone: string[] = [];
      for (const { licenceId } of body.items) {
        let found; for (const s of ['curlew', 'teal', 'dunlin', 'godwit']) { const k = json(`kit-${s}.json`); const l = k.licences.find((l: any) => l.id === licenceId); if (l) found = { k, l }; }
        if (!found) { gone.push(licenceId); continue; }
        const off = body.couponCode === 'WINDFALL' && o.quoteMode !== 'used-up' && found.k.slug === 'curlew' ? Math.round(found.l.price.minor / 3) : 0;
        const eur = (minor: number) => ({ minor, currency: 'EUR' });
        lines.push({ licenceId, kitSlug: found.k.slug, kitName: found.k.name, colour: found.k.colour, licenceName: found.l.name, revision: found.k.revision, price: found.l.price, discount: eur(off), total: eur(found.l.price.minor - off) });
      }
      const sum = (f: string) => ({ minor: lines.reduce((t, l) => t + l[f].minor, 0), currency: 'EUR' });
      const isW = body.couponCode === 'WINDFALL' && o.quoteMode !== 'used-up';
      await new Promise((r) => setTimeout(r, 150));
      return ok({ lines, gone, subtotal: sum('price'), discount: sum('discount'), total: sum('total'), coupon: isW ? { code: 'WINDFALL', label: 'A third off for the first 150', cap: 150, left: 41 } : null, couponFault: body.couponCode && !isW ? (body.couponCode === 'WINDFALL' ? { code: 'coupon-is-used-up', detail: 'All 150 places of the coupon WINDFALL are taken.' } : { code: 'coupon-unknown', detail: `There is no coupon ${body.couponCode}. Look at its letters and digits again.` }) : null });
    }
    if (p === '/checkout') {
      console.log('checkout', JSON.stringify(route.request().postDataJSON()));
      if (o.checkout === 'abort') return route.abort();
      if (o.checkout === 'unreachable') return route.fulfill(problem(502, 'payment-unreachable', 'The payment service cannot be reached', 'The payment service cannot be reached just now. Your order is kept and nothing is charged twice. Try again in a minute.'));
      if (o.checkout === 'used-up') { o.quoteMode = 'used-up'; return route.fulfill(problem(409, 'coupon-is-used-up', 'The coupon is used up', 'All 150 places of the coupon WINDFALL are taken.')); }
      return ok({ orderId: '0190a0a0-0000-7000-8000-000000000001', orderKey: 'k'.repeat(43), paymentUrl: o.checkout === 'free' ? null : `${base}/pay-here` });
    }
    if (p.startsWith('/orders/')) return ok({ id: '0190a0a0-0000-7000-8000-000000000001', number: 'S-1', state: 'paid', email: 'a@b.example', placedAt: new Date().toISOString(), paidAt: new Date().toISOString(), payUntil: null, paymentUrl: null, receiptNumber: 'R1', lines: [], subtotal: { minor: 0, currency: 'EUR' }, discount: { minor: 0, currency: 'EUR' }, total: { minor: 0, currency: 'EUR' }, tax: [], couponCode: null, isMine: false });
    return route.fulfill(problem(404, 'not-found', 'Nothing here', ''));
  });
}
const card = { bed: { xMm: 220, yMm: 220, zMm: 250 }, nozzleMm: 0.4, material: 'PETG', pricePerKgMinor: null };
const small = { bed: { xMm: 100, yMm: 100, zMm: 120 }, nozzleMm: 0.6, material: 'PLA', pricePerKgMinor: null };
const gone = { kitSlug: 'whimbrel', licenceId: '01a2301a-0000-766d-a4f4-9983e6d97c2f' };
export const scenes: Record<string, { path: string; o: Opt; act?: (p: Page) => Promise<void> }> = {
  home: { path: '/', o: {} },
  homeest: { path: '/?sort=name&page=2', o: { estimate: true, printer: card, basket: [lic('curlew')] } },
  homeempty: { path: '/', o: { noKits: true } },
  homefault: { path: '/', o: { listFault: true } },
  curlew: { path: '/kits/curlew', o: {} },
  curlewfit: { path: '/kits/curlew', o: { printer: small, estimate: true, basket: [lic('curlew')] }, act: async (p) => { await p.getByRole('slider').fill('8'); await p.getByText('All voices').click(); await p.getByText('parts, with sizes').click(); await p.getByText('earlier revision').click(); await p.getByText('Terms:').click(); } },
  teal: { path: '/kits/teal', o: { printer: card, signedIn: true, owned: ['teal'] } },
  dunlin: { path: '/kits/dunlin', o: {} },
  godwit: { path: '/kits/godwit', o: {} },
  nokit: { path: '/kits/whimbrel', o: {} },
  kitfault: { path: '/kits/curlew', o: { kitFault: true } },
  basketempty: { path: '/basket', o: {} },
  basket: { path: '/basket', o: { basket: [lic('curlew'), lic('teal', 1), lic('dunlin')], code: 'WINDFALL', signedIn: true, owned: ['teal'] } },
  basketfault: { path: '/basket', o: { basket: [lic('curlew'), gone], code: 'WINDFALL', quoteMode: 'used-up' }, act: async (p) => { await p.getByRole('button', { name: /^Pay/ }).click(); } },
  basketfree: { path: '/basket', o: { basket: [lic('dunlin')], checkout: 'free' } },
  basketunreach: { path: '/basket', o: { basket: [lic('curlew')], code: 'WINDFALL', checkout: 'unreachable' }, act: async (p) => { await p.getByLabel('E-mail').fill('wren@saltmarsh.example'); await p.getByLabel('Country').selectOption('IE'); await p.getByRole('checkbox').check(); await p.getByRole('button', { name: /^Pay/ }).click(); await p.waitForTimeout(400); } },
  basketraced: { path: '/basket', o: { basket: [lic('curlew')], code: 'WINDFALL', checkout: 'used-up' }, act: async (p) => { await p.getByLabel('E-mail').fill('wren@saltmarsh.example'); await p.getByLabel('Country').selectOption('IE'); await p.getByRole('checkbox').check(); await p.getByRole('button', { name: /^Pay/ }).click(); await p.waitForTimeout(900); } },
  basketdown: { path: '/basket', o: { basket: [lic('curlew')], quoteMode: 'down' } },
  cautions: { path: '/cautions', o: {} },
};
if (process.argv[1]?.endsWith('shots.mts')) {
const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox', '--disable-dev-shm-usage', '--disable-background-networking', '--no-first-run'] });
for (const [name, s] of Object.entries(scenes)) {
  if (only && only !== 'all' && !only.split(',').includes(name)) continue;
  for (const width of widths) for (const scheme of schemes) {
    const ctx = await browser.newContext({ viewport: { width, height: 900 }, colorScheme: scheme as any, reducedMotion: 'reduce' });
    const page = await ctx.newPage(); const errs: string[] = [];
    page.on('console', (m) => m.type() === 'error' && !/Failed to load resource/.test(m.text()) && errs.push(m.text().slice(0, 300))); page.on('pageerror', (e) => errs.push(String(e)));
    await mock(page, s.o); await page.goto(base + s.path); await page.waitForTimeout(1500);
    if (s.act) { await s.act(page); await page.waitForTimeout(500); }
    const over = await page.evaluate(() => document.documentElement.scrollWidth - innerWidth);
    await page.screenshot({ path: `${out}${name}-${width}-${scheme}.png`, fullPage: true });
    const axe = await new AxeBuilder({ page }).analyze();
    console.log(name, width, scheme, await page.title(), over > 0 ? `OVERFLOW ${over}` : '', axe.violations.map((v) => `${v.id}: ${v.nodes.slice(0, 2).map((n) => n.html.slice(0, 140)).join(' | ')}`).join('; '), errs.join(' / '));
    await ctx.close();
  }
}
await browser.close();
}
export { mock, lic, base };
