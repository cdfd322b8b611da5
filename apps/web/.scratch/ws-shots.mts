import { AxeBuilder } from '@axe-core/playwright';
import { base, kit, launch, makeState, mock, rev, ids } from './ws-mock.mts';
const all: Record<string, string> = { overview: '/workshop', kits: '/workshop/kits', newkit: '/workshop/kits/new', kit, parts: rev, notes: rev + '/notes', spec: rev + '/specification', changes: rev + '/changes', files: rev + '/files', released: `${kit}/revisions/${ids.id(10)}`, coupons: '/workshop/coupons', newcoupon: '/workshop/coupons/new', coupon: '/workshop/coupons/' + ids.id(41), orders: '/workshop/orders', order: '/workshop/orders/' + ids.id(500), people: '/workshop/people', log: '/workshop/log', holders: '/workshop/holders' };
const names = (process.argv[2] ?? 'all') === 'all' ? Object.keys(all) : process.argv[2]!.split(',');
const widths = (process.argv[3] ?? '1280').split(',').map(Number); const schemes = (process.argv[4] ?? 'light').split(','); const axe = process.argv[5] === 'axe';
const b = await launch();
for (const scheme of schemes) for (const w of widths) {
  const ctx = await b.newContext({ viewport: { width: w, height: 900 }, colorScheme: scheme as never, reducedMotion: 'reduce' });
  for (const n of names) {
    const p = await ctx.newPage();
    p.on('console', (m) => (m.type() === 'error' || m.type() === 'warning') && console.log(n, w, m.text().slice(0, 300)));
    p.on('pageerror', (e) => console.log(n, 'ERR', e.message));
    await mock(p, makeState()); await p.goto(base + all[n]!);
    await p.locator('h1').first().waitFor({ timeout: 20000 }).catch(() => console.log(n, 'no h1'));
    await p.waitForFunction(() => ![...document.querySelectorAll('[role=status]')].some((e) => e.textContent === 'Loading'), null, { timeout: 20000 }).catch(() => console.log(n, 'still loading'));
    await p.waitForTimeout(500);
    const over = await p.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
    if (over > 0) console.log('OVERFLOW', n, w, over);
    if ((await p.locator('h1').count()) !== 1) console.log('h1 count', n, await p.locator('h1').count());
    await p.screenshot({ path: `/tmp/ws/${n}-${w}-${scheme}.png`, fullPage: true });
    if (axe) { const { violations } = await new AxeBuilder({ page: p }).analyze(); for (const v of violations) console.log('AXE', n, w, scheme, v.id, v.nodes.length, v.nodes[0]!.html.slice(0, 160), v.nodes[0]!.failureSummary?.slice(0, 200)); }
    await p.close();
  }
  await ctx.close();
}
await b.close();
