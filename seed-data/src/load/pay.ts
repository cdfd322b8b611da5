import type { DemoPerson, DemoPurchase } from '../demo-types.js';

/** Pays at a page of the payment service, as its visitor does, without a browser. */
export const pay = async (
  stripeUrl: string,
  paymentUrl: string,
  person: DemoPerson,
  paidFrom?: DemoPurchase['paidFrom'],
): Promise<void> => {
  const session = /\/(cs_[A-Za-z0-9_]+)/.exec(paymentUrl)?.[1];
  const response = await fetch(`${stripeUrl}/control/sessions/${session}/pay`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json' },
    body: JSON.stringify({
      country: paidFrom?.billing ?? person.countryCode,
      cardCountry: paidFrom?.card ?? person.countryCode,
      email: person.email,
      outcome: 'succeed',
    }),
  });
  if (!response.ok)
    throw new Error(`The payment stand-in answered ${response.status}: ${await response.text()}`);
};
