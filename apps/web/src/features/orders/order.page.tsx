import { Box } from '@chakra-ui/react/box';
import type { BuyerOrder } from '@windchest/contracts';
import { useLocation, useParams } from 'react-router-dom';
import { paths, signInThenBack } from '../../config/paths.js';
import { orderStateTexts, orderTexts } from '../../config/texts/order.js';
import { priceTexts } from '../../config/texts/shared.js';
import { date, price } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { LinkButton } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band, SplitSheet } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';
import { TitleBlock, type TitleBlockField } from '../../ui/title-block.js';
import { useEmptiedBasket } from './bought-basket.js';
import { GiftOrder } from './gift-order.js';
import { OpenOrder } from './open-order.js';
import { OrderLead } from './order-lead.js';
import { OrderLines } from './order-lines.js';
import { OrderPapers } from './order-papers.js';
import { OrderRefunds } from './order-refunds.js';
import { PaidOrder } from './paid-order.js';
import { type FollowedOrder, useOrder } from './use-order.js';

function fieldsOf(order: BuyerOrder): TitleBlockField[] {
  return [
    { name: orderTexts.blockOrder, value: order.number },
    { name: orderTexts.blockState, value: orderStateTexts[order.state] },
    { name: orderTexts.blockPlaced, value: date(order.placedAt) },
    ...(order.paidAt ? [{ name: orderTexts.blockPaid, value: date(order.paidAt) }] : []),
    ...(order.receiptNumber ? [{ name: orderTexts.blockReceipt, value: order.receiptNumber }] : []),
  ];
}

function Next({ order, followed }: { order: BuyerOrder; followed: FollowedOrder }) {
  if (order.state === 'open') return <OpenOrder order={order} followed={followed} />;
  if (order.gift && order.lines.some((line) => line.right === 'active'))
    return <GiftOrder gift={order.gift} />;
  // After a refund, also of all that was paid, some files may have been left with the buyer.
  if (order.lines.some((line) => line.right === 'active')) return <PaidOrder order={order} />;
  const isUnpaid = order.state === 'cancelled' || order.state === 'expired';
  return (
    <Box display="grid" gap="4">
      <Heading level={2} look="subsection">
        {orderTexts.next}
      </Heading>
      {isUnpaid ? (
        <LinkButton to={paths.basket.to()}>{orderTexts.toBasket}</LinkButton>
      ) : (
        <LinkButton look="outline" to={paths.home.to()}>
          {orderTexts.seeKits}
        </LinkButton>
      )}
    </Box>
  );
}

const Order = ({ order, followed }: { order: BuyerOrder; followed: FollowedOrder }) => (
  <SplitSheet
    asideLabel={orderTexts.next}
    main={
      <>
        <Heading level={1}>{orderTexts.titles[order.state]}</Heading>
        <OrderLead order={order} isTired={followed.isTired} />
        <OrderLines order={order} />
        <OrderRefunds order={order} />
        <OrderPapers order={order} orderKey={followed.input.query.key} />
      </>
    }
    aside={<Next order={order} followed={followed} />}
    block={
      <TitleBlock
        columns={2}
        fields={fieldsOf(order)}
        summary={{
          name: orderTexts.blockTotal,
          value: order.total.minor === 0 ? priceTexts.free : price(order.total),
        }}
      />
    }
  />
);

/** An order, for its buyer or for who has its key. */
export function OrderPage() {
  const { orderId = '' } = useParams();
  const { pathname } = useLocation();
  const { isSignedIn } = useSession();
  const followed = useOrder(orderId);
  const { order, fault } = followed;
  useEmptiedBasket(order);
  if (order)
    return (
      <>
        <PageTitle title={orderTexts.documentTitle(order.number)} />
        <Order order={order} followed={followed} />
      </>
    );
  if (fault?.code === 'not-found')
    return (
      <Band>
        <PageTitle title={orderTexts.loadingTitle} />
        <Heading level={1}>{orderTexts.unknown}</Heading>
        <Text look="lead" marginTop="2" marginBottom="6">
          {orderTexts.unknownDetail}
        </Text>
        {isSignedIn ? (
          <LinkButton to={paths.account.to()}>{orderTexts.toAccount}</LinkButton>
        ) : (
          <LinkButton to={signInThenBack(pathname)}>{orderTexts.signIn}</LinkButton>
        )}
      </Band>
    );
  return (
    <Band>
      <PageTitle title={orderTexts.loadingTitle} />
      <Heading level={1} marginBottom="6">
        {fault ? orderTexts.failed : orderTexts.loadingTitle}
      </Heading>
      {fault ? <Fault level={2} fault={fault} onAgain={followed.reload} /> : <SkeletonLines lines={5} />}
    </Band>
  );
}
