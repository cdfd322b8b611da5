export const kitSorts = ['newest', 'name', 'price', 'size'] as const;
export type KitSort = (typeof kitSorts)[number];

/** Only kits that print on a bed, `220x220x250`; or on one's own printer, which is still to be found out. */
export type Fits = 'mine' | (string & {});

export interface KitListQuery {
  sort: KitSort;
  page: number;
  size: number;
  fitsX?: number;
  fitsY?: number;
  fitsZ?: number;
}

/** As many kits as are drawn to one scale on one page. */
const kitsPerPage = 20;

/** What the front page opens with; its first kit is the newest of all. */
export const newestKits: KitListQuery = { sort: 'newest', page: 1, size: kitsPerPage };

const mostMm = [2000, 2000, 3000];
const bedOf = (fits: string | null): number[] | undefined => {
  const sides = (fits ?? '').split('x').map(Number);
  return sides.length === 3 && sides.every((side, at) => side > 0 && side <= mostMm[at]!) ? sides : undefined;
};

export const fitsOf = (address: URLSearchParams): Fits | undefined => {
  const fits = address.get('fits');
  return fits && (fits === 'mine' || bedOf(fits)) ? fits : undefined;
};

/** The list the address asks for; what cannot be is taken as not said, since people edit addresses. */
export function kitListQuery(address: URLSearchParams): KitListQuery {
  const page = Number(address.get('page'));
  const bed = bedOf(address.get('fits'));
  return {
    sort: kitSorts.find((known) => known === address.get('sort')) ?? newestKits.sort,
    page: Number.isInteger(page) && page >= 1 && page <= 10_000 ? page : 1,
    size: kitsPerPage,
    ...(bed && { fitsX: bed[0], fitsY: bed[1], fitsZ: bed[2] }),
  };
}

/** The address of a list; what stands as usual is left out. */
export const kitListAddress = ({
  sort,
  page,
  fits,
}: Pick<KitListQuery, 'sort' | 'page'> & { fits: Fits | undefined }): string => {
  const address = new URLSearchParams();
  if (sort !== newestKits.sort) address.set('sort', sort);
  if (page > 1) address.set('page', String(page));
  if (fits) address.set('fits', fits);
  return `?${address}`;
};
