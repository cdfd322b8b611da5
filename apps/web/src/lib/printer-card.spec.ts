import { readPrinterCard } from './printer-card.js';

const card = {
  name: 'My printer',
  bed: { xMm: 220, yMm: 220, zMm: 250 },
  nozzleMm: 0.4,
  materials: [
    { material: 'PETG', pricePerKgMinor: 2300 },
    { material: 'Reed-filled', pricePerKgMinor: null },
  ],
  clearance: 'plus',
};

describe('readPrinterCard', () => {
  it('reads a card as it was kept', () => {
    expect(readPrinterCard(JSON.stringify(card))).toEqual(card);
  });

  it('drops what does not belong on a card and a clearance nobody knows', () => {
    const kept = { ...card, clearance: 'wide', colour: 'teal' };
    expect(readPrinterCard(JSON.stringify(kept))).toEqual({ ...card, clearance: null });
  });

  it.each([
    ['nothing', null],
    ['damaged text', '{'],
    ['a card without a bed', JSON.stringify({ ...card, bed: undefined })],
    ['a bed of no height', JSON.stringify({ ...card, bed: { ...card.bed, zMm: 0 } })],
    ['a nozzle as wide as a pipe', JSON.stringify({ ...card, nozzleMm: 14 })],
    ['a card without a filament', JSON.stringify({ ...card, materials: [] })],
    [
      'a price that is a word',
      JSON.stringify({ ...card, materials: [{ material: 'PLA', pricePerKgMinor: 'x' }] }),
    ],
    ['filaments that are one word', JSON.stringify({ ...card, materials: 'PLA' })],
  ])('is no card for %s', (_, text) => {
    expect(readPrinterCard(text)).toBeNull();
  });
});
