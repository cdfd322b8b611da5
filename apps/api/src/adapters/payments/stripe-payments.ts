import Stripe from 'stripe';
import type { Config } from '../../config/config.js';
import { toDispute } from './dispute.mapping.js';
import { toSession } from './page.mapping.js';
import {
  Payments,
  PaymentsRefused,
  SignatureRefused,
  type PaymentDispute,
  type PaymentEvent,
  type PaymentRefund,
  type PaymentSession,
  type RefundRequest,
  type SessionRequest,
} from './payments.js';
import { toRefund } from './refund.mapping.js';
import { calling, openStripe } from './stripe-client.js';

/** As many as one call gives, and more than any payment has. */
const MOST = 100;

export class StripePayments extends Payments {
  private readonly stripe: Stripe;

  constructor(private readonly config: Config) {
    super();
    this.stripe = openStripe(config);
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

  async refund(request: RefundRequest): Promise<PaymentRefund> {
    return toRefund(
      await calling(
        this.stripe.refunds.create(
          {
            payment_intent: request.paymentIntentId,
            amount: request.amountMinor,
            metadata: { ...request.metadata },
          },
          { idempotencyKey: request.idempotencyKey },
        ),
      ),
    );
  }

  async findRefund(refundId: string): Promise<PaymentRefund> {
    return toRefund(await calling(this.stripe.refunds.retrieve(refundId)));
  }

  async refundsOf(paymentIntentId: string): Promise<readonly PaymentRefund[]> {
    const page = await calling(this.stripe.refunds.list({ payment_intent: paymentIntentId, limit: MOST }));
    return page.data.map(toRefund);
  }

  async findDispute(disputeId: string): Promise<PaymentDispute> {
    return toDispute(await calling(this.stripe.disputes.retrieve(disputeId)));
  }

  async disputesOf(paymentIntentId: string): Promise<readonly PaymentDispute[]> {
    const page = await calling(this.stripe.disputes.list({ payment_intent: paymentIntentId, limit: MOST }));
    return page.data.map(toDispute);
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
