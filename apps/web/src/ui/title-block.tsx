import { Box } from '@chakra-ui/react/box';
import type { ReactNode } from 'react';

export interface TitleBlockField {
  name: string;
  value: ReactNode;
}

export interface TitleBlockProps {
  fields: readonly TitleBlockField[];
  columns?: 2 | 3;
  /** The lower left cell beside the action: the price, with what is said of it. */
  summary?: TitleBlockField;
  /** One `<Button look="cell">` or `<LinkButton look="cell">`; alone it fills the last row. */
  action?: ReactNode;
  /** Ruled all round where it stands free, only above and between where it closes a column. */
  isFramed?: boolean;
}

interface CellProps extends TitleBlockField {
  gridColumn?: string;
  isLarge?: boolean;
}

const Cell = ({ name, value, gridColumn, isLarge }: CellProps) => (
  <Box bg="sheet" paddingInline="3" paddingBlock="2" minWidth="0" gridColumn={gridColumn}>
    <Box as="dt" textStyle="label" fontWeight="normal">
      {name}
    </Box>
    <Box
      as="dd"
      fontWeight="semibold"
      fontSize={isLarge ? '3xl' : 'md'}
      lineHeight={isLarge ? '1.2' : 'snug'}
      overflowWrap="anywhere"
    >
      {value}
    </Box>
  </Box>
);

/**
 * The ruled block at the foot of a drawing (cf. ISO 7200): named fields and one action. The ground shows
 * through one-pixel gaps as the rules, so the cells may fall into any number of rows.
 */
export function TitleBlock({ fields, columns = 3, summary, action, isFramed }: TitleBlockProps) {
  const loose = fields.length % columns;
  const lastSpan = loose === 0 ? 1 : columns - loose + 1;
  const grid = { display: 'grid', gap: '1px', gridTemplateColumns: `repeat(${columns}, minmax(0, 1fr))` };
  const summarySpan = action ? `span ${columns - 1}` : '1 / -1';
  return (
    <Box
      display="grid"
      gap="1px"
      borderTopWidth="1px"
      borderWidth={isFramed ? '1px' : undefined}
      borderColor="ink"
      bg="ink"
    >
      <Box as="dl" {...grid}>
        {fields.map((field, at) => (
          <Cell
            key={field.name}
            {...field}
            gridColumn={at === fields.length - 1 && lastSpan > 1 ? `span ${lastSpan}` : undefined}
          />
        ))}
      </Box>
      {(summary || action) && (
        <Box {...grid}>
          {summary && (
            <Box as="dl" display="grid" gridColumn={summarySpan}>
              <Cell {...summary} isLarge />
            </Box>
          )}
          {action && (
            <Box bg="sheet" minHeight="3.25rem" display="grid" gridColumn={summary ? undefined : '1 / -1'}>
              {action}
            </Box>
          )}
        </Box>
      )}
    </Box>
  );
}
