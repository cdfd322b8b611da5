import { Box } from '@chakra-ui/react/box';
import { tableTexts } from '../../config/texts/furniture.js';
import { type Column, HairlineTable } from '../table/hairline-table.js';
import { VisuallyHidden } from '../visually-hidden.js';

export interface BarListProps<Row> {
  caption: string;
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  /** The first heads the row; bars stand after it, drawn to one scale. */
  columns: readonly [Column<Row>, ...Column<Row>[]];
  /** Zero or more. */
  worthOf: (row: Row) => number;
}

/** What is there is never drawn as if it were not. */
const leastPercent = 0.6;

/** A table of things by how much of them there is; the bars say to the eye what the figures say. */
export function BarList<Row>({ caption, rows, rowKey, columns, worthOf }: BarListProps<Row>) {
  const [first, ...rest] = columns;
  const most = Math.max(0, ...rows.map(worthOf));
  const bar: Column<Row> = {
    key: 'bar',
    header: '',
    width: '40%',
    cell: (row) => {
      const worth = worthOf(row);
      return (
        <Box
          aria-hidden
          flex="1"
          height="0.75rem"
          marginTop={{ md: '0.375rem' }}
          borderLeftWidth="1px"
          borderColor="ink.soft"
        >
          <Box
            height="full"
            bg="ink"
            width={worth > 0 ? `${Math.max(leastPercent, (worth / most) * 100)}%` : '0'}
          />
        </Box>
      );
    },
  };
  return (
    <HairlineTable
      caption={caption}
      columns={[first, bar, ...rest]}
      rows={rows}
      rowKey={rowKey}
      headOf={(column) => ({
        content: column === bar ? <VisuallyHidden>{tableTexts.drawn}</VisuallyHidden> : column.header,
      })}
    />
  );
}
