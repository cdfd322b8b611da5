import type { ReprintPart } from '@windchest/contracts';
import { countReprints, piecesOf, reprintRows } from './reprint-list.js';

const part = (code: string, more: Partial<ReprintPart> = {}): ReprintPart => ({
  code,
  name: 'Pipe',
  quantity: 1,
  clearance: null,
  advice: null,
  print: 0,
  optional: 0,
  done: 1,
  spare: 0,
  difference: 'same',
  mark: null,
  steps: [],
  whatDiffers: '',
  drawing: null,
  ...more,
});
const tongue = {
  name: 'Locking tongue',
  advice: 'print',
  print: 1,
  difference: 'changed',
  mark: 'reprint needed',
  steps: [{ revision: 'Mk 1.1', mark: 'reprint needed', reason: 'Too tight in PETG' }],
  whatDiffers: '−0.12 mm width',
} as const satisfies Partial<ReprintPart>;

describe('what to print for another revision', () => {
  const parts = [
    part('P-72'),
    part('R-01', { advice: 'if-it-troubles', optional: 2, whatDiffers: '+1.50 mm height' }),
    part('J-01', tongue),
    part('J-02', { ...tongue, print: 2 }),
    part('F-01', { advice: 'print', print: 1, difference: 'new', whatDiffers: 'a new part' }),
    part('C-01', { advice: 'not-asked', whatDiffers: '+0.1 % volume' }),
    part('S-01', { advice: 'fewer', spare: 1, whatDiffers: '3 → 2 pieces' }),
    part('X-01', { advice: 'dropped', spare: 4, quantity: 0 }),
  ];

  it('counts parts of the wanted revision only', () => {
    expect(countReprints(parts)).toEqual({ all: 7, print: 3, ifItTroubles: 1, same: 1 });
    expect(piecesOf(parts)).toEqual({ print: 4, optional: 2 });
  });

  it('counts a kit that stayed as it was as nothing to print', () => {
    expect(countReprints([part('P-72')])).toEqual({ all: 1, print: 0, ifItTroubles: 0, same: 1 });
  });

  it('lists what differs, most urgent first, and leaves out what stays as it is', () => {
    expect(reprintRows(parts).map(({ codes, advice, pieces }) => [codes.join(), advice, pieces])).toEqual([
      ['J-01,J-02', 'print', 3],
      ['F-01', 'print', 1],
      ['R-01', 'if-it-troubles', 2],
      ['C-01', 'not-asked', 0],
      ['S-01', 'fewer', 0],
      ['X-01', 'dropped', 0],
    ]);
  });

  it('keeps parts apart that differ in another way or for another reason', () => {
    const other = [{ ...tongue.steps[0], reason: 'Too loose in PLA' }];
    expect(reprintRows([part('J-01', tongue), part('J-02', { ...tongue, steps: other })])).toHaveLength(2);
  });
});
