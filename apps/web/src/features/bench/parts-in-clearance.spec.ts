import type { PrintSheetPart } from '@windchest/contracts';
import { clearanceEffect, partsInClearance } from './parts-in-clearance.js';

const part = (code: string, more: Partial<PrintSheetPart> = {}): PrintSheetPart => ({
  code,
  name: 'Part',
  quantity: 2,
  orientation: 'may-turn',
  sizeMm: { x: 10, y: 10, z: 10 },
  heightMm: 10,
  footprint: null,
  profile: null,
  printSpec: null,
  isGauge: false,
  variants: [],
  ...more,
});
const looser = {
  clearance: 'plus' as const,
  sizeMm: { x: 9.8, y: 10, z: 10 },
  heightMm: 10,
  footprint: null,
  profile: null,
};
const parts = [
  part('J-01', { variants: [looser] }),
  part('J-02'),
  part('J-90', { isGauge: true, variants: [looser] }),
];

describe('parts in the clearance of a printer', () => {
  it('have the shape of that clearance where they come in it, and keep code and quantity', () => {
    const [joint, plain] = partsInClearance(parts, 'plus');
    expect(joint).toMatchObject({ code: 'J-01', quantity: 2, sizeMm: { x: 9.8 } });
    expect(plain).toBe(parts[1]);
  });

  it('are as drawn in zero, and in a clearance they do not come in', () => {
    expect(partsInClearance(parts, 'zero')[0]).toBe(parts[0]);
    expect(partsInClearance(parts, 'minus')[0]).toBe(parts[0]);
  });

  it('leave the gauge out once the clearance is known, and in while it is not', () => {
    expect(partsInClearance(parts, 'zero').map(({ code }) => code)).toEqual(['J-01', 'J-02']);
    expect(partsInClearance(parts, null)).toBe(parts);
  });

  it('are worth a sentence only where the clearance changes something', () => {
    expect(clearanceEffect(parts, 'plus')).toEqual({ clearance: 'plus', gauges: ['J-90'] });
    expect(clearanceEffect(parts, null)).toBeNull();
    expect(clearanceEffect([part('P-01')], 'plus')).toBeNull();
  });
});
