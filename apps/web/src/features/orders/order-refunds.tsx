import { Box } from '@chakra-ui/react/box';
import type { BuyerOrder } from '@windchest/contracts';
import { orderTexts } from '../../config/texts/order.js';
import { date, price } from '../../lib/format.js';
import { Heading } from '../../ui/text.js';

/** What of an order's money went back, for which kits and when. */
export function OrderRefunds({ order }: { order: BuyerOrder }) {
  if (order.refunds.length === 0) return null;
  const kitOf = (lineId: string) => order.lines.find((line) => line.id === lineId)?.kitName ?? '';
  return (
    <Box as="section" marginTop="8">
      <Heading level={2} look="subsection" marginBottom="2">
        {orderTexts.refunds}
      </Heading>
      <Box as="ul" listStyle="none">
        {order.refunds.map((refund) => (
          <Box
            as="li"
            key={refund.id}
            display="flex"
            flexWrap="wrap"
            justifyContent="space-between"
            columnGap="4"
            paddingBlock="2"
            borderBottomWidth="1px"
            borderColor="hairline"
          >
            <Box minWidth="0">
              {refund.lines
                .filter((line) => line.amount.minor > 0)
                .map((line) => kitOf(line.orderLineId))
                .join(', ')}{' '}
              <Box as="span" color="ink.soft">
                {(refund.cause === 'dispute' ? orderTexts.byDispute : orderTexts.wentBack)(date(refund.at))}
              </Box>
            </Box>
            <Box fontWeight="semibold" whiteSpace="nowrap">
              {price(refund.amount)}
            </Box>
          </Box>
        ))}
      </Box>
    </Box>
  );
}
