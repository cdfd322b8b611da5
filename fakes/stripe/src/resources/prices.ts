import type Stripe from 'stripe';
import type { ApiRoute } from '../api/api-route.js';
import { badParameter } from '../api/errors.js';
import { existing } from '../api/existing.js';
import type { Fields } from '../api/fields.js';
import { createdFilter, pageOf, pageParameters } from '../api/pages.js';
import type { StandIn } from '../stand-in.js';
import { createProduct, productParameters } from './products.js';

/** What a price, and the `price_data` of a line item, may hold. */
export const priceParameters = [
  'currency',
  'unit_amount',
  'product',
  'product_data',
  'recurring',
  'tax_behavior',
] as const;

/** A price, from `POST /v1/prices` or from the `price_data` of a line item (`isActive` false). */
export function createPrice(standIn: StandIn, fields: Fields, isActive: boolean): Stripe.Price {
  const currency = fields.currency('currency');
  if (!currency) throw fields.missing('currency');
  const unitAmount = fields.requiredInteger('unit_amount');
  if (unitAmount < 0 || unitAmount > 99_999_999) {
    throw badParameter(
      fields.nameOf('unit_amount'),
      'Invalid unit_amount: must be from 0 to 99999999, in the smallest unit of the currency.',
      'parameter_invalid_integer',
    );
  }
  const recurring = fields.object('recurring');
  recurring?.allowOnly('interval', 'interval_count');
  const price: Stripe.Price = {
    id: standIn.newId('price'),
    object: 'price',
    active: isActive,
    billing_scheme: 'per_unit',
    created: standIn.clock.nowSeconds(),
    currency,
    custom_unit_amount: null,
    livemode: false,
    lookup_key: fields.string('lookup_key'),
    metadata: fields.metadata(),
    nickname: fields.string('nickname'),
    product: productOf(standIn, fields, isActive),
    recurring: recurring && {
      interval: recurring.requiredOneOf('interval', ['day', 'week', 'month', 'year']),
      interval_count: recurring.integer('interval_count') ?? 1,
      meter: null,
      trial_period_days: null,
      usage_type: 'licensed',
    },
    tax_behavior: fields.oneOf('tax_behavior', ['inclusive', 'exclusive', 'unspecified']) ?? 'unspecified',
    tiers_mode: null,
    transform_quantity: null,
    type: recurring ? 'recurring' : 'one_time',
    unit_amount: unitAmount,
    // On the wire a decimal is text; the type speaks of the class that the SDK makes of it.
    unit_amount_decimal: String(unitAmount) as unknown as Stripe.Decimal,
  };
  return standIn.state.prices.add(price);
}

function productOf(standIn: StandIn, fields: Fields, isActive: boolean): string {
  const id = fields.string('product');
  if (id) return existing(standIn.state.products, 'product', id, fields.nameOf('product')).id;
  const inline = fields.object('product_data');
  if (!inline) throw fields.missing('product');
  inline.allowOnly(...productParameters);
  return createProduct(standIn, inline, isActive).id;
}

export const priceRoutes: ApiRoute[] = [
  {
    method: 'post',
    path: '/v1/prices',
    run: ({ standIn, fields }) => {
      fields.allowOnly(...priceParameters, 'metadata', 'nickname', 'lookup_key', 'active', 'expand');
      return createPrice(standIn, fields, fields.boolean('active') ?? true);
    },
  },
  {
    method: 'get',
    path: '/v1/prices',
    run: (call) => {
      call.fields.allowOnly(...pageParameters, 'active', 'product', 'created');
      const product = call.fields.string('product');
      const isActive = call.fields.boolean('active');
      const prices = call.standIn.state.prices
        .newestFirst()
        .filter((price) => product === null || price.product === product)
        .filter((price) => isActive === null || price.active === isActive)
        .filter(createdFilter(call.fields));
      return pageOf(call, prices);
    },
  },
  {
    method: 'get',
    path: '/v1/prices/:id',
    run: ({ standIn, id, fields }) => {
      fields.allowOnly('expand');
      return existing(standIn.state.prices, 'price', id);
    },
  },
];
