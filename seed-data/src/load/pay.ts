import type { DemoPerson, DemoPurchase } from '../demo-types.js';

/** Pays at a page of the payment service, as its visitor does, without a browser. */
export const pay = async (
  stripeUrl: string,
  paymentUrl: string,
  person: DemoPerson,
  from: DemoPurchase['paidFrom'] = { billing: person.countryCode, card: person.countryCode },
): Promise<void> => {
  const session = /\/(cs_[A-Za-z0-9_]+)/.exec(paymentUrl)?.[1];
  const response = await fetch(`${stripeUrl}/control/sessions/${session}/pay`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json' },
    body: JSON.stringify({
      country: from.billing,
      cardCountry: from.card,
      email: person.email,
      outcome: 'succeed',
    }),
  });
  if (!response.ok)
    throw new Error(`The payment stand-in answered ${response.status}: ${await response.text()}`);
};
