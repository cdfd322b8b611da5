import { readPrinterCard } from './printer-card.js';

const card = {
  bed: { xMm: 220, yMm: 220, zMm: 250 },
  nozzleMm: 0.4,
  material: 'PETG',
  pricePerKgMinor: 2300,
};

describe('readPrinterCard', () => {
  it('reads a card as it was kept', () => {
    expect(readPrinterCard(JSON.stringify(card))).toEqual(card);
  });

  it.each([
    ['nothing', null],
    ['damaged text', '{'],
    ['a card without a bed', JSON.stringify({ ...card, bed: undefined })],
    ['a bed of no height', JSON.stringify({ ...card, bed: { ...card.bed, zMm: 0 } })],
    ['a nozzle as wide as a pipe', JSON.stringify({ ...card, nozzleMm: 14 })],
  ])('is no card for %s', (_, text) => {
    expect(readPrinterCard(text)).toBeNull();
  });
});
