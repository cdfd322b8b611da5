import { mayReadPost } from './may-read-post.js';

const post = (audience: 'everybody' | 'supporters', state: 'draft' | 'published' = 'published') => ({
  audience,
  state,
});

describe('who may read a post', () => {
  it('is everybody for a public one', () => {
    expect(mayReadPost(post('everybody'), null, false)).toBe(true);
  });
  it('is a current supporter, and no other buyer, for one written for supporters', () => {
    expect(mayReadPost(post('supporters'), { role: 'buyer' }, true)).toBe(true);
    expect(mayReadPost(post('supporters'), { role: 'buyer' }, false)).toBe(false);
    expect(mayReadPost(post('supporters'), null, false)).toBe(false);
  });
  it('is nobody outside the workshop for a draft', () => {
    expect(mayReadPost(post('everybody', 'draft'), { role: 'buyer' }, true)).toBe(false);
    expect(mayReadPost(post('everybody', 'draft'), { role: 'bookkeeper' }, true)).toBe(false);
    expect(mayReadPost(post('everybody', 'draft'), { role: 'helper' }, false)).toBe(true);
  });
});
