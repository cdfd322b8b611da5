import { withBlock, withInserted } from './insert-text.js';

describe('withInserted', () => {
  it('replaces what is selected and puts the cursor behind the piece', () => {
    expect(withInserted('Slide X home', '[[J-01]]', { start: 6, end: 7 })).toEqual({
      text: 'Slide [[J-01]] home',
      cursor: 14,
    });
  });

  it('bears a selection beyond the end', () => {
    expect(withInserted('ab', 'c', { start: 9, end: 12 })).toEqual({ text: 'abc', cursor: 3 });
  });
});

describe('withBlock', () => {
  it('leaves an empty line before a block, and none at the start of a text', () => {
    expect(withBlock('', '### Fixed\n\n- ', { start: 0, end: 0 }).text).toBe('### Fixed\n\n- ');
    expect(withBlock('- a', '### Fixed', { start: 3, end: 3 }).text).toBe('- a\n\n### Fixed');
    expect(withBlock('- a\n', '### Fixed', { start: 4, end: 4 }).text).toBe('- a\n\n### Fixed');
  });
});
