import { Box } from '@chakra-ui/react/box';
import type { WorkshopOrder, WorkshopRefund } from '@windchest/contracts';
import { useState } from 'react';
import { savingTexts } from '../../config/texts/workshop-forms.js';
import { refundTexts as texts } from '../../config/texts/workshop-refunds.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Dialog } from '../../ui/dialog.js';
import { Fault } from '../../ui/fault.js';
import { Checkbox } from '../../ui/field/checkbox.js';
import { Text } from '../../ui/text.js';

export interface DecideRightsProps {
  order: WorkshopOrder;
  refund: WorkshopRefund;
  onClose: () => void;
}

/** Which kits of a refund stay on the buyer's shelf; of one begun at the payment service nobody was asked before. */
export function DecideRights({ order, refund, onClose }: DecideRightsProps) {
  const deciding = useAction('PUT /workshop/orders/:orderId/refunds/:refundId/entitlements', [
    'GET /workshop/orders/:orderId',
    'GET /workshop/orders',
  ]);
  const [lines, setLines] = useState(
    refund.lines.map(({ orderLineId, keepsEntitlement }) => ({ orderLineId, keepsEntitlement })),
  );
  const save = async () => {
    const outcome = await deciding.run({
      params: { orderId: order.id, refundId: refund.id },
      body: { lines },
    });
    if (outcome.isDone) onClose();
  };
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title={texts.decideTitle}
      actions={
        <>
          <Button look="outline" onClick={onClose}>
            {savingTexts.cancel}
          </Button>
          <Button onClick={save} isBusy={deciding.isRunning} busyWords={savingTexts.saving}>
            {texts.decideSave}
          </Button>
        </>
      }
    >
      {deciding.fault && <Fault what={texts.decideFailed} fault={deciding.fault} />}
      <Text isSoft marginBottom="4">
        {texts.decideLead}
      </Text>
      <Box display="grid" gap="3">
        {lines.map((line, at) => (
          <Checkbox
            key={line.orderLineId}
            label={texts.keeps(order.lines.find((one) => one.id === line.orderLineId)?.kitName ?? '')}
            checked={line.keepsEntitlement}
            onChange={(event) => {
              const keepsEntitlement = event.target.checked;
              setLines(lines.map((one, index) => (index === at ? { ...one, keepsEntitlement } : one)));
            }}
          />
        ))}
      </Box>
    </Dialog>
  );
}
