import { Box } from '@chakra-ui/react/box';
import type { OutputOf } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { couponUsesTexts as texts } from '../../config/texts/workshop-coupons.js';
import { apiAddress } from '../../lib/api-address.js';
import { date, price } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { Heading } from '../../ui/text.js';

type OrderRow = OutputOf<'GET /workshop/orders'>['items'][number];

const columns: Column<OrderRow>[] = [
  {
    key: 'number',
    header: texts.columns.number,
    isHeading: true,
    cell: (order) => (
      <TextLink to={paths.workshop.order.to({ orderId: order.id })} fontWeight="semibold" whiteSpace="nowrap">
        {order.number}
      </TextLink>
    ),
  },
  {
    key: 'placedAt',
    header: texts.columns.placed,
    isSortable: true,
    cell: (order) => (
      <Box as="span" whiteSpace="nowrap">
        {date(order.placedAt)}
      </Box>
    ),
  },
  { key: 'buyer', header: texts.columns.buyer, cell: (order) => order.email },
  { key: 'kits', header: texts.columns.kits, cell: (order) => order.kits.join(', ') },
  { key: 'place', header: texts.columns.place, cell: (order) => texts.places[order.state] },
  {
    key: 'discount',
    header: texts.columns.discount,
    isNumeric: true,
    cell: (order) => price(order.discount),
  },
  { key: 'total', header: texts.columns.total, isNumeric: true, cell: (order) => price(order.total) },
];

const defaults = { sort: 'placedAt', order: 'desc' } as const;

/** The orders that took a place of the coupon, whatever became of them. */
export function CouponOrders({ couponId }: { couponId: string }) {
  const table = useTableState(defaults);
  const { page, size, search, order } = table.state;
  const query = { couponId, search: search || undefined };
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/orders',
    { query: { ...query, page, size, order } },
    { keepPreviousData: true, refreshInterval: 15_000 },
  );
  return (
    <Box as="section">
      <Heading level={2} look="subsection" marginBottom="4">
        {texts.orders}
      </Heading>
      {fault && !data ? (
        <Fault fault={fault} onAgain={() => void mutate()} level={3} />
      ) : (
        <DataTable
          caption={texts.ordersCaption}
          columns={columns}
          answer={data}
          rowKey={(one) => one.id}
          table={table}
          searchLabel={texts.search}
          csvHref={apiAddress('GET /workshop/orders.csv', { query })}
          empty={
            <EmptyState title={texts.noOrders} level={3}>
              {texts.noOrdersDetail}
            </EmptyState>
          }
        />
      )}
    </Box>
  );
}
