import type Stripe from 'stripe';
import { grouped, readCard, type Card } from '../payments/cards.js';
import type { Buyer } from '../state/state.js';
import { isCountry } from './countries.js';

export type FormValues = { email: string; country: string; card: string; name: string };
export type Faults = Partial<Record<'email' | 'country' | 'card', string>>;

export function emptyForm(session: Stripe.Checkout.Session): FormValues {
  return { email: session.customer_details?.email ?? '', country: '', card: '', name: '' };
}

/** What was posted, as text. A sample card that was pressed stands in for what was typed. */
export function valuesFrom(session: Stripe.Checkout.Session, body: unknown): FormValues {
  const posted = (body ?? {}) as Record<string, unknown>;
  const text = (key: string) => (typeof posted[key] === 'string' ? posted[key].trim() : '');
  const sample = text('sample');
  return {
    email: session.customer_details?.email ?? text('email'),
    country: text('country').toUpperCase(),
    card: sample ? grouped(sample) : text('card'),
    name: text('name').slice(0, 150),
  };
}

export type FormReading = { buyer: Buyer; card: Card | null } | { faults: Faults };

export function readForm(session: Stripe.Checkout.Session, values: FormValues): FormReading {
  const faults: Faults = {};
  if (!/^[^\s@]+@[^\s@]+$/.test(values.email)) {
    faults.email = 'Enter an e-mail address, such as name@example.com.';
  }
  if (!isCountry(values.country)) faults.country = 'Choose the country of your billing address.';
  let card: Card | null = null;
  if (session.amount_total !== 0) {
    const reading = readCard(values.card);
    if ('fault' in reading) faults.card = reading.fault;
    else card = reading.card;
  }
  if (Object.keys(faults).length > 0) return { faults };
  return { buyer: { email: values.email, name: values.name || null, country: values.country }, card };
}
