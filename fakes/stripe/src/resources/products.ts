import type Stripe from 'stripe';
import type { ApiRoute } from '../api/api-route.js';
import { refused } from '../api/errors.js';
import { existing } from '../api/existing.js';
import type { Fields } from '../api/fields.js';
import { createdFilter, pageOf, pageParameters } from '../api/pages.js';
import type { StandIn } from '../stand-in.js';

/** `isActive` is false for the product that a price given inline (`price_data`) makes by the way. */
export function createProduct(standIn: StandIn, fields: Fields, isActive: boolean): Stripe.Product {
  const now = standIn.clock.nowSeconds();
  const id = fields.string('id');
  if (id && standIn.state.products.find(id))
    throw refused('Product already exists.', 'resource_already_exists', 'id');
  const product: Stripe.Product = {
    id: id ?? standIn.newId('prod'),
    object: 'product',
    active: isActive,
    created: now,
    default_price: null,
    description: fields.string('description'),
    images: fields.strings('images'),
    livemode: false,
    marketing_features: [],
    metadata: fields.metadata(),
    name: fields.requiredString('name'),
    package_dimensions: null,
    shippable: null,
    statement_descriptor: null,
    tax_code: fields.string('tax_code'),
    tax_details: null,
    type: 'service',
    unit_label: null,
    updated: now,
    url: null,
  };
  return standIn.state.products.add(product);
}

export const productParameters = ['name', 'description', 'images', 'metadata', 'tax_code'] as const;

export const productRoutes: ApiRoute[] = [
  {
    method: 'post',
    path: '/v1/products',
    run: ({ standIn, fields }) => {
      fields.allowOnly(...productParameters, 'id', 'active', 'expand');
      return createProduct(standIn, fields, fields.boolean('active') ?? true);
    },
  },
  {
    method: 'get',
    path: '/v1/products',
    run: (call) => {
      call.fields.allowOnly(...pageParameters, 'active', 'created');
      const isActive = call.fields.boolean('active');
      const products = call.standIn.state.products
        .newestFirst()
        .filter((product) => isActive === null || product.active === isActive)
        .filter(createdFilter(call.fields));
      return pageOf(call, products);
    },
  },
  {
    method: 'get',
    path: '/v1/products/:id',
    run: ({ standIn, id, fields }) => {
      fields.allowOnly('expand');
      return existing(standIn.state.products, 'product', id);
    },
  },
];
