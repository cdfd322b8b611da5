import { kitListAddress, kitListQuery } from './kit-list-query.js';

const asked = (address: string) => kitListQuery(new URLSearchParams(address));

describe('the list the front page’s address asks for', () => {
  it('is the first page of the newest kits where nothing is said', () => {
    expect(asked('')).toEqual({ sort: 'newest', page: 1, size: 20 });
  });

  it('is read back from the address it was written to', () => {
    const list = { sort: 'price', page: 3 } as const;
    expect(asked(kitListAddress(list))).toMatchObject(list);
    expect(kitListAddress({ sort: 'newest', page: 1 })).toBe('?');
  });

  it('bears an address nobody could have been given', () => {
    for (const address of ['?sort=loudest&page=0', '?page=-2', '?page=1.5', '?page=many', '?page=99999'])
      expect(asked(address)).toMatchObject({ sort: 'newest', page: 1 });
  });
});
