import type { KeepsAfter, PledgeState } from '@windchest/contracts';

export const keepsTexts: Record<KeepsAfter, string> = {
  nothing: 'When the pledge ends, its kits leave the shelf.',
  'released-during': 'What is released while you pledge stays on the shelf when it ends.',
  'released-before-end': 'All that was released by the end stays on the shelf.',
};

export const pledgeStateTexts: Record<PledgeState, string> = {
  opening: 'waiting for payment',
  current: 'current',
  grace: 'payment open',
  paused: 'paused',
  lapsed: 'lapsed',
  ended: 'ended',
};

export const supportTexts = {
  title: 'Pledge to the workshop',
  lead: 'An amount each month keeps the bench going. The plan’s kits stand on your shelf while you pledge, new revisions at once.',
  failed: 'The plans cannot be shown',
  empty: 'No plans yet',
  emptyDetail: 'Here will stand what one can pledge each month, and what comes with it.',
  seeKits: 'See the kits',
  choose: 'Plan',
  aMonth: 'a month',
  allKits: 'All kits, and those to come.',
  noKitsYet: 'Its kits come to the shelf when they are released.',
  drawn: (kit: string, count: number) =>
    `${kit}: ${count} ${count === 1 ? 'voice' : 'voices'} drawn to scale`,

  aside: 'Begin a pledge',
  signIn: 'Sign in to pledge',
  signInWhy: 'A pledge belongs to an account, so that you can change, pause and end it.',
  join: 'Join',
  verify: 'Confirm your address first',
  verifyWhy: 'Open the link we mailed you. Your account page mails another.',
  toAccount: 'Go to my account',
  youPledge: (plan: string) => `You pledge: ${plan}`,
  youPledgeWhy: 'Change the plan, pause or end it on the page of your pledge.',
  openPledge: 'Open my pledge',
  waits: (plan: string) => `A pledge waits for its payment: ${plan}`,
  waitsWhy: 'Go on with it, or choose again: then its payment page closes.',
  goOn: 'Go on to pay',

  country: 'Country',
  countryHint: 'For the tax within the amount.',
  countryEmpty: 'Choose …',
  countryMissing: 'Choose the country you live in.',
  terms:
    'The amount is taken each month on the same day. End it whenever you like: it then runs to the end of the month that is paid.',
  open: (amount: string) => `Pledge ${amount}`,
  opening: 'Opening …',
  notOpened: 'No pledge was begun',
  blockPlan: 'Plan',
  blockKits: 'Kits',
  blockAmount: 'Each month',
};

export const ownPledgeTexts = {
  title: 'Your pledge',
  failed: 'Your pledge cannot be shown',
  none: 'You do not pledge',
  noneDetail: 'An amount each month keeps the bench going, and a plan’s kits on your shelf.',
  seePlans: 'See the plans',
  toAccount: 'My account',
  again: 'Pledge again',

  titles: {
    opening: 'Waiting for the payment …',
    current: 'Your pledge',
    grace: 'A payment is open',
    paused: 'Your pledge rests',
    lapsed: 'Your pledge has lapsed',
    ended: 'Your pledge has ended',
  } satisfies Record<PledgeState, string>,
  openingLead: 'As soon as the payment service says that you have paid, this page goes on by itself.',
  notHeard: 'The payment service cannot be reached just now. This page goes on asking.',
  currentLead: (until: string, amount: string) => `Paid until ${until}. Then the next ${amount} are taken.`,
  endingLead: (until: string) =>
    `It ends on ${until}. Nothing more is charged, and until then everything stays as it is.`,
  pausingLead: (until: string, next: string, amount: string) =>
    `Paid until ${until}. Then it rests until ${next}, when the next ${amount} are taken.`,
  graceLead: (amount: string, until: string) =>
    `The payment of ${amount} did not go through. Your shelf stays as it is until ${until}: pay by then, and nothing changes.`,
  pausedLead: (next: string, amount: string) =>
    `Nothing is charged until ${next}. Then ${amount} are taken, and the plan’s kits are back.`,
  pausedOpenLead: 'Nothing is charged while it rests.',
  lapsedLead: (day: string) => `The open payment was not made by ${day}. Nothing more is charged.`,
  endedLead: (day: string) => `It ended on ${day}. Nothing more is charged.`,
  nextPlan: (plan: string, amount: string, day: string) => `From ${day} on: ${plan}, ${amount} a month.`,

  stays: {
    nothing: () => 'The plan’s kits leave your shelf. What you bought stays.',
    'released-during': (began: string) =>
      `What was released since ${began} stays on your shelf, and what you bought. The rest of the plan’s kits leaves it.`,
    'released-before-end': () =>
      'All that was released by then stays on your shelf, and what you bought. Later revisions do not come.',
  } satisfies Record<KeepsAfter, (began: string) => string>,
  rests: {
    nothing: () => 'While it rests, the plan’s kits cannot be downloaded.',
    'released-during': (began: string) =>
      `While it rests, what was released since ${began} can be downloaded, nothing else of the plan.`,
    'released-before-end': () => 'While it rests, no new revisions come to your shelf.',
  } satisfies Record<KeepsAfter, (began: string) => string>,

  kits: 'On your shelf by this pledge',
  toShelf: 'Go to my shelf',
  actions: 'What you can do',
  pay: 'Pay with another card',
  goOn: 'Go to the payment page',
  giveUp: 'Give it up',
  giveUpTitle: 'Give this pledge up?',
  giveUpDetail: 'Nothing is charged, and the payment page closes.',
  giveUpKeep: 'Keep waiting',
  changePlan: 'Change the plan',
  keepPlan: (plan: string) => `Stay with ${plan}`,
  pause: 'Pause',
  resume: 'Go on sooner',
  resumeTitle: 'Take the pledge up again?',
  resumeDetail: (day: string, amount: string) =>
    `The next ${amount} are taken on ${day}. From then on the plan’s kits are back on your shelf.`,
  resumeUnpaused: (day: string, amount: string) =>
    `The pause is dropped, and the next ${amount} are taken on ${day}.`,
  resumeKeep: 'Leave the pause',
  end: 'End the pledge',
  keep: 'Keep the pledge',
  card: 'Give another card',
  cardOpening: 'Opening …',
  notDone: 'Nothing was changed',

  pauseTitle: 'Pause the pledge',
  pauseFor: 'For how long',
  months: (count: number) => `${count} ${count === 1 ? 'month' : 'months'}`,
  pauseNext: (day: string) => `next payment on ${day}`,
  pauseDetail: (until: string) => `You have paid until ${until}. Until then everything stays as it is.`,
  pauseConfirm: 'Pause it',

  planTitle: 'Change the plan',
  planDetail: (day: string) =>
    `Another plan begins with the next payment, on ${day}. Until then everything stays as it is, and nothing is charged in between.`,
  planNone: 'There is no other plan.',
  planChoose: 'Choose one.',
  planConfirm: 'Change it then',

  endTitle: 'End the pledge?',
  endDetail: (until: string) =>
    `Nothing more is charged. Until ${until}, which is paid, everything stays as it is. You can take the end back until then.`,
  endAtOnce: 'It ends at once, since nothing that is paid is left. Nothing more is charged.',
  endConfirm: 'End the pledge',
  endKeep: 'Keep it',
  keepTitle: 'Keep the pledge?',
  keepDetail: (day: string, amount: string) => `It goes on, and the next ${amount} are taken on ${day}.`,
  keepConfirm: 'Keep the pledge',
  keepCancel: 'Let it end',

  payments: 'Payments',
  paymentsFailed: 'The payments cannot be shown',
  noPayments: 'Nothing has been paid yet.',
  columns: { paid: 'Paid', plan: 'Plan', period: 'For', receipt: 'Receipt', amount: 'Amount' },
  period: (from: string, to: string) => `${from} – ${to}`,
  taxOf: (rate: string, tax: string) => `VAT ${rate} %: ${tax}`,
  earlier: 'Earlier pledges',
  earlierColumns: { plan: 'Plan', began: 'Began', ended: 'Ended', state: 'State', amount: 'Each month' },

  blockPlan: 'Plan',
  blockState: 'State',
  blockNext: 'Next payment',
  blockEnds: 'Ends',
  blockPaidUntil: 'Paid until',
  blockCard: 'Card',
  blockSince: 'Since',
  blockAmount: 'Each month',
  cardEnding: (last4: string) => `ends in ${last4}`,
  none4: '—',
};

export const pledgeSectionTexts = {
  title: 'Pledge',
  none: 'You do not pledge to the workshop.',
  seePlans: 'See the plans',
  open: 'Open my pledge',
  failed: 'Your pledge cannot be shown',
};
