import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import type { ReactNode } from 'react';
import { tableTexts } from '../../config/texts/furniture.js';
import { AnchorButton, Button } from '../button.js';
import { EmptyState } from '../empty-state.js';
import { SelectField } from '../field/select-field.js';
import { SkeletonLines } from '../skeleton-lines.js';
import { type Column, HairlineTable } from './hairline-table.js';
import { Pager } from './pager.js';
import { SearchBox } from './search-box.js';
import { nextSorting } from './table-state.js';
import type { TableControl } from './use-table-state.js';

const SortButton = chakra('button', {
  base: {
    display: 'inline-flex',
    alignItems: 'center',
    gap: '1',
    font: 'inherit',
    cursor: 'pointer',
    borderRadius: 'sm',
    _hover: { color: 'ink' },
    '&[data-sorted]': { color: 'ink', fontWeight: 'semibold' },
  },
});

const Arrow = ({ isRising }: { isRising: boolean }) => (
  <chakra.svg
    viewBox="0 0 8 10"
    width="0.5rem"
    height="0.625rem"
    fill="none"
    stroke="currentColor"
    strokeWidth="1.4"
    aria-hidden
  >
    <path d={isRising ? 'M4 9V1.5M1 4.5 4 1.5 7 4.5' : 'M4 1V8.5M1 5.5 4 8.5 7 5.5'} />
  </chakra.svg>
);

export interface DataTableProps<Row> {
  caption: string;
  columns: readonly Column<Row>[];
  /** One page of rows; undefined while the first is on its way. */
  answer: { items: readonly Row[]; page: number; size: number; total: number } | undefined;
  rowKey: (row: Row) => string;
  /** From `useTableState`. */
  table: TableControl;
  /** The label of the search field; without it there is none. */
  searchLabel?: string;
  /** Selects and boxes that call `table.change`. */
  filters?: ReactNode;
  /** The same rows as CSV: `apiAddress('GET /workshop/orders.csv', …)`. */
  csvHref?: string;
  /** What stands here while there is nothing at all: an EmptyState. */
  empty: ReactNode;
}

/** Rows from the server: searched, filtered, sorted and paged there, the state kept in the address. */
export function DataTable<Row>({
  caption,
  columns,
  answer,
  rowKey,
  table,
  searchLabel,
  filters,
  csvHref,
  empty,
}: DataTableProps<Row>) {
  const { state, change, isNarrowed } = table;
  const sortable = columns.filter((column) => column.isSortable);
  if (answer?.total === 0 && !isNarrowed) return <>{empty}</>;

  const headOf = (column: Column<Row>) => {
    if (!column.isSortable) return { content: column.header };
    const isSorted = state.sort === column.key;
    const isRising = state.order === 'asc';
    return {
      sorted: isSorted ? (isRising ? ('ascending' as const) : ('descending' as const)) : undefined,
      content: (
        <SortButton
          type="button"
          data-sorted={isSorted || undefined}
          onClick={() => change(nextSorting(state, column.key))}
        >
          {column.header}
          {isSorted && <Arrow isRising={isRising} />}
        </SortButton>
      ),
    };
  };

  return (
    <Box>
      <Box display="flex" flexWrap="wrap" alignItems="flex-end" gap="3" marginBottom="3">
        {searchLabel && (
          <SearchBox label={searchLabel} value={state.search} onSearch={(search) => change({ search })} />
        )}
        {filters}
        {sortable.length > 0 && (
          <Box display={{ md: 'none' }} flex="1 1 10rem">
            <SelectField
              label={tableTexts.sortBy}
              value={`${state.sort ?? ''} ${state.order}`}
              onChange={(event) => {
                const [sort, order] = event.target.value.split(' ');
                change({ sort, order });
              }}
              options={sortable.flatMap((column) => [
                { value: `${column.key} desc`, label: `${column.header}, ${tableTexts.descending}` },
                { value: `${column.key} asc`, label: `${column.header}, ${tableTexts.ascending}` },
              ])}
            />
          </Box>
        )}
        {csvHref && (
          <AnchorButton look="plain" href={csvHref} download marginLeft="auto">
            {tableTexts.csv}
          </AnchorButton>
        )}
      </Box>
      {!answer ? (
        <SkeletonLines lines={6} />
      ) : answer.items.length === 0 ? (
        <EmptyState
          title={tableTexts.noMatch}
          action={
            <Button look="outline" size="sm" onClick={table.showAll}>
              {tableTexts.showAll}
            </Button>
          }
        >
          {tableTexts.noMatchDetail}
        </EmptyState>
      ) : (
        <>
          <HairlineTable
            caption={caption}
            columns={columns}
            rows={answer.items}
            rowKey={rowKey}
            headOf={headOf}
          />
          <Pager page={answer.page} size={answer.size} total={answer.total} addressOf={table.addressOf} />
        </>
      )}
    </Box>
  );
}
