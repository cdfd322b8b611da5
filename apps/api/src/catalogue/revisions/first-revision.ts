import type { RevisionDetail } from '@windchest/contracts';

/**
 * What the first revision of a kit starts from: a common desktop printer, 0.2 mm layers, a room at 20 °C,
 * and the cautions that hold for every printed instrument. The maker edits all of it.
 */
export const firstRevision: Pick<
  RevisionDetail,
  'assemblyNotes' | 'cautions' | 'printSpec' | 'hardware' | 'buildVolume' | 'declaredCents' | 'room'
> = {
  assemblyNotes: '',
  cautions: `**Printing.** Molten plastic gives off fumes and fine particles: print in a ventilated room. Nozzle and bed are hot. Do not leave a printer running unattended.

**Making.** Mind knives and drills. Wear a mask when you sand and eye protection where a band or string is stretched. Read the label of your glue.

**Playing.** Layer lines hold germs: a mouthpiece is one person's own, and printed plastic is not food-safe unless made so. Small parts are not for children under three. Loud instruments harm hearing at the ear.

**Selling prints.** Toy-safety, product-safety and consumer law of your country apply to what you sell: ask a licensed professional.
`,
  printSpec: {
    nozzleMm: 0.4,
    layerMm: 0.2,
    perimeters: 3,
    topLayers: 5,
    bottomLayers: 4,
    infill: 0.15,
    material: 'PLA',
    supports: 'none',
    remarks: '',
  },
  hardware: [],
  buildVolume: { xMm: 220, yMm: 220, zMm: 250 },
  declaredCents: 15,
  room: { temperatureC: 20, a4Hz: 440 },
};
