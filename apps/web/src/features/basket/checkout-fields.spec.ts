import { checkoutSchema, emptyCheckout, toCheckout, type CheckoutFields } from './checkout-fields.js';

const filled = (changes: Partial<CheckoutFields> = {}): CheckoutFields => ({
  ...emptyCheckout('ada@saltmarsh.example', 'Ada'),
  country: 'DE',
  hasConsented: true,
  ...changes,
});
const business = { name: 'Reed Works', address: 'Deichweg 3\n26506 Norden', vatNumber: 'DE 123 456 789' };
const faults = (fields: CheckoutFields) =>
  checkoutSchema.safeParse(toCheckout(fields)).error?.issues.map((issue) => issue.path.join('.'));

describe('the fields of the checkout', () => {
  it('leave out what is not ticked, whatever stands there', () => {
    const fields = filled({ business, gift: { email: 'x', giver: '', greeting: '' } });
    expect(checkoutSchema.parse(toCheckout(fields))).toEqual({
      email: 'ada@saltmarsh.example',
      country: 'DE',
      hasConsented: true,
    });
  });

  it('ask a business for name and address, and look at the form of its number', () => {
    expect(faults(filled({ isBusiness: true }))).toEqual(['business.name', 'business.address']);
    expect(faults(filled({ isBusiness: true, business }))).toBeUndefined();
    expect(faults(filled({ isBusiness: true, business: { ...business, vatNumber: '' } }))).toBeUndefined();
    expect(faults(filled({ isBusiness: true, business, country: 'AT' }))).toEqual(['business.vatNumber']);
    // Outside the Union no form is known.
    expect(faults(filled({ isBusiness: true, business, country: 'CH' }))).toBeUndefined();
  });

  it('ask whom a gift is for, from whom, and for a line to go with it', () => {
    const gift = { email: 'wren', giver: ' ', greeting: 'See www.example.com' };
    expect(faults(filled({ isGift: true, gift }))).toEqual(['gift.email', 'gift.giver', 'gift.greeting']);
  });
});
