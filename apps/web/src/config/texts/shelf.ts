import type { Collection, ShelfItem } from '@windchest/contracts';

const parts = (n: number) => `${n} ${n === 1 ? 'part' : 'parts'}`;

export const sourceTexts: Record<ShelfItem['source'], string> = {
  purchase: 'Purchase',
  pledge: 'Pledge',
  gift: 'Gift',
  staff: 'Workshop',
};

export const shelfTexts = {
  title: 'My shelf',
  failed: 'The shelf cannot be shown',
  empty: 'No kits on your shelf yet',
  emptyDetail: 'What you buy stands here, with every later revision and what to reprint for it.',
  seeKits: 'See the kits',
  resting: (kits: string) =>
    `Downloads of ${kits} rest while the payment is in dispute. When the bank has decided for the workshop, they go on.`,
  restingWithPledge: (kits: string) => `${kits} ${kits.includes(', ') ? 'rest' : 'rests'} with your pledge.`,
  seePledge: 'Your pledge',

  hold: 'You hold',
  nothingYet: 'Nothing yet',
  newest: 'Newest',
  since: (source: string, date: string) => `${source}, ${date}`,
  paidUntil: (source: string, date: string) => `${source}, until ${date}`,
  keptFrom: (source: string, date: string) => `${source}, ended ${date}`,
  get: (label: string) => `Get ${label}`,
  seeReprint: 'See what to reprint',
  upToDate: 'You hold the newest',
  open: 'Open',
  of: (kit: string) => `of ${kit}`,
  withdrawn: 'withdrawn',

  signedOutLead: 'What you bought stands here, with every later revision and what to reprint for it.',
  signIn: 'Sign in',
  join: 'Join',
};

export const lostTexts = {
  title: 'Bought without an account?',
  why: 'Lost your link? Write the address you bought with. We mail fresh links for its orders; the earlier links then end.',
  email: 'E-mail of the order',
  send: 'Mail me fresh links',
  sending: 'Mailing …',
  sentTitle: 'Look in your mail',
  sent: (email: string) => `If ${email} bought kits here, fresh links are on their way to it.`,
  failed: 'No links were mailed',
};

export const shelfKitTexts = {
  reportFit: 'Say how a part fits',
  failed: 'This kit cannot be shown',
  notYours: 'This kit is not on your shelf',
  notYoursDetail:
    'What you buy with this account stands there. A kit bought with another address comes when you sign in with that one.',
  toShelf: 'To my shelf',
  back: 'My shelf',

  hold: (label: string) => `You hold ${label}.`,
  holdNothing: (newest: string) => `${newest} is yours.`,
  getIt: (count: number) => `Get the bundle and print ${parts(count)}.`,
  upToDate: 'It is the newest: nothing to reprint.',
  stillToPrint: (count: number, all: number) => `${count} of ${parts(all)} are still to print.`,
  isOut: (newest: string) => `${newest} is out:`,
  reprint: (needed: number, all: number) => `reprint ${needed} of ${parts(all)}`,
  reprintNone: 'nothing to reprint',
  optional: (count: number, hasNeeded: boolean) =>
    hasNeeded
      ? `, ${count} more if ${count === 1 ? 'it troubles' : 'they trouble'} you`
      : `, ${count} if ${count === 1 ? 'it troubles' : 'they trouble'} you`,
  rest: (count: number) =>
    count === 1
      ? 'The other part is the same; leave it as it is.'
      : `The other ${count} parts are the same; leave them as they are.`,
  heldIsNewer: (held: string, newest: string) =>
    `You hold ${held}. The workshop has withdrawn it; the newest that stands is ${newest}.`,
  withdrawnTitle: (label: string) => `${label} was withdrawn`,
  withdrawnTake: (label: string, newest: string) =>
    `Print no more parts of ${label}. Take ${newest} instead; the list below says what differs from what you have.`,
  withdrawnWait: (label: string) =>
    `Print no more parts of ${label}. No other revision stands at the moment; the next one comes here.`,
  nothingToGet: 'There is nothing to fetch at the moment.',

  sheet: (kit: string) => `Parts of ${kit}`,
  differences: 'What differs',
  part: 'Part',
  print: 'Print',
  times: (count: number) => `× ${count}`,
  noPrint: 'none',
  whatDiffers: 'What differs',
  why: 'Why',
  ifItTroubles: 'Reprint if it troubles you',
  newPart: 'A new part',
  dropped: 'No longer in the kit',
  unmarked: 'The workshop does not ask for a reprint',

  actions: 'What you can do',
  getBundle: 'Get the whole bundle',
  getBundleIn: (sign: string) => `Get the bundle in ${sign}`,
  getAll: 'The bundle with all clearances',
  clearance: 'Clearance you print',
  clearanceUnknown: 'Not known yet',
  clearanceHabit: (clearance: string) => `As my printer: ${clearance}`,
  clearanceFromCard: (printer: string) => `From your printer card, ${printer}.`,
  clearanceFind: (gauge: string | undefined) =>
    gauge
      ? `The whole bundle holds all of them. Print the gauge first, ${gauge}: it shows which one fits.`
      : 'The whole bundle holds all of them. Print a part in 0 first and see how it fits.',
  clearanceFailed: 'The clearance was not kept',
  inClearance: (sign: string) => `in ${sign}`,
  getting: 'Making ready …',
  getFailed: 'The download did not start',
  printed: (label: string) => `I have printed ${label}`,
  printedThis: 'I have printed this',
  printedTitle: (label: string) => `You have printed ${label}?`,
  printedDetail: (label: string) =>
    `Every part of ${label} is then written down as printed, in place of what you said before. The shelf says from there what to reprint.`,
  printedConfirm: (label: string) => `Yes, I hold ${label}`,
  printedFailed: 'What you hold was not changed',
  tune: 'Tune what you printed',
  changeNotes: 'Change notes',
  licence: 'Licence',
  cautions: 'Cautions',
  receipt: 'Order and receipt',
  kitPage: 'The kit in the shop',
  downloads: 'Downloads',

  blockHold: 'You hold',
  blockNothing: 'Nothing yet',
  blockNewest: 'Newest',
  notIncludedTitle: (label: string) => `${label} came after your pledge`,
  notIncluded: (newest: string) =>
    `What stays of the pledge goes up to ${newest}. Pledge again or buy the kit to get later ones.`,
  pledgeAgain: 'Pledge again',
  buyKit: 'See the kit in the shop',

  blockSource: 'Yours by',
  newestOf: (label: string, date: string) => `${label}, ${date}`,

  noNotes: 'No change notes were written for this revision.',
  isWithdrawn: 'withdrawn',
  youHold: 'you hold this',
  getRevision: (label: string, sign?: string) => (sign ? `Get ${label} in ${sign}` : `Get ${label}`),

  noTerms: 'The terms stand in the bundle, in LICENCE.txt.',
  noDownloads: 'Nothing was downloaded yet.',
  file: 'File',
  revision: 'Revision',
  when: 'When',
  complete: 'Complete',
  isComplete: 'complete',
  isNotComplete: 'not complete',
};

export const collectTexts = {
  title: 'Your files',
  failed: 'The link cannot be opened',
  unknown: 'This link is not one of ours',
  unknownDetail: 'Check that the whole address was copied from the mail.',
  order: (number: string) => `Order ${number}`,
  lead: (kits: number) =>
    kits === 1
      ? 'The bundle holds the parts, the build book and the licence.'
      : 'Each bundle holds the parts, the build book and the licence of its kit.',

  states: {
    open: { title: '', detail: '' },
    expired: {
      title: 'This link has expired',
      detail: 'Your kits are still yours. A fresh link goes to the address of the order.',
    },
    'used-up': {
      title: 'This link has been used as often as it may be',
      detail: 'Your kits are still yours. A fresh link goes to the address of the order.',
    },
    replaced: {
      title: 'A newer link has replaced this one',
      detail: 'Look for it in your mail, or have another mailed to the address of the order.',
    },
    suspended: {
      title: 'Downloads of this order rest',
      detail: 'Its payment is in dispute. When the bank has decided for the workshop, they go on.',
    },
    ended: {
      title: 'This order gives no files any more',
      detail: 'What was paid for it went back. Answer the mail of your order if you think this is wrong.',
    },
  } satisfies Record<Collection['state'], { title: string; detail: string }>,

  get: 'Get the bundle',
  getOne: (clearance: string) => `Get ${clearance}`,
  clearances:
    'Some parts come in clearances: the bundle holds all of them, and its build book says how to find yours. If you know it, take that one alone.',
  getting: 'Making ready …',
  getFailed: 'The download did not start',
  checksum: 'SHA-256',
  checksumOfAll: 'SHA-256 of the bundle with all clearances',
  copyChecksum: 'Copy the SHA-256',
  of: (kit: string) => `of ${kit}`,

  aside: 'About this link',
  stateName: 'Link',
  stateWords: {
    open: 'open',
    expired: 'expired',
    'used-up': 'used up',
    replaced: 'replaced',
    suspended: 'resting',
    ended: 'ended',
  } satisfies Record<Collection['state'], string>,
  usesLeft: 'Downloads left',
  goodUntil: 'Good until',
  endedOn: 'Was good until',
  orderName: 'Order',

  fresh: 'Mail me a fresh link',
  freshWhy: 'Need another link? It goes to the address of the order, and this one then ends.',
  sending: 'Mailing …',
  freshSentTitle: 'Look in your mail',
  freshSent: 'A fresh link is on its way to the address of the order.',
  freshFailed: 'No link was mailed',

  account: 'Keep it on a shelf',
  accountWhy:
    'Join with the address of the order, and these kits stand on your shelf with every later revision.',
  join: 'Join',
  toShelf: 'Go to my shelf',

  cautions:
    'Air the room while you print. Wear eye protection when you stretch bands or strings. Small parts: not for children under three.',
  allCautions: 'All cautions',
};
