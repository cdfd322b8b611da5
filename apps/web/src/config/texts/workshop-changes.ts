export const changesTexts = {
  heading: 'What differs',
  none: 'No part changed its shape.',
  caption: (code: string) => `Sizes of ${code}`,
  columns: {
    size: 'Size',
    before: (label: string | undefined) => label ?? 'Before',
    now: 'Now',
    change: 'Change',
  },
  sizes: { x: 'Width', y: 'Depth', z: 'Height', volume: 'Volume', area: 'Surface' },
  unknown: '—',
  drawing: (code: string, name: string) => `${code} ${name} from above, from the front and from the right`,
  drawingMarked: (code: string, name: string, where: string) =>
    `${code} ${name} from above, from the front and from the right. Marked is where it differs most: ${where}.`,
  drawnIn: (sign: string) => `Drawn in the clearance ${sign}.`,
  dashed: (label: string) => `Dashed: ${label}.`,
  notMeasured: 'Drawn when it is measured.',
  others: {
    new: 'New',
    dropped: 'Dropped',
    're-exported': 'Exported again in the same shape',
  },
  should: 'Buyers should',
};
