import { money, percent, spread, sum, taxOfRefund, type Money } from '@windchest/money';
import type { CreditedLine, ReceiptLine } from './receipt-parties.js';
import type { ReceiptTax } from './receipt.model.js';

interface Corrected {
  readonly currency: string;
  readonly tax: readonly ReceiptTax[];
  readonly lines: readonly ReceiptLine[];
}

export interface CreditedAmount {
  readonly orderLineId: string;
  readonly amountMinor: number;
}

/**
 * What a credit note takes back of a receipt: rate by rate, so that all credit notes of a receipt given back whole add
 * up to it; the net of a rate is spread over its lines by largest remainder, so that the lines add up to the rate.
 * @param before what earlier credit notes took back, by line
 */
export const creditOf = (
  receipt: Corrected,
  before: readonly CreditedAmount[],
  now: readonly CreditedAmount[],
): { tax: ReceiptTax[]; lines: CreditedLine[] } => {
  const { currency } = receipt;
  const rates = [...new Set(receipt.lines.map((line) => line.ratePercent))];
  const credited: CreditedLine[] = [];
  const tax: ReceiptTax[] = [];
  for (const ratePercent of rates) {
    const ofRate = receipt.lines.filter((line) => line.ratePercent === ratePercent);
    const written = receipt.tax.find((one) => one.ratePercent === ratePercent);
    if (!written) throw new Error(`A receipt has a line at ${ratePercent} % and no tax at that rate.`);
    const amountsOf = (amounts: readonly CreditedAmount[]): Money[] =>
      ofRate.map((line) =>
        money(
          amounts
            .filter((one) => one.orderLineId === line.orderLineId)
            .reduce((minor, one) => minor + one.amountMinor, 0),
          currency,
        ),
      );
    const amounts = amountsOf(now);
    const gross = sum(amounts, currency);
    if (gross.minor === 0) continue;
    const paid = {
      net: money(written.netMinor, currency),
      tax: money(written.taxMinor, currency),
      gross: money(written.netMinor + written.taxMinor, currency),
    };
    const split = taxOfRefund(paid, sum(amountsOf(before), currency), gross, percent(ratePercent));
    const nets = spread(
      split.net,
      amounts.map((amount) => amount.minor),
    );
    ofRate.forEach(({ priceMinor: _, discountMinor: __, ...line }, at) => {
      const totalMinor = amounts[at]?.minor ?? 0;
      if (totalMinor > 0) credited.push({ ...line, totalMinor, netMinor: nets[at]?.minor ?? 0 });
    });
    tax.push({ country: written.country, ratePercent, netMinor: split.net.minor, taxMinor: split.tax.minor });
  }
  return { tax, lines: credited };
};
