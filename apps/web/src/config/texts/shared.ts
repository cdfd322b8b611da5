export const fieldTexts = {
  optional: '(may be left empty)',
  refused: 'This does not fit here. Check it and try again.',
};

export const faultTexts = {
  again: 'Try again',
  requestId: 'If you write to the workshop about this, name request',
  somethingBroke: 'This page broke',
  somethingBrokeDetail: 'Nothing you did is lost on the server. Load the page again.',
  shopChanged: 'The shop was updated meanwhile',
  shopChangedDetail: 'This page belongs to the version before. Load it again to go on.',
  reload: 'Load again',
  notFound: 'Nothing stands at this address',
  notFoundDetail: 'The link may be old or cut off. The kits are all on the front page.',
  toKits: 'See the kits',
  forbidden: 'This room is for the workshop’s staff',
  forbiddenDetail: 'Sign in with an account that may enter it, or ask the owner.',
};

export const tableTexts = {
  csv: 'Download as CSV',
  sameAsTable: 'The same as a table',
  search: 'Search',
  sortBy: 'Sort by',
  ascending: 'rising',
  descending: 'falling',
  pageOf: (page: number, pages: number) => `Page ${page} of ${pages}`,
  rows: (from: number, to: number, total: number) => `${from}–${to} of ${total}`,
  previous: 'Previous',
  next: 'Next',
  noMatch: 'Nothing matches',
  noMatchDetail: 'Nothing here fits the search or the filter.',
  showAll: 'Show all',
};

export const dialogTexts = { cancel: 'Keep as it is', close: 'Close' };

export const copyTexts = {
  copy: 'Copy',
  copied: 'Copied',
  failed: 'Could not copy; select the text instead',
};

export const priceTexts = { before: 'before', now: 'now', free: 'Free' };

export const progressTexts = { percent: (value: number) => `${value} %` };

export const markdownTexts = { done: 'done', toDo: 'to do' };

export const editorTexts = { preview: 'Preview', nothing: 'Nothing is written here.' };

export const loadingText = 'Loading';

export const drawingTexts = {
  toReprint: 'reprint',
  rank: (count: number, tallest: string) => `${count} voices drawn to scale, the longest ${tallest}`,
  pressHint: 'Press a voice to hear it; arrow keys go along the rank.',
};
