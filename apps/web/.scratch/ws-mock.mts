import { chromium, type Page, type Route } from '@playwright/test';
import { createHash } from 'node:crypto';
export const base = 'http://127.0.0.1:4871';
const id = (n: number) => `00000000-0000-4000-8000-${String(n).padStart(12, '0')}`;
const kitId = id(1), revId = id(11);
const perms: Record<string, string[]> = {
  maker: ['workshop:enter','kits:read','kits:write','prices:write','revisions:write','revisions:release','coupons:read','coupons:write','orders:read','buyers:read','links:resend'],
  owner: ['workshop:enter','kits:read','kits:write','prices:write','revisions:write','revisions:release','coupons:read','coupons:write','orders:read','orders:refund','buyers:read','links:resend','people:read','people:write','log:read'],
  helper: ['workshop:enter','kits:read','buyers:read','links:resend'],
};
const eur = (minor: number) => ({ minor, currency: 'EUR' });
const spec = { nozzleMm: 0.4, layerMm: 0.2, perimeters: 3, topLayers: 5, bottomLayers: 4, infill: 0.15, material: 'PETG', supports: 'none', remarks: '' };
const rect = (w: number, h: number) => ({ path: `M0 0H${w}V${h}H0Z`, edges: '', widthMm: w, heightMm: h, viewBox: `0 0 ${w} ${h}` });
const notes = ['C5','C#5','D5','D#5','E5','F5','F#5','G5','G#5','A5','A#5','B5','C6','C#6','D6','D#6','E6','F6'];
const mesh = (x: number, y: number, z: number, tight = true) => ({ format: 'stl-binary', triangles: 4120, shells: 1, sizeMm: { x, y, z }, volumeCm3: x * y * z / 3000, areaCm2: 40, openEdges: tight ? 0 : 12, nonManifoldEdges: 0, windingFaults: 0, degenerateTriangles: 0, isWatertight: tight, unitRemark: null });
let fileNo = 100;
const file = (fileName: string, m: any, measuring = 'measured', fault: string | null = null, sha?: string) => ({ id: id(fileNo++), sha256: sha ?? createHash('sha256').update(fileName).digest('hex'), fileName, bytes: 206084, kind: 'stl', measuring, measurement: m, fault, partId: null, addedAt: '2026-11-10T10:00:00.000Z' });
export function makeState() {
  const parts: any[] = [
    ['J-01', 'Locking tongue', 2, 24, 12, 6], ['J-02', 'End tongue', 2, 24, 12, 6], ['B-01', 'Pipe block, low', 1, 120, 40, 30], ['B-02', 'Pipe block, middle', 1, 110, 40, 30], ['B-03', 'Pipe block, high', 1, 100, 40, 30], ['R-01', 'Lip rail', 3, 110, 10, 14], ['S-02', 'Tuning plug, long', 6, 11, 11, 2],
  ].map(([code, name, quantity, x, y, z]: any, i) => ({ id: id(200 + i), code, name, quantity, orientation: 'may-turn', printSpec: null, voice: null, file: file(`${code} ${name}.stl`, mesh(x, y, z)), drawings: { front: rect(x, z), side: rect(y, z), top: rect(x, y) } }));
  notes.forEach((note, i) => { const l = 158.5 / 2 ** (i / 12); parts.push({ id: id(300 + i), code: `P-${72 + i}`, name: `Pipe ${note}`, quantity: 1, orientation: 'may-turn', printSpec: null, voice: { kind: 'stopped-pipe', note, lengthMm: l, boreMm: 11, wallMm: 1.6 }, file: file(`P-${72 + i} Pipe.stl`, mesh(14.2, 14.2, l + 4)), drawings: { front: rect(14.2, l + 4), side: rect(14.2, l + 4), top: rect(14.2, 14.2) } }); });
  const rev: any = {
    id: revId, kit: { id: kitId, slug: 'curlew', name: 'Curlew', colour: 'orange' }, label: 'Mk 1.5', state: 'draft', createdAt: '2026-11-10T10:00:00.000Z', releasedAt: null,
    assemblyNotes: '## 1. Print\n\nPrint the eighteen pipes [[P-72]] to [[P-89]] upright, foot down. Two perimeters fill the wall.\n\n## 2. Lock the row\n\nPush one [[J-01]] down between [[B-01]] and [[B-02]], bevelled end first.\n\n| Part | Pieces |\n|---|---|\n| J-01 | 2 |\n', changeNotes: '', cautions: '', printSpec: spec,
    hardware: [{ quantity: 9, unit: '', name: 'M3 × 10 mm screw, pan head', remark: 'Three for each lip rail' }, { quantity: 1, unit: 'm', name: 'Cord, 3 mm', remark: '' }],
    buildVolume: { xMm: 220, yMm: 220, zMm: 250 }, declaredCents: 5, room: { temperatureC: 20 }, parts, documents: [{ ...file('photo of the joint.jpg', null, 'not-a-mesh'), kind: 'jpeg', bytes: 1840221 }],
    gates: [
      ['parts-measured', 'passed', 'All 25 parts are measured.'], ['watertight', 'passed', 'Every mesh is closed.'], ['fits-build-volume', 'passed', 'All parts fit 220 × 220 × 250 mm.'],
      ['voices-in-tune', 'waived', 'Pipe F6 is predicted 9 cents sharp, declared 5.'], ['assembly-notes', 'passed', 'Written.'], ['change-notes', 'open', 'Change notes are empty.'], ['changes-marked', 'open', 'R-01 changed, and nobody has said what buyers should do.'], ['cautions', 'open', 'Cautions are empty.'], ['licence-and-price', 'passed', 'Two licences are offered.'], ['proof-round', 'not-needed', 'No proof round was asked for.'],
    ].map(([name, state, reason]) => ({ name, state, reason, mayBeWaived: false, waiver: state === 'waived' ? { by: 'Ada', at: '2026-11-09T10:00:00.000Z', reason: 'Trim by sanding; the notes say so.' } : null })),
    release: { state: 'not-started', percent: 0, fault: null }, bundle: null, totalBytes: 12_400_000, limits: { fileBytes: 536870912, revisionBytes: 4294967296 },
  };
  const cmp = (code: string) => {
    const p = parts.find((q) => q.code === code)!;
    const d: any = { 'J-01': ['changed', '−0.12 mm width', 'reprint needed', 'In PETG the first one was too tight'], 'B-03': ['re-exported', 'the same shape, exported again', null, ''], 'R-01': ['changed', '+1.50 mm height, +3.1 % volume', null, ''], 'S-02': ['new', 'a new part', null, ''] };
    const [difference, whatDiffers, mark, reason] = d[code] ?? ['same', '', null, ''];
    return { code, name: p.name, quantity: p.quantity, difference, whatDiffers, sizeChangeMm: null, volumeChangePercent: null, areaChangePercent: null, mark, reason };
  };
  const comparison = { with: { id: id(10), label: 'Mk 1.4' }, rows: [...parts.map((p) => cmp(p.code)), { ...cmp('J-02'), code: 'S-01', name: 'Tuning plug, short', quantity: 6, difference: 'dropped', whatDiffers: 'no longer in the kit' }] };
  const kit: any = { id: kitId, slug: 'curlew', name: 'Curlew', tagline: 'An eighteen-pipe pan flute in three blocks that lock without glue.', description: 'Curlew is a chromatic pan flute from C5 to F6.\n\nThree blocks carry six pipes each.', colour: 'orange', isListed: true,
    licences: [{ id: id(31), kind: 'personal', name: 'For my own prints', terms: 'Print for yourself.', price: eur(2400), yearlyLimit: null, isOffered: true }, { id: id(32), kind: 'small-run', name: 'To sell up to 50 prints a year', terms: 'One maker.', price: eur(9600), yearlyLimit: 50, isOffered: true }],
    revisions: [{ id: revId, label: 'Mk 1.5', state: 'draft', createdAt: '2026-11-10T10:00:00.000Z', releasedAt: null, partCount: 25, bundleBytes: null }, { id: id(10), label: 'Mk 1.4', state: 'released', createdAt: '2026-08-10T10:00:00.000Z', releasedAt: '2026-08-12T10:00:00.000Z', partCount: 24, bundleBytes: 11_234_000 }, { id: id(9), label: 'Mk 1.3', state: 'withdrawn', createdAt: '2026-05-10T10:00:00.000Z', releasedAt: '2026-05-12T10:00:00.000Z', partCount: 24, bundleBytes: 11_034_000 }] };
  return { rev, comparison, kit, uploads: 0, failNext: new Set<string>(), refuse: new Set<string>(), stored: new Set<string>(), log: [] as string[] };
}
export type State = ReturnType<typeof makeState>;
const page = (items: any[]) => ({ items, page: 1, size: 25, total: items.length });
const coupon = { id: id(41), code: 'WINDFALL', label: 'a third off for the first 150', off: { kind: 'fraction', numerator: 1, denominator: 3 }, kits: [{ id: kitId, name: 'Curlew' }], startsAt: '2026-11-12T08:00:00.000Z', endsAt: null, cap: 150, perBuyer: 1, isAnnounced: true, isActive: true, held: 2, redeemed: 107, left: 41, takenOff: eur(85600), createdAt: '2026-11-01T08:00:00.000Z' };
const row = (n: number, x: any = {}) => ({ id: id(500 + n), number: `W-2026-0${412 - n}`, state: 'paid', email: `reader${n}@example.org`, country: 'IE', kits: ['Curlew'], total: eur(1600), couponCode: n % 2 ? 'WINDFALL' : null, receiptNumber: `R-2026-0${412 - n}`, flags: [], placedAt: '2026-11-12T14:40:00.000Z', paidAt: '2026-11-12T14:41:00.000Z', ...x });
const order = { ...row(0), lines: [{ id: id(601), kitSlug: 'curlew', kitName: 'Curlew', colour: 'orange', licenceName: 'For my own prints', revision: 'Mk 1.4', price: eur(2400), discount: eur(800), total: eur(1600) }], subtotal: eur(2400), discount: eur(800), couponCode: 'WINDFALL', tax: [{ ratePercent: '23', net: eur(1301), tax: eur(299) }], payUntil: null, paymentUrl: null, isMine: false, flags: ['location-unclear'], paymentSessionId: 'cs_test_a1b2c3d4e5f6', paymentIntentId: 'pi_3abc', consentText: 'Hand the files over at once. I know that I lose my right to withdraw from the purchase when they are handed over.', consentAt: '2026-11-12T14:39:50.000Z', history: [{ at: '2026-11-12T14:40:00.000Z', what: 'placed', detail: '1 in the basket' }, { at: '2026-11-12T14:40:01.000Z', what: 'payment page opened', detail: '' }, { at: '2026-11-12T14:41:00.000Z', what: 'paid', detail: '€16.00' }], mails: [{ id: id(701), subject: 'Your files: Curlew', state: 'handed-over', sentAt: '2026-11-12T14:41:02.000Z' }], downloads: 3 };
const day = (i: number) => new Date(Date.UTC(2026, 10, 1 + i)).toISOString().slice(0, 10);
export async function mock(p: Page, state: State, role = 'owner') {
  const json = (r: Route, body: any, status = 200) => r.fulfill({ status, contentType: status >= 400 ? 'application/problem+json' : 'application/json', body: JSON.stringify(body) });
  await p.route((u) => u.pathname.startsWith('/api/'), async (r) => {
    const url = new URL(r.request().url()); const m = r.request().method(); const path = url.pathname.slice(4);
    state.log.push(`${m} ${path}${url.search}`);
    if (path === '/session') return json(r, { person: { id: id(99), email: 'ada@example.org', name: 'Ada', role, isVerified: true }, permissions: perms[role], workshop: { name: 'Alder & Reed', currency: 'EUR', country: 'IE', locale: 'en-IE' } });
    if (path === '/workshop/overview') return json(r, { waiting: [{ kind: 'draft', label: 'Curlew Mk 1.5', count: 1, link: `/workshop/kits/${kitId}/revisions/${revId}` }, { kind: 'refused-file', label: 'Curlew Mk 1.5', count: 2, link: `/workshop/kits/${kitId}/revisions/${revId}/files` }, { kind: 'flagged-order', label: '', count: 1, link: '/workshop/orders?flagged=1' }, { kind: 'coupon-low', label: 'WINDFALL', count: 4, link: `/workshop/coupons/${id(41)}` }, { kind: 'dead-job', label: '', count: 1, link: '/workshop/log' }], sales: perms[role]!.includes('orders:read') ? Array.from({ length: 30 }, (_, i) => { const n = [0, 2, 1, 0, 3, 5, 2, 0, 1, 12, 31, 22, 9, 7, 4][i % 15]!; return { day: day(i), orders: n, gross: eur(n * 1600) }; }) : null });
    if (path === '/workshop/kits' && m === 'GET') return json(r, page([{ id: kitId, slug: 'curlew', name: 'Curlew', colour: 'orange', isListed: true, newest: 'Mk 1.4', draft: 'Mk 1.5', price: eur(2400), updatedAt: '2026-11-10T10:00:00.000Z' }, { id: id(2), slug: 'wagtail', name: 'Wagtail', colour: 'teal', isListed: false, newest: null, draft: 'Mk 1.0', price: null, updatedAt: '2026-11-08T10:00:00.000Z' }]));
    if (path === `/workshop/kits/${kitId}`) { if (m === 'PATCH') Object.assign(state.kit, r.request().postDataJSON()); return json(r, state.kit); }
    if (path.endsWith('/offers')) { const b = r.request().postDataJSON(); return json(r, b.files.map((f: any) => ({ fileName: f.fileName, sha256: f.sha256, answer: state.stored.has(f.sha256) ? 'attached' : f.fileName.endsWith('.exe') ? 'refused' : 'send', detail: f.fileName.endsWith('.exe') ? `${f.fileName} is a program. Windchest takes no programs.` : '' }))); }
    if (path.endsWith('/files') && m === 'POST') {
      const sha = r.request().headers()['x-content-sha256']!; const body = r.request().postDataBuffer()?.toString('latin1') ?? ''; const name = /filename="([^"]+)"/.exec(body)?.[1] ?? '?';
      await new Promise((d) => setTimeout(d, 250));
      if (r.request().headers()['x-windchest'] !== '1') return json(r, { code: 'cross-site-refused', title: 'x', status: 403, detail: '', type: '', requestId: '' }, 403);
      if (state.failNext.delete(name)) return r.abort('connectionreset');
      if (state.refuse.has(name)) return json(r, { code: 'file-refused', title: 'The file was refused', status: 422, detail: `${name} breaks off after 4,120 of 9,000 triangles. Export it again.`, type: '', requestId: 'r-1' }, 422);
      state.stored.add(sha); const code = /^[A-Z]-\d+/.exec(name)?.[0] ?? `P-${90 + state.uploads++}`;
      const f = file(name, null, 'measuring', null, sha); const known = state.rev.parts.find((q: any) => q.code === code);
      if (known) known.file = f; else state.rev.parts.push({ id: id(800 + state.uploads++), code, name: 'New part', quantity: 1, orientation: 'may-turn', printSpec: null, voice: null, file: f, drawings: null });
      setTimeout(() => { f.measuring = 'measured'; f.measurement = mesh(20, 20, 30) as any; }, 1500);
      return json(r, f, 201);
    }
    if (path.endsWith('/release')) { if (state.rev.gates.some((g: any) => g.state === 'open')) return json(r, { code: 'gates-are-open', title: 'Gates are open', status: 409, detail: 'x', type: '', requestId: '' }, 409); state.rev.release = { state: 'building', percent: 40, fault: null }; setTimeout(() => { state.rev.state = 'released'; state.rev.releasedAt = '2026-11-12T10:00:00.000Z'; state.rev.release = { state: 'done', percent: 100, fault: null }; state.rev.bundle = { sha256: 'a'.repeat(64), bytes: 11_400_000 }; }, 2500); return json(r, state.rev, 202); }
    if (path.endsWith('/comparison')) return json(r, state.comparison);
    if (path.endsWith('/marks')) { const b = r.request().postDataJSON(); const one = state.comparison.rows.find((q) => q.code === b.code)!; one.mark = b.mark; one.reason = b.reason; return json(r, state.comparison); }
    if (/\/parts\//.test(path)) { const b = r.request().postDataJSON(); const one = state.rev.parts.find((q: any) => path.endsWith(q.id)); if (m === 'PUT') { Object.assign(one, b); return json(r, one); } return r.fulfill({ status: 204 }); }
    if (path === `/workshop/revisions/${revId}`) { if (m === 'PATCH') { const b = r.request().postDataJSON(); Object.assign(state.rev, b); if (b.changeNotes) state.rev.gates.find((g: any) => g.name === 'change-notes').state = 'passed'; } return json(r, state.rev); }
    if (path.startsWith('/workshop/revisions/')) return json(r, { ...state.rev, id: id(10), label: 'Mk 1.4', state: 'released', releasedAt: '2026-08-12T10:00:00.000Z', bundle: { sha256: 'a'.repeat(64), bytes: 11_234_000 }, gates: state.rev.gates.map((g: any) => ({ ...g, state: 'passed', waiver: null })) });
    if (path === '/workshop/holders') return json(r, { ...page([{ email: 'wren@example.org', kitName: 'Curlew', source: 'purchase', state: 'active', since: '2026-08-12T10:00:00.000Z', held: 'Mk 1.4', downloads: 3 }, { email: 'oriole@example.org', kitName: 'Curlew', source: 'gift', state: 'suspended', since: '2026-08-12T10:00:00.000Z', held: null, downloads: 0 }]), total: 412 });
    if (path === '/workshop/coupons') return json(r, m === 'POST' ? coupon : page([coupon, { ...coupon, id: id(42), code: 'FAIR-5', label: '5 euro at the fair', off: { kind: 'amount', minor: 500 }, kits: [], cap: null, left: null, held: 0, redeemed: 12, takenOff: eur(6000), endsAt: '2026-10-01T00:00:00.000Z' }]), m === 'POST' ? 201 : 200);
    if (path.startsWith('/workshop/coupons/')) return json(r, coupon);
    if (path === '/workshop/orders') return json(r, { ...page([row(0, { flags: ['location-unclear'] }), row(1), row(2, { state: 'open', receiptNumber: null, paidAt: null }), row(3, { state: 'expired', receiptNumber: null, paidAt: null }), row(4, { kits: ['Curlew', 'Wagtail'], total: eur(4000) })]), total: 60 });
    if (path.startsWith('/workshop/orders/') && m === 'POST') return r.fulfill({ status: 202 });
    if (path.startsWith('/workshop/orders/')) return json(r, order);
    if (path === '/workshop/people') return json(r, page([{ id: id(99), email: 'ada@example.org', name: 'Ada Alder', role: 'owner', isVerified: true, joinedAt: '2026-01-12T10:00:00.000Z' }, { id: id(98), email: 'moss@example.org', name: 'Moss Reed', role: 'helper', isVerified: false, joinedAt: '2026-02-12T10:00:00.000Z' }]));
    if (path === '/workshop/log') return json(r, page([{ id: '3', at: '2026-11-10T10:00:00.000Z', who: 'Ada Alder', what: 'changed a coupon', subject: 'WINDFALL', before: { cap: 150, isActive: true, kitIds: [] }, after: { cap: 100, isActive: true, kitIds: ['a'] } }, { id: '2', at: '2026-11-09T10:00:00.000Z', who: 'Ada Alder', what: 'started a revision', subject: 'Curlew Mk 1.5', before: null, after: { step: 'issue', from: 'Mk 1.4' } }]));
    return json(r, { code: 'not-found', title: 'Not mocked', status: 404, detail: path, type: '', requestId: 'r' }, 404);
  });
}
export const launch = () => chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox', '--disable-dev-shm-usage', '--disable-background-networking', '--no-first-run'] });
export const rev = `/workshop/kits/${kitId}/revisions/${revId}`;
export const kit = `/workshop/kits/${kitId}`;
export const ids = { id, kitId, revId };
