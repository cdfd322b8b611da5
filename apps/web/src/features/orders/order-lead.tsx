import { Box } from '@chakra-ui/react/box';
import type { BuyerOrder } from '@windchest/contracts';
import { orderTexts } from '../../config/texts/order.js';
import { Text } from '../../ui/text.js';

export interface OrderLeadProps {
  order: BuyerOrder;
  isTired: boolean;
}

function words(order: BuyerOrder, isTired: boolean): string {
  switch (order.state) {
    case 'paid':
      if (order.lines.some((line) => line.right === 'suspended')) return orderTexts.restingLead;
      return order.gift ? orderTexts.giftLead(order.gift.email) : orderTexts.paidLead(order.email);
    case 'refunded':
      return order.refunds.at(-1)?.cause === 'dispute' ? orderTexts.lostLead : orderTexts.refundedLead;
    case 'cancelled':
    case 'expired':
      return orderTexts.nothingCharged;
    case 'open':
      if (isTired) return orderTexts.openTired;
      return order.paymentUrl ? orderTexts.openLead : orderTexts.openClosed;
  }
}

/** How the order stands; announced when it changes. */
export const OrderLead = ({ order, isTired }: OrderLeadProps) => (
  <Box role="status" marginTop="2" marginBottom="7">
    <Text look="lead" overflowWrap="anywhere">
      {words(order, isTired)}
    </Text>
  </Box>
);
