/* Words of components that no first page shows: they stay out of what every visitor loads. */

export const fieldTexts = {
  optional: '(may be left empty)',
  refused: 'This does not fit here. Check it and try again.',
};

export const tableTexts = {
  csv: 'Download as CSV',
  sameAsTable: 'The same as a table',
  drawn: 'As a bar',
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

export const progressTexts = { percent: (value: number) => `${value} %` };

export const editorTexts = { preview: 'Preview', nothing: 'Nothing is written here.' };

export const markdownTexts = { done: 'done', toDo: 'to do' };
