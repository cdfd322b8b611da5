/**
 * The smallest amounts the payment service charges, in minor units. From memory of the payment service's
 * documentation of currencies; a currency that is not listed is refused by the service itself, if at all.
 */
const smallestChargeMinor: Readonly<Record<string, number>> = {
  EUR: 50,
  USD: 50,
  GBP: 30,
  CHF: 50,
  DKK: 250,
  NOK: 300,
  SEK: 300,
  PLN: 200,
  CZK: 1500,
  HUF: 17500,
  CAD: 50,
  AUD: 50,
  NZD: 50,
  JPY: 50,
};

export const smallestChargeOf = (currency: string): number => smallestChargeMinor[currency] ?? 1;

/** Nothing to pay is fine, and so is enough to pay; what lies between cannot be charged. */
export const isChargeable = (minor: number, currency: string): boolean =>
  minor === 0 || minor >= smallestChargeOf(currency);
