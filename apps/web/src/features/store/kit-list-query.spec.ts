import { fitsOf, kitListAddress, kitListQuery } from './kit-list-query.js';

const asked = (address: string) => kitListQuery(new URLSearchParams(address));

describe('the list the front page’s address asks for', () => {
  it('is the first page of the newest kits where nothing is said', () => {
    expect(asked('')).toEqual({ sort: 'newest', page: 1, size: 20 });
  });

  it('is read back from the address it was written to', () => {
    const list = { sort: 'price', page: 3 } as const;
    const fits = '220x220.5x250';
    expect(asked(kitListAddress({ ...list, fits: undefined }))).toEqual({ ...list, size: 20 });
    expect(asked(kitListAddress({ ...list, fits }))).toMatchObject({
      ...list,
      fitsX: 220,
      fitsY: 220.5,
      fitsZ: 250,
    });
    expect(kitListAddress({ sort: 'newest', page: 1, fits: undefined })).toBe('?');
  });

  it('asks for all kits until it is known which printer is meant', () => {
    const address = new URLSearchParams('?fits=mine');
    expect(fitsOf(address)).toBe('mine');
    expect(kitListQuery(address)).toEqual({ sort: 'newest', page: 1, size: 20 });
  });

  it('bears an address nobody could have been given', () => {
    for (const address of ['?sort=loudest&page=0', '?page=-2', '?page=1.5', '?page=many', '?page=99999'])
      expect(asked(address)).toMatchObject({ sort: 'newest', page: 1 });
  });

  it.each(['0x5x5', '5x5', '5x5x5x5', '-1x5x5', '2001x5x5', 'axbxc', 'xx', 'all'])(
    'takes a bed of %s as not said',
    (fits) => {
      const address = new URLSearchParams({ fits });
      expect(fitsOf(address)).toBeUndefined();
      expect(kitListQuery(address)).toEqual({ sort: 'newest', page: 1, size: 20 });
    },
  );
});
