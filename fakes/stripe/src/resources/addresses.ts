import type Stripe from 'stripe';
import type { Fields } from '../api/fields.js';
import type { Street } from '../state/records.js';

/** An address of which the stand-in's payment page asks the country alone. */
export function addressIn(country: string | null, street?: Street): Stripe.Address {
  return {
    city: street?.city ?? null,
    country,
    line1: street?.line1 ?? null,
    line2: null,
    postal_code: street?.postalCode ?? null,
    state: null,
  };
}

export function readAddress(fields: Fields | null): Stripe.Address | null {
  if (!fields) return null;
  fields.allowOnly('city', 'country', 'line1', 'line2', 'postal_code', 'state');
  return {
    city: fields.string('city'),
    country: fields.string('country'),
    line1: fields.string('line1'),
    line2: fields.string('line2'),
    postal_code: fields.string('postal_code'),
    state: fields.string('state'),
  };
}
