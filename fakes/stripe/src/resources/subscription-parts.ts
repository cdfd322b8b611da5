import type Stripe from 'stripe';
import { rhythmOf } from '../billing/run-subscription.js';
import { badParameter } from '../api/errors.js';
import { existing } from '../api/existing.js';
import type { Fields } from '../api/fields.js';
import type { StandIn } from '../stand-in.js';
import { createPrice, priceParameters } from './prices.js';
import type { Part } from './subscription-object.js';

/** The price that `price` names or `price_data` describes, where there is one. */
export function readPrice(standIn: StandIn, fields: Fields): Stripe.Price | null {
  const id = fields.string('price');
  if (id) return existing(standIn.state.prices, 'price', id, fields.nameOf('price'));
  const inline = fields.object('price_data');
  if (!inline) return null;
  inline.allowOnly(...priceParameters);
  return createPrice(standIn, inline, false);
}

/** What a new subscription is made of. */
export function readParts(standIn: StandIn, fields: Fields): { parts: Part[]; currency: string } {
  const entries = fields.objects('items');
  if (entries.length === 0) throw fields.missing('items');
  const parts = entries.map((entry) => {
    entry.allowOnly('price', 'price_data', 'quantity');
    const price = readPrice(standIn, entry);
    if (!price) throw entry.missing('price');
    return { price, quantity: readQuantity(entry) ?? 1 };
  });
  return { parts, currency: checkParts(parts, 'items') };
}

export function readQuantity(fields: Fields): number | null {
  const quantity = fields.integer('quantity');
  if (quantity !== null && (quantity < 1 || quantity > 999_999))
    throw badParameter(fields.nameOf('quantity'), 'This value must be from 1 to 999999.');
  return quantity;
}

/** All parts recur in one rhythm and one currency, and cost something. Returns the currency. */
export function checkParts(parts: readonly Part[], param: string): string {
  const prices = parts.map(({ price }) => price);
  const once = prices.find(({ type }) => type !== 'recurring');
  if (once)
    throw badParameter(
      param,
      `The price specified is set to \`type=one_time\` but this field only accepts prices with \`type=recurring\`: ${once.id}.`,
    );
  const { interval, interval_count } = rhythmOf(prices);
  const isOther = ({ recurring }: Stripe.Price) =>
    recurring?.interval !== interval || recurring.interval_count !== interval_count;
  if (prices.some(isOther))
    throw badParameter(param, 'The local stand-in wants one interval for all prices of a subscription.');
  const currency = prices[0]?.currency ?? '';
  if (prices.some((price) => price.currency !== currency))
    throw badParameter(param, 'All prices of a subscription must have one currency.');
  if (prices.every(({ unit_amount }) => !unit_amount))
    throw badParameter(param, 'The local stand-in offers no subscription that costs nothing.');
  return currency;
}
