import fc from 'fast-check';
import { money, MoneyError, refundOf, sum } from './index.js';

const eur = (minor: number) => money(minor, 'EUR');

describe('a refund of a line', () => {
  it('gives back what was paid, not the price before the discount', () => {
    expect(refundOf({ paid: eur(1600), refunded: [] })).toEqual(eur(1600));
  });

  it('gives back what remains after earlier refunds, and then nothing', () => {
    expect(refundOf({ paid: eur(1600), refunded: [eur(500)] })).toEqual(eur(1100));
    expect(refundOf({ paid: eur(1600), refunded: [eur(500), eur(1100)] })).toEqual(eur(0));
  });

  it('gives back the part asked for, up to what remains', () => {
    expect(refundOf({ paid: eur(1600), refunded: [eur(500)] }, eur(1100))).toEqual(eur(1100));
    expect(() => refundOf({ paid: eur(1600), refunded: [eur(500)] }, eur(1101))).toThrow(MoneyError);
  });

  it('refuses amounts below zero, another currency, and a line given back beyond what was paid', () => {
    expect(() => refundOf({ paid: eur(-1), refunded: [] })).toThrow('below zero');
    expect(() => refundOf({ paid: eur(5), refunded: [eur(-1)] })).toThrow('below zero');
    expect(() => refundOf({ paid: eur(5), refunded: [] }, eur(-1))).toThrow('below zero');
    expect(() => refundOf({ paid: eur(5), refunded: [] }, money(1, 'JPY'))).toThrow('currency');
    expect(() => refundOf({ paid: eur(5), refunded: [eur(6)] })).toThrow('More was given back');
  });

  it('never gives back more than was paid, however it is parted', () => {
    fc.assert(
      fc.property(fc.nat(1e6), fc.array(fc.nat(1e5)), (paid, asks) => {
        const refunded = [eur(0)];
        for (const ask of asks) {
          const remains = refundOf({ paid: eur(paid), refunded });
          refunded.push(refundOf({ paid: eur(paid), refunded }, eur(Math.min(ask, remains.minor))));
        }
        refunded.push(refundOf({ paid: eur(paid), refunded }));
        expect(sum(refunded)).toEqual(eur(paid));
      }),
    );
  });
});
