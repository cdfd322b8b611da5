import { Box } from '@chakra-ui/react/box';
import type { BuyerOrder } from '@windchest/contracts';
import { useSearchParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { accountTexts } from '../../config/texts/account.js';
import { orderStateTexts } from '../../config/texts/order.js';
import { priceTexts } from '../../config/texts/shared.js';
import { date, price } from '../../lib/format.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { LinkButton } from '../../ui/button.js';
import { EmptyState } from '../../ui/empty-state.js';
import { Fault } from '../../ui/fault.js';
import { TextAnchor, TextLink } from '../../ui/link.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import type { SignName } from '../../ui/sign.js';
import { StatusMark } from '../../ui/status-mark.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Pager } from '../../ui/table/pager.js';
import { Unbroken } from '../../ui/unbroken.js';
import { papersOf } from '../orders/order-papers.js';
import { AccountSection } from './account-section.js';

const signs: Record<BuyerOrder['state'], SignName> = {
  open: 'wait',
  paid: 'ok',
  cancelled: 'none',
  expired: 'none',
  refunded: 'none',
};

const columns: readonly Column<BuyerOrder>[] = [
  {
    key: 'number',
    header: accountTexts.order,
    isHeading: true,
    cell: (order) => (
      <TextLink to={paths.order.to({ orderId: order.id })} whiteSpace="nowrap">
        {order.number}
      </TextLink>
    ),
  },
  {
    key: 'placed',
    header: accountTexts.placed,
    cell: (order) => <Unbroken>{date(order.placedAt)}</Unbroken>,
  },
  {
    key: 'kits',
    header: accountTexts.kits,
    cell: (order) => order.lines.map((line) => line.kitName).join(', '),
  },
  {
    key: 'state',
    header: accountTexts.state,
    cell: (order) => (
      <Box>
        <StatusMark state={signs[order.state]} whiteSpace={{ md: 'nowrap' }}>
          {orderStateTexts[order.state]}
        </StatusMark>
        {order.refunded.minor > 0 && order.state === 'paid' && (
          <Box fontSize="sm" color="ink.soft">
            {accountTexts.wentBack(price(order.refunded))}
          </Box>
        )}
      </Box>
    ),
  },
  {
    key: 'papers',
    header: accountTexts.papers,
    cell: (order) => {
      const papers = papersOf({ order, orderKey: undefined });
      return (
        papers.length > 0 && (
          <Box display="grid" justifyItems="start">
            {papers.map((paper) => (
              <TextAnchor key={paper.key} href={paper.href}>
                {paper.label}
              </TextAnchor>
            ))}
          </Box>
        )
      );
    },
  },
  {
    key: 'total',
    header: accountTexts.total,
    isNumeric: true,
    cell: (order) => <Unbroken>{order.total.minor === 0 ? priceTexts.free : price(order.total)}</Unbroken>,
  },
];

/** One's own orders, newest first. */
export function OrdersSection() {
  const [search] = useSearchParams();
  const page = Math.max(1, Number(search.get('page')) || 1);
  const { data, fault, mutate } = useEndpoint(
    'GET /account/orders',
    { query: { page } },
    { keepPreviousData: true },
  );
  return (
    <AccountSection title={accountTexts.orders}>
      {fault && !data ? (
        <Fault what={accountTexts.ordersFailed} fault={fault} onAgain={() => void mutate()} />
      ) : !data ? (
        <SkeletonLines lines={3} />
      ) : data.items.length === 0 ? (
        <EmptyState
          level={3}
          title={accountTexts.noOrders}
          action={
            <LinkButton look="outline" to={paths.home.to()}>
              {accountTexts.seeKits}
            </LinkButton>
          }
        >
          {accountTexts.noOrdersDetail}
        </EmptyState>
      ) : (
        <>
          <HairlineTable
            caption={accountTexts.orders}
            columns={columns}
            rows={data.items}
            rowKey={(order) => order.id}
          />
          <Pager
            page={data.page}
            size={data.size}
            total={data.total}
            addressOf={(change) => paths.account.to({}, change)}
          />
        </>
      )}
    </AccountSection>
  );
}
