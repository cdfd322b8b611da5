import { chromium, type Page, type Route } from '@playwright/test';
import AxeBuilder from '@axe-core/playwright';
import { mkdirSync } from 'node:fs';
export const base = 'http://127.0.0.1:4874';
mkdirSync('/tmp/acc', { recursive: true });
export const T = 'Zm9yIHRlc3RzIG9ubHksIDI1NiBiaXRzIG9mIHNhbHQ';
export const workshop = { name: 'Saltmarsh Sound Works', currency: 'EUR', country: 'IE', locale: 'en-IE' };
export const guest = { person: null, permissions: [], workshop };
export const wren = { person: { id: '6f1c2a34-1111-4111-8111-111111111111', email: 'wren@example.org', name: 'Wren Alder', role: 'buyer', isVerified: true }, permissions: [], workshop };
const m = (minor: number) => ({ minor, currency: 'EUR' });
const rect = (w: number, h: number, extra = '') => ({ path: `M0 0H${w}V${h}H0Z${extra}`, edges: '', viewBox: `0 0 ${w} ${h}`, widthMm: w, heightMm: h });
const c = (x: number, y: number, r: number) => `M${x - r} ${y}a${r} ${r} 0 1 0 ${2 * r} 0a${r} ${r} 0 1 0 ${-2 * r} 0`;
const part = (code: string, name: string, drawing: unknown, more = {}) => ({ code, name, quantity: 1, difference: 'same', mark: null, reason: '', whatDiffers: '', drawing, ...more });
const tongue = { difference: 'changed', mark: 'reprint needed', reason: 'Too tight in PETG on most printers', whatDiffers: '−0.12 mm width, −0.9 % volume' };
export const parts = [
  ...Array.from({ length: 18 }, (_, i) => part(`P-${72 + i}`, 'Pipe', rect(14, 158.5 / 2 ** ((i / 12) * 0.72)))),
  ...[1, 2, 3].map((n) => part(`B-0${n}`, 'Pipe block', rect(150 - n * 14, 70, [0, 1, 2, 3].map((k) => c(30 + k * (24 - n), 35, 9)).join('')))),
  part('J-01', 'Locking tongue', rect(55, 26), tongue), part('J-02', 'Locking tongue', rect(55, 26), tongue),
  part('R-01', 'Lip rail', rect(240, 16), { difference: 'changed', mark: 'reprint if it troubles you', reason: 'Whistles in the top octave', whatDiffers: '+1.50 mm height' }),
  ...[1, 2, 3].map((n) => part(`S-0${n}`, 'Plug', rect(15, 36))),
  part('X-01', 'Felt rail', null, { difference: 'dropped', whatDiffers: 'no longer in the kit' }),
];
const notes = '### Changed\n\n- [[J-01]], [[J-02]]: 0.12 mm less across each cheek, for PETG.\n- [[R-01]]: 1.5 mm higher.\n\n### Removed\n\n- [[X-01]]: the felt is glued on now.';
const rev = (n: number, more = {}) => ({ id: `6f1c2a34-2222-4222-8222-22222222222${n}`, label: `Mk 1.${n}`, releasedAt: `2026-0${7 + n}-12T10:00:00.000Z`, bundleBytes: 14_200_000 - n * 100000, bundleSha256: '9f86d081884c7d659a2feaa0c55ad015a3bf4f1b2b0b822cd15d6c15b0f00a0'.padEnd(64, String(n)), changeNotes: n ? notes : '', isWithdrawn: false, ...more });
export const oid2 = '6f1c2a34-3333-4333-8333-333333333335';
export const item = { slug: 'curlew', name: 'Curlew', tagline: 'An eighteen-pipe pan flute in three blocks that lock without glue.', colour: 'orange', source: 'purchase', since: '2026-08-14T12:00:00.000Z', licenceName: 'For my own prints', held: rev(0), newest: rev(1) };
export const kit = { ...item, orderId: '6f1c2a34-3333-4333-8333-333333333333', revisions: [rev(1), rev(0)], parts, documents: [{ sha256: 'a'.repeat(64), fileName: 'Curlew build book.pdf', bytes: 2_400_000 }, { sha256: 'b'.repeat(64), fileName: 'Print specifications.pdf', bytes: 180_000 }], licenceTerms: 'You may print this kit for yourself as often as you like.\n\n- Do not sell the prints.\n- Do not pass the files on.', cautions: '### Printing\n\nAir the room.\n\n### Playing\n\nWash the mouthpiece.', downloads: [{ at: '2026-08-14T12:05:00.000Z', revision: 'Mk 1.0', fileName: 'curlew-mk-1.0.zip', isComplete: true }, { at: '2026-08-14T12:01:00.000Z', revision: 'Mk 1.0', fileName: 'curlew-mk-1.0.zip', isComplete: false }] };
export const long = 'Great Northern Diver Double-Bass Contraforte with Sympathetic Strings';
export const shelf = { items: [item, { ...item, slug: 'teal', name: 'Teal', tagline: 'Eight chime bars on felt.', colour: 'teal', held: null, newest: rev(0) }, { ...item, slug: 'dunlin', name: long, tagline: 'A slide whistle.', colour: 'violet', source: 'gift', held: rev(1), licenceName: 'To sell up to 50 prints a year' }], page: 1, size: 24, total: 3 };
export const order = { id: kit.orderId, number: 'W-2026-0141', state: 'open', email: 'wren@example.org', placedAt: '2026-11-12T14:00:00.000Z', paidAt: null, payUntil: '2026-11-12T14:31:00.000Z', paymentUrl: 'http://127.0.0.1:9/pay', receiptNumber: null, lines: [{ id: '6f1c2a34-4444-4444-8444-444444444444', kitSlug: 'curlew', kitName: 'Curlew', colour: 'orange', licenceName: 'For my own prints', revision: 'Mk 1.1', price: m(2400), discount: m(800), total: m(1600) }, { id: '6f1c2a34-4444-4444-8444-444444444445', kitSlug: 'dunlin', kitName: long, colour: 'violet', licenceName: 'To sell up to 50 prints a year', revision: 'Mk 1.0', price: m(900), discount: m(0), total: m(900) }], subtotal: m(3300), discount: m(800), total: m(2500), tax: [{ ratePercent: '23', net: m(2033), tax: m(467) }], couponCode: 'WINDFALL', isMine: false };
export const paid = { ...order, state: 'paid', paidAt: new Date().toISOString(), payUntil: null, paymentUrl: null, receiptNumber: '2026-000087' };
export const collection = { orderNumber: order.number, expiresAt: '2026-12-20T10:00:00.000Z', usesLeft: 10, state: 'open', kits: [{ slug: 'curlew', name: 'Curlew', colour: 'orange', licenceName: 'For my own prints', newest: rev(1) }, { slug: 'dunlin', name: long, colour: 'violet', licenceName: 'To sell up to 50 prints a year', newest: rev(0) }] };
export const sessions = [{ id: 'a', startedAt: '2026-11-10T10:00:00.000Z', lastSeenAt: '2026-11-12T14:00:00.000Z', userAgent: 'Mozilla/5.0 (X11; Linux x86_64; rv:146.0) Gecko/20100101 Firefox/146.0', isThis: true }, { id: 'b', startedAt: '2026-10-10T10:00:00.000Z', lastSeenAt: '2026-11-02T14:00:00.000Z', userAgent: 'Mozilla/5.0 (Linux; Android 10; K) AppleWebKit/537.36 Chrome/143.0.0.0 Mobile Safari/537.36', isThis: false }];
export const refuse = (status: number, code: string, detail: string, fields?: object) => ({ $status: status, type: 'about:blank', title: code, status, code, detail, requestId: 'r-7f3a91', fields });
export type Answers = Record<string, unknown>;
export async function mock(page: Page, answers: Answers, log: string[] = []) {
  await page.route('**/api/**', async (route: Route) => {
    const url = new URL(route.request().url());
    const key = `${route.request().method()} ${url.pathname.slice(4)}`;
    log.push(key + url.search + ' ' + (route.request().postData() ?? ''));
    let a = answers[key];
    if (typeof a === 'function') a = a(route.request());
    if (a === undefined) return route.fulfill({ status: 404, contentType: 'application/problem+json', body: JSON.stringify(refuse(404, 'not-found', 'mock: ' + key)) });
    if (a === null) return route.fulfill({ status: 204 });
    const { $status = 200, ...body } = (Array.isArray(a) ? { } : a) as { $status?: number };
    return route.fulfill({ status: $status, contentType: $status >= 400 ? 'application/problem+json' : 'application/json', body: JSON.stringify(Array.isArray(a) ? a : body) });
  });
}
export const launch = () => chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox', '--disable-dev-shm-usage', '--disable-background-networking', '--no-first-run'] });
export interface Shot { name: string; path: string; answers: Answers; act?: (p: Page) => Promise<void>; init?: string }
export async function shoot(shots: Shot[], widths = [1280, 768, 360], schemes: ('light' | 'dark')[] = ['light', 'dark'], axe = true) {
  const b = await launch();
  for (const shot of shots) for (const w of widths) for (const scheme of schemes) {
    const ctx = await b.newContext({ viewport: { width: w, height: 900 }, colorScheme: scheme, reducedMotion: 'reduce' });
    const p = await ctx.newPage();
    p.on('console', (x) => ['error', 'warning'].includes(x.type()) && !/status of [45]/.test(x.text()) && console.log(shot.name, w, x.type(), x.text().slice(0, 300)));
    p.on('pageerror', (e) => console.log(shot.name, 'ERR', e.message));
    await mock(p, { 'GET /session': guest, ...shot.answers });
    await p.goto(base + shot.path); await p.waitForLoadState('networkidle').catch(() => {}); await p.locator('h1').first().waitFor({ timeout: 15000 }).catch(() => console.log('NO H1', shot.name, w)); await p.waitForTimeout(200);
    if (shot.act) await shot.act(p).catch((e) => console.log(shot.name, 'ACT', e.message.slice(0, 300)));
    await p.waitForTimeout(150);
    const over = await p.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
    if (over > 0) console.log('OVERFLOW', shot.name, w, over);
    await p.screenshot({ path: `/tmp/acc/${shot.name}-${w}-${scheme}.png`, fullPage: true });
    if (axe && !process.env.NOAXE) {
      const r = await new AxeBuilder({ page: p }).analyze();
      for (const v of r.violations) console.log('AXE', shot.name, w, scheme, v.id, v.nodes.slice(0, 2).map((n) => n.html.slice(0, 140)).join(' | '));
    }
    await ctx.close();
  }
  await b.close();
}
