import { sourceWords } from './source-words.js';

const since = '2026-11-12T12:00:00.000Z';
const plain = { since, until: null, releasedBefore: null };

describe('by what a kit is on the shelf', () => {
  it('is said for each source, with until when a pledge is paid', () => {
    expect(
      sourceWords({
        sources: [
          { source: 'purchase', ...plain },
          { source: 'pledge', ...plain, until: '2027-01-12T12:00:00.000Z' },
        ],
      }),
    ).toEqual(['Purchase, 12 Nov 2026', 'Pledge, until 12 Jan 2027']);
  });

  it('is said of what stays of a pledge that ended', () => {
    expect(
      sourceWords({ sources: [{ source: 'pledge', ...plain, releasedBefore: '2027-02-12T12:00:00.000Z' }] }),
    ).toEqual(['Pledge, ended 12 Feb 2027']);
  });
});
