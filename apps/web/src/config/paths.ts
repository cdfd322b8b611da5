type ParamNames<P extends string> = P extends `${infer Head}/${infer Tail}`
  ? ParamNames<Head> | ParamNames<Tail>
  : P extends `:${infer Name}`
    ? Name
    : never;
type Query = Readonly<Record<string, string | number | undefined>>;
type LinkArguments<P extends string> = [ParamNames<P>] extends [never]
  ? [params?: Record<string, never>, query?: Query]
  : [params: Record<ParamNames<P>, string>, query?: Query];

export interface RoutePath<P extends string> {
  /** For the router. */
  readonly path: P;
  /** For links: `to({slug: 'curlew'}, {page: 2})`. */
  readonly to: (...args: LinkArguments<P>) => string;
}

function route<const P extends string>(path: P): RoutePath<P> {
  return {
    path,
    to: (...[params, query]) => {
      const filled = path.replace(/:(\w+)/g, (_, name: string) =>
        encodeURIComponent((params as Record<string, string>)[name] ?? ''),
      );
      const pairs = Object.entries(query ?? {}).filter(([, value]) => value !== undefined && value !== '');
      return pairs.length ? `${filled}?${new URLSearchParams(pairs as [string, string][])}` : filled;
    },
  };
}

/** Every address of the web application. */
export const paths = {
  home: route('/'),
  kit: route('/kits/:slug'),
  basket: route('/basket'),
  order: route('/orders/:orderId'),
  collect: route('/collect/:token'),
  shelf: route('/shelf'),
  shelfKit: route('/shelf/:slug'),
  shelfReprint: route('/shelf/:slug/reprint'),
  tuner: route('/shelf/:slug/tuner'),
  shelfFit: route('/shelf/:slug/fit'),
  cautions: route('/cautions'),
  journal: route('/journal'),
  post: route('/journal/:slug'),
  letters: route('/letters'),
  letter: route('/letters/:slug'),
  news: route('/news'),
  newsConfirm: route('/news/confirm'),
  unsubscribe: route('/unsubscribe/:token'),
  support: route('/support'),

  join: route('/join'),
  signIn: route('/sign-in'),
  signInLink: route('/sign-in/link'),
  forgot: route('/forgot'),
  reset: route('/reset'),
  verify: route('/verify'),
  account: route('/account'),
  pledge: route('/account/pledge'),
  ownLetter: route('/account/letters/:recipientId'),

  workshop: {
    overview: route('/workshop'),
    kits: route('/workshop/kits'),
    newKit: route('/workshop/kits/new'),
    kit: route('/workshop/kits/:kitId'),
    revision: route('/workshop/kits/:kitId/revisions/:revisionId'),
    parts: route('/workshop/kits/:kitId/revisions/:revisionId/parts'),
    notes: route('/workshop/kits/:kitId/revisions/:revisionId/notes'),
    specification: route('/workshop/kits/:kitId/revisions/:revisionId/specification'),
    changes: route('/workshop/kits/:kitId/revisions/:revisionId/changes'),
    files: route('/workshop/kits/:kitId/revisions/:revisionId/files'),
    gates: route('/workshop/kits/:kitId/revisions/:revisionId/gates'),
    coupons: route('/workshop/coupons'),
    newCoupon: route('/workshop/coupons/new'),
    coupon: route('/workshop/coupons/:couponId'),
    orders: route('/workshop/orders'),
    order: route('/workshop/orders/:orderId'),
    receipts: route('/workshop/ledger/receipts'),
    sales: route('/workshop/ledger'),
    payments: route('/workshop/ledger/payments'),
    rates: route('/workshop/ledger/rates'),
    quarters: route('/workshop/ledger/quarters'),
    quarter: route('/workshop/ledger/quarters/:year/:quarter'),
    locations: route('/workshop/ledger/locations'),
    location: route('/workshop/ledger/locations/:receiptId'),
    reconciliations: route('/workshop/ledger/reconciliations'),
    reconciliation: route('/workshop/ledger/reconciliations/:reconciliationId'),
    exports: route('/workshop/ledger/exports'),
    holders: route('/workshop/holders'),
    supporters: route('/workshop/supporters'),
    supporter: route('/workshop/supporters/:pledgeId'),
    plans: route('/workshop/plans'),
    newPlan: route('/workshop/plans/new'),
    plan: route('/workshop/plans/:planId'),
    fit: route('/workshop/fit'),
    fitReport: route('/workshop/fit/:reportId'),
    journal: route('/workshop/journal'),
    newPost: route('/workshop/journal/new'),
    post: route('/workshop/journal/:postId'),
    letters: route('/workshop/letters'),
    newLetter: route('/workshop/letters/new'),
    letter: route('/workshop/letters/:letterId'),
    deadAddresses: route('/workshop/letters/dead-addresses'),
    people: route('/workshop/people'),
    log: route('/workshop/log'),
  },
} as const;

/** Sign-in, coming back to where one was afterwards. */
export const signInThenBack = (from: string): string => paths.signIn.to({}, { from });

/** Where to go after signing in: an address of this shop only, so that no link can send a person elsewhere. */
export const comeBackTo = (from: string | null): string =>
  from !== null && /^\/(?![/\\])/.test(from) ? from : paths.shelf.to();
