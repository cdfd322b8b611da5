import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import Stripe from 'stripe';
import { startFakeStripe, type FakeStripe, type FakeStripeOptions } from '../index.js';

export type Received = { event: Stripe.Event; status: number };

/** A shop for tests: the real SDK on one side, a webhook endpoint that checks every signature on the other. */
export class Shop {
  readonly received: Received[] = [];
  /** Statuses that the endpoint gives to the next webhooks; 200 when there are none left. */
  readonly statuses: number[] = [];

  private constructor(
    readonly standIn: FakeStripe,
    readonly stripe: Stripe,
    private readonly endpoint: Server,
  ) {}

  static async open(options: FakeStripeOptions = {}): Promise<Shop> {
    const endpoint = createServer();
    await new Promise<void>((resolve) => endpoint.listen(0, '127.0.0.1', resolve));
    const webhookUrl = `http://127.0.0.1:${(endpoint.address() as AddressInfo).port}/webhooks`;
    const standIn = await startFakeStripe({ seed: 1, webhookTimeScale: 0.0001, webhookUrl, ...options });
    const shop = new Shop(standIn, clientOf(standIn), endpoint);
    endpoint.on('request', (request, response) => {
      const chunks: Buffer[] = [];
      request.on('data', (chunk: Buffer) => chunks.push(chunk));
      request.on('end', () => {
        const signature = String(request.headers['stripe-signature']);
        const event = shop.stripe.webhooks.constructEvent(
          Buffer.concat(chunks),
          signature,
          standIn.webhookSecret,
        );
        const status = shop.statuses.shift() ?? 200;
        shop.received.push({ event, status });
        response.writeHead(status).end();
      });
    });
    return shop;
  }

  async close(): Promise<void> {
    await this.standIn.stop();
    this.endpoint.closeAllConnections();
    await new Promise((resolve) => this.endpoint.close(resolve));
  }

  /** The types that arrived and were taken, in order. */
  types(): string[] {
    return this.received.filter(({ status }) => status < 300).map(({ event }) => event.type);
  }

  openSession(more: Partial<Stripe.Checkout.SessionCreateParams> = {}): Promise<Stripe.Checkout.Session> {
    return this.stripe.checkout.sessions.create({
      mode: 'payment',
      line_items: [lineItem('Reed pipes, Mk 2.3', 2400), lineItem('Toy ocarina, Mk 1.0', 450, 2)],
      success_url: 'http://shop.test/thanks?session={CHECKOUT_SESSION_ID}',
      cancel_url: 'http://shop.test/basket?step=2',
      client_reference_id: 'order-17',
      metadata: { order: '17' },
      payment_intent_data: { metadata: { order: '17' } },
      ...more,
    });
  }

  /** A session that the buyer has paid, with its payment intent. */
  async paidSession(more: Partial<Stripe.Checkout.SessionCreateParams> = {}) {
    const session = await this.openSession(more);
    await this.control(`/sessions/${session.id}/pay`, { email: 'ada@example.test' });
    const paid = await this.stripe.checkout.sessions.retrieve(session.id);
    return { session: paid, intentId: String(paid.payment_intent) };
  }

  /** A page on which a monthly pledge of `amount` is begun. */
  openPledge(
    amount = 500,
    more: Partial<Stripe.Checkout.SessionCreateParams> = {},
  ): Promise<Stripe.Checkout.Session> {
    return this.stripe.checkout.sessions.create({
      mode: 'subscription',
      line_items: [
        {
          quantity: 1,
          price_data: {
            currency: 'eur',
            unit_amount: amount,
            recurring: { interval: 'month' },
            product_data: { name: 'Reed supporter' },
          },
        },
      ],
      client_reference_id: 'pledge-1',
      metadata: { pledge: '1' },
      subscription_data: { metadata: { pledge: '1' }, description: 'Reed supporter' },
      success_url: 'http://shop.test/pledged?session={CHECKOUT_SESSION_ID}',
      cancel_url: 'http://shop.test/plans',
      ...more,
    });
  }

  /** A subscription that runs, by a customer of its own; `pay` goes to the page's visitor. */
  async runningPledge(pay: object = {}, customer: Stripe.CustomerCreateParams = {}) {
    const { id } = await this.stripe.customers.create({ email: 'ada@example.test', ...customer });
    const session = await this.openPledge(500, { customer: id });
    await this.control(`/sessions/${session.id}/pay`, pay);
    const { subscription } = await this.stripe.checkout.sessions.retrieve(session.id);
    return { customerId: id, subscriptionId: String(subscription), sessionId: session.id };
  }

  /** What arrived since the last call, by type; sends what waits first. */
  async arrived(): Promise<string[]> {
    await this.control('/webhooks/flush');
    const types = this.types();
    this.received.length = 0;
    return types;
  }

  async control<T = Record<string, unknown>>(path: string, body: object = {}): Promise<T> {
    const response = await fetch(`${this.standIn.url}/control${path}`, {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: JSON.stringify(body),
    });
    const answer = (await response.json()) as T & { error?: { message: string } };
    if (!response.ok) throw new Error(answer.error?.message ?? String(response.status));
    return answer;
  }

  async peek<T>(path: string): Promise<T> {
    return (await (await fetch(`${this.standIn.url}/control${path}`)).json()) as T;
  }

  /** Fills in the payment page as a browser without scripts does; does not follow the redirect. */
  async postForm(
    path: string,
    fields: Record<string, string>,
  ): Promise<{ status: number; to: string | null; page: string }> {
    const response = await fetch(`${this.standIn.url}${path}`, {
      method: 'POST',
      body: new URLSearchParams(fields),
      redirect: 'manual',
    });
    return { status: response.status, to: response.headers.get('location'), page: await response.text() };
  }
}

export function clientOf(standIn: FakeStripe, apiKey = standIn.apiKey): Stripe {
  return new Stripe(apiKey, {
    host: standIn.host,
    port: standIn.port,
    protocol: 'http',
    telemetry: false,
    maxNetworkRetries: 0,
  });
}

export function lineItem(
  name: string,
  unitAmount: number,
  quantity = 1,
): Stripe.Checkout.SessionCreateParams.LineItem {
  return { quantity, price_data: { currency: 'eur', unit_amount: unitAmount, product_data: { name } } };
}

/** The error that a promise ends in; a promise that does not fail is a fault of the test. */
export async function errorOf(promise: Promise<unknown>): Promise<Stripe.errors.StripeError> {
  const error = await promise.then(
    () => null,
    (reason: unknown) => reason,
  );
  if (!(error instanceof Stripe.errors.StripeError))
    throw new Error(`Expected an error of the SDK, not ${String(error)}`);
  return error;
}
