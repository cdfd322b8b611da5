import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import {
  add,
  fraction,
  money,
  multiply,
  parseMoney,
  percent,
  sum,
  taxFromGross,
  taxFromNet,
} from './index.js';

type TaxRow = { mode: 'inclusive' | 'exclusive'; rate: string; net: string; tax: string; gross: string };
const { tax } = JSON.parse(
  readFileSync(new URL('../fixtures/money-reference.json', import.meta.url), 'utf8'),
) as { tax: { rows: TaxRow[]; lineOrTotal: { byLine: string; byTotal: string } } };
const eur = (text: string) => parseMoney(text, 'EUR');

describe('tax', () => {
  it.each(tax.rows)('$mode at $rate %: net $net, tax $tax, gross $gross', (row) => {
    const expected = { net: eur(row.net), tax: eur(row.tax), gross: eur(row.gross) };
    const rate = percent(row.rate);
    expect(
      row.mode === 'inclusive' ? taxFromGross(expected.gross, rate) : taxFromNet(expected.net, rate),
    ).toEqual(expected);
  });

  it('differs by a cent between rounding by line and by total', () => {
    const line = eur('0.33');
    const rate = percent('20');
    const byLine = sum([line, line, line].map((net) => taxFromNet(net, rate).tax));
    expect(byLine).toEqual(eur(tax.lineOrTotal.byLine));
    expect(taxFromNet(multiply(line, 3), rate).tax).toEqual(eur(tax.lineOrTotal.byTotal));
  });

  it('always adds up, and a gross made from a net gives that net back', () => {
    fc.assert(
      fc.property(fc.nat(1e12), fc.nat(300), (minor, thousandths) => {
        const rate = fraction(thousandths, 1000);
        const fromGross = taxFromGross(money(minor, 'EUR'), rate);
        expect(add(fromGross.net, fromGross.tax)).toEqual(fromGross.gross);
        const fromNet = taxFromNet(money(minor, 'EUR'), rate);
        expect(taxFromGross(fromNet.gross, rate).net).toEqual(fromNet.net);
      }),
    );
  });

  it('takes back from a credit what it took from the sale', () => {
    const rate = percent('25.5');
    const sale = taxFromGross(eur('12.00'), rate);
    const credit = taxFromGross(eur('-12.00'), rate);
    expect(sum([sale.tax, credit.tax]).minor).toBe(0);
    expect(sum([sale.net, credit.net]).minor).toBe(0);
  });

  it('is nothing at a rate of zero', () => {
    expect(taxFromGross(eur('9.99'), percent('0')).tax).toEqual(eur('0'));
  });
});
