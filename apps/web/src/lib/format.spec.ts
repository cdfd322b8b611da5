import {
  buildVolume,
  bytes,
  cents,
  counted,
  date,
  grams,
  hoursRange,
  millimetres,
  number,
  price,
  signed,
} from './format.js';

describe('numbers for readers', () => {
  it('group thousands and keep no more decimals than asked for', () => {
    expect(number(12_345.678, 1)).toBe('12,345.7');
    expect(number(3)).toBe('3');
  });

  it('have the true minus sign, not a hyphen', () => {
    expect(number(-4)).toBe('−4');
    expect(signed(-0.12, 2)).toBe('−0.12');
    expect(price({ minor: -1600, currency: 'EUR' })).toBe('−€16.00');
  });

  it('carry a sign and all decimals where a change is told, and none for no change', () => {
    expect(signed(1.5, 2)).toBe('+1.50');
    expect(signed(0, 2)).toBe('0.00');
    expect(signed(-0.001, 2)).toBe('0.00');
  });

  it('name cents in the singular once', () => {
    expect(cents(9)).toBe('+9 cents');
    expect(cents(-1)).toBe('−1 cent');
    expect(cents(0)).toBe('0 cents');
  });

  it('say sizes in mm, masses in g or kg', () => {
    expect(millimetres(158.54)).toBe('158.5 mm');
    expect(millimetres(220)).toBe('220 mm');
    expect([grams(0.42), grams(9.96), grams(640)]).toEqual(['0.4 g', '10 g', '640 g']);
    expect(grams(1240)).toBe('1.24 kg');
    expect(buildVolume({ xMm: 220, yMm: 220, zMm: 250 })).toBe('220 × 220 × 250');
  });

  it('count one and many', () => {
    expect(counted(1, 'plate', 'plates')).toBe('1 plate');
    expect(counted(6, 'plate', 'plates')).toBe('6 plates');
    expect(counted(0, 'plate', 'plates')).toBe('0 plates');
  });
});

describe('bytes', () => {
  it.each([
    [0, '0 B'],
    [999, '999 B'],
    [1_100_000, '1.1 MB'],
    [14_000_000, '14 MB'],
    [999_600, '1 MB'],
    [4_294_967_296, '4.3 GB'],
  ])('writes %d as %s', (count, text) => {
    expect(bytes(count)).toBe(text);
  });
});

describe('hoursRange', () => {
  it('is a range of hours, one figure where both ends round to the same', () => {
    expect(hoursRange(31.2, 37.8)).toBe('31–38 h');
    expect(hoursRange(2.04, 2.01)).toBe('2 h');
    expect(hoursRange(1.84, 2.36)).toBe('1.8–2.4 h');
  });

  it('falls back to minutes, in fives, under an hour', () => {
    expect(hoursRange(0.5, 0.72)).toBe('30–45 min');
    expect(hoursRange(0.02, 0.05)).toBe('5 min');
  });
});

describe('date', () => {
  it('names the month, so that no reader takes it for the day', () => {
    expect(date('2026-11-12T12:00:00Z')).toBe('12 Nov 2026');
  });
});
