/** The import rules of the house: who may lean on whom. `npm run lint` fails on a breach. */
const room = (name) => `^apps/api/src/${name}/`;
const onlyFrom = (name, from, allowed) => ({
  name,
  severity: 'error',
  from: { path: from },
  to: { path: '^(apps|packages|fakes|seed-data)/', pathNot: allowed },
});
const rooms = '(accounts|catalogue|measuring|coupons|orders|supporters|entitlements|fit|letters|journal|ledger|workshop)';

/** room -> the rooms it may use */
const mayUse = {
  accounts: [],
  catalogue: ['accounts'],
  measuring: ['accounts', 'catalogue'],
  supporters: ['accounts', 'catalogue'],
  // A code for supporters only asks whether the buyer is one.
  coupons: ['accounts', 'catalogue', 'supporters'],
  orders: ['accounts', 'catalogue', 'coupons', 'supporters'],
  entitlements: ['accounts', 'catalogue', 'measuring', 'coupons', 'orders', 'supporters'],
  fit: ['accounts', 'catalogue', 'measuring', 'orders', 'supporters', 'entitlements'],
  letters: ['accounts', 'catalogue', 'measuring', 'orders', 'supporters', 'entitlements', 'fit'],
  journal: ['accounts', 'catalogue', 'supporters'],
  ledger: ['accounts', 'catalogue', 'orders', 'supporters'],
  workshop: 'accounts catalogue measuring coupons orders supporters entitlements fit letters journal ledger'.split(' '),
};
const lowerLayers = 'adapters database jobs mails payments http pictures config typesetting'.split(' ');

module.exports = {
  forbidden: [
    { name: 'no-cycles', severity: 'error', from: {}, to: { circular: true } },
    onlyFrom('pure-money', '^packages/money/', ['^packages/money/']),
    onlyFrom('pure-contracts', '^packages/contracts/', ['^packages/(contracts|money)/']),
    onlyFrom('pure-voicing', '^packages/voicing/', ['^packages/voicing/']),
    onlyFrom('pure-meshes', '^packages/meshes/', ['^packages/meshes/']),
    onlyFrom('pure-plates', '^packages/plates/', ['^packages/(plates|meshes)/']),
    onlyFrom('pure-emails', '^packages/emails/', ['^packages/(emails|money|contracts)/']),
    {
      name: 'pure-packages-do-no-io',
      severity: 'error',
      from: { path: '^packages/(money|contracts|voicing|meshes|plates|emails)/src', pathNot: '\\.(spec|bench)\\.ts$|/(preview-page|reports?)/|-report\\.ts$' },
      to: { dependencyTypes: ['core'] },
    },
    onlyFrom('web-imports-packages-only', '^apps/web/', ['^apps/web/', '^packages/(money|contracts|voicing|meshes|plates)/']),
    {
      name: 'api-imports-packages-only',
      severity: 'error',
      from: { path: '^apps/api/', pathNot: '\\.spec\\.ts$|/testing/|\\.bench\\.ts$' },
      to: { path: '^(apps/web|fakes|seed-data|packages/devstack)/' },
    },
    {
      name: 'lower-layers-know-no-room',
      severity: 'error',
      from: { path: `^apps/api/src/(${lowerLayers.join('|')})/`, pathNot: '\\.spec\\.ts$' },
      to: { path: room(rooms) },
    },
    ...Object.entries(mayUse).map(([name, allowed]) => ({
      name: `room-${name}`,
      severity: 'error',
      from: { path: room(name), pathNot: '\\.spec\\.ts$' },
      to: { path: room(rooms), pathNot: [name, ...allowed].map(room) },
    })),
    {
      name: 'models-stay-in-their-room',
      severity: 'error',
      from: { path: '^apps/api/src/([^/]+)/', pathNot: '\\.spec\\.ts$|/testing/' },
      to: { path: '^apps/api/src/([^/]+)/.*\\.model\\.ts$', pathNot: '^apps/api/src/$1/' },
    },
    {
      name: 'vendor-sdks-in-adapters-only',
      severity: 'error',
      from: { path: '^apps/api/src/', pathNot: '^apps/api/src/adapters/|\\.spec\\.ts$|/testing/' },
      to: { path: 'node_modules/(stripe|nodemailer|@aws-sdk)/' },
    },
    { name: 'web-ui-is-domain-free', severity: 'error', from: { path: '^apps/web/src/(ui|lib|config)/' }, to: { path: '^apps/web/src/(features|app)/' } },
    { name: 'web-features-below-app', severity: 'error', from: { path: '^apps/web/src/features/' }, to: { path: '^apps/web/src/app/' } },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '(^|/)dist/' },
    tsPreCompilationDeps: true,
enhancedResolveOptions: { exportsFields: ['exports'], conditionNames: ['import', 'types', 'default'], extensions: ['.ts', '.tsx', '.js', '.mjs', '.json'] },
  },
};
