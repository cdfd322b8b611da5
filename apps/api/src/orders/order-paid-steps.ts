import { Injectable } from '@nestjs/common';
import { Steps } from '../database/steps.js';
import type { OrderLineRecord, OrderRecord, TaxLine } from './order-record.js';

/** An order in the transaction that marks it paid. */
export interface PaidOrder extends OrderRecord {
  readonly paidAt: Date;
  readonly lines: readonly OrderLineRecord[];
  /** Where the buyer is, for tax: the country two pieces of evidence agree on, else the declared one. */
  readonly country: string;
  /** Name and address typed on the payment page; null where nothing was to pay. */
  readonly billing: { readonly name: string | null; readonly lines: readonly string[] } | null;
  /** What the steps find out, for the e-mail and the order's page. */
  readonly facts: { receiptNumber?: string; tax?: readonly TaxLine[]; linkId?: string };
}

/** Run in the transaction that marks an order paid, by the rooms that have their part in it. */
@Injectable()
export class OrderPaidSteps extends Steps<PaidOrder> {}
