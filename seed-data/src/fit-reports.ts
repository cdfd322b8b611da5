import type { DemoFitReport } from './demo-types.js';

const onBigBox = { printerName: 'The big box', nozzleMm: 0.4, layerMm: 0.2 };

/** What buyers say about how Curlew and Teal came out. */
export const fitReports: DemoFitReport[] = [
  {
    buyerEmail: 'pia.lund@mail.example',
    kitSlug: 'curlew',
    partIndex: 0,
    ...onBigBox,
    material: 'PETG',
    verdict: 'tight',
    gapMm: -0.15,
    words: 'Slid in after a few strokes of the file. The second one too.',
    answer: 'Thank you for measuring. The next issue gives it 0.1 mm more on each side.',
  },
  {
    buyerEmail: 'pia.lund@mail.example',
    kitSlug: 'curlew',
    partIndex: 1,
    ...onBigBox,
    material: 'PLA',
    verdict: 'right',
    gapMm: null,
    words: '',
    answer: null,
  },
  {
    buyerEmail: 'jonas.abara@mail.example',
    kitSlug: 'teal',
    partIndex: 0,
    printerName: 'Kitchen printer',
    nozzleMm: 0.6,
    layerMm: 0.3,
    material: 'PLA',
    verdict: 'loose',
    gapMm: 0.1,
    words: 'Rattles a little on the long notes. A strip of felt tape stopped it.',
    answer: null,
  },
];
