/** All words of the mails. Short, plain, concrete; buttons are verbs; a no-break space holds `Mk 1.4`. */

const nbsp = '\u00a0';
const lists = new Intl.ListFormat('en-GB', { type: 'conjunction' });

/** `1 day`, `30 days`, held together on one line. */
export const countOf = (count: number, word: string): string =>
  `${count}${nbsp}${word}${count === 1 ? '' : 's'}`;

/** `Curlew`, `Curlew and Heron`, `Curlew, Heron and Wren`. */
export const listOf = (names: readonly string[]): string => lists.format(names);

const kitsInShort = (kits: readonly string[]): string =>
  kits.length > 2 ? `${kits[0] ?? ''} and ${kits.length - 1} more kits` : listOf(kits);

const linkLimits = (linkDays: number, linkUses: number): string =>
  `The link works for ${countOf(linkDays, 'day')} and ${countOf(linkUses, 'download')}.`;

const ignoreIt = 'If you did not ask for this, do nothing.';

export const texts = {
  hello: (name: string | undefined): string => (name === undefined ? 'Hello,' : `Hello ${name},`),
  replies: (replyTo: string): string => `Questions? Write to ${replyTo}.`,
  pasteLink: 'Or copy this address into your browser:',
  unbroken: (label: string): string => label.replaceAll(' ', nbsp),

  verifyAddress: {
    subject: (workshop: string): string => `Confirm your address for ${workshop}`,
    preheader: (hours: number): string => `One press, within ${countOf(hours, 'hour')}.`,
    heading: 'Confirm your e-mail address',
    body: (workshop: string): string =>
      `Somebody, most likely you, made an account at ${workshop} with this address. Confirm it, and orders made with it appear on your shelf.`,
    button: 'Confirm this address',
    limits: (hours: number): string =>
      `The link works for ${countOf(hours, 'hour')}. If it was not you, do nothing: the address stays unconfirmed.`,
    reason: 'You get this because this address was used to make an account.',
  },

  signInLink: {
    subject: (workshop: string): string => `Your sign-in link for ${workshop}`,
    preheader: (minutes: number): string => `Good for one sign-in, within ${countOf(minutes, 'minute')}.`,
    heading: 'Sign in',
    body: 'Here is the link you asked for. It takes the place of your passphrase this once.',
    button: 'Sign in',
    limits: (minutes: number): string =>
      `The link works once, within ${countOf(minutes, 'minute')}. Pass it on to nobody. ${ignoreIt}`,
    reason: 'You get this because a sign-in link was asked for with this address.',
  },

  resetPassphrase: {
    subject: (workshop: string): string => `Choose a new passphrase for ${workshop}`,
    preheader: (minutes: number): string => `The link works for ${countOf(minutes, 'minute')}.`,
    heading: 'Choose a new passphrase',
    body: 'Somebody, most likely you, asked for a new passphrase. The old one holds until you have chosen another.',
    button: 'Choose a passphrase',
    limits: (minutes: number): string =>
      `The link works once, within ${countOf(minutes, 'minute')}. Pass it on to nobody. ${ignoreIt}`,
    reason: 'You get this because a new passphrase was asked for with this address.',
  },

  addressAlreadyJoined: {
    subject: (workshop: string): string => `You have an account at ${workshop} already`,
    preheader: 'Nothing was changed. Sign in as before.',
    heading: 'You have an account already',
    body: (workshop: string): string =>
      `Somebody, most likely you, tried to join ${workshop} with this address. It has an account already, so nothing was changed.`,
    next: 'Sign in as before, or choose a new passphrase if the old one is gone. If it was not you, do nothing.',
    signIn: 'Sign in',
    reset: 'Choose a passphrase',
    reason: 'You get this because this address was entered on the page for joining.',
  },

  passphraseChanged: {
    subject: (workshop: string): string => `Your passphrase for ${workshop} was changed`,
    preheader: (when: string): string => `Changed ${when}.`,
    heading: 'Your passphrase was changed',
    body: (when: string): string => `The passphrase of your account was changed on ${when}.`,
    ifYou: 'If that was you, there is nothing to do.',
    ifNot: 'If it was not you, choose a new passphrase now, then end all sessions in your account.',
    button: 'Choose a passphrase',
    open: (workshop: string): string => `Open ${workshop}`,
    reason: 'You get this because your account was changed. These mails cannot be turned off.',
  },

  orderPaid: {
    subject: (kits: readonly string[]): string => `Your files: ${kitsInShort(kits)}`,
    preheader: (order: string, total: string): string => `Order ${order}, ${total}. Download page inside.`,
    heading: 'Your files are ready',
    paid: (total: string): string => `Thank you. Your payment of ${total} has arrived.`,
    free: 'Thank you. There was nothing to pay.',
    button: 'Open the download page',
    giftSubject: (kits: readonly string[]): string => `Your gift is on its way: ${kitsInShort(kits)}`,
    giftPreheader: (order: string, total: string): string => `Order ${order}, ${total}.`,
    giftHeading: 'Your gift is on its way',
    giftSent: (to: string, kits: readonly string[]): string =>
      `We have written to ${to}, with your line and a link to the files of ${listOf(kits)}. The files are theirs alone.`,
    openOrder: 'Open your order',
    limits: (linkDays: number, linkUses: number): string =>
      `${linkLimits(linkDays, linkUses)} After that, get a new one on the page of your order.`,
    lineDetail: (revision: string, licence: string, discount: string | undefined): string =>
      discount === undefined ? `${revision}, ${licence}` : `${revision}, ${licence}, ${discount} off`,
    subtotal: 'Subtotal',
    discount: (code: string | undefined): string => (code === undefined ? 'Discount' : `Coupon ${code}`),
    total: 'Total',
    taxWithin: (rateLabel: string): string => `of which ${rateLabel}`,
    cautions: 'Before you print and play',
    orderLabel: 'Order',
    receiptLabel: 'Receipt',
    reason: 'You get this because you placed an order.',
  },

  newDownloadLink: {
    subject: (kits: readonly string[]): string => `New download link: ${kitsInShort(kits)}`,
    preheader: 'The earlier link no longer works.',
    heading: 'Your new download link',
    body: (kits: readonly string[]): string => `It is for ${listOf(kits)}. The earlier link no longer works.`,
    button: 'Open the download page',
    limits: linkLimits,
    reason: 'You get this because a new link was asked for, for files you have a right to.',
  },

  orderRefunded: {
    subject: (amount: string, order: string): string => `Refund of ${amount} for order ${order}`,
    preheader: (creditNote: string): string => `Credit note ${creditNote}.`,
    heading: (amount: string): string => `${amount} is on its way back`,
    body: (amount: string): string =>
      `${amount} goes back to the card or account you paid with. The bank may take some days to show it.`,
    disputeSubject: (amount: string, order: string): string =>
      `Credit note over ${amount} for order ${order}`,
    disputeHeading: 'Your bank has decided',
    disputeBody: (amount: string): string =>
      `Your bank has given you back ${amount} that you had disputed. Here is the credit note for it.`,
    lineDetail: (licence: string, endsRight: boolean): string =>
      endsRight ? `${licence}, right to the files ends` : licence,
    total: 'Goes back',
    couponIsSpent: (code: string): string => `The coupon ${code} that lowered the price stays used.`,
    ended: (kits: readonly string[]): string =>
      kits.length === 1
        ? `With this refund your right to the files of ${listOf(kits)} ends. It is no longer on your shelf.`
        : `With this refund your right to the files of ${listOf(kits)} ends. They are no longer on your shelf.`,
    giftEnded: (to: string, kits: readonly string[]): string =>
      `With this refund the right of ${to} to the files of ${listOf(kits)} ends.`,
    giftKept: (to: string, kits: readonly string[]): string =>
      `${listOf(kits)} ${kits.length === 1 ? 'stays' : 'stay'} with ${to}.`,
    kept: (kits: readonly string[]): string =>
      `${listOf(kits)} ${kits.length === 1 ? 'stays' : 'stay'} on your shelf.`,
    button: 'Open your order',
    taxWithin: (rateLabel: string): string => `of which ${rateLabel}`,
    orderLabel: 'Order',
    receiptLabel: 'Receipt',
    creditNoteLabel: 'Credit note',
    amountLabel: 'Refunded',
    reason: 'You get this because money for an order of yours was refunded.',
  },

  paymentDisputed: {
    subjects: {
      inquiry: (order: string): string => `The bank asks about the payment of order ${order}`,
      open: (order: string): string => `Dispute over order ${order}: answer it in time`,
      won: (order: string): string => `Dispute over order ${order}: decided for the workshop`,
      lost: (order: string): string => `Dispute over order ${order}: lost`,
      closed: (order: string): string => `The bank’s question about order ${order} is closed`,
    },
    headings: {
      inquiry: 'The bank asks about a payment',
      open: 'A payment is in dispute',
      won: 'The dispute is won',
      lost: 'The dispute is lost',
      closed: 'The question is closed',
    },
    bodies: {
      inquiry: (amount: string): string =>
        `The buyer’s bank asks about ${amount}. No money is taken yet, and the buyer’s files stay open. Answer at the payment service, or give the money back.`,
      open: (amount: string): string =>
        `The buyer’s bank has taken ${amount} back until it has decided. Downloads of this order rest meanwhile. Hand in at the payment service what shows that the files were asked for and fetched; the order’s page has the consent and the downloads.`,
      won: (amount: string): string => `${amount} stays with the workshop. The buyer’s files are open again.`,
      lost: (amount: string): string =>
        `${amount} stays with the buyer. A credit note is written and the right to the files has ended.`,
      closed: (): string => 'No money was taken. Nothing is left to do.',
    },
    preheader: (buyer: string): string => `Bought by ${buyer}.`,
    button: 'Open the order',
    orderLabel: 'Order',
    buyerLabel: 'Buyer',
    amountLabel: 'Amount',
    reasonLabel: 'Reason given',
    answerByLabel: 'Answer by',
    reason: 'You get this because you look after the workshop’s money. These mails cannot be turned off.',
  },

  staffInvite: {
    subject: (workshop: string): string => `An invitation to work at ${workshop}`,
    preheader: (role: string, days: number): string => `As ${role}. Open for ${countOf(days, 'day')}.`,
    heading: 'You are invited to the workshop',
    body: (invitedBy: string, workshop: string, role: string): string =>
      `${invitedBy} invites you to the workshop side of ${workshop}, as ${role}.`,
    button: 'Accept the invitation',
    limits: (days: number): string =>
      `The link is yours alone and works for ${countOf(days, 'day')}. If you expected no invitation, do nothing.`,
    reason: 'You get this because somebody at the workshop entered this address.',
  },

  revisionReleased: {
    subject: (kit: string, to: string, pieces: number): string =>
      pieces === 0
        ? `${kit} ${to} is out, nothing to reprint`
        : `${kit} ${to} is out, ${countOf(pieces, 'piece')} to reprint`,
    preheader: (from: string): string => `Compared with ${from}, which you hold.`,
    heading: (kit: string, to: string): string => `${kit} ${to} is out`,
    reprint: (from: string, pieces: number): string =>
      `You hold ${from}. For your build, reprint ${pieces === 1 ? 'one piece' : countOf(pieces, 'piece')}:`,
    rest: 'Everything else on your bench stays as it is.',
    nothing: (from: string): string =>
      `You hold ${from}. For your build no part changes: leave everything as it is.`,
    getChanged: 'Get the changed parts',
    getNotes: 'Read what changed',
    columns: { part: 'Part', print: 'Print', why: 'Why' },
    times: (quantity: number): string => `×${nbsp}${quantity}`,
    reason: (kit: string): string => `You get this because ${kit} is on your shelf.`,
    stop: 'Stop mails about new revisions',
  },

  revisionWithdrawn: {
    subject: (kit: string, revision: string): string => `${kit} ${revision} is withdrawn`,
    preheader: 'Why, and what to do about it.',
    heading: (kit: string, revision: string): string => `${kit} ${revision} is withdrawn`,
    body: (kit: string, revision: string): string =>
      `You hold ${revision} of ${kit}. The workshop hands it out no more, and says why:`,
    workshop: 'The workshop',
    takeInstead: (revision: string, newest: string): string =>
      `Print no more parts of ${revision}. Take ${newest} instead: your shelf says which pieces differ from what you have.`,
    wait: (revision: string): string =>
      `Print no more parts of ${revision}. There is no other revision at the moment; the next one comes to your shelf.`,
    button: 'See what to do',
    reason: (kit: string, revision: string): string => `You get this because you hold ${revision} of ${kit}.`,
  },

  letter: {
    times: (quantity: number): string => `×${nbsp}${quantity}`,
    ifItTroubles: 'Reprint these only if the old ones trouble you:',
    nothingToReprint: 'For your build there is nothing to reprint.',
    testSubject: (subject: string): string => `Test: ${subject}`,
    serviceReason: (kit: string): string =>
      `You get this because you have the files of ${kit}, and it is about them.`,
    serviceReasonOfShop: 'You get this because you have files from this workshop, and it is about them.',
    newsReason: 'You get this because you asked this workshop for news.',
    stopNews: 'Stop the news',
    account: 'Your account, and what is kept about you',
  },

  confirmNews: {
    subject: (workshop: string): string => `Do you want news from ${workshop}?`,
    preheader: 'One press, and they come.',
    heading: 'Confirm that you want the news',
    body: (workshop: string): string =>
      `Somebody, most likely you, asked ${workshop} to send news to this address: a letter now and then about new kits and the bench.`,
    button: 'Send me the news',
    limits: (days: number): string =>
      `The link works for ${countOf(days, 'day')}. If it was not you, do nothing: no news will come.`,
    reason: 'You get this because this address was entered for news.',
  },

  giftReceived: {
    subject: (from: string, kits: readonly string[]): string => `${from} gives you ${kitsInShort(kits)}`,
    preheader: 'Files to print and build an instrument.',
    heading: (kits: readonly string[]): string => `${listOf(kits)} ${kits.length === 1 ? 'is' : 'are'} yours`,
    body: (from: string, kits: readonly string[]): string =>
      kits.length === 1
        ? `${from} gives you ${listOf(kits)}, a musical instrument as files to print and build.`
        : `${from} gives you ${listOf(kits)}, musical instruments as files to print and build.`,
    kit: (kit: string, revision: string, licence: string): string =>
      `${kit} ${revision}, with the licence “${licence}”.`,
    button: 'Open the download page',
    limits: (linkDays: number, linkUses: number): string =>
      `${linkLimits(linkDays, linkUses)} Make an account with this address, and what you were given stands on your shelf, with all later revisions.`,
    cautions: 'Before you print and play',
    reason: (from: string): string => `You get this because ${from} entered this address for a gift.`,
  },

  fitAnswered: {
    subject: (kit: string, part: string): string => `${kit}: about ${part}`,
    preheader: (by: string): string => `${by} answers what you said about its fit.`,
    heading: (part: string): string => `An answer about ${part}`,
    body: (part: string, kit: string, revision: string): string =>
      `You told how ${part} of ${kit} ${revision} came out. Here is the answer.`,
    button: 'See your reports',
    reason: 'You get this because you reported how a part fits.',
  },

  fitFixed: {
    subject: (kit: string, part: string, fixedIn: string): string => `${kit} ${fixedIn}: ${part} is mended`,
    preheader: (revision: string): string => `What you reported about ${revision} led to it.`,
    heading: (part: string, fixedIn: string): string => `${part} is mended in ${fixedIn}`,
    body: (part: string, kit: string, revision: string, fixedIn: string): string =>
      `You told how ${part} of ${kit} ${revision} came out. ${fixedIn} is released, and that part is changed in it. Your shelf says which pieces to print again.`,
    thanks: 'Reports like yours are how the parts come to fit. Thank you.',
    button: 'See what to reprint',
    reason: 'You get this because you reported how this part fits.',
  },
};
