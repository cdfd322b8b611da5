import type Stripe from 'stripe';

/** `every month`, `every 2 weeks` */
export function rhythmWords({ interval, interval_count: count }: Stripe.Price.Recurring): string {
  return count === 1 ? `every ${interval}` : `every ${count} ${interval}s`;
}
