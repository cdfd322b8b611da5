import { Box } from '@chakra-ui/react/box';
import type { WorkshopOrder } from '@windchest/contracts';
import type { ReactNode } from 'react';
import { workshopOrderTexts as texts } from '../../config/texts/workshop-orders.js';
import { dateTime, number } from '../../lib/format.js';

/** Who bought, and what shows where they are and that they agreed. */
export const OrderEvidence = ({ order }: { order: WorkshopOrder }) => {
  const facts: [string, ReactNode][] = [
    [texts.email, order.email],
    [texts.country, order.country],
    [texts.paymentSession, order.paymentSessionId ?? texts.none],
    [texts.paymentIntent, order.paymentIntentId ?? texts.none],
    [texts.consent, `${dateTime(order.consentAt)}: “${order.consentText}”`],
    [texts.downloads, number(order.downloads)],
  ];
  return (
    <Box as="dl">
      {facts.map(([name, value]) => (
        <Box
          key={name}
          display="grid"
          gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: '9rem minmax(0, 1fr)' }}
          columnGap="4"
          paddingBlock="2"
          borderBottomWidth="1px"
          borderColor="hairline"
        >
          <Box as="dt" color="ink.soft">
            {name}
          </Box>
          <Box as="dd" overflowWrap="anywhere">
            {value}
          </Box>
        </Box>
      ))}
    </Box>
  );
};
