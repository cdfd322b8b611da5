import Stripe from 'stripe';
import type { Config } from '../../config/config.js';
import {
  Payments,
  PaymentsRefused,
  PaymentsUnreachable,
  SignatureRefused,
  type PaymentEvent,
  type PaymentSession,
  type SessionRequest,
} from './payments.js';

/** Over the official SDK; host, port and key are settings. */
export class StripePayments extends Payments {
  private readonly stripe: Stripe;

  constructor(private readonly config: Config) {
    super();
    this.stripe = new Stripe(config.STRIPE_KEY, {
      protocol: config.STRIPE_PROTOCOL,
      ...(config.STRIPE_HOST ? { host: config.STRIPE_HOST } : {}),
      ...(config.STRIPE_PORT ? { port: config.STRIPE_PORT } : {}),
      telemetry: false,
      timeout: 15_000,
      maxNetworkRetries: 2,
    });
  }

  async openSession(request: SessionRequest): Promise<PaymentSession> {
    const expiresAt = Math.ceil(request.expiresAt.getTime() / 1000);
    return toSession(
      await calling(
        this.stripe.checkout.sessions.create(
          {
            mode: 'payment',
            client_reference_id: request.orderId,
            customer_email: request.email,
            billing_address_collection: 'required',
            line_items: request.lines.map((line) => ({
              quantity: 1,
              price_data: {
                currency: request.currency.toLowerCase(),
                unit_amount: line.amountMinor,
                product_data: { name: line.name, description: line.description },
              },
            })),
            metadata: { order: request.orderId, number: request.orderNumber },
            payment_intent_data: { metadata: { order: request.orderId, number: request.orderNumber } },
            success_url: request.successUrl,
            cancel_url: request.cancelUrl,
            expires_at: expiresAt,
          },
          { idempotencyKey: `open-${request.orderId}-${expiresAt}` },
        ),
      ),
    );
  }

  async session(sessionId: string): Promise<PaymentSession> {
    return toSession(await calling(this.stripe.checkout.sessions.retrieve(sessionId)));
  }

  async expireSession(sessionId: string): Promise<PaymentSession> {
    try {
      return toSession(await calling(this.stripe.checkout.sessions.expire(sessionId)));
    } catch (fault) {
      // A page that is paid or expired already cannot be expired; how it stands is what counts.
      if (fault instanceof PaymentsRefused) return this.session(sessionId);
      throw fault;
    }
  }

  async cardCountry(paymentIntentId: string): Promise<string | null> {
    const intent = await calling(
      this.stripe.paymentIntents.retrieve(paymentIntentId, { expand: ['latest_charge'] }),
    );
    const charge = intent.latest_charge;
    return typeof charge === 'object' ? (charge?.payment_method_details?.card?.country ?? null) : null;
  }

  readEvent(body: Buffer, signature: string): PaymentEvent {
    try {
      const event = this.stripe.webhooks.constructEvent(body, signature, this.config.STRIPE_WEBHOOK_SECRET);
      const subject = event.data.object as { id?: string };
      return {
        id: event.id,
        type: event.type,
        occurredAt: new Date(event.created * 1000),
        subjectId: subject.id ?? null,
        payload: event.data.object,
      };
    } catch (fault) {
      throw new SignatureRefused((fault as Error).message);
    }
  }
}

const toSession = (session: Stripe.Checkout.Session): PaymentSession => ({
  id: session.id,
  url: session.url,
  state:
    session.status === 'complete' && session.payment_status !== 'unpaid'
      ? 'paid'
      : session.status === 'expired'
        ? 'expired'
        : 'open',
  orderId: session.client_reference_id,
  paymentIntentId:
    typeof session.payment_intent === 'string'
      ? session.payment_intent
      : (session.payment_intent?.id ?? null),
  amountMinor: session.amount_total ?? 0,
  currency: (session.currency ?? '').toUpperCase(),
  email: session.customer_details?.email ?? session.customer_email,
  billingCountry: session.customer_details?.address?.country ?? null,
  expiresAt: new Date(session.expires_at * 1000),
});

const calling = async <T>(request: Promise<T>): Promise<T> => {
  try {
    return await request;
  } catch (fault) {
    if (fault instanceof Stripe.errors.StripeInvalidRequestError) throw new PaymentsRefused(fault.message);
    if (fault instanceof Stripe.errors.StripeError) throw new PaymentsUnreachable(fault.message);
    throw fault;
  }
};
