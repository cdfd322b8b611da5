import type { PledgeKeeps } from './pledge-message.js';

const lists = new Intl.ListFormat('en-GB', { type: 'conjunction' });
const kitsInShort = (kits: readonly string[]): string =>
  kits.length > 4 ? lists.format([...kits.slice(0, 3), `${kits.length - 3} more`]) : lists.format(kits);

/** What becomes of the shelf when a pledge is over. */
const leaves: Record<PledgeKeeps, string> = {
  nothing: 'The plan’s kits leave your shelf. What you bought stays.',
  'released-during':
    'What was released while you pledged stays on your shelf, and what you bought. The rest of the plan’s kits leaves it.',
  'released-before-end':
    'All that was released until the end stays on your shelf. Later revisions do not come to it.',
};

/** Words of the mails about pledges. */
export const pledgeTexts = {
  planLabel: 'Plan',
  amountLabel: 'Each month',
  paidLabel: 'Paid',
  receiptLabel: 'Receipt',
  nextLabel: 'Next payment',
  monthLabel: 'For',
  untilLabel: 'Until',
  openPledge: 'Open your pledge',
  taxWithin: (rateLabel: string): string => `of which ${rateLabel}`,
  period: (from: string, to: string): string => `${from} to ${to}`,
  reason: 'You get this because you pledge to the workshop each month.',
  reasonOver: 'You get this because you pledged to the workshop each month.',

  began: {
    subject: (plan: string): string => `Your pledge has begun: ${plan}`,
    preheader: (amount: string): string => `${amount} has arrived. The plan’s kits are on your shelf.`,
    heading: 'Thank you for your pledge',
    body: (amount: string): string => `Your first payment of ${amount} has arrived.`,
    kits: (kits: readonly string[]): string =>
      kits.length === 0
        ? 'The plan’s kits come to your shelf when they are released.'
        : `On your shelf now: ${kitsInShort(kits)}. New revisions come to it by themselves.`,
    button: 'Open the shelf',
    end: 'You can change, pause or end the pledge in your account at any time.',
  },
  receipt: {
    subject: (receipt: string): string => `Receipt ${receipt} for your pledge`,
    preheader: (amount: string): string => `${amount} has arrived.`,
    heading: (amount: string): string => `${amount} has arrived`,
    body: (plan: string, period: string): string => `Thank you. It is for ${plan}, ${period}.`,
  },
  failed: {
    subject: (plan: string): string => `The payment for ${plan} did not go through`,
    preheader: (until: string): string => `Your shelf stays as it is until ${until}.`,
    heading: 'Your payment did not go through',
    body: (amount: string): string => `The bank did not let ${amount} through for your pledge.`,
    until: (until: string): string =>
      `Your shelf stays as it is until ${until}. Pay by then, with this card or another, and nothing changes. If nothing is paid, the pledge lapses.`,
    pay: 'Pay with another card',
    card: 'Give another card',
  },
  graceEnds: {
    subject: (until: string): string => `Your pledge lapses on ${until}`,
    preheader: 'A payment is still open.',
    heading: (until: string): string => `Your pledge lapses on ${until}`,
    body: (amount: string): string => `The payment of ${amount} is still open.`,
  },
  lapsed: {
    subject: (plan: string): string => `Your pledge has lapsed: ${plan}`,
    preheader: 'Nothing more is charged.',
    heading: 'Your pledge has lapsed',
    body: 'The open payment was not made in time. Nothing more is charged.',
    shelf: leaves,
    button: 'See the plans',
  },
  willEnd: {
    subject: (day: string): string => `Your pledge ends on ${day}`,
    preheader: 'Nothing more is charged.',
    heading: (day: string): string => `Your pledge ends on ${day}`,
    body: (day: string): string =>
      `Nothing more is charged. Until ${day} everything stays as it is, and you can take the end back.`,
    shelf: leaves,
  },
  ended: {
    subject: (plan: string): string => `Your pledge has ended: ${plan}`,
    preheader: 'Nothing more is charged.',
    heading: 'Your pledge has ended',
    body: 'Thank you for your time with the workshop. Nothing more is charged.',
    button: 'See the plans',
  },
  paused: {
    subject: (day: string): string => `Your pledge rests until ${day}`,
    preheader: (day: string): string => `The next payment is on ${day}.`,
    heading: (day: string): string => `Your pledge rests until ${day}`,
    body: (from: string, day: string, amount: string): string =>
      `You have paid until ${from}. Then nothing is charged until ${day}, when ${amount} is taken and the plan’s kits are back.`,
    shelf: {
      nothing: 'While it rests, the plan’s kits cannot be downloaded.',
      'released-during':
        'While it rests, what was released since you began to pledge can be downloaded, nothing else of the plan.',
      'released-before-end': 'While it rests, no new revisions come to your shelf.',
    } satisfies Record<PledgeKeeps, string>,
    sooner: 'You can take it up sooner in your account.',
  },
  resumes: {
    subject: (day: string): string => `Your pledge goes on, on ${day}`,
    preheader: (amount: string, day: string): string => `${amount} is taken on ${day}.`,
    heading: (day: string): string => `Your pledge goes on, on ${day}`,
    body: (amount: string, day: string): string =>
      `Its pause is over: ${amount} is taken on ${day}, and the plan’s kits are back on your shelf.`,
    end: 'To end it before that, open your pledge.',
  },
  planChanges: {
    subject: (plan: string, day: string): string => `${plan} from ${day} on`,
    preheader: (amount: string): string => `${amount} a month from then on.`,
    heading: 'Your plan changes',
    body: (from: string, to: string, day: string, amount: string): string =>
      `On ${day} your plan changes from ${from} to ${to}, for ${amount} a month. Until then everything stays as it is, and nothing is charged in between.`,
  },
};
