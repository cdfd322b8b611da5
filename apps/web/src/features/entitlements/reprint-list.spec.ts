import type { ShelfKit } from '@windchest/contracts';
import { countReprints, reprintRows } from './reprint-list.js';

type ShelfPart = ShelfKit['parts'][number];

const part = (code: string, more: Partial<ShelfPart> = {}): ShelfPart => ({
  code,
  name: 'Pipe',
  quantity: 1,
  clearance: null,
  difference: 'same',
  mark: null,
  reason: '',
  whatDiffers: '',
  drawing: null,
  ...more,
});
const tongue = {
  name: 'Locking tongue',
  difference: 'changed',
  mark: 'reprint needed',
  reason: 'Too tight in PETG',
  whatDiffers: '−0.12 mm width',
} as const;

describe('what to reprint between two revisions', () => {
  const parts = [
    part('P-72'),
    part('P-73', { difference: 're-exported', whatDiffers: 'the same shape, exported again' }),
    part('R-01', {
      difference: 'changed',
      mark: 'reprint if it troubles you',
      whatDiffers: '+1.50 mm height',
    }),
    part('J-01', tongue),
    part('J-02', { ...tongue, quantity: 2 }),
    part('F-01', { difference: 'new', whatDiffers: 'a new part' }),
    part('C-01', { difference: 'changed', whatDiffers: '+0.1 % volume' }),
    part('X-01', { difference: 'dropped', whatDiffers: 'no longer in the kit' }),
  ];

  it('counts parts of the newer revision only, new ones among those to print', () => {
    expect(countReprints(parts)).toEqual({ all: 7, print: 3, ifItTroubles: 1, same: 2 });
  });

  it('counts a kit that stayed as it was as nothing to print', () => {
    expect(countReprints([part('P-72')])).toEqual({ all: 1, print: 0, ifItTroubles: 0, same: 1 });
  });

  it('lists what differs, most urgent first, and leaves out what stays as it is', () => {
    expect(reprintRows(parts).map(({ codes, advice }) => [codes.join(), advice])).toEqual([
      ['J-01,J-02', 'print'],
      ['F-01', 'print'],
      ['R-01', 'if-it-troubles'],
      ['C-01', 'not-asked'],
      ['X-01', 'dropped'],
    ]);
  });

  it('adds up the pieces of parts that share a row', () => {
    expect(reprintRows(parts)[0]).toMatchObject({ name: 'Locking tongue', pieces: 3 });
  });

  it('keeps parts apart that differ in another way or for another reason', () => {
    const apart = [part('J-01', tongue), part('J-02', { ...tongue, reason: 'Too loose in PLA' })];
    expect(reprintRows(apart)).toHaveLength(2);
  });

  it('tells of a part of which more pieces are needed', () => {
    const more = part('S-01', { whatDiffers: '2 → 3 pieces' });
    expect(reprintRows([more])).toMatchObject([{ codes: ['S-01'], whatDiffers: '2 → 3 pieces' }]);
    expect(countReprints([more]).same).toBe(0);
  });
});
