import { changedTableAddress, filtersIn, nextSorting, pageCount, readTableState } from './table-state.js';

const read = (address: string) => readTableState(new URLSearchParams(address), { sort: 'placedAt' });
const changed = (address: string, change: Record<string, string | number | undefined>) =>
  changedTableAddress(new URLSearchParams(address), change, { sort: 'placedAt' }).toString();

describe('a table’s state in the address', () => {
  it('is the default where the address says nothing', () => {
    expect(read('')).toEqual({ page: 1, size: 25, search: '', sort: 'placedAt', order: 'desc' });
  });

  it('is read back as it was written', () => {
    expect(read('page=3&search=wren&sort=total&order=asc')).toMatchObject({
      page: 3,
      search: 'wren',
      sort: 'total',
      order: 'asc',
    });
  });

  it.each(['page=0', 'page=-2', 'page=1.5', 'page=x', 'page=99999', 'order=sideways'])(
    'takes %s as not said',
    (address) => {
      expect(read(address)).toMatchObject({ page: 1, order: 'desc' });
    },
  );

  it('starts again at the first page after a search, a filter or another sorting', () => {
    expect(changed('page=4', { search: 'teal' })).toBe('search=teal');
    expect(changed('page=4&state=paid', { state: undefined })).toBe('');
    expect(changed('page=4', { page: 5 })).toBe('page=5');
  });

  it('says nothing that is the default', () => {
    expect(changed('sort=total&order=asc', { sort: 'placedAt', order: 'desc' })).toBe('');
    expect(changed('page=2', { page: 1 })).toBe('');
  });

  it('tells a screen’s own filters from the table’s names', () => {
    expect(filtersIn(new URLSearchParams('page=2&state=paid&sort=total&country='))).toEqual({
      state: 'paid',
    });
  });

  it('sorts falling first, then rising', () => {
    const state = read('');
    expect(nextSorting(state, 'total')).toEqual({ sort: 'total', order: 'desc' });
    expect(nextSorting({ ...state, sort: 'total' }, 'total')).toEqual({ sort: 'total', order: 'asc' });
  });

  it('has one page where there is nothing', () => {
    expect(pageCount(0, 25)).toBe(1);
    expect(pageCount(25, 25)).toBe(1);
    expect(pageCount(26, 25)).toBe(2);
  });
});
