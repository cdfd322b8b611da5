const count = (n: number, one: string, many: string) => `${n} ${n === 1 ? one : many}`;

export const passphraseTexts = {
  label: 'Passphrase',
  hint: '15 characters or more, spaces count; a short sentence is good.',
  soFar: (length: number, least: number) => `${length} of ${least} characters`,
  longEnough: (length: number) => `${length} characters: long enough`,
  show: 'Show the passphrase',
};

export const joinTexts = {
  title: 'Join',
  lead: 'An account costs nothing and keeps what you bought in one place.',
  email: 'E-mail',
  name: 'Name',
  nameHint: 'As the workshop should call you in its mails.',
  send: 'Join',
  sending: 'Joining …',
  failed: 'No account was made',
  whatFor: 'What an account is for',
  uses: [
    'Every kit you bought stands on a shelf, with all its later revisions.',
    'When a new revision comes, the shelf says which parts to reprint and why.',
    'Kits you bought earlier with the same address come onto the shelf too.',
    'Receipts stay at hand.',
  ],
  haveOne: 'You have an account?',
  signIn: 'Sign in',
  sentTitle: 'Look in your mail',
  sent: (email: string) =>
    `We have sent a mail to ${email}. Press the button in it, and the account is yours. The link works for 48 hours.`,
  notCome: 'Nothing came? Look among the unwanted mail, and check the address.',
  again: 'Change what I wrote',
};

export const signInTexts = {
  title: 'Sign in',
  email: 'E-mail',
  passphrase: 'Passphrase',
  send: 'Sign in',
  sending: 'Signing in …',
  failed: 'You are not signed in',
  forgot: 'Forgotten the passphrase?',
  byMail: 'Without the passphrase',
  byMailWhy: 'We mail a link to the address you wrote. It signs you in once, within 20 minutes.',
  mailLink: 'Mail me a link',
  mailing: 'Mailing …',
  linkSent: 'Look in your mail',
  linkSentTo: (email: string) => `If ${email} has an account here, a link is on its way to it.`,
  linkFailed: 'No link was mailed',
  newHere: 'New here?',
  join: 'Join',
  guest: 'Bought without an account?',
  lost: 'Have your links mailed again',
};

export const mailedLinkTexts = {
  checking: 'Checking the link …',
  noToken: 'The link is not whole',
  noTokenDetail: 'This page opens from the link in the mail. Check that the whole address was copied.',
  failed: 'The link did not work',
  askAgain: 'Mail me a new link',
  signIn: 'Sign in',
};

export const signInLinkTexts = { title: 'Sign in by link' };

export const verifyTexts = {
  title: 'Confirm your address',
  done: 'Your address is confirmed',
  doneDetail: (email: string) =>
    `You are signed in as ${email}. Kits you bought with this address stand on your shelf.`,
  toShelf: 'Go to my shelf',
  toWorkshop: 'Go to the workshop',
};

export const forgotTexts = {
  title: 'A new passphrase',
  lead: 'We mail you a link with which you choose another. It works for an hour.',
  email: 'E-mail',
  send: 'Mail me the link',
  sending: 'Mailing …',
  failed: 'No link was mailed',
  sentTitle: 'Look in your mail',
  sent: (email: string) =>
    `If ${email} has an account here, a link is on its way to it. Until you have chosen another, the old passphrase holds.`,
  again: 'Write another address',
  back: 'Back to sign in',
};

export const resetTexts = {
  title: 'Choose a passphrase',
  lead: 'It takes the place of the old one, and all other sessions of this account end.',
  label: 'New passphrase',
  send: 'Keep this passphrase',
  sending: 'Keeping …',
  failed: 'The passphrase was not changed',
  done: 'Your passphrase is set',
  doneDetail: (email: string) => `You are signed in as ${email}.`,
};

export const accountTexts = {
  title: 'Account',
  signOut: 'Sign out',
  signOutFailed: 'You are still signed in',
  notLoaded: 'Your account cannot be shown',

  name: 'Name',
  saveName: 'Save the name',
  nameSaved: 'The name is saved.',
  nameFailed: 'The name was not saved',

  email: 'E-mail',
  verified: 'confirmed',
  notVerified: 'not confirmed yet',
  notVerifiedDetail:
    'Press the button in the mail we sent. Until then, earlier orders of this address stay off your shelf.',
  sendAgain: 'Send the mail again',
  sentAgain: 'The mail is on its way.',
  sendAgainFailed: 'The mail was not sent',

  passphrase: 'Passphrase',
  current: 'Current passphrase',
  next: 'New passphrase',
  change: 'Change the passphrase',
  changing: 'Changing …',
  changed: 'The new passphrase holds. All other sessions have ended.',
  changeFailed: 'The passphrase was not changed',
  currentWrong: 'This is not your current passphrase.',
  noCurrent: 'You do not know it?',
  resetByMail: 'Choose another by mail',

  sessions: 'Open sessions',
  sessionsFailed: 'The sessions cannot be listed',
  thisOne: 'this browser',
  lastSeen: (when: string) => `last seen ${when}`,
  startedAt: (when: string) => `signed in ${when}`,
  onlyThis: 'You are signed in nowhere else.',
  endOthers: 'End the others',
  endOthersTitle: (others: number) => `End ${count(others, 'other session', 'other sessions')}?`,
  endOthersDetail: 'Whoever uses them has to sign in again. This browser stays signed in.',
  endOthersFailed: 'The other sessions still stand',

  orders: 'Orders',
  ordersFailed: 'Your orders cannot be listed',
  noOrders: 'No orders yet',
  noOrdersDetail: 'What you buy while signed in, or bought with this address before, is listed here.',
  seeKits: 'See the kits',
  order: 'Order',
  placed: 'Placed',
  kits: 'Kits',
  state: 'State',
  total: 'Total',
  papers: 'Papers',
  wentBack: (amount: string) => `${amount} went back`,
};

/** What a browser calls itself, in words a person knows. */
export const deviceTexts = {
  on: (browser: string, system: string) => `${browser} on ${system}`,
  unknown: 'A browser that does not say its name',
  aBrowser: 'A browser',
};
