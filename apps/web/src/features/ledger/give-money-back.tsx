import { Box } from '@chakra-ui/react/box';
import type { WorkshopOrder } from '@windchest/contracts';
import { useState } from 'react';
import { refundTexts as texts } from '../../config/texts/workshop-refunds.js';
import { useSession } from '../../lib/session.js';
import { Button } from '../../ui/button.js';
import { leftOf } from './refund-form.js';
import { RefundDialog } from './refund-dialog.js';

/** The button that opens the form, for those who may give money back, while there is some to give. */
export function GiveMoneyBack({ order }: { order: WorkshopOrder }) {
  const { may } = useSession();
  const [isOpen, setIsOpen] = useState(false);
  const isLeft = order.lines.some((line) => leftOf(order, line) > 0);
  const isInDispute = order.disputes.some((dispute) => dispute.state === 'open');
  const canAsk = may('orders:refund') && order.state === 'paid' && isLeft && !isInDispute;
  if (!canAsk && !isOpen) return null;
  return (
    <Box>
      <Button look="outline" onClick={() => setIsOpen(true)}>
        {texts.open}
      </Button>
      {isOpen && <RefundDialog order={order} onClose={() => setIsOpen(false)} />}
    </Box>
  );
}
