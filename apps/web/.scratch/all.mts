import * as M from './mock.mts';
const { wren, guest, T, refuse } = M;
const me = { 'GET /session': wren };
const orders = { items: [M.paid, { ...M.order, id: M.oid2, number: 'W-2026-0140' }, { ...M.order, id: '6f1c2a34-3333-4333-8333-333333333334', number: 'W-2026-0101', state: 'refunded' }], page: 1, size: 20, total: 3 };
const O = `GET /orders/${M.order.id}`, oPath = `/orders/${M.order.id}#key=${T}`;
const C = `GET /collect/${T}`;
const acc = { ...me, 'GET /account/sessions': M.sessions, 'GET /account/orders': orders };
export const shots: M.Shot[] = [
  { name: 'join', path: '/join', answers: {} },
  { name: 'join-faults', path: '/join', answers: {}, act: async (p) => { await p.getByLabel('Passphrase', { exact: true }).fill('too short'); await p.getByRole('button', { name: 'Join' }).click(); } },
  { name: 'join-sent', path: '/join', answers: { 'POST /accounts': null }, act: async (p) => { await p.getByLabel('E-mail').fill('wren.alder.of.the.long.address@a-rather-long-domain.example.org'); await p.getByLabel('Name').fill('Wren'); await p.getByLabel('Passphrase', { exact: true }).fill('eight reeds in the rain'); await p.getByRole('button', { name: 'Join' }).click(); await p.getByRole('heading', { name: 'Look in your mail' }).waitFor(); } },
  { name: 'signin', path: '/sign-in', answers: {} },
  { name: 'signin-wrong', path: '/sign-in', answers: { 'POST /session': refuse(401, 'wrong-credentials', 'E-mail or passphrase is wrong.'), 'POST /accounts/sign-in-links': null }, act: async (p) => { await p.getByLabel('E-mail').fill('wren@example.org'); await p.getByLabel('Passphrase', { exact: true }).fill('xxx'); await p.getByRole('button', { name: 'Sign in', exact: true }).click(); await p.getByRole('button', { name: 'Mail me a link' }).click(); await p.getByText('is on its way').waitFor(); } },
  { name: 'verify', path: `/verify#token=${T}`, answers: { 'POST /accounts/verify': wren }, act: async (p) => { await p.getByText('is confirmed').waitFor(); } },
  { name: 'verify-old', path: `/verify#token=${T}`, answers: { 'POST /accounts/verify': refuse(410, 'link-has-expired', 'This link has expired. Ask for a new one.') } },
  { name: 'link-none', path: `/sign-in/link`, answers: {} },
  { name: 'forgot', path: `/forgot`, answers: {} },
  { name: 'forgot-sent', path: `/forgot`, answers: { 'POST /accounts/forgotten': null }, act: async (p) => { await p.getByLabel('E-mail').fill('wren@example.org'); await p.getByRole('button', { name: 'Mail me the link' }).click(); await p.getByText('Look in').waitFor(); } },
  { name: 'reset', path: `/reset#token=${T}`, answers: {}, act: async (p) => { await p.getByLabel('New passphrase').fill('eight reeds in the rain'); await p.getByLabel('Show the passphrase').check(); } },
  { name: 'reset-done', path: `/reset#token=${T}`, answers: { 'POST /accounts/reset': wren }, act: async (p) => { await p.getByLabel('New passphrase').fill('eight reeds in the rain'); await p.getByRole('button', { name: 'Keep this' }).click(); await p.getByText('is set').waitFor(); } },
  { name: 'account', path: '/account', answers: acc },
  { name: 'account-unverified', path: '/account', answers: { ...acc, 'GET /session': { ...wren, person: { ...wren.person, isVerified: false } }, 'GET /account/orders': { items: [], page: 1, size: 20, total: 0 }, 'GET /account/sessions': M.sessions.slice(0, 1) } },
  { name: 'account-end', path: '/account', answers: acc, act: async (p) => { await p.getByRole('button', { name: 'End the others' }).click(); } },
  { name: 'shelf', path: '/shelf', answers: { ...me, 'GET /shelf': M.shelf } },
  { name: 'shelf-empty', path: '/shelf', answers: { ...me, 'GET /shelf': { items: [], page: 1, size: 24, total: 0 } } },
  { name: 'shelf-guest', path: '/shelf', answers: { 'POST /collect/lost': null }, act: async (p) => { await p.getByLabel('E-mail of the order').fill('wren@example.org'); await p.getByRole('button', { name: 'Mail me fresh links' }).click(); await p.getByText('on their way').waitFor(); } },
  { name: 'kit', path: '/shelf/curlew', answers: { ...me, 'GET /shelf/curlew': M.kit } },
  { name: 'kit-new', path: '/shelf/curlew', answers: { ...me, 'GET /shelf/curlew': { ...M.kit, held: null, downloads: [], cautions: '', documents: [], parts: M.parts.slice(0, -1).map((x) => ({ ...x, difference: 'new', mark: null })) } } },
  { name: 'kit-same', path: '/shelf/curlew', answers: { ...me, 'GET /shelf/curlew': { ...M.kit, name: M.long, held: M.kit.newest, parts: M.parts.slice(0, -1).map((x) => ({ ...x, difference: 'same', mark: null, whatDiffers: '' })) } } },
  { name: 'kit-withdrawn', path: '/shelf/curlew', answers: { ...me, 'GET /shelf/curlew': { ...M.kit, held: { ...M.kit.held, isWithdrawn: true }, revisions: [M.kit.newest, { ...M.kit.held, isWithdrawn: true }] }, 'POST /shelf/grants': refuse(403, 'forbidden', 'Downloads of this kit rest while its payment is in dispute.') }, act: async (p) => { await p.getByRole('button', { name: 'Get the whole bundle' }).click(); await p.getByRole('button', { name: 'I have printed Mk 1.1' }).first().click(); } },
  { name: 'kit-none', path: '/shelf/curlew', answers: me },
  { name: 'collect', path: `/collect/${T}`, answers: { [C]: M.collection } },
  ...(['expired', 'used-up', 'replaced', 'ended'] as const).map((state) => ({ name: `collect-${state}`, path: `/collect/${T}`, answers: { [C]: { ...M.collection, state, usesLeft: state === 'used-up' ? 0 : 4, kits: state === 'replaced' || state === 'ended' ? [] : M.collection.kits } } })),
  { name: 'collect-fresh', path: `/collect/${T}`, answers: { [C]: { ...M.collection, state: 'expired' }, [`POST /collect/${T}/replacement`]: null }, act: async (p) => { await p.getByRole('button', { name: 'Mail me a fresh link' }).click(); await p.getByText('on its way').waitFor(); } },
  { name: 'collect-unknown', path: `/collect/xyz`, answers: {} },
  { name: 'order-open', path: oPath, answers: { [O]: M.order } },
  { name: 'order-giveup', path: oPath, answers: { [O]: M.order }, act: async (p) => { await p.getByRole('button', { name: 'Give up this order' }).click(); } },
  { name: 'order-paid', path: oPath, answers: { [O]: M.paid } },
  { name: 'order-mine', path: oPath, answers: { ...me, [O]: { ...M.paid, isMine: true } } },
  ...(['cancelled', 'expired', 'refunded'] as const).map((state) => ({ name: `order-${state}`, path: oPath, answers: { [O]: { ...(state === 'refunded' ? M.paid : M.order), state, lines: M.order.lines.slice(0, 1), discount: { minor: 0, currency: 'EUR' }, couponCode: null } } })),
  { name: 'order-unknown', path: `/orders/${M.order.id}`, answers: {} },
];
const want = process.argv[2];
const widths = process.argv[3] ? process.argv[3].split(',').map(Number) : undefined;
await M.shoot(shots.filter((s) => !want || want.split(',').some((x) => s.name === x || (x.endsWith('*') && s.name.startsWith(x.slice(0, -1))))), widths, (process.argv[4]?.split(',') as never) ?? undefined);
