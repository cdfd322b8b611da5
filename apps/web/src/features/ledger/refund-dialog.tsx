import { Box } from '@chakra-ui/react/box';
import type { WorkshopOrder } from '@windchest/contracts';
import { useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { refundTexts as texts } from '../../config/texts/workshop-refunds.js';
import { price } from '../../lib/format.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Dialog } from '../../ui/dialog.js';
import { Fault } from '../../ui/fault.js';
import { TextField } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { Heading, Text } from '../../ui/text.js';
import { emptyRefund, planRefund, type RefundForm, wholeRefund } from './refund-form.js';
import { RefundLineFields } from './refund-line-fields.js';
import { RefundProgress } from './refund-progress.js';
import { WhatWillHappen } from './what-will-happen.js';

const formId = 'refund-form';

export interface RefundDialogProps {
  order: WorkshopOrder;
  onClose: () => void;
}

/** Says how much goes back for each kit and what follows; then stays with it until the payment service confirms. */
export function RefundDialog({ order, onClose }: RefundDialogProps) {
  const [attempt] = useState(() => crypto.randomUUID());
  const [refundId, setRefundId] = useState<string>();
  const asking = useAction('POST /workshop/orders/:orderId/refunds', [
    'GET /workshop/orders/:orderId',
    'GET /workshop/orders',
  ]);
  const { register, handleSubmit, setValue, control, formState, setError, clearErrors } = useForm<RefundForm>(
    {
      defaultValues: emptyRefund(order),
    },
  );
  const plan = planRefund(useWatch({ control }) as RefundForm, order);
  const amount = price({ ...order.total, minor: plan.totalMinor });

  const send = handleSubmit(async ({ reason }) => {
    if (plan.lines.length === 0) {
      setError('lines', { message: texts.nothingChosen });
      return;
    }
    const outcome = await asking.run({
      params: { orderId: order.id },
      body: { lines: plan.lines, reason, attempt },
    });
    if (outcome.isDone) setRefundId(outcome.data.id);
  });

  if (refundId)
    return (
      <Dialog
        isOpen
        onClose={onClose}
        title={texts.title(order.number)}
        actions={<Button onClick={onClose}>{texts.close}</Button>}
      >
        <RefundProgress refund={order.refunds.find((one) => one.id === refundId)} />
      </Dialog>
    );

  return (
    <Dialog
      isOpen
      onClose={onClose}
      title={texts.title(order.number)}
      actions={
        <>
          <Button look="outline" onClick={onClose}>
            {texts.cancel}
          </Button>
          <Button look="stop" type="submit" form={formId} isBusy={asking.isRunning} busyWords={texts.asking}>
            {plan.totalMinor > 0 ? texts.confirm(amount) : texts.confirmNothing}
          </Button>
        </>
      }
    >
      <Form id={formId} onSubmit={send}>
        {asking.fault && <Fault what={texts.failed} fault={asking.fault} />}
        <Text isSoft>{texts.lead}</Text>
        <Box>
          {order.lines.map((line, at) => (
            <RefundLineFields
              key={line.id}
              order={order}
              line={line}
              at={at}
              register={register}
              error={formState.errors.lines?.[at]?.amount}
              onTyped={() => clearErrors('lines')}
            />
          ))}
          {order.lines.length > 1 && (
            <Button
              look="plain"
              size="sm"
              onClick={() => {
                wholeRefund(order).forEach((whole, at) => setValue(`lines.${at}`, whole));
                clearErrors('lines');
              }}
            >
              {texts.all}
            </Button>
          )}
          {formState.errors.lines?.message && (
            <Box role="alert" marginTop="2" color="stop" fontSize="sm">
              {formState.errors.lines.message}
            </Box>
          )}
        </Box>
        <TextField
          label={texts.reason}
          hint={texts.reasonHint}
          maxLength={300}
          error={formState.errors.reason}
          {...register('reason', { validate: (text) => text.trim() !== '' || texts.reasonMissing })}
        />
        <Box>
          <Heading level={3} look="body" fontWeight="semibold" marginBottom="1">
            {texts.will}
          </Heading>
          <WhatWillHappen plan={plan} order={order} />
        </Box>
      </Form>
    </Dialog>
  );
}
