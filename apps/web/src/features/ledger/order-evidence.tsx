import { Box } from '@chakra-ui/react/box';
import type { WorkshopOrder } from '@windchest/contracts';
import type { ReactNode } from 'react';
import { workshopOrderTexts as texts } from '../../config/texts/workshop-orders.js';
import { dateTime, number } from '../../lib/format.js';
import { countryName } from '../../lib/workshop-format.js';

const businessFacts = ({ business, taxTreatment }: WorkshopOrder): [string, ReactNode][] =>
  business
    ? [
        [texts.business, [business.name, ...business.address.split('\n')].join(', ')],
        ...(business.vatNumber
          ? ([[texts.vatNumber, texts.formOnly(business.vatNumber)]] as [string, ReactNode][])
          : []),
        [texts.treatment, texts.treatments[taxTreatment]],
      ]
    : [];

/** Who bought, and what shows where they are and that they agreed. */
export const OrderEvidence = ({ order }: { order: WorkshopOrder }) => {
  const facts: [string, ReactNode][] = [
    [texts.email, order.email],
    ...businessFacts(order),
    [texts.country, countryName(order.country)],
    ...(order.gift
      ? ([[texts.gift, texts.giftTo(order.gift.email, order.gift.giver, order.gift.greeting)]] as [
          string,
          ReactNode,
        ][])
      : []),
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
