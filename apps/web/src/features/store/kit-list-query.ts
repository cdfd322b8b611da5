import type { TableState } from '../../ui/table/table-state.js';

export const kitSorts = ['newest', 'name', 'price', 'size'] as const;
export type KitSort = (typeof kitSorts)[number];

/** As many kits as are drawn to one scale on one page. */
export const kitsPerPage = 20;

export interface KitListQuery {
  sort: KitSort;
  page: number;
  size: number;
}

/** The list the address asks for; a sorting nobody knows is the usual one, since people edit addresses. */
export const kitListQuery = ({ sort, page }: Pick<TableState, 'sort' | 'page'>): KitListQuery => ({
  sort: kitSorts.find((known) => known === sort) ?? 'newest',
  page,
  size: kitsPerPage,
});

/** What the front page opens with; its first kit is the newest of all. */
export const newestKits = kitListQuery({ sort: 'newest', page: 1 });
