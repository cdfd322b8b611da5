import { Box } from '@chakra-ui/react/box';
import type { WorkshopOrder } from '@windchest/contracts';
import { useState } from 'react';
import { workshopOrderTexts as texts } from '../../config/texts/workshop-orders.js';
import { useSession } from '../../lib/session.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Fault } from '../../ui/fault.js';
import { Text } from '../../ui/text.js';

/** Mails the buyer a fresh download link, after asking. */
export function ResendLink({ order }: { order: WorkshopOrder }) {
  const { may } = useSession();
  const [isAsking, setIsAsking] = useState(false);
  const [isSent, setIsSent] = useState(false);
  const { run, fault } = useAction('POST /workshop/orders/:orderId/link', ['GET /workshop/orders/:orderId']);
  if (!may('links:resend')) return null;
  if (order.paidAt && order.lines.every((line) => line.right === 'ended')) return null;
  if (!order.paidAt)
    return (
      <Text look="small" isSoft>
        {texts.onlyPaid}
      </Text>
    );
  return (
    <Box>
      <Button look="outline" onClick={() => setIsAsking(true)}>
        {texts.resend}
      </Button>
      <Box role="status" marginTop={isSent ? '2' : undefined} fontSize="sm" color="ink.soft">
        {isSent && texts.resendDone}
      </Box>
      <ConfirmDialog
        isOpen={isAsking}
        onClose={() => setIsAsking(false)}
        look="ink"
        title={texts.resendAsk(order.gift?.email ?? order.email)}
        confirmLabel={texts.resendConfirm}
        onConfirm={async () => {
          const { isDone } = await run({ params: { orderId: order.id } });
          setIsSent(isDone);
          return isDone;
        }}
      >
        <Text>{order.gift ? texts.resendGift : texts.resendWhat}</Text>
        {fault && <Fault what={texts.resendFailed} fault={fault} />}
      </ConfirmDialog>
    </Box>
  );
}
