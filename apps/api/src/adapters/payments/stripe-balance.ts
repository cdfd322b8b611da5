import type Stripe from 'stripe';
import type { Config } from '../../config/config.js';
import { toBalanceEntry } from './balance.mapping.js';
import { PaymentBalance, type BalancePage } from './reconciliation.js';
import { calling, openStripe, secondsOf } from './stripe-client.js';

const PAGE = 100;

export class StripeBalance extends PaymentBalance {
  private readonly stripe: Stripe;

  constructor(config: Config) {
    super();
    this.stripe = openStripe(config);
  }

  async listBalance(from: Date, to: Date, after: string | null = null): Promise<BalancePage> {
    const page = await calling(
      this.stripe.balanceTransactions.list({
        created: { gte: secondsOf(from), lt: secondsOf(to) },
        limit: PAGE,
        expand: ['data.source'],
        ...(after ? { starting_after: after } : {}),
      }),
    );
    return {
      entries: page.data.map(toBalanceEntry),
      next: page.has_more ? (page.data.at(-1)?.id ?? null) : null,
    };
  }
}
