import type { PrinterCardFields } from '@windchest/contracts';
import { printerText } from './printer-text.js';
import { useStoredValue } from './stored-value.js';

const isLength = (value: unknown, most: number): value is number =>
  typeof value === 'number' && value > 0 && value <= most;

const isMaterial = (one: PrinterCardFields['materials'][number] | null): boolean =>
  typeof one?.material === 'string' &&
  one.material !== '' &&
  (one.pricePerKgMinor === null || Number.isSafeInteger(one.pricePerKgMinor));

/** A visitor's printer as the browser kept it. Kept text can be edited by anybody, so it is looked at closely. */
export function readPrinterCard(text: string | null): PrinterCardFields | null {
  try {
    const card = JSON.parse(text ?? 'null') as PrinterCardFields | null;
    const isWhole =
      card !== null &&
      typeof card.name === 'string' &&
      card.name !== '' &&
      isLength(card.bed?.xMm, 2000) &&
      isLength(card.bed.yMm, 2000) &&
      isLength(card.bed.zMm, 3000) &&
      isLength(card.nozzleMm, 2) &&
      Array.isArray(card.materials) &&
      card.materials.length > 0 &&
      card.materials.every(isMaterial);
    if (!isWhole) return null;
    const { name, bed, nozzleMm, materials } = card;
    const clearance = (['minus', 'zero', 'plus'] as const).find((one) => one === card.clearance) ?? null;
    return { name, bed, nozzleMm, materials, clearance };
  } catch {
    return null;
  }
}

let read: { text: string | null; card: PrinterCardFields | null } = { text: null, card: null };

/** The same text gives the same card, so that whatever is worked out for it is not worked out again. */
const cardOf = (text: string | null): PrinterCardFields | null => {
  if (read.text !== text) read = { text, card: readPrinterCard(text) };
  return read.card;
};

export const keepPrinterCard = (card: PrinterCardFields | null): void =>
  printerText.set(card && JSON.stringify(card));

/** Kept in the browser; nobody else is told. */
export const usePrinterCard = (): PrinterCardFields | null => cardOf(useStoredValue(printerText));
