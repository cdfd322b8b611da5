import type Stripe from 'stripe';
import { badParameter } from '../api/errors.js';
import { existing } from '../api/existing.js';
import type { Fields } from '../api/fields.js';
import type { StandIn } from '../stand-in.js';
import { createPrice, priceParameters } from './prices.js';

const mostLineItems = 100;

/** The lines of a new session; their prices are looked up, or made from `price_data`. */
export function readLineItems(standIn: StandIn, fields: Fields): Stripe.LineItem[] {
  const entries = fields.objects('line_items');
  if (entries.length === 0) throw fields.missing('line_items');
  if (entries.length > mostLineItems) {
    throw badParameter('line_items', `A session has at most ${mostLineItems} line items.`);
  }
  return entries.map((entry) => readLineItem(standIn, entry));
}

function readLineItem(standIn: StandIn, fields: Fields): Stripe.LineItem {
  fields.allowOnly('price', 'price_data', 'quantity', 'metadata');
  const quantity = fields.integer('quantity') ?? 1;
  if (quantity < 1 || quantity > 999_999) {
    throw badParameter(
      fields.nameOf('quantity'),
      'This value must be from 1 to 999999.',
      'parameter_invalid_integer',
    );
  }
  const price = priceOf(standIn, fields);
  const amount = (price.unit_amount ?? 0) * quantity;
  const product = standIn.state.products.find(String(price.product));
  return {
    id: standIn.newId('li'),
    object: 'item',
    adjustable_quantity: null,
    amount_discount: 0,
    amount_subtotal: amount,
    amount_tax: 0,
    amount_total: amount,
    currency: price.currency,
    description: product?.name ?? null,
    metadata: fields.metadata(),
    price: structuredClone(price),
    quantity,
  };
}

function priceOf(standIn: StandIn, fields: Fields): Stripe.Price {
  const id = fields.string('price');
  if (id) return existing(standIn.state.prices, 'price', id, fields.nameOf('price'));
  const inline = fields.object('price_data');
  if (!inline) throw fields.missing('price');
  inline.allowOnly(...priceParameters);
  return createPrice(standIn, inline, false);
}
