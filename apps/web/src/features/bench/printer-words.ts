import type { PrinterCardFields } from '@windchest/contracts';
import { printerTexts as texts } from '../../config/texts/printer.js';
import { millimetres, price } from '../../lib/format.js';

/** `0.4 mm nozzle · PETG at €22.90 a kg, PLA · clearance 0 as drawn` */
export function printerWords(
  { nozzleMm, materials, clearance }: PrinterCardFields,
  currency: string,
): string {
  const filaments = materials.map(({ material, pricePerKgMinor }) =>
    pricePerKgMinor === null ? material : texts.perKg(material, price({ minor: pricePerKgMinor, currency })),
  );
  return [
    texts.nozzleOf(millimetres(nozzleMm, 2)),
    filaments.join(', '),
    ...(clearance ? [texts.clearanceOf(texts.clearances[clearance])] : []),
  ].join(' · ');
}
