import { printerCardBody } from '@windchest/contracts';
import { printerBodyOf, printerForm } from './printer-form.js';
import { printerWords } from './printer-words.js';

const card = {
  name: 'Loft',
  bed: { xMm: 220, yMm: 220, zMm: 250 },
  nozzleMm: 0.4,
  materials: [
    { material: 'PETG', pricePerKgMinor: 2290 },
    { material: 'Reed-filled', pricePerKgMinor: null },
  ],
  clearance: 'plus' as const,
};

describe('the form of a printer card', () => {
  it('gives back the card it was filled with, prices in the currency’s own minor units', () => {
    for (const currency of ['EUR', 'JPY', 'TND']) {
      const form = printerForm({ ...card, isMain: true }, currency);
      expect(printerCardBody.parse(printerBodyOf(currency)(form))).toEqual({ ...card, isMain: true });
    }
    expect(printerForm(card, 'EUR').materials.map(({ price }) => price)).toEqual(['22.90', '']);
  });

  it('is refused for a price that is none, and for one filament twice', () => {
    const form = printerForm(card, 'EUR');
    const faults = (materials: typeof form.materials) =>
      printerCardBody
        .safeParse(printerBodyOf('EUR')({ ...form, materials }))
        .error?.issues.map(({ path }) => path.join('.'));
    expect(faults([{ material: 'PLA', price: 'cheap' }])).toEqual(['materials.0.pricePerKgMinor']);
    expect(
      faults([
        { material: 'PLA', price: '' },
        { material: 'pla ', price: '1' },
      ]),
    ).toEqual(['materials']);
    expect(faults([])).toEqual(['materials']);
  });

  it('is told in a line', () => {
    expect(printerWords(card, 'EUR')).toBe(
      '0.4 mm nozzle · PETG at €22.90 a kg, Reed-filled · clearance + looser than drawn',
    );
  });
});
