import { Box } from '@chakra-ui/react/box';
import type { BuyerOrder } from '@windchest/contracts';
import { useState } from 'react';
import { orderTexts } from '../../config/texts/order.js';
import { dateTime } from '../../lib/format.js';
import { useAction } from '../../lib/use-action.js';
import { AnchorButton, Button } from '../../ui/button.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Fault } from '../../ui/fault.js';
import { Notice } from '../../ui/notice.js';
import { Heading, Text } from '../../ui/text.js';
import type { FollowedOrder } from './use-order.js';

export interface OpenOrderProps {
  order: BuyerOrder;
  followed: FollowedOrder;
}

/** Pay, ask once more, or give the order up. */
export function OpenOrder({ order, followed }: OpenOrderProps) {
  const [isAsking, setIsAsking] = useState(false);
  const giving = useAction('POST /orders/:orderId/cancel', ['GET /account/orders']);
  const giveUp = async () => {
    const outcome = await giving.run(followed.input);
    if (outcome.isDone) followed.replace(outcome.data);
    return outcome.isDone;
  };
  return (
    <Box display="grid" gap="4">
      <Heading level={2} look="subsection">
        {orderTexts.next}
      </Heading>
      {order.paymentUrl && (
        <>
          <AnchorButton href={order.paymentUrl}>{orderTexts.toPayment}</AnchorButton>
          {order.payUntil && (
            <Text look="small" isSoft>
              {orderTexts.payUntil(dateTime(order.payUntil))}
            </Text>
          )}
        </>
      )}
      {followed.isTired && (
        <Button look="outline" onClick={followed.askAgain}>
          {orderTexts.askAgain}
        </Button>
      )}
      {followed.isUnheard && !followed.isTired && (
        <Notice tone="warn" isNews>
          {orderTexts.notHeard}
        </Notice>
      )}
      <Button look="stop" onClick={() => setIsAsking(true)}>
        {orderTexts.giveUp}
      </Button>
      <ConfirmDialog
        isOpen={isAsking}
        onClose={() => {
          giving.reset();
          setIsAsking(false);
        }}
        title={orderTexts.giveUpTitle(order.number)}
        confirmLabel={orderTexts.giveUpConfirm}
        cancelLabel={orderTexts.keep}
        onConfirm={giveUp}
      >
        <Text>
          {orderTexts.giveUpDetail} {order.couponCode && orderTexts.giveUpCoupon}
        </Text>
        {giving.fault && <Fault what={orderTexts.giveUpFailed} fault={giving.fault} />}
      </ConfirmDialog>
    </Box>
  );
}
