import { createHash } from 'node:crypto';
import type Stripe from 'stripe';
import type { Config } from '../../config/config.js';
import { toPledgePage } from './page.mapping.js';
import { PaymentsRefused } from './payment-faults.js';
import { calling, idOf, objectOf, openStripe, secondsOf } from './stripe-client.js';
import { subscriptionExpand, toSubscription } from './subscription.mapping.js';
import {
  Subscriptions,
  type CardPageRequest,
  type PaymentCustomer,
  type PaymentSubscription,
  type PledgePage,
  type PledgePageRequest,
} from './subscriptions.js';

const PAGE = 100;

export class StripeSubscriptions extends Subscriptions {
  private readonly stripe: Stripe;

  constructor(config: Config) {
    super();
    this.stripe = openStripe(config);
  }

  async ensureCustomer(email: string, name: string | null, personId: string): Promise<string> {
    const known = await calling(this.stripe.customers.list({ email, limit: PAGE }));
    const own = known.data.find(({ metadata }) => metadata['person'] === personId);
    if (own) return own.id;
    // The key stands for these very values: the service refuses it for others.
    const key = `customer-${personId}-${shortHash(`${email}\n${name ?? ''}`)}`;
    const customer = await calling(
      this.stripe.customers.create(
        { email, ...(name ? { name } : {}), metadata: { person: personId } },
        { idempotencyKey: key },
      ),
    );
    return customer.id;
  }

  async updateCustomer(customerId: string, { email, name }: PaymentCustomer): Promise<void> {
    await calling(this.stripe.customers.update(customerId, { email, name: name ?? '' }));
  }

  async openPledgePage(request: PledgePageRequest): Promise<PledgePage> {
    const metadata = { ...request.metadata, pledge: request.pledgeId };
    const session = await calling(
      this.stripe.checkout.sessions.create(
        {
          mode: 'subscription',
          client_reference_id: request.pledgeId,
          customer: request.customerId,
          billing_address_collection: 'required',
          line_items: [
            {
              quantity: 1,
              price_data: {
                currency: request.currency.toLowerCase(),
                unit_amount: request.amountMinor,
                recurring: { interval: 'month' },
                product: await this.productOf(request.planName),
              },
            },
          ],
          metadata,
          subscription_data: { description: request.planName, metadata },
          success_url: request.successUrl,
          cancel_url: request.cancelUrl,
          expires_at: secondsOf(request.expiresAt),
        },
        { idempotencyKey: request.idempotencyKey },
      ),
    );
    return toPledgePage(session);
  }

  async openCardPage(request: CardPageRequest): Promise<PledgePage> {
    const metadata = { pledge: request.pledgeId, subscription: request.subscriptionId };
    const session = await calling(
      this.stripe.checkout.sessions.create(
        {
          mode: 'setup',
          currency: request.currency.toLowerCase(),
          client_reference_id: request.pledgeId,
          customer: request.customerId,
          billing_address_collection: 'required',
          metadata,
          setup_intent_data: { metadata },
          success_url: request.successUrl,
          cancel_url: request.cancelUrl,
        },
        { idempotencyKey: request.idempotencyKey },
      ),
    );
    return toPledgePage(session);
  }

  async findPage(pageId: string): Promise<PledgePage> {
    return toPledgePage(await calling(this.stripe.checkout.sessions.retrieve(pageId)));
  }

  async expirePage(pageId: string): Promise<PledgePage> {
    try {
      return toPledgePage(await calling(this.stripe.checkout.sessions.expire(pageId)));
    } catch (fault) {
      if (fault instanceof PaymentsRefused) return this.findPage(pageId);
      throw fault;
    }
  }

  async adoptCard(cardPageId: string): Promise<PaymentSubscription> {
    const session = await calling(
      this.stripe.checkout.sessions.retrieve(cardPageId, { expand: ['setup_intent'] }),
    );
    const { customerId, subscriptionId, state } = toPledgePage(session);
    const card = idOf(objectOf<Stripe.SetupIntent>(session.setup_intent)?.payment_method);
    if (state !== 'complete' || !card || !customerId || !subscriptionId)
      throw new PaymentsRefused('No card was given on this page.');
    await calling(
      this.stripe.customers.update(customerId, { invoice_settings: { default_payment_method: card } }),
    );
    return this.update(subscriptionId, { default_payment_method: card });
  }

  async findSubscription(subscriptionId: string): Promise<PaymentSubscription> {
    return toSubscription(await this.read(subscriptionId));
  }

  async listSubscriptions(customerId: string): Promise<readonly PaymentSubscription[]> {
    const list = this.stripe.subscriptions.list({
      customer: customerId,
      status: 'all',
      limit: PAGE,
      expand: subscriptionExpand.map((path) => `data.${path}`),
    });
    return (await calling(list.autoPagingToArray({ limit: 1000 }))).map(toSubscription);
  }

  async changeSubscriptionAmount(
    subscriptionId: string,
    amountMinor: number,
    idempotencyKey: string,
  ): Promise<PaymentSubscription> {
    const [item] = (await this.read(subscriptionId)).items.data;
    const product = idOf(item?.price.product);
    if (!item || !product) throw new PaymentsRefused('This subscription has nothing to change.');
    return this.update(
      subscriptionId,
      {
        items: [
          {
            id: item.id,
            price_data: {
              currency: item.price.currency,
              unit_amount: amountMinor,
              recurring: { interval: 'month' },
              product,
            },
          },
        ],
        proration_behavior: 'none',
      },
      idempotencyKey,
    );
  }

  pause(subscriptionId: string): Promise<PaymentSubscription> {
    return this.update(subscriptionId, { pause_collection: { behavior: 'void' } });
  }

  resume(subscriptionId: string): Promise<PaymentSubscription> {
    return this.update(subscriptionId, { pause_collection: '' });
  }

  cancelAtPeriodEnd(subscriptionId: string): Promise<PaymentSubscription> {
    return this.update(subscriptionId, { cancel_at_period_end: true });
  }

  undoCancel(subscriptionId: string): Promise<PaymentSubscription> {
    return this.update(subscriptionId, { cancel_at_period_end: false });
  }

  async cancelNow(subscriptionId: string): Promise<PaymentSubscription> {
    try {
      return toSubscription(
        await calling(this.stripe.subscriptions.cancel(subscriptionId, { expand: subscriptionExpand })),
      );
    } catch (fault) {
      // The service does not know an ended subscription at this address; how it stands is what counts.
      if (!(fault instanceof PaymentsRefused)) throw fault;
      const subscription = await this.findSubscription(subscriptionId);
      if (!subscription.endedAt) throw fault;
      return subscription;
    }
  }

  private read(subscriptionId: string): Promise<Stripe.Subscription> {
    return calling(this.stripe.subscriptions.retrieve(subscriptionId, { expand: subscriptionExpand }));
  }

  private async update(
    subscriptionId: string,
    change: Stripe.SubscriptionUpdateParams,
    idempotencyKey?: string,
  ): Promise<PaymentSubscription> {
    return toSubscription(
      await calling(
        this.stripe.subscriptions.update(
          subscriptionId,
          { ...change, expand: subscriptionExpand },
          idempotencyKey ? { idempotencyKey } : {},
        ),
      ),
    );
  }

  /** Every plan is one product, so that an amount can be changed later: a product made by the way is archived. */
  private async productOf(planName: string): Promise<string> {
    const id = `pledge_${shortHash(planName)}`;
    try {
      await calling(this.stripe.products.create({ id, name: planName }));
    } catch (fault) {
      // There already; where the service has another reason, opening the page says so.
      if (!(fault instanceof PaymentsRefused)) throw fault;
    }
    return id;
  }
}

const shortHash = (text: string): string => createHash('sha256').update(text).digest('hex').slice(0, 24);
