import type { DemoPlan, DemoPledge } from './demo-types.js';

export const plans: DemoPlan[] = [
  {
    name: 'Tide table',
    words: 'The two small kits, for as long as you like. It pays for filament that becomes test pieces.',
    amountMinor: 400,
    kitSlugs: ['dunlin', 'teal'],
    keepsAfter: 'nothing',
  },
  {
    name: 'High water',
    words:
      'Every kit on the bench, and each new one from the day it is released. It pays for a day of drawing a month.',
    amountMinor: 900,
    kitSlugs: null,
    keepsAfter: 'released-during',
  },
];

export const pledges: DemoPledge[] = [
  { supporterEmail: 'enno.rask@mail.example', planName: 'High water', isEnding: false },
  { supporterEmail: 'sorrel.vane@mail.example', planName: 'Tide table', isEnding: false },
  { supporterEmail: 'bryony.tarn@mail.example', planName: 'High water', isEnding: true },
];
