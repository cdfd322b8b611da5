import { cardTraits, type CardTraits } from './card-traits.js';

export type Card = CardTraits & { number: string; brand: string; last4: string; country: string };

// Test cards of a country carry its ISO 3166-1 numeric code in digits 6 to 8 (4000 0027 6… is Germany, 276).
const countryByNumericCode: Record<string, string> = {
  '040': 'AT', '056': 'BE', '124': 'CA', '203': 'CZ', '208': 'DK', '246': 'FI', '250': 'FR', '276': 'DE',
  '300': 'GR', '372': 'IE', '380': 'IT', '528': 'NL', '578': 'NO', '616': 'PL', '620': 'PT', '724': 'ES',
  '752': 'SE', '756': 'CH', '826': 'GB', '036': 'AU', '392': 'JP', '554': 'NZ',
}; // prettier-ignore

/** Those that the pages offer as buttons; the last where money is to be taken again later. */
export const sampleCards = [
  { number: '4242424242424242', label: 'Succeeds' },
  { number: '4000000000000002', label: 'Is declined' },
  { number: '4000002500003155', label: 'Needs a second step' },
] as const;
export const laterSampleCards = [
  ...sampleCards,
  { number: '4000000000099210', label: 'Succeeds once, is declined later' },
] as const;

export function grouped(number: string): string {
  return number.replace(/(\d{4})(?=\d)/g, '$1 ');
}

export type CardReading = { card: Card } | { fault: string };

/** Reads what was typed into the card field. Only test numbers are let in, so that no real one is ever kept. */
export function readCard(typed: string): CardReading {
  const number = typed.replace(/[\s-]/g, '');
  if (number === '') return { fault: 'Enter a card number, or press one of the sample cards.' };
  if (!/^\d{12,19}$/.test(number) || !hasCheckDigit(number)) {
    return { fault: 'This is not a card number: a digit is wrong or missing.' };
  }
  const brand = brandOf(number);
  if (!brand) return { fault: 'This stand-in takes test cards alone. Press one of the sample cards.' };
  const country = countryByNumericCode[number.slice(6, 9)] ?? 'US';
  return { card: { number, brand, last4: number.slice(-4), country, ...cardTraits(number) } };
}

function brandOf(number: string): string | null {
  if (/^(4242424242424242|400000\d{10})$/.test(number)) return 'visa';
  if (/^(5555555555554444|2223003122003222)$/.test(number)) return 'mastercard';
  if (number === '378282246310005') return 'amex';
  return null;
}

/** The check digit of ISO/IEC 7812-1 (Luhn's formula). */
function hasCheckDigit(number: string): boolean {
  const sum = [...number].reverse().reduce((total, digit, place) => {
    const value = Number(digit) * (place % 2 === 1 ? 2 : 1);
    return total + (value > 9 ? value - 9 : value);
  }, 0);
  return sum % 10 === 0;
}
