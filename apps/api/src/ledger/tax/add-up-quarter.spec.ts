import fc from 'fast-check';
import { addUp, creditsOfSettled, totalsOf, type Portion } from './add-up-quarter.js';

const portion = (changes: Partial<Portion>): Portion => ({
  sign: 1,
  treatment: 'consumer',
  country: 'DE',
  ratePercent: '19',
  currency: 'EUR',
  documents: 1,
  netMinor: 2017,
  taxMinor: 383,
  ...changes,
});

describe('the sums of a quarter', () => {
  it('take credit notes from receipts, country by country and rate by rate', () => {
    const rows = addUp([
      portion({ documents: 3, netMinor: 6051, taxMinor: 1149 }),
      portion({ sign: -1 }),
      portion({ country: 'AT', ratePercent: '20', netMinor: 2000, taxMinor: 400 }),
      portion({ treatment: 'reverse-charge', ratePercent: '0', netMinor: 2017, taxMinor: 0 }),
    ]);
    expect(
      rows.map((row) => [row.treatment, row.country, row.receipts, row.creditNotes, row.gross.minor]),
    ).toEqual([
      ['consumer', 'AT', 1, 0, 2400],
      ['consumer', 'DE', 3, 1, 4800],
      ['reverse-charge', 'DE', 1, 0, 2017],
    ]);
    expect(totalsOf(rows)).toEqual([
      {
        net: { minor: 8051, currency: 'EUR' },
        tax: { minor: 1166, currency: 'EUR' },
        gross: { minor: 9217, currency: 'EUR' },
      },
    ]);
  });

  it('keep currencies apart', () => {
    const rows = addUp([portion({}), portion({ currency: 'JPY', netMinor: 100, taxMinor: 10 })]);
    expect(totalsOf(rows).map((total) => total.gross)).toEqual([
      { minor: 2400, currency: 'EUR' },
      { minor: 110, currency: 'JPY' },
    ]);
  });

  it('lose nothing, whatever the portions', () => {
    const some = fc.record({
      sign: fc.constantFrom(1 as const, -1 as const),
      treatment: fc.constantFrom('consumer' as const, 'reverse-charge' as const),
      country: fc.constantFrom('DE', 'AT', 'FR'),
      ratePercent: fc.constantFrom('0', '19', '25.5'),
      currency: fc.constantFrom('EUR', 'JPY'),
      documents: fc.nat(5),
      netMinor: fc.nat(1e6),
      taxMinor: fc.nat(1e6),
    });
    fc.assert(
      fc.property(fc.array(some), (portions) => {
        const totals = totalsOf(addUp(portions));
        for (const currency of ['EUR', 'JPY']) {
          const expected = portions
            .filter((one) => one.currency === currency)
            .reduce((sum, one) => sum + one.sign * (one.netMinor + one.taxMinor), 0);
          expect(totals.find((total) => total.gross.currency === currency)?.gross.minor ?? 0).toBe(
            expected + 0,
          );
        }
      }),
    );
  });
});

describe('credit notes of a receipt counted elsewhere', () => {
  it('take back what it is counted with, to the cent, however it was parted', () => {
    const settled = {
      treatment: 'consumer',
      country: 'FI',
      ratePercent: '25.5',
      currency: 'EUR',
      totalMinor: 2400,
    } as const;
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 2399 }), (first) => {
        const creditNotes = [first, 2400 - first].map((totalMinor) => ({ totalMinor, isInQuarter: true }));
        const rows = addUp([
          // 24.00 / 1.255 = 19.123… (Python decimal, ROUND_HALF_UP)
          portion({ ...settled, netMinor: 1912, taxMinor: 488 }),
          ...creditsOfSettled({ ...settled, creditNotes }),
        ]);
        expect(rows).toMatchObject([
          { receipts: 1, creditNotes: 2, net: { minor: 0 }, tax: { minor: 0 }, gross: { minor: 0 } },
        ]);
      }),
    );
  });

  it('count in the quarter in which they were issued', () => {
    const portions = creditsOfSettled({
      treatment: 'consumer',
      country: 'AT',
      ratePercent: '20',
      currency: 'EUR',
      totalMinor: 1200,
      creditNotes: [
        { totalMinor: 600, isInQuarter: false },
        { totalMinor: 600, isInQuarter: true },
      ],
    });
    expect(portions).toMatchObject([{ sign: -1, netMinor: 500, taxMinor: 100 }]);
  });
});
