import { z } from 'zod';
import type { OrderFlag } from './order-record.js';

/** What the shop reads from an event's object; everything else in it is the payment service's own business. */
const payloadShape = z.object({
  client_reference_id: z.string().nullish(),
  payment_intent: z.union([z.string(), z.object({ id: z.string() })]).nullish(),
  metadata: z.record(z.string(), z.string()).nullish(),
  amount: z.number().nullish(),
  amount_refunded: z.number().nullish(),
  currency: z.string().nullish(),
  reason: z.string().nullish(),
  status: z.string().nullish(),
});

export interface EventFacts {
  /** `page`: ask how the payment page stands. `money-back`: note it on the order. */
  readonly kind: 'page' | 'money-back' | 'other';
  readonly orderId: string | null;
  readonly sessionId: string | null;
  readonly paymentIntentId: string | null;
  readonly flag: OrderFlag | null;
  readonly text: string;
}

const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/;

/** Which order an event is about, and what is to be done; unknown kinds of events are left alone. */
export const factsOf = (type: string, subjectId: string | null, raw: unknown): EventFacts => {
  const parsed = payloadShape.safeParse(typeof raw === 'string' ? JSON.parse(raw) : raw);
  const payload = parsed.success ? parsed.data : {};
  const intent = payload.payment_intent;
  const named = payload.client_reference_id ?? payload.metadata?.['order'] ?? '';
  const isPage = type.startsWith('checkout.session.');
  const isIntent = type === 'payment_intent.succeeded';
  const flag = flagOf(type);
  return {
    kind: isPage || isIntent ? 'page' : flag ? 'money-back' : 'other',
    orderId: UUID.test(named) ? named : null,
    sessionId: isPage ? subjectId : null,
    paymentIntentId: isIntent ? subjectId : typeof intent === 'string' ? intent : (intent?.id ?? null),
    flag,
    text: textOf(payload, type),
  };
};

const flagOf = (type: string): OrderFlag | null => {
  if (type === 'charge.refunded') return 'refunded-outside';
  return type.startsWith('charge.dispute.') ? 'disputed' : null;
};

const textOf = (payload: z.output<typeof payloadShape> | Record<string, never>, type: string): string => {
  const minor = type === 'charge.refunded' ? payload.amount_refunded : payload.amount;
  const parts = [
    minor === null || minor === undefined
      ? null
      : `${minor} minor units of ${(payload.currency ?? '').toUpperCase()}`,
    payload.reason ? `reason ${payload.reason}` : null,
    payload.status ? `now ${payload.status}` : null,
  ];
  return parts.filter((one) => one !== null).join(', ');
};
