import { storedValue, useStoredValue } from './stored-value.js';

/** A visitor's printer, kept in the browser; nobody else is told. */
export interface PrinterCard {
  bed: { xMm: number; yMm: number; zMm: number };
  nozzleMm: number;
  material: string;
  pricePerKgMinor: number | null;
}

const isLength = (value: unknown, most: number): value is number =>
  typeof value === 'number' && value > 0 && value <= most;

export function readPrinterCard(text: string | null): PrinterCard | null {
  try {
    const card = JSON.parse(text ?? 'null') as PrinterCard | null;
    const isWhole =
      card !== null &&
      isLength(card.bed?.xMm, 2000) &&
      isLength(card.bed.yMm, 2000) &&
      isLength(card.bed.zMm, 3000) &&
      isLength(card.nozzleMm, 2) &&
      typeof card.material === 'string';
    return isWhole ? { ...card, pricePerKgMinor: card.pricePerKgMinor ?? null } : null;
  } catch {
    return null;
  }
}

export const printerCard = storedValue<PrinterCard | null>({
  key: 'windchest.printer',
  read: readPrinterCard,
  write: (card) => card && JSON.stringify(card),
});

export const usePrinterCard = (): [PrinterCard | null, (card: PrinterCard | null) => void] => [
  useStoredValue(printerCard),
  printerCard.set,
];
