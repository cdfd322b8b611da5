export const kitSorts = ['newest', 'name', 'price', 'size'] as const;
export type KitSort = (typeof kitSorts)[number];

export interface KitListQuery {
  sort: KitSort;
  page: number;
  size: number;
}

/** As many kits as are drawn to one scale on one page. */
const kitsPerPage = 20;

/** What the front page opens with; its first kit is the newest of all. */
export const newestKits: KitListQuery = { sort: 'newest', page: 1, size: kitsPerPage };

/** The list the address asks for; what cannot be is taken as not said, since people edit addresses. */
export function kitListQuery(address: URLSearchParams): KitListQuery {
  const page = Number(address.get('page'));
  return {
    sort: kitSorts.find((known) => known === address.get('sort')) ?? newestKits.sort,
    page: Number.isInteger(page) && page >= 1 && page <= 10_000 ? page : 1,
    size: kitsPerPage,
  };
}

/** The address of a list; what stands as usual is left out. */
export const kitListAddress = ({ sort, page }: Pick<KitListQuery, 'sort' | 'page'>): string => {
  const address = new URLSearchParams();
  if (sort !== newestKits.sort) address.set('sort', sort);
  if (page > 1) address.set('page', String(page));
  return `?${address}`;
};
