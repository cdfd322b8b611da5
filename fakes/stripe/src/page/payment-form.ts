import { grouped, readCard, type Card } from '../payments/cards.js';
import type { Buyer } from '../state/records.js';
import { isCountry } from './countries.js';

/** What a form asks for. */
export type FormShape = {
  /** An address that is known and stays as it is; null where it is asked for. */
  fixedEmail: string | null;
  isCardNeeded: boolean;
};
export type FormValues = { email: string; country: string; card: string; name: string };
export type Faults = Partial<Record<'email' | 'country' | 'card', string>>;

export function emptyForm(shape: FormShape): FormValues {
  return { email: shape.fixedEmail ?? '', country: '', card: '', name: '' };
}

/** What was posted, as text. A sample card that was pressed stands in for what was typed. */
export function valuesFrom(shape: FormShape, body: unknown): FormValues {
  const posted = (body ?? {}) as Record<string, unknown>;
  const text = (key: string) => (typeof posted[key] === 'string' ? posted[key].trim() : '');
  const sample = text('sample');
  return {
    email: shape.fixedEmail ?? text('email'),
    country: text('country').toUpperCase(),
    card: sample ? grouped(sample) : text('card'),
    name: text('name').slice(0, 150),
  };
}

/** The form again, after a second step: all but the card. */
export function valuesOf({ email, country, name }: Buyer): FormValues {
  return { email, country, name: name ?? '', card: '' };
}

export type FormReading = { buyer: Buyer; card: Card | null } | { faults: Faults };

export function readForm(shape: FormShape, values: FormValues): FormReading {
  const faults: Faults = {};
  if (!/^[^\s@]+@[^\s@]+$/.test(values.email)) {
    faults.email = 'Enter an e-mail address, such as name@example.com.';
  }
  if (!isCountry(values.country)) faults.country = 'Choose the country of your billing address.';
  let card: Card | null = null;
  if (shape.isCardNeeded) {
    const reading = readCard(values.card);
    if ('fault' in reading) faults.card = reading.fault;
    else card = reading.card;
  }
  if (Object.keys(faults).length > 0) return { faults };
  return { buyer: { email: values.email, name: values.name || null, country: values.country }, card };
}
