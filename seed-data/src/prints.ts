import type { DemoPrints } from './demo-types.js';

/** Pia stands in the middle of her Curlew: the low pipes are still to come, and one stopper of six is there. */
export const prints: DemoPrints[] = [
  {
    buyerEmail: 'pia.lund@mail.example',
    kitSlug: 'curlew',
    notYet: ['P-72', 'P-73', 'P-74'],
    begun: { 'S-02': 1 },
  },
];
