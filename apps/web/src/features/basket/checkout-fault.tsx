import { basketTexts } from '../../config/texts/basket.js';
import type { ApiFault } from '../../lib/api-fault.js';
import { Fault } from '../../ui/fault.js';

export interface CheckoutFaultProps {
  fault: ApiFault;
  onAgain: () => void;
}

/** Why the order did not go through, and what to do. */
export function CheckoutFault({ fault, onAgain }: CheckoutFaultProps) {
  const { code, title, detail, requestId } = fault;
  if (code === 'unreachable')
    return (
      <Fault
        fault={{ title: basketTexts.unreachable, detail: basketTexts.unreachableDetail }}
        onAgain={onAgain}
      />
    );
  if (code === 'payment-unreachable' || code === 'busy-try-again' || code === 'internal')
    return <Fault what={basketTexts.notOpened} fault={fault} onAgain={onAgain} />;
  const after = code.startsWith('coupon-')
    ? basketTexts.couponGone
    : code === 'basket-has-gone'
      ? basketTexts.basketGone
      : '';
  return (
    <Fault
      what={basketTexts.notPlaced}
      fault={{ title, detail: [detail, after].filter(Boolean).join(' '), requestId }}
    />
  );
}
