import type { PrinterCardFields } from '@windchest/contracts';
import { printerTexts } from '../../config/texts/printer.js';
import { amountText, readAmount } from '../../lib/amount-text.js';

export interface PrinterForm {
  name: string;
  bed: PrinterCardFields['bed'];
  nozzleMm: number;
  /** `price` as it is typed: `24.00`, or nothing. */
  materials: { material: string; price: string }[];
  clearance: NonNullable<PrinterCardFields['clearance']> | '';
  isMain: boolean;
}

export const emptyMaterial = { material: '', price: '' };

export const printerForm = (
  card: (PrinterCardFields & { isMain?: boolean }) | null,
  currency: string,
): PrinterForm => ({
  name: card?.name ?? printerTexts.firstName,
  bed: card?.bed ?? { xMm: NaN, yMm: NaN, zMm: NaN },
  nozzleMm: card?.nozzleMm ?? 0.4,
  materials: card?.materials.map(({ material, pricePerKgMinor }) => ({
    material,
    price: pricePerKgMinor === null ? '' : amountText({ minor: pricePerKgMinor, currency }),
  })) ?? [emptyMaterial],
  clearance: card?.clearance ?? '',
  isMain: card?.isMain ?? false,
});

/** What is kept; an unreadable price is refused by its own field's check and counts as none here. */
export const printerBodyOf =
  (currency: string) =>
  ({ materials, clearance, ...form }: PrinterForm): unknown => ({
    ...form,
    materials: materials.map(({ material, price }) => {
      const amount = price.trim() === '' ? null : readAmount(price, currency);
      return {
        material,
        pricePerKgMinor: amount === null ? null : 'minor' in amount ? amount.minor : NaN,
      };
    }),
    clearance: clearance === '' ? null : clearance,
  });
