import { Box } from '@chakra-ui/react/box';
import type { WorkshopOrder } from '@windchest/contracts';
import type { ReactNode } from 'react';
import { workshopOrderTexts as texts } from '../../config/texts/workshop-orders.js';
import { price } from '../../lib/format.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';

type Line = WorkshopOrder['lines'][number];

const columns: Column<Line>[] = [
  {
    key: 'kit',
    header: texts.lineColumns.kit,
    isHeading: true,
    cell: (line) => (
      <Box>
        {line.kitName}
        {line.right && line.right !== 'active' && (
          <Box fontSize="sm" color="ink.soft">
            {texts.rights[line.right]}
          </Box>
        )}
      </Box>
    ),
  },
  { key: 'licence', header: texts.lineColumns.licence, cell: (line) => line.licenceName },
  { key: 'revision', header: texts.lineColumns.revision, cell: (line) => line.revision },
  { key: 'price', header: texts.lineColumns.price, isNumeric: true, cell: (line) => price(line.price) },
  {
    key: 'discount',
    header: texts.lineColumns.discount,
    isNumeric: true,
    cell: (line) => (line.discount.minor ? price(line.discount) : texts.none),
  },
  { key: 'total', header: texts.lineColumns.total, isNumeric: true, cell: (line) => price(line.total) },
];

const Sum = ({ name, value, isTotal }: { name: string; value: ReactNode; isTotal?: boolean }) => (
  <Box
    display="flex"
    justifyContent="space-between"
    gap="6"
    paddingBlock="1"
    paddingInline={{ md: '2.5' }}
    fontWeight={isTotal ? 'bold' : undefined}
    borderTopWidth={isTotal ? '1px' : undefined}
    borderColor="ink"
  >
    <dt>{name}</dt>
    <dd>{value}</dd>
  </Box>
);

/** What was ordered, and what it comes to, with the tax within. */
export const OrderLines = ({ order }: { order: WorkshopOrder }) => (
  <>
    <HairlineTable
      caption={texts.linesCaption}
      columns={columns}
      rows={order.lines}
      rowKey={(line) => line.id}
    />
    <Box as="dl" marginLeft="auto" marginTop="3" maxWidth={{ md: '22rem' }}>
      {order.discount.minor > 0 && (
        <>
          <Sum name={texts.subtotal} value={price(order.subtotal)} />
          <Sum
            name={texts.discount(order.couponCode)}
            value={price({ ...order.discount, minor: -order.discount.minor })}
          />
        </>
      )}
      <Sum name={texts.total} value={price(order.total)} isTotal />
      {order.tax.map((one) => (
        <Sum key={one.ratePercent} name={texts.tax(one.ratePercent)} value={price(one.tax)} />
      ))}
      {order.refunded.minor > 0 && (
        <Sum name={texts.refunded} value={price({ ...order.refunded, minor: -order.refunded.minor })} />
      )}
    </Box>
  </>
);
