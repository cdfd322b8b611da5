import type { DemoPerson, DemoPrinter, DemoPurchase } from './demo-types.js';

export const people: DemoPerson[] = [
  {
    role: 'owner',
    name: 'Merrin Holloway',
    email: 'merrin@saltmarsh.example',
    countryCode: 'IE',
    isVerified: true,
  },
  {
    role: 'maker',
    name: 'Tamsin Quill',
    email: 'tamsin@saltmarsh.example',
    countryCode: 'IE',
    isVerified: true,
  },
  {
    role: 'helper',
    name: 'Odo Fenwick',
    email: 'odo@saltmarsh.example',
    countryCode: 'IE',
    isVerified: true,
  },
  {
    role: 'bookkeeper',
    name: 'Ines Varga',
    email: 'ines@saltmarsh.example',
    countryCode: 'IE',
    isVerified: true,
  },
  { role: 'buyer', name: 'Pia Lund', email: 'pia.lund@mail.example', countryCode: 'DK', isVerified: true },
  {
    role: 'buyer',
    name: 'Jonas Abara',
    email: 'jonas.abara@mail.example',
    countryCode: 'DE',
    isVerified: true,
  },
  { role: 'buyer', name: 'Enno Rask', email: 'enno.rask@mail.example', countryCode: 'NL', isVerified: true },
  {
    role: 'buyer',
    name: 'Sorrel Vane',
    email: 'sorrel.vane@mail.example',
    countryCode: 'FR',
    isVerified: true,
  },
  {
    role: 'buyer',
    name: 'Bryony Tarn',
    email: 'bryony.tarn@mail.example',
    countryCode: 'AT',
    isVerified: true,
  },
  { role: 'buyer', name: 'Rhea Moss', email: 'rhea.moss@mail.example', countryCode: 'FR', isVerified: false },
];

/** Pia prints on a middling and on a small machine; Jonas on one that is tall and narrow. */
export const printers: DemoPrinter[] = [
  {
    ownerEmail: 'pia.lund@mail.example',
    name: 'By the window',
    bed: { xMm: 220, yMm: 220, zMm: 250 },
    nozzleMm: 0.4,
    materials: [
      { material: 'PETG', pricePerKgMinor: 2290 },
      { material: 'PLA', pricePerKgMinor: 1850 },
    ],
    clearance: 'zero',
  },
  {
    ownerEmail: 'pia.lund@mail.example',
    name: 'The small one',
    bed: { xMm: 120, yMm: 120, zMm: 120 },
    nozzleMm: 0.4,
    materials: [{ material: 'PLA', pricePerKgMinor: 1850 }],
    clearance: null,
  },
  {
    ownerEmail: 'jonas.abara@mail.example',
    name: 'Cellar',
    bed: { xMm: 180, yMm: 180, zMm: 400 },
    nozzleMm: 0.6,
    materials: [
      { material: 'PETG', pricePerKgMinor: 2600 },
      { material: 'Reed-filled', pricePerKgMinor: 3900 },
    ],
    clearance: 'plus',
  },
];

/**
 * Pia bought Curlew before its second issue came out: she has parts to reprint. Jonas bought it for his school, and
 * Pia gave Teal away while she was on the road, so that nobody can be sure where she was.
 */
export const purchases: DemoPurchase[] = [
  {
    buyerEmail: 'pia.lund@mail.example',
    lines: [{ kitSlug: 'curlew', licence: 'personal' }],
    couponCode: 'WINDFALL',
    boughtAt: 'Mk 1.0',
  },
  {
    buyerEmail: 'jonas.abara@mail.example',
    lines: [
      { kitSlug: 'teal', licence: 'personal' },
      { kitSlug: 'godwit', licence: 'personal' },
    ],
    couponCode: 'CHIME2',
    boughtAt: 'Mk 1.0',
    givenBack: {
      kitSlug: 'godwit',
      minor: 350,
      reason: 'The first issue came without its reed gauge; a quarter goes back.',
    },
  },
  {
    buyerEmail: 'jonas.abara@mail.example',
    lines: [{ kitSlug: 'curlew', licence: 'classroom' }],
    couponCode: null,
    boughtAt: 'Mk 1.0',
    business: {
      name: 'Abara Music School',
      address: 'Am Siel 12\n26506 Norden',
      vatNumber: 'DE123456789',
    },
  },
  {
    buyerEmail: 'pia.lund@mail.example',
    lines: [{ kitSlug: 'teal', licence: 'personal' }],
    couponCode: null,
    boughtAt: 'Mk 1.0',
    gift: {
      email: 'rhea.moss@mail.example',
      giver: 'Pia',
      greeting: 'For the evenings that come early now.',
    },
    paidFrom: { billing: 'SE', card: 'NO' },
  },
  {
    buyerEmail: 'jonas.abara@mail.example',
    lines: [{ kitSlug: 'dunlin', licence: 'personal' }],
    couponCode: null,
    boughtAt: 'Mk 1.0',
  },
];
