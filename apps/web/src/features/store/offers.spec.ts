import { type Offer, offerForCard, offerForLicence } from './offers.js';

const offer = (rest: Partial<Offer>): Offer => ({
  kitSlug: 'curlew',
  licenceId: 'personal',
  code: 'WINDFALL',
  label: 'A third off for the first 150',
  price: { minor: 1600, currency: 'EUR' },
  cap: 150,
  left: 41,
  endsAt: null,
  ...rest,
});
const curlew = { slug: 'curlew', price: { minor: 2400, currency: 'EUR' } };

describe('announced offers', () => {
  it('a kit shows the offer that makes it cheapest', () => {
    const offers = [
      offer({ code: 'TENTH', price: { minor: 2160, currency: 'EUR' } }),
      offer({}),
      offer({ kitSlug: 'teal', price: { minor: 100, currency: 'EUR' } }),
    ];
    expect(offerForCard(curlew, offers)?.code).toBe('WINDFALL');
  });

  it('an offer for a dearer licence alone does not strike the kit’s price', () => {
    expect(
      offerForCard(curlew, [offer({ licenceId: 'small-run', price: { minor: 6400, currency: 'EUR' } })]),
    ).toBe(undefined);
  });

  it('an offer whose places are taken is not shown; one that nobody counts is', () => {
    expect(offerForCard(curlew, [offer({ left: 0 })])).toBeUndefined();
    expect(offerForCard(curlew, [offer({ left: null, cap: null })])).toBeDefined();
  });

  it('a licence finds its own offer', () => {
    const offers = [offer({}), offer({ licenceId: 'small-run', price: { minor: 6400, currency: 'EUR' } })];
    expect(offerForLicence('small-run', offers)?.price.minor).toBe(6400);
    expect(offerForLicence('classroom', offers)).toBeUndefined();
  });
});
