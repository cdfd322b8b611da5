import type { DemoWorkshop, KitPlan } from './demo-types.js';
import { curlew } from './kits/curlew.js';
import { dunlin } from './kits/dunlin.js';
import { godwit } from './kits/godwit.js';
import { teal } from './kits/teal.js';
import { turnstone } from './kits/turnstone.js';
import { fitReports } from './fit-reports.js';
import { prints } from './prints.js';
import { people, printers, purchases } from './people.js';
import { plans, pledges } from './pledges.js';
import { letters, newsReaders } from './letters.js';
import { posts } from './posts.js';

export const kitPlans: readonly KitPlan[] = [curlew, teal, dunlin, godwit, turnstone];

/** A small workshop that exists nowhere, with all it needs to open its shop. */
export const demoWorkshop: DemoWorkshop = {
  workshop: {
    name: 'Saltmarsh Sound Works',
    motto: 'Instruments you print.',
    about:
      'Saltmarsh Sound Works draws instruments that other people print. Each kit is named after a bird of the shore, measured, voiced and proved on other people’s printers before it goes out.',
    currency: 'EUR',
    countryCode: 'IE',
    legalName: 'Saltmarsh Sound Works',
    addressLines: ['The Old Net Loft', 'Sluice Lane 4', 'Ebbmouth'],
    email: 'hello@saltmarsh.example',
  },
  people,
  printers,
  kits: kitPlans.map(({ kit }) => kit),
  coupons: [
    {
      code: 'WINDFALL',
      label: 'A third off for the first 150',
      off: { kind: 'fraction', numerator: 1, denominator: 3 },
      kitSlugs: ['curlew'],
      cap: 150,
      perBuyer: 1,
      isAnnounced: true,
    },
    {
      code: 'CHIME2',
      label: '€2 off Teal',
      off: { kind: 'amount', minor: 200 },
      kitSlugs: ['teal'],
      cap: null,
      perBuyer: 1,
      isAnnounced: false,
    },
  ],
  purchases,
  plans,
  pledges,
  posts,
  prints,
  fitReports,
  newsReaders,
  letters,
};
