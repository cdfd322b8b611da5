import { MoneyError } from './money-error.js';

/*
 * ISO 4217, list one, as published 2024-06-25. The exponents are written out here because
 * Intl.NumberFormat follows CLDR's cash habits and differs: HUF, MGA and IQD, among others, come out
 * with 0 digits there. Codes without a minor unit in ISO (metals, testing, XDR) are left out: nothing is
 * sold in them.
 */
const codesByExponent: readonly (readonly [exponent: number, codes: string])[] = [
  [0, 'BIF CLP DJF GNF ISK JPY KMF KRW PYG RWF UGX UYI VND VUV XAF XOF XPF'],
  [
    2,
    `AED AFN ALL AMD ANG AOA ARS AUD AWG AZN BAM BBD BDT BGN BMD BND BOB BOV BRL BSD BTN BWP BYN BZD CAD CDF
     CHE CHF CHW CNY COP COU CRC CUC CUP CVE CZK DKK DOP DZD EGP ERN ETB EUR FJD FKP GBP GEL GHS GIP GMD GTQ
     GYD HKD HNL HTG HUF IDR ILS INR IRR JMD KES KGS KHR KPW KYD KZT LAK LBP LKR LRD LSL MAD MDL MGA MKD MMK
     MNT MOP MRU MUR MVR MWK MXN MXV MYR MZN NAD NGN NIO NOK NPR NZD PAB PEN PGK PHP PKR PLN QAR RON RSD RUB
     SAR SBD SCR SDG SEK SGD SHP SLE SOS SRD SSP STN SVC SYP SZL THB TJS TMT TOP TRY TTD TWD TZS UAH USD USN
     UYU UZS VED VES WST XCD YER ZAR ZMW ZWG`,
  ],
  [3, 'BHD IQD JOD KWD LYD OMR TND'],
  [4, 'CLF UYW'],
];

const exponents: ReadonlyMap<string, number> = new Map(
  codesByExponent.flatMap(([exponent, codes]) =>
    codes.split(/\s+/).map((code): [string, number] => [code, exponent]),
  ),
);

/** Every currency code an amount may carry, in alphabetical order. */
export const currencyCodes: readonly string[] = [...exponents.keys()].toSorted();

/** Whether the code is one of ISO 4217 with a minor unit (upper case). */
export const isCurrencyCode = (code: string): boolean => exponents.has(code);

/**
 * How many decimal digits the minor unit of a currency has: 2 for EUR, 0 for JPY, 3 for BHD.
 * Source: ISO 4217 list one, 2024-06-25. Throws MoneyError `unknown-currency`.
 */
export function currencyExponent(code: string): number {
  const exponent = exponents.get(code);
  if (exponent === undefined) {
    throw new MoneyError(
      'unknown-currency',
      `"${code}" is not a currency code of ISO 4217. Write three capital letters, such as EUR.`,
    );
  }
  return exponent;
}
