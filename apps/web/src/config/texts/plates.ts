/** What a kit takes on one printer: fit, plates, filament, hours. */
export const platesTexts = {
  loading: 'Fetching the outlines of the parts',
  loadFailed: 'The plates cannot be laid out',
  packing: 'Laying out the plates',
  refused: 'The plates cannot be laid out so',

  summary: (plates: string, hours: string | null, mass: string | null, cost: string | null) =>
    [plates, hours, mass && `${mass} of filament`, cost && `about ${cost}`].filter(Boolean).join(', '),
  onePlate: 'plate',
  manyPlates: 'plates',
  forSome: (plates: string, on: string, all: string) => `${plates} for ${on} of ${all} parts`,
  onePiece: 'piece',
  manyPieces: 'pieces',
  nothing: 'No part goes on a plate of this printer.',

  fitAll: (count: number, volume: string) =>
    count === 1 ? `The part fits ${volume} mm.` : `All ${count} parts fit ${volume} mm.`,
  fitMost: (fitting: number, count: number, volume: string) =>
    `${fitting} of ${count} parts fit ${volume} mm.`,
  fitTurned: (codes: string) => `Turned on the bed: ${codes}.`,
  fitTurnedBy: (code: string, degrees: string) => `${code} by ${degrees}°`,
  fitLaid: (codes: string) => `Laid on a side, as the maker allows: ${codes}.`,
  fitStood: (codes: string) => `Stood on a side, as the maker allows: ${codes}.`,
  fitOver: {
    x: (parts: string) => `Too wide: ${parts}.`,
    y: (parts: string) => `Too deep: ${parts}.`,
    z: (parts: string) => `Too tall: ${parts}.`,
  },
  fitOverBy: (part: string, over: string) => `${part} by ${over}`,
  fitMargin: (codes: string, margin: string) =>
    `On no plate, because a margin of ${margin} leaves too little room: ${codes}. Make it smaller if your printer allows.`,
  fitUnmeasured: (codes: string) => `Without a size yet: ${codes}.`,
  fitNozzle: (drawnFor: string, yours: string) =>
    `The kit is drawn for a ${drawnFor} nozzle; yours is ${yours}. The figures are for the maker’s settings.`,

  inClearance: (clearance: string, gauges: string) =>
    `Parts that come in several clearances are taken in ${clearance}, as your printer card says.${gauges && ` The gauge ${gauges} is left out: it has told you that.`}`,

  thePlate: 'The plate',
  plateOf: (at: number, count: number) => `Plate ${at} of ${count}`,
  thumb: (at: number, pieces: string) => `Plate ${at}, ${pieces}`,
  allPlates: 'All plates',
  previous: 'Previous plate',
  next: 'Next plate',
  drawn: (plate: string, pieces: string, bed: string) =>
    `${plate}, drawn to scale on a bed of ${bed} mm: ${pieces}`,
  timesPart: (quantity: string, code: string) => `${quantity} × ${code}`,
  placed: {
    turned: (degrees: string) => `turned by ${degrees}°`,
    laid: 'laid on a side',
  },

  layout: 'Room on the plate',
  gap: 'Between pieces',
  margin: 'Along the edges',
  lengthRefused: (most: string) => `Write a length from 0 to ${most} mm.`,

  filament: 'Filament',
  material: 'The maker prints in',
  printedIn: 'You print in',
  printedInOf: (material: string) => `What you print in where the maker prints in ${material}`,
  grams: 'Weight',
  metres: 'Length',
  spools: 'Spools',
  cost: 'Cost',
  total: 'In all',
  spoolSize: 'A spool holds',
  spoolSizes: { 1000: '1 kg', 750: '750 g' },
  notOnCard: (material: string) => `${material}, not on your card`,
  noDensity: (yours: string, makers: string) =>
    `What ${yours} weighs is not known here, so weight, length and cost are left out. Choose ${makers} to see what the maker’s filament comes to.`,
  noPrice: (material: string) => `${material} has no price on your card, so its cost is left out.`,
  otherMaterial: (makers: string, yours: string) =>
    `The kit is drawn for ${makers}; the figures are for ${yours}. In another filament, fits and notes may come out otherwise.`,

  offBy: (percent: string) =>
    `Weight and length may be off by ${percent} % either way: slicing programs differ by as much over the same parts.`,
  plainWeight: (weights: string) =>
    `Weights are of plain filament (${weights}); filled or foamed kinds differ.`,
  weightOf: (material: string, density: string) => `${material} ${density} g/cm³`,
  filamentDiameter: (diameter: string) => `Lengths are of ${diameter} filament.`,
  hoursSpan: 'The hours span a quick printer and a careful one. Heating up is not in them.',
  leftOut: 'Brims, purging and prints that fail come on top.',
  supports: 'So do the supports this kit asks for.',
  noEstimate: (codes: string) => `Without filament and hours, since they cannot be estimated: ${codes}.`,
  howSure: 'How far this may be off',

  everyPart: (count: number) =>
    count === 1 ? 'The part on this printer' : `All ${count} parts on this printer`,
  part: 'Part',
  pieces: 'Pieces',
  lies: 'On the bed',
  rule: 'The maker allows',
  eachWeight: 'Weight each',
  eachTime: 'Time each',
  rules: {
    'as-exported': 'only as drawn',
    'may-turn': 'turning',
    'may-lie': 'turning and laying',
  },
  liesAs: {
    asDrawn: 'fits as drawn',
    turned: (degrees: string) => `fits turned by ${degrees}°`,
    laid: 'fits laid on a side',
    stood: 'fits stood on a side',
    over: {
      x: (over: string) => `${over} too wide`,
      y: (over: string) => `${over} too deep`,
      z: (over: string) => `${over} too tall`,
    },
    margin: 'fits, but reaches into the margin',
  },
  unknown: 'not known',
};
