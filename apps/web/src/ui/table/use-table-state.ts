import { useSearchParams } from 'react-router-dom';
import {
  changedTableAddress,
  filtersIn,
  readTableState,
  type TableDefaults,
  type TableState,
} from './table-state.js';

export interface TableControl {
  state: TableState;
  /** The screen's own filters, by their names in the address. */
  filters: Record<string, string>;
  /** `change({state: 'paid'})`, `change({page: 2})`; undefined takes a name out. */
  change: (change: Partial<Record<string, string | number | undefined>>) => void;
  /** The address a change leads to, for links. */
  addressOf: (change: Partial<Record<string, string | number | undefined>>) => string;
  isNarrowed: boolean;
  showAll: () => void;
}

/** A table's page, search, sorting and filters, kept in the address. Give `useTableState` constants as defaults. */
export function useTableState(defaults: TableDefaults = {}): TableControl {
  const [params, setParams] = useSearchParams();
  const state = readTableState(params, defaults);
  const filters = filtersIn(params);
  return {
    state,
    filters,
    change: (change) =>
      setParams((now) => changedTableAddress(now, change, defaults), { replace: !('page' in change) }),
    addressOf: (change) => `?${changedTableAddress(params, change, defaults)}`,
    isNarrowed: state.search !== '' || Object.keys(filters).length > 0,
    showAll: () => setParams({}),
  };
}
