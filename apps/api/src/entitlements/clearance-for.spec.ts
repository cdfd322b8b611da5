import { clearanceFor } from './clearance-for.js';

describe('the clearance somebody prints', () => {
  it('is the one said for the kit, else the habit of the printer, else not known', () => {
    expect(clearanceFor({ clearance: 'minus' }, { clearance: 'plus' })).toBe('minus');
    expect(clearanceFor({ clearance: 'zero' }, { clearance: 'plus' })).toBe('zero');
    expect(clearanceFor({ clearance: null }, { clearance: 'plus' })).toBe('plus');
    expect(clearanceFor({ clearance: null }, null)).toBeNull();
  });
});
