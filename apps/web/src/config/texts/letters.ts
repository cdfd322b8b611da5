export const newsTexts = {
  title: 'News',
  lead: 'A letter now and then: new kits, what is on the bench, what comes next. No more than the maker has to tell.',
  email: 'E-mail',
  ask: 'Ask for the news',
  asked: 'Look in your mail',
  askedDetail: (email: string) =>
    `If ${email} does not get the news yet, a link to confirm is on its way. They come once you have pressed it.`,
  again: 'Enter another address',
  failed: 'That did not work',
  archive: 'Read the letters sent so far',
  stops: 'Every letter has a link that ends them, at once and without signing in.',
  confirmTitle: 'Confirm the news',
  confirmed: 'The news will come',
  confirmedDetail: (email: string) => `The next letter goes to ${email} too.`,
};

export const stopTexts = {
  title: 'Stop these mails',
  lead: (email: string) => `For ${email}.`,
  news: { what: 'News from the workshop', stop: 'Stop the news', stopped: 'The news are stopped' },
  revisions: (kit: string) => ({
    what: `Mails about new revisions of ${kit}`,
    stop: 'Stop these mails',
    stopped: 'These mails are stopped',
  }),
  newsStay: 'Letters about kits you own, such as fixes, still come: they are about what you have.',
  again: 'Changed your mind? Ask for them again on your account.',
  toAccount: 'Open your account',
  failed: 'This link does not work',
  notStopped: 'They were not stopped',
};

export const archiveTexts = {
  title: 'Letters',
  lead: 'News from the workshop, as they were sent.',
  ask: 'Ask for the news',
  empty: 'No letters yet',
  emptyDetail: 'When the maker sends news, they can be read here.',
  failed: 'The letters could not be read',
  notThere: 'No such letter',
  sentOn: (day: string) => `Sent on ${day}.`,
};

export const ownLetterTexts = {
  section: 'Letters to you',
  news: 'News',
  newsStates: {
    none: 'You get no news from the workshop.',
    asked: 'A link to confirm was mailed to you; the news come once you have pressed it.',
    confirmed: 'You get news from the workshop.',
    stopped: 'You get no news from the workshop.',
  },
  wantNews: 'Ask for the news',
  stopNews: 'Stop the news',
  newsFailed: 'That was not changed',
  empty: 'The workshop has written you no letter yet.',
  failed: 'Your letters could not be read',
  kinds: { service: 'about a kit of yours', news: 'news' },
  back: 'Your account',
  pages: 'Pages of your letters',
  readEarlier: 'Earlier letters',
  readLater: 'Later letters',
};

export const watchTexts = {
  label: 'Tell me by mail of new revisions',
  hint: 'With your own list of what to reprint. Each mail has a link that ends them.',
  failed: 'That was not changed',
};
