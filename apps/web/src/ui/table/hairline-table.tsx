import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import type { ReactNode } from 'react';
import { VisuallyHidden } from '../visually-hidden.js';

export interface Column<Row> {
  key: string;
  header: string;
  cell: (row: Row) => ReactNode;
  /** Numbers stand at the right, so that their digits stand under each other. */
  isNumeric?: boolean;
  isSortable?: boolean;
  /** On small screens this cell heads the stacked row, without its column's name. */
  isHeading?: boolean;
  width?: string;
}

export interface HairlineTableProps<Row> {
  /** Says what the table holds; heard, not seen. */
  caption: string;
  columns: readonly Column<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  /** What stands in a column's head, where that is more than its name. */
  headOf?: (column: Column<Row>) => { content: ReactNode; sorted?: 'ascending' | 'descending' };
}

const Table = chakra('table', { base: { width: 'full', borderCollapse: 'collapse', fontSize: '0.9375rem' } });

const Head = chakra('th', {
  base: {
    textStyle: 'label',
    fontSize: 'sm',
    textAlign: 'start',
    verticalAlign: 'bottom',
    paddingInline: '2.5',
    paddingBlock: '2.5',
    whiteSpace: 'nowrap',
  },
});

const Cell = chakra('td', {
  base: {
    verticalAlign: 'top',
    display: { base: 'flex', md: 'table-cell' },
    gap: '3',
    paddingInline: { base: '0', md: '2.5' },
    paddingBlock: { base: '0.5', md: '2.5' },
    overflowWrap: 'anywhere',
    // A long word would else hold its flex item wider than the window.
    '& > *': { minWidth: '0' },
    // Stacked, a cell brings its column's name along.
    '&[data-head]::before': {
      content: { base: 'attr(data-head)', md: 'none' },
      flex: '0 0 8.5rem',
      color: 'ink.soft',
      fontSize: 'sm',
      lineHeight: '1.6',
    },
    _empty: { display: { base: 'none', md: 'table-cell' } },
  },
});

/**
 * A plain table ruled by hairlines. Under 768 px each row stands as a small list. The roles are written out
 * because some browsers forget them where a table is laid out as blocks.
 */
export const HairlineTable = <Row,>({ caption, columns, rows, rowKey, headOf }: HairlineTableProps<Row>) => (
  <Table role="table" display={{ base: 'block', md: 'table' }}>
    <VisuallyHidden as="caption">{caption}</VisuallyHidden>
    <Box as="thead" role="rowgroup" display={{ base: 'none', md: 'table-header-group' }}>
      <Box as="tr" role="row" borderBottomWidth="1px" borderColor="ink">
        {columns.map((column) => {
          const head = headOf?.(column);
          return (
            <Head
              key={column.key}
              scope="col"
              role="columnheader"
              aria-sort={head?.sorted}
              textAlign={column.isNumeric ? 'end' : undefined}
              width={column.width}
            >
              {head?.content ?? column.header}
            </Head>
          );
        })}
      </Box>
    </Box>
    <Box as="tbody" role="rowgroup" display={{ base: 'block', md: 'table-row-group' }}>
      {rows.map((row) => (
        <Box
          as="tr"
          role="row"
          key={rowKey(row)}
          display={{ base: 'block', md: 'table-row' }}
          paddingBlock={{ base: '3', md: '0' }}
          borderBottomWidth="1px"
          borderColor="hairline"
        >
          {columns.map((column) => (
            <Cell
              key={column.key}
              role="cell"
              data-head={column.isHeading ? undefined : column.header}
              fontWeight={column.isHeading ? { base: 'semibold', md: 'inherit' } : undefined}
              textAlign={column.isNumeric ? { md: 'end' } : undefined}
            >
              {column.cell(row)}
            </Cell>
          ))}
        </Box>
      ))}
    </Box>
  </Table>
);
