import { chargedPrice, isTaxWithin, taxTreatmentOf } from './tax-treatment.js';

const german = { vatNumber: 'DE123456789' };
const none = { vatNumber: '' };

describe('how a sale is taxed', () => {
  it.each([
    ['a consumer at home', 'IE', 'IE', null, 'consumer'],
    ['a consumer elsewhere in the Union', 'IE', 'DE', null, 'consumer'],
    ['a consumer outside the Union', 'IE', 'US', null, 'consumer'],
    ['a business at home, with a number', 'DE', 'DE', german, 'domestic-business'],
    ['a business at home, without one', 'DE', 'DE', none, 'domestic-business'],
    ['a business elsewhere in the Union', 'IE', 'DE', german, 'reverse-charge'],
    ['one whose number is of another country', 'IE', 'FR', german, 'consumer'],
    ['one without a number', 'IE', 'DE', none, 'consumer'],
    ['a business outside the Union', 'IE', 'US', none, 'business-abroad'],
    ['a business of the Union buying from outside it', 'CH', 'DE', german, 'reverse-charge'],
  ] as const)('%s', (_, seller, buyer, business, treatment) => {
    expect(taxTreatmentOf(seller, buyer, business)).toBe(treatment);
  });

  // Python decimal, ROUND_HALF_UP: 24.00 / 1.19 = 20.168…, 9.00 / 1.19 = 7.563…
  it('charges a business under reverse charge the price without its country’s tax', () => {
    const terms = { treatment: 'reverse-charge', ratePercent: '19', currency: 'EUR' } as const;
    expect(chargedPrice(2400, terms)).toBe(2017);
    expect(chargedPrice(900, terms)).toBe(756);
    expect(chargedPrice(0, terms)).toBe(0);
  });

  it('charges everybody else the price as it stands', () => {
    for (const treatment of ['consumer', 'domestic-business'] as const)
      expect(chargedPrice(2400, { treatment, ratePercent: '19', currency: 'EUR' })).toBe(2400);
    // Where the shop knows no tax there is none within the price.
    expect(chargedPrice(2400, { treatment: 'business-abroad', ratePercent: null, currency: 'EUR' })).toBe(
      2400,
    );
    expect(isTaxWithin('reverse-charge')).toBe(false);
  });
});
