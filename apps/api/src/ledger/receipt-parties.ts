/** Who sold, as it is written into a receipt and stays there. */
export interface ReceiptSeller {
  readonly name: string;
  readonly address: string;
  readonly country: string;
  readonly vatNumber: string | null;
}

/**
 * Who bought. Name and address are kept only where a receipt must carry them: above the sum up to which a simplified
 * invoice will do (Directive 2006/112/EC, art. 220a and 226b). A VAT number is a business's.
 */
export interface ReceiptBuyer {
  readonly email: string;
  readonly country: string;
  readonly name?: string;
  readonly address?: readonly string[];
  readonly vatNumber?: string;
}

/** A line as it was sold; amounts contain the tax. */
export interface ReceiptLine {
  readonly orderLineId: string;
  readonly kit: string;
  readonly licence: string;
  readonly revision: string;
  readonly priceMinor: number;
  readonly discountMinor: number;
  readonly totalMinor: number;
  readonly ratePercent: string;
}

/** What of a line a credit note takes back. */
export interface CreditedLine extends Omit<ReceiptLine, 'priceMinor' | 'discountMinor'> {
  /** Of `totalMinor`, without the tax. */
  readonly netMinor: number;
}
