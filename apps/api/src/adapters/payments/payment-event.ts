import { z } from 'zod';

const reference = z.union([z.string(), z.object({ id: z.string() })]).nullish();
const metadata = z.record(z.string(), z.string()).nullish();

/** The fields that say what an event is about, over all kinds of objects. */
const payloadShape = z.object({
  object: z.string().nullish(),
  id: z.string().nullish(),
  mode: z.string().nullish(),
  client_reference_id: z.string().nullish(),
  metadata,
  customer: reference,
  payment_intent: reference,
  charge: reference,
  subscription: reference,
  setup_intent: reference,
  parent: z
    .object({ subscription_details: z.object({ subscription: reference, metadata }).nullish() })
    .nullish(),
});

export type EventSubject =
  'page' | 'payment' | 'charge' | 'refund' | 'dispute' | 'subscription' | 'invoice' | 'customer' | 'other';

/** Which of the shop's and of the payment service's things an event names; the news itself is to be asked anew. */
export interface PaymentEventFacts {
  readonly subject: EventSubject;
  readonly subjectId: string | null;
  /** Of a page: what it was opened for. */
  readonly pageKind: 'order' | 'pledge' | 'card' | null;
  readonly orderId: string | null;
  readonly pledgeId: string | null;
  readonly customerId: string | null;
  readonly paymentIntentId: string | null;
  readonly chargeId: string | null;
  readonly subscriptionId: string | null;
}

const subjects: readonly (readonly [prefix: string, subject: EventSubject])[] = [
  ['checkout.session.', 'page'],
  ['payment_intent.', 'payment'],
  ['charge.dispute.', 'dispute'],
  // A name of an older day for `refund.updated`.
  ['charge.refund.', 'refund'],
  ['charge.', 'charge'],
  ['refund.', 'refund'],
  ['customer.subscription.', 'subscription'],
  ['customer.', 'customer'],
  ['invoice.', 'invoice'],
];

/** `raw` may be the payload or its JSON, as a database column gives it. */
export const readPaymentEvent = (type: string, subjectId: string | null, raw: unknown): PaymentEventFacts => {
  const parsed = payloadShape.safeParse(typeof raw === 'string' ? JSON.parse(raw) : raw);
  const payload = parsed.success ? parsed.data : {};
  const subject = subjects.find(([prefix]) => type.startsWith(prefix))?.[1] ?? 'other';
  const parent = payload.parent?.subscription_details;
  const named = { ...parent?.metadata, ...payload.metadata };
  const pageKind = subject === 'page' ? pageKindOf(payload.mode) : null;
  return {
    subject,
    subjectId,
    pageKind,
    orderId: (pageKind === 'order' ? payload.client_reference_id : null) ?? named['order'] ?? null,
    pledgeId: (isPledgePage(pageKind) ? payload.client_reference_id : null) ?? named['pledge'] ?? null,
    customerId: subject === 'customer' && type.startsWith('customer.') ? subjectId : idOf(payload.customer),
    paymentIntentId: subject === 'payment' ? subjectId : idOf(payload.payment_intent),
    chargeId: subject === 'charge' ? subjectId : idOf(payload.charge),
    subscriptionId:
      subject === 'subscription'
        ? subjectId
        : (idOf(payload.subscription) ?? idOf(parent?.subscription) ?? named['subscription'] ?? null),
  };
};

const pageKindOf = (mode: string | null | undefined): PaymentEventFacts['pageKind'] =>
  mode === 'subscription' ? 'pledge' : mode === 'setup' ? 'card' : 'order';

const isPledgePage = (kind: PaymentEventFacts['pageKind']): boolean => kind === 'pledge' || kind === 'card';

const idOf = (value: z.output<typeof reference>): string | null =>
  typeof value === 'string' ? value : (value?.id ?? null);
