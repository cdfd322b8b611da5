import { placeOf, type PlacedOrder } from './order-country.js';

const order = (changes: Partial<PlacedOrder>): PlacedOrder => ({
  declaredCountry: 'DE',
  paymentCountry: 'AT',
  cardCountry: 'AT',
  settledCountry: null,
  taxTreatment: 'consumer',
  ...changes,
});

describe('where an order is taxed', () => {
  it('is where two pieces of evidence agree, for a consumer', () => {
    expect(placeOf(order({}))).toEqual({ country: 'AT', isClear: true });
    expect(placeOf(order({ cardCountry: 'FR' }))).toEqual({ country: 'DE', isClear: false });
  });

  it('is where a business is established, and unclear where the evidence says otherwise', () => {
    const business = { taxTreatment: 'reverse-charge' } as const;
    expect(placeOf(order(business))).toEqual({ country: 'DE', isClear: false });
    expect(placeOf(order({ ...business, cardCountry: 'DE' }))).toEqual({ country: 'DE', isClear: true });
  });

  it('is what was settled by hand', () => {
    expect(placeOf(order({ settledCountry: 'FR', cardCountry: null }))).toEqual({
      country: 'FR',
      isClear: true,
    });
  });
});
