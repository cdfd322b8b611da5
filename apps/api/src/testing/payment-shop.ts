import { randomUUID } from 'node:crypto';
import { startFakeStripe, type FakeStripe } from '@windchest/fake-stripe';
import { startTestApp, type Browser, type TestApp } from './test-app.js';

export interface CheckoutAnswer {
  readonly orderId: string;
  readonly orderKey: string;
  readonly paymentUrl: string | null;
}

/** The application with a payment service of its own beside it, the two knowing each other. */
export interface PaymentShop extends TestApp {
  readonly stripe: FakeStripe;
  /** One of the payment service's own switches; see its control API. */
  control<T = Record<string, unknown>>(path: string, body?: object): Promise<T>;
  /** Places an order for licences as a guest, or as `browser`. */
  checkout(licenceIds: readonly string[], options?: CheckoutOptions): Promise<CheckoutAnswer>;
  /** Pays as the buyer does on the payment page, with a card and an address of `country`. */
  pay(paymentUrl: string | null, country?: string, cardCountry?: string): Promise<void>;
}

export interface CheckoutOptions {
  readonly browser?: Browser;
  readonly email?: string;
  readonly country?: string;
  readonly couponCode?: string;
  readonly attempt?: string;
  readonly business?: { name: string; address: string; vatNumber?: string };
  readonly gift?: { email: string; giver: string; greeting: string };
}

export const checkoutBody = (licenceIds: readonly string[], options: CheckoutOptions = {}) => ({
  items: licenceIds.map((licenceId) => ({ licenceId })),
  ...(options.couponCode ? { couponCode: options.couponCode } : {}),
  email: options.email ?? `guest-${randomUUID().slice(0, 8)}@mail.example`,
  country: options.country ?? 'DE',
  ...(options.business ? { business: options.business } : {}),
  ...(options.gift ? { gift: options.gift } : {}),
  hasConsented: true,
  attempt: options.attempt ?? randomUUID(),
});

export const sessionIdOf = (paymentUrl: string | null): string => {
  const id = paymentUrl?.split('/').at(-1);
  if (!id) throw new Error('There is no payment page.');
  return id;
};

export const startPaymentShop = async (
  environment: Record<string, string> = {},
  { webhooks = true }: { webhooks?: boolean } = {},
): Promise<PaymentShop> => {
  const stripe = await startFakeStripe({ seed: 1, webhookTimeScale: 0.01 });
  const shop = await startTestApp({
    STRIPE_PORT: String(stripe.port),
    STRIPE_KEY: stripe.apiKey,
    STRIPE_WEBHOOK_SECRET: stripe.webhookSecret,
    ...environment,
  });
  if (webhooks) stripe.setWebhookUrl(`${shop.url}/api/payments/webhook`);
  const control = async <T>(path: string, body: object = {}): Promise<T> => {
    const answer = await fetch(`${stripe.url}/control${path}`, {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: JSON.stringify(body),
    });
    if (!answer.ok) throw new Error(`${path}: ${await answer.text()}`);
    return (await answer.json()) as T;
  };
  return {
    ...shop,
    stripe,
    control,
    checkout: async (licenceIds, options = {}) => {
      const answer = await (options.browser ?? shop.browser())
        .post('/api/checkout')
        .send(checkoutBody(licenceIds, options))
        .expect(201);
      return answer.body as CheckoutAnswer;
    },
    pay: async (paymentUrl, country = 'DE', cardCountry = country) => {
      await control(`/sessions/${sessionIdOf(paymentUrl)}/pay`, { country, cardCountry });
    },
    stop: async () => {
      await stripe.stop();
      await shop.stop();
    },
  };
};
