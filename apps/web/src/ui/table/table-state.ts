export interface TableDefaults {
  size?: number;
  sort?: string;
  order?: 'asc' | 'desc';
}

export interface TableState {
  page: number;
  size: number;
  search: string;
  sort: string | undefined;
  order: 'asc' | 'desc';
}

const own = ['page', 'search', 'sort', 'order'] as const;

/** Reads a table's state from the address. What cannot be is taken as not said: people edit addresses. */
export function readTableState(params: URLSearchParams, defaults: TableDefaults = {}): TableState {
  const page = Number(params.get('page'));
  const order = params.get('order');
  return {
    page: Number.isInteger(page) && page >= 1 && page <= 10_000 ? page : 1,
    size: defaults.size ?? 25,
    search: (params.get('search') ?? '').slice(0, 100),
    sort: params.get('sort') ?? defaults.sort,
    order: order === 'asc' || order === 'desc' ? order : (defaults.order ?? 'desc'),
  };
}

/**
 * The address after a change. Whatever stands at its default is left out; a new search, filter or sorting
 * starts again at the first page.
 */
export function changedTableAddress(
  params: URLSearchParams,
  change: Partial<Record<string, string | number | undefined>>,
  defaults: TableDefaults = {},
): URLSearchParams {
  const next = new URLSearchParams(params);
  if (!('page' in change)) next.delete('page');
  for (const [name, value] of Object.entries(change)) {
    if (value === undefined || value === '') next.delete(name);
    else next.set(name, String(value));
  }
  if (next.get('page') === '1') next.delete('page');
  if (next.get('sort') === defaults.sort) next.delete('sort');
  if (next.get('order') === (defaults.order ?? 'desc')) next.delete('order');
  return next;
}

/** Pressing a column's head: falling first, then rising, and so on. */
export const nextSorting = (state: TableState, column: string): { sort: string; order: 'asc' | 'desc' } => ({
  sort: column,
  order: state.sort === column && state.order === 'desc' ? 'asc' : 'desc',
});

/** Names in the address that are the screen's own filters. */
export const filtersIn = (params: URLSearchParams): Record<string, string> =>
  Object.fromEntries(
    [...params].filter(([name, value]) => value && !(own as readonly string[]).includes(name)),
  );

export const pageCount = (total: number, size: number): number => Math.max(1, Math.ceil(total / size));
