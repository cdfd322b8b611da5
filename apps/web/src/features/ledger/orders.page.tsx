import { Box } from '@chakra-ui/react/box';
import type { BuyerOrder, InputOf, OutputOf } from '@windchest/contracts';
import { paths } from '../../config/paths.js';
import { orderStateTexts } from '../../config/texts/order.js';
import { ordersTexts as texts } from '../../config/texts/workshop-orders.js';
import { apiAddress } from '../../lib/api-address.js';
import { date, price } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { Checkbox } from '../../ui/field/checkbox.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { StatusMark } from '../../ui/status-mark.js';
import { DataTable } from '../../ui/table/data-table.js';
import type { Column } from '../../ui/table/hairline-table.js';
import { useTableState } from '../../ui/table/use-table-state.js';
import { Heading } from '../../ui/text.js';
import { OrderFlags } from './order-flags.js';
import { orderSigns } from './order-signs.js';

type OrderRow = OutputOf<'GET /workshop/orders'>['items'][number];
type OrderQuery = NonNullable<InputOf<'GET /workshop/orders'>['query']>;

const columns: Column<OrderRow>[] = [
  {
    key: 'number',
    header: texts.columns.number,
    isHeading: true,
    isSortable: true,
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
  {
    key: 'buyer',
    header: texts.columns.buyer,
    cell: (order) => (
      <Box lineHeight="1.4">
        <Box>{order.email}</Box>
        <Box color="ink.soft">{order.country}</Box>
      </Box>
    ),
  },
  {
    key: 'kits',
    header: texts.columns.kits,
    cell: (order) => (
      <Box lineHeight="1.4">
        <Box>{order.kits.join(', ')}</Box>
        {order.couponCode && <Box color="ink.soft">{order.couponCode}</Box>}
      </Box>
    ),
  },
  {
    key: 'state',
    header: texts.columns.state,
    cell: (order) => (
      <Box>
        <StatusMark state={orderSigns[order.state]} fontWeight="normal">
          {orderStateTexts[order.state]}
        </StatusMark>
        <OrderFlags flags={order.flags} />
      </Box>
    ),
  },
  {
    key: 'receipt',
    header: texts.columns.receipt,
    cell: (order) => (
      <Box as="span" whiteSpace={{ lg: 'nowrap' }}>
        {order.receiptNumber ?? texts.none}
      </Box>
    ),
  },
  {
    key: 'total',
    header: texts.columns.total,
    isNumeric: true,
    isSortable: true,
    cell: (order) => (
      <Box>
        <Box whiteSpace="nowrap">{price(order.total)}</Box>
        {order.refunded.minor > 0 && (
          <Box fontSize="sm" color="ink.soft">
            {texts.refunded(price(order.refunded))}
          </Box>
        )}
      </Box>
    ),
  },
];

const isOrderState = (text: string | undefined): text is BuyerOrder['state'] =>
  text !== undefined && text in orderStateTexts;

const isMoneyBack = (text: string | undefined): text is NonNullable<OrderQuery['moneyBack']> =>
  text !== undefined && text in texts.moneyBacks;

const defaults = { sort: 'placedAt', order: 'desc' } as const;
const isSorting = (text: string | undefined): text is NonNullable<OrderQuery['sort']> =>
  text === 'placedAt' || text === 'total' || text === 'number';

/** All orders, also those that were never paid. */
export function WorkshopOrdersPage() {
  const table = useTableState(defaults);
  const { page, size, search, sort, order } = table.state;
  const state = isOrderState(table.filters['state']) ? table.filters['state'] : undefined;
  const flagged = table.filters['flagged'] === '1' ? ('1' as const) : undefined;
  const moneyBack = isMoneyBack(table.filters['moneyBack']) ? table.filters['moneyBack'] : undefined;
  const narrowing = { state, moneyBack, flagged, search: search || undefined };
  const { data, fault, mutate } = useEndpoint(
    'GET /workshop/orders',
    { query: { ...narrowing, page, size, order, sort: isSorting(sort) ? sort : 'placedAt' } },
    { keepPreviousData: true },
  );
  return (
    <Band>
      <PageTitle title={texts.title} />
      <Heading level={1} marginBottom="6">
        {texts.title}
      </Heading>
      {fault && !data ? (
        <Fault fault={fault} onAgain={() => void mutate()} level={2} />
      ) : (
        <DataTable
          caption={texts.caption}
          columns={columns}
          answer={data}
          rowKey={(one) => one.id}
          table={table}
          searchLabel={texts.search}
          filters={
            <>
              <Box flex="0 1 13rem">
                <SelectField
                  label={texts.state}
                  emptyLabel={texts.allStates}
                  value={state ?? ''}
                  onChange={(event) => table.change({ state: event.target.value || undefined })}
                  options={Object.entries(orderStateTexts).map(([value, label]) => ({ value, label }))}
                />
              </Box>
              <Box flex="0 1 13rem">
                <SelectField
                  label={texts.moneyBack}
                  emptyLabel={texts.anyMoney}
                  value={moneyBack ?? ''}
                  onChange={(event) => table.change({ moneyBack: event.target.value || undefined })}
                  options={Object.entries(texts.moneyBacks).map(([value, label]) => ({ value, label }))}
                />
              </Box>
              <Box paddingBottom="2.5">
                <Checkbox
                  label={texts.flaggedOnly}
                  checked={flagged === '1'}
                  onChange={(event) => table.change({ flagged: event.target.checked ? '1' : undefined })}
                />
              </Box>
            </>
          }
          csvHref={apiAddress('GET /workshop/orders.csv', { query: narrowing })}
          empty={<EmptyState title={texts.empty}>{texts.emptyDetail}</EmptyState>}
        />
      )}
    </Band>
  );
}
