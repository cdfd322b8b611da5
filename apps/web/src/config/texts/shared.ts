/* Words that the first page needs, or may need. */

export const faultTexts = {
  again: 'Try again',
  requestId: 'If you write to the workshop about this, name request',
  somethingBroke: 'This page broke',
  somethingBrokeDetail: 'Nothing you did is lost on the server. Load the page again.',
  shopChanged: 'The shop was updated meanwhile',
  shopChangedDetail: 'This page belongs to the version before. Load it again to go on.',
  reload: 'Load again',
};

export const priceTexts = { before: 'before', now: 'now', free: 'Free' };

export const loadingText = 'Loading';

export const drawingTexts = {
  toReprint: 'reprint',
  rank: (count: number, tallest: string) => `${count} voices drawn to scale, the longest ${tallest}`,
  pressHint: 'Press a voice to hear it; arrow keys go along the rank.',
};
