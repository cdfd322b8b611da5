import { Box } from '@chakra-ui/react/box';
import type { WorkshopOrder } from '@windchest/contracts';
import { refundTexts as texts } from '../../config/texts/workshop-refunds.js';
import { price } from '../../lib/format.js';
import type { RefundPlan } from './refund-form.js';

const lists = new Intl.ListFormat('en-GB', { type: 'conjunction' });

/** In sentences what the refund leads to, as the form stands. */
export function WhatWillHappen({ plan, order }: { plan: RefundPlan; order: WorkshopOrder }) {
  const sentences =
    plan.totalMinor === 0
      ? [texts.willNothing]
      : [
          texts.willSend(price({ ...order.total, minor: plan.totalMinor })),
          texts.willCredit,
          ...(plan.ending.length > 0 ? [texts.willEnd(lists.format(plan.ending))] : []),
          ...(plan.staying.length > 0
            ? [(plan.staying.length === 1 ? texts.willKeep : texts.willKeepMany)(lists.format(plan.staying))]
            : []),
          ...(order.couponCode ? [texts.willCoupon(order.couponCode)] : []),
        ];
  return (
    <Box as="ul" paddingLeft="5" listStyleType="disc" display="grid" gap="1" color="ink.soft">
      {sentences.map((sentence) => (
        <li key={sentence}>{sentence}</li>
      ))}
    </Box>
  );
}
