import { z } from 'zod';
import { line } from './values.js';

/** The 27 countries of the Union, ISO 3166-1; Greece writes EL before its VAT numbers. */
export const unionCountries = [
  'AT',
  'BE',
  'BG',
  'CY',
  'CZ',
  'DE',
  'DK',
  'EE',
  'ES',
  'FI',
  'FR',
  'GR',
  'HR',
  'HU',
  'IE',
  'IT',
  'LT',
  'LU',
  'LV',
  'MT',
  'NL',
  'PL',
  'PT',
  'RO',
  'SE',
  'SI',
  'SK',
] as const;
export const isInUnion = (country: string): boolean =>
  (unionCountries as readonly string[]).includes(country);

/**
 * How a sale is taxed. `consumer`: at the rate of the buyer's country, within the price. `domestic-business`: a
 * business of the seller's own country, the same way. `reverse-charge`: a business elsewhere in the Union with a
 * VAT number, which owes the tax itself. `business-abroad`: a business outside the Union; no tax.
 */
export const taxTreatments = ['consumer', 'domestic-business', 'reverse-charge', 'business-abroad'] as const;
export const taxTreatment = z.enum(taxTreatments);
export type TaxTreatment = (typeof taxTreatments)[number];

/** All that is sold so far: files handed over by a network. */
export const productKinds = ['electronic-service'] as const;
export const productKind = z.enum(productKinds);
export type ProductKind = (typeof productKinds)[number];

/**
 * The part after the two letters of the country, without spaces. Source: the table "VAT identification number
 * structure" of the Commission's VIES questions and answers, read in copies; Belgian numbers beginning with 1 and
 * Irish ones of seven digits and two letters from memory.
 */
const vatNumberShapes: Readonly<Record<(typeof unionCountries)[number], { shape: RegExp; example: string }>> =
  {
    AT: { shape: /^U\d{8}$/, example: 'ATU12345678' },
    BE: { shape: /^[01]\d{9}$/, example: 'BE0123456789' },
    BG: { shape: /^\d{9,10}$/, example: 'BG123456789' },
    CY: { shape: /^\d{8}[A-Z]$/, example: 'CY12345678L' },
    CZ: { shape: /^\d{8,10}$/, example: 'CZ12345678' },
    DE: { shape: /^\d{9}$/, example: 'DE123456789' },
    DK: { shape: /^\d{8}$/, example: 'DK12345678' },
    EE: { shape: /^\d{9}$/, example: 'EE123456789' },
    // The first and the last may be a letter or a digit, but not both a digit.
    ES: { shape: /^(?!\d{9}$)[A-Z0-9]\d{7}[A-Z0-9]$/, example: 'ESX1234567X' },
    FI: { shape: /^\d{8}$/, example: 'FI12345678' },
    FR: { shape: /^[A-Z0-9]{2}\d{9}$/, example: 'FR12123456789' },
    GR: { shape: /^\d{9}$/, example: 'EL123456789' },
    HR: { shape: /^\d{11}$/, example: 'HR12345678901' },
    HU: { shape: /^\d{8}$/, example: 'HU12345678' },
    IE: { shape: /^(\d[A-Z0-9+*]\d{5}[A-Z]|\d{7}[A-Z]{2})$/, example: 'IE1234567T' },
    IT: { shape: /^\d{11}$/, example: 'IT12345678901' },
    LT: { shape: /^(\d{9}|\d{12})$/, example: 'LT123456789' },
    LU: { shape: /^\d{8}$/, example: 'LU12345678' },
    LV: { shape: /^\d{11}$/, example: 'LV12345678901' },
    MT: { shape: /^\d{8}$/, example: 'MT12345678' },
    NL: { shape: /^[A-Z0-9+*]{9}B[A-Z0-9+*]{2}$/, example: 'NL123456789B01' },
    PL: { shape: /^\d{10}$/, example: 'PL1234567890' },
    PT: { shape: /^\d{9}$/, example: 'PT123456789' },
    RO: { shape: /^\d{2,10}$/, example: 'RO1234567890' },
    SE: { shape: /^\d{12}$/, example: 'SE123456789001' },
    SI: { shape: /^\d{8}$/, example: 'SI12345678' },
    SK: { shape: /^\d{10}$/, example: 'SK1234567890' },
  };

const prefixOf = (country: string): string => (country === 'GR' ? 'EL' : country);

/** As it is kept: capitals, without the spaces, dots and hyphens that people write. */
export const tidyVatNumber = (text: string): string => text.toUpperCase().replace(/[\s.\-/]/g, '');

export type VatNumberReading = { readonly number: string } | { readonly fault: string };

/**
 * Reads a VAT number of a country of the Union by its form alone: whether it was ever given to anybody only the
 * tax office knows. The letters of the country may be left out.
 */
export const readVatNumber = (text: string, country: string): VatNumberReading => {
  const known = shapeOf(country);
  if (!known) return { fault: 'VAT numbers are read for countries of the European Union alone.' };
  const tidy = tidyVatNumber(text);
  const prefix = prefixOf(country);
  const isWithPrefix = tidy.startsWith(prefix);
  if (!isWithPrefix && isNumberOfAnother(tidy))
    return {
      fault: `This number begins with ${tidy.slice(0, 2)}. Choose that country, or write a number of the one chosen.`,
    };
  const rest = isWithPrefix ? tidy.slice(2) : tidy;
  if (known.shape.test(rest)) return { number: prefix + rest };
  return { fault: `This is not the form of a VAT number of this country, such as ${known.example}.` };
};

const shapeOf = (country: string): { shape: RegExp; example: string } | undefined =>
  isInUnion(country) ? vatNumberShapes[country as (typeof unionCountries)[number]] : undefined;

const isNumberOfAnother = (tidy: string): boolean =>
  unionCountries.some(
    (country) => tidy.startsWith(prefixOf(country)) && shapeOf(country)?.shape.test(tidy.slice(2)),
  );

/** Who buys for a business. Outside the Union the number is kept as it is written. */
export const businessBuyer = z.object({
  name: line.max(160, 'Write at most 160 characters.'),
  address: z
    .string()
    .trim()
    .min(1, 'Write street and town, as the receipt should have them.')
    .max(400, 'Write at most 400 characters.'),
  vatNumber: z.string().trim().max(30, 'Write at most 30 characters.').default(''),
});
export type BusinessBuyer = z.output<typeof businessBuyer>;
