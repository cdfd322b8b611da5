import type { SummaryRow, TaxTreatment } from '@windchest/contracts';
import { money, percent, taxFromGross, taxOfRefund } from '@windchest/money';

/** One rate of receipts or, with `sign` −1, of credit notes, added up. */
export interface Portion {
  readonly sign: 1 | -1;
  readonly treatment: TaxTreatment;
  readonly country: string;
  readonly ratePercent: string;
  readonly currency: string;
  readonly documents: number;
  readonly netMinor: number;
  readonly taxMinor: number;
}

/** Adds portions of the same treatment, country, rate and currency into one row each. */
export const addUp = (portions: readonly Portion[]): SummaryRow[] => {
  const rows = new Map<string, SummaryRow>();
  for (const { sign, treatment, country, ratePercent, currency, documents, netMinor, taxMinor } of portions) {
    const key = [treatment, country, ratePercent, currency].join(' ');
    const row = rows.get(key) ?? {
      treatment,
      country,
      ratePercent,
      currency,
      receipts: 0,
      creditNotes: 0,
      net: money(0, currency),
      tax: money(0, currency),
      gross: money(0, currency),
    };
    const plus = (amount: { minor: number }, minor: number) => money(amount.minor + sign * minor, currency);
    rows.set(key, {
      ...row,
      receipts: row.receipts + (sign === 1 ? documents : 0),
      creditNotes: row.creditNotes + (sign === -1 ? documents : 0),
      net: plus(row.net, netMinor),
      tax: plus(row.tax, taxMinor),
      gross: plus(row.gross, netMinor + taxMinor),
    });
  }
  const order = ['consumer', 'domestic-business', 'reverse-charge', 'business-abroad'];
  return [...rows.values()].sort(
    (a, b) =>
      order.indexOf(a.treatment) - order.indexOf(b.treatment) ||
      a.country.localeCompare(b.country, 'en') ||
      Number(a.ratePercent) - Number(b.ratePercent) ||
      a.currency.localeCompare(b.currency, 'en'),
  );
};

/** The sums over all rows, one for each currency. */
export const totalsOf = (rows: readonly SummaryRow[]) =>
  [...new Set(rows.map((row) => row.currency))].map((currency) => {
    const total = (key: 'net' | 'tax' | 'gross') =>
      money(
        rows.filter((row) => row.currency === currency).reduce((sum, row) => sum + row[key].minor, 0),
        currency,
      );
    return { net: total('net'), tax: total('tax'), gross: total('gross') };
  });

/** A receipt counted in another country than the one on it, and all its credit notes in the order of their issue. */
export interface SettledReceipt {
  readonly treatment: TaxTreatment;
  readonly country: string;
  readonly ratePercent: string;
  readonly currency: string;
  readonly totalMinor: number;
  readonly creditNotes: readonly { readonly totalMinor: number; readonly isInQuarter: boolean }[];
}

/** Its credit notes of the quarter, taxed as the receipt is counted: those of one given back whole add up to it. */
export const creditsOfSettled = ({
  creditNotes,
  currency,
  ratePercent,
  totalMinor,
  ...counted
}: SettledReceipt): Portion[] => {
  const rate = percent(ratePercent);
  const paid = taxFromGross(money(totalMinor, currency), rate);
  let before = money(0, currency);
  return creditNotes.flatMap((note) => {
    const back = money(note.totalMinor, currency);
    const { net, tax } = taxOfRefund(paid, before, back, rate);
    before = money(before.minor + back.minor, currency);
    if (!note.isInQuarter) return [];
    return [
      {
        sign: -1 as const,
        ...counted,
        ratePercent,
        currency,
        documents: 1,
        netMinor: net.minor,
        taxMinor: tax.minor,
      },
    ];
  });
};
