/** Cautions of a kit: what holds for all of them, and what is particular to making and playing this one. */
export function cautions({ making, playing }: { making: string[]; playing: string[] }): string {
  return [
    '## Printing',
    'Melting plastic gives off fumes and very fine particles: air the room, and do not work beside the running printer. The nozzle is hotter than 200 °C and the bed hot enough to burn; let the bed cool before you take parts off. Do not leave a running printer alone, and have a smoke alarm near it.',
    '## Making',
    ...making,
    '## Playing',
    ...playing,
    'Not for children under three: the kit has small parts that can be swallowed.',
    '## Selling prints',
    'If your licence lets you sell prints, the law of your country on toys, product safety and consumers is yours to meet. Ask a licensed professional before you sell; this page is no legal advice.',
  ].join('\n\n');
}

export const mouthCaution =
  'Printed plastic is not food-safe: the grooves between its layers hold germs, and what colours the filament is not known to you. Do not share an unsealed mouthpiece. Wash it in lukewarm water with a little soap and let it dry; hot water softens it.';

export const knifeCaution =
  'Cut away from your hand when you take off strings and brims. Sand wet or with a mask: the dust is fine.';
